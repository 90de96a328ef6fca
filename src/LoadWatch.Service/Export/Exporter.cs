using LoadWatch.Activities;
using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Limits;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Stimulus;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Export;

/// <summary>Writes what is stored as JSON Lines, sorted so that equal stores give equal text.</summary>
/// <param name="person">Id of one person, or null for all.</param>
/// <param name="from">First date, or null; arrivals have no date and are never cut by it.</param>
/// <param name="to">Last date, or null.</param>
public sealed class Exporter(WorkingConfiguration configuration, StoreSession session, string? person, LocalDate? from, LocalDate? to)
{
    private TableBasis? basis;

    /// <summary>What can be exported.</summary>
    public static IReadOnlyList<string> Tables { get; } = ["arrivals", "activities", "days", "findings", "alerts", "today"];

    public void Write(string table, TextWriter output) => Write(Lines(table), output);

    /// <summary>A line of JSON each.</summary>
    public static void Write(IEnumerable<object> lines, TextWriter output)
    {
        foreach (var line in lines)
        {
            output.Write(Words.Line(line));
            output.Write('\n');
        }
    }

    private IEnumerable<object> Lines(string table) => table switch
    {
        "arrivals" => session.Arrivals.All().Where(arrival => person is null || arrival.Person == person).Select(arrival => new ArrivalLine(
            arrival.Sha, FileOf(arrival.Sha), arrival.Kind, Words.Of(arrival.State), arrival.Reason, arrival.Person)),
        "activities" => ByPerson(Activities),
        "days" => ByPerson(id => session.Days.OfPerson(id, from, to)).Select(OfDay),
        "today" => ByPerson(id => session.Rooms.Of(id) is { } room && InRange(room.Date) ? [room] : Array.Empty<TodaysRoom>()).Select(OfRoom),
        "findings" => ByPerson(id => session.Findings.OfPerson(id, from, to)).Select(OfFinding),
        "alerts" => ByPerson(id => session.Alerts.All(id)).Where(alert => InRange(alert.Raised)).Select(OfAlert),
        _ => throw new ArgumentOutOfRangeException(nameof(table)),
    };

    private IEnumerable<T> ByPerson<T>(Func<string, IEnumerable<T>> read) =>
        configuration.People.Values.Select(known => known.Id)
            .Where(id => person is null || id == person)
            .Order(StringComparer.Ordinal)
            .SelectMany(read);

    private bool InRange(LocalDate date) => (from is null || date >= from) && (to is null || date <= to);

    private string FileOf(string sha) => session.Sightings.Of(sha) is [var first, ..] ? first.Path : "";

    private IEnumerable<ActivityLine> Activities(string id)
    {
        var owner = configuration.People[id];
        var recorded = session.Activities.OfPerson(id, from, to).ToDictionary(activity => activity.Key, StringComparer.Ordinal);
        basis ??= TableBasis.Of(configuration, session);
        return PersonTraining.Of(session, configuration, basis, owner, from, to).Activities
            .Select(activity => Activity(owner, activity, recorded.GetValueOrDefault(activity.Key)));
    }

    /// <param name="recorded">What was recorded of it; null where rows of tables stand for the session alone.</param>
    private ActivityLine Activity(Person owner, JoinedActivity activity, StoredActivity? recorded)
    {
        var values = recorded?.Values ?? new ActivityValues();
        return new ActivityLine(
            owner.Id,
            Words.Date(activity.Date),
            activity.Start is { } start ? Words.Start(start.WithOffset(recorded?.Session.LocalOffset ?? owner.Zone.GetUtcOffset(start))) : null,
            activity.Sport.ToString(),
            recorded?.Session.ElapsedSeconds,
            recorded?.Session.TimerSeconds,
            activity.Quantities.Select(quantity => new QuantityLine(quantity.Name, quantity.Value, quantity.Unit, quantity.Estimated)).ToList(),
            configuration.Groups[owner.Group].LoadQuantity,
            TimesInZone(values.TimesInZone),
            values.HeartRateMeanBpm,
            values.HeartRateMaxBpm,
            values.PowerMeanWatts,
            values.PowerMaxWatts,
            activity.UsableShare.OrderBy(pair => pair.Key).ToDictionary(pair => Words.Channel(pair.Key), pair => pair.Value, StringComparer.Ordinal),
            values.Cuts.Select(OfCut).ToList(),
            activity.Stimulus.Select(OfStimulus).ToList(),
            recorded?.Merge.Contributions.OrderBy(one => one.Key, StringComparer.Ordinal).Select(OfRecording).ToList() ?? [],
            activity.Tables,
            activity.AddsLoad,
            activity.Remarks);
    }

    private static CutLine OfCut(Cut cut) => new(
        cut.Channel is { } channel ? Words.Channel(channel) : null,
        Words.Of(cut.Reason),
        Moment(cut.Stretch.From),
        Moment(cut.Stretch.To),
        cut.Readings,
        cut.Milliseconds / 1000.0,
        cut.Share);

    private static string? Moment(long? unixMilliseconds) => unixMilliseconds is { } known ? Words.Utc(Instant.FromUnixTimeMilliseconds(known)) : null;

    private RecordingLine OfRecording(Contribution contribution)
    {
        var (sha, part) = RecordingKey.Parse(contribution.Key);
        return new RecordingLine(
            sha,
            FileOf(sha),
            part,
            Words.Of(contribution.Role),
            contribution.Gifts?.Select(gift => gift.Channel is { } channel ? Words.Channel(channel) : Words.Of(gift.Whole!.Value)).ToList());
    }

    private static TimeInZoneLine TimesInZone(IReadOnlyList<TimeInZone> times)
    {
        IReadOnlyList<double>? Seconds(Channel channel) => times.FirstOrDefault(zone => zone.Channel == channel)?.Seconds;
        return new TimeInZoneLine(
            Seconds(Channel.HeartRate),
            Seconds(Channel.Power),
            Seconds(Channel.Speed),
            times.OrderBy(zone => zone.Channel).ToDictionary(
                zone => Words.Channel(zone.Channel),
                zone => new ZonesLine(zone.Basis, zone.Bounds, Words.Unit(zone.Channel), zone.Estimated),
                StringComparer.Ordinal));
    }

    private static StimulusLine OfStimulus(RegionStimulus stimulus) => new(
        BodyRegions.Word(stimulus.Region),
        OfBand(stimulus.HardBouts),
        OfBand(stimulus.HardRepetitions),
        OfBand(stimulus.SlowSeconds),
        OfBand(stimulus.MediumSeconds),
        OfBand(stimulus.LargeSeconds),
        stimulus.Grade.ToString(),
        stimulus.Channel,
        stimulus.NotSeen);

    private static BandLine? OfBand(Band? band) => band is { } known ? new BandLine(known.Low, known.Mid, known.High) : null;

    private static DayLine OfDay(Day day) => new(
        day.Person,
        Words.Date(day.Date),
        Words.Of(day.State),
        day.StateSource,
        day.Load,
        day.LoadError,
        day.Acute,
        day.Chronic,
        day.RatioCoupled,
        day.RatioUncoupled,
        day.RatioEwma,
        day.WeeklyChange,
        day.WeeklyChangeOrdinary,
        day.UsualWeek,
        day.LargestSession30,
        day.LongestRunMetres30,
        day.Monotony,
        day.Strain,
        day.Coverage7,
        day.Coverage28,
        ByRegion(day, region => region.Days7),
        ByRegion(day, region => region.Days28),
        ByRegion(day, region => region.Days14),
        ByRegion(day, region => region.Usual14),
        ByRegion<int?>(day, region => region.Known7),
        ByRegion<int?>(day, region => region.Known14),
        ByRegion<int?>(day, region => region.Known28),
        ByRegion(day, region => region.DaysSince));

    private static RoomLine OfRoom(TodaysRoom room) => new(
        room.Person,
        Words.Date(room.Date),
        room.LoadQuantity,
        room.Load,
        room.Reason is { } reason ? Words.Of(reason) : null,
        room.HeldBy,
        room.IsPassedAtRest,
        room.LargestDay,
        room.LargestDayOn is { } on ? Words.Date(on) : null,
        room.Regions.ToDictionary(week => BodyRegions.Word(week.Region), week => new HeavyWeekLine(week.Days, week.Known, week.UsualDays, week.IsReached), StringComparer.Ordinal));

    private static Dictionary<string, T?> ByRegion<T>(Day day, Func<RegionDay, T?> value) =>
        BodyRegions.All.ToDictionary(
            BodyRegions.Word, region => day.Regions.TryGetValue(region, out var known) ? value(known) : default, StringComparer.Ordinal);

    private static FindingLine OfFinding(Finding finding) => new(
        finding.Person,
        finding.Rule,
        finding.Region is { } region ? BodyRegions.Word(region) : null,
        finding.Quantity,
        Words.Date(finding.Date),
        Words.Of(finding.Severity),
        finding.Value,
        finding.Limit,
        finding.Unit);

    public static AlertLine OfAlert(Alert alert) => new(
        alert.Id,
        alert.Key.Person,
        alert.Key.Rule,
        alert.Key.Region is { } region ? BodyRegions.Word(region) : null,
        alert.Key.Quantity,
        Words.Date(alert.Raised),
        Words.Of(alert.State),
        Words.Of(alert.Severity),
        alert.ShelvedUntil is { } until ? Words.Date(until) : null,
        Words.Of(alert.Watch),
        alert.Text);
}
