using LoadWatch.Activities;
using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Storage.Tests;

/// <summary>Valid things, told apart by a number.</summary>
internal static class Some
{
    public static readonly LocalDate Date = new(2026, 3, 1);

    public static readonly Instant Moment = Instant.FromUtc(2026, 3, 2, 5, 0);

    public static string Sha(int number) => number.ToString("x64");

    public static RecordingSummary Recording(int number) => new(
        Sha(number),
        Part: 1,
        "anna",
        Instant.FromUtc(2026, 3, 1, 7, 30).Plus(Duration.FromMilliseconds(number)),
        Offset.FromHoursAndMinutes(5, 30),
        new Sport("training", "strength_training"),
        ElapsedSeconds: 3600.25,
        TimerSeconds: null,
        "device 255/7/1234",
        Channels: new ChannelExtents([new ChannelExtent(Channel.HeartRate, IsUsable: true, 5, 7), new ChannelExtent(Channel.Power, IsUsable: false, null, null)]),
        Samples: 3601,
        Sets: 4,
        SamplesDigest: long.MinValue + number)
    {
        DistanceMetres = 0.1 + 0.2,
    };

    public static StoredActivity Activity(int number) => new(Recording(number), new ActivityValues());

    public static Day Day(LocalDate date) => new() { Person = "anna", Date = date, State = DayState.Unknown };

    public static Evidence Evidence { get; } = new(
        "acute / chronic before",
        "a choice",
        [new EvidenceItem("acute", 812.5, "AU"), new EvidenceItem("maximal heart rate", null, "bpm", "never measured; Größe > 0")]);

    public static Finding Finding(LocalDate date) => new(
        "anna",
        date,
        "stimulus_gap",
        BodyRegion.Legs,
        Severity.Warning,
        Since: date.PlusDays(-3),
        Value: 14,
        Limit: 0.1 + 0.2,
        "days",
        "no heavy work for 14 days",
        Evidence);

    public static Alert Alert(string person = "anna") => new(
        new FindingKey(person, "load_ratio", null), Date, Date.PlusDays(2), AlertState.Unacknowledged, Severity.Notice, "well above the usual");

    public static AlertChange Change(Alert alert, int sequence) => new(
        alert.Id, sequence, Date, AlertState.Normal, AlertState.Unacknowledged, AlertChangeReason.Raised, Severity.Notice, "raised", Evidence);

    public static Notice Notice(string contact, LocalDate date) => new(
        $"{contact}|brief|{date:uuuu-MM-dd}", contact, date, "Morning brief", "All quiet.", "<p>All quiet.</p>", NoticeReason.BriefDue);

    public static Quantity Quantity(string name, double value) => new(name, value, "AU", Estimated: true);
}
