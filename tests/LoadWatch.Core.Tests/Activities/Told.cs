using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What recordings and tables tell of a person on the date of <see cref="Given"/>.</summary>
internal static class Told
{
    public static readonly AnchorBook Anchors = Given.Anchors(
        Given.Anchor(AnchorKind.OneRepetitionMax, 100, Given.Date.PlusDays(-7), exercise: "squat"));

    public static JoinResult Join(IEnumerable<RecordedActivity> recorded, params OwnedRow[] rows) =>
        ActivityJoin.Join(Given.Person(), [.. recorded], rows, Anchors, new ComputationSettings());

    /// <summary>A recording of an hour that tells of its minutes.</summary>
    public static RecordedActivity Recorded(string sport, int hour, int minute = 0, int sets = 0, LocalDate? date = null, params Quantity[] quantities)
    {
        var start = (date ?? Given.Date).At(new LocalTime(hour, minute));
        var summary = new RecordingSummary(
            $"{sport}{start:MMddHHmm}", 1, "p1", start.InUtc().ToInstant(), Offset.Zero, Sport.Parse(sport), 3600, 3600, "device 1", ChannelExtents.None, 10, sets, 0);
        return new RecordedActivity(summary, start, new ActivityValues { Quantities = [.. quantities, Minutes(60)] });
    }

    public static RecordedActivity With(this RecordedActivity recorded, params RegionStimulus[] stimulus) =>
        recorded with { Values = recorded.Values with { Stimulus = stimulus } };

    public static OwnedRow Session(
        string layout = "ratings",
        int? order = null,
        LocalTime? start = null,
        string? sport = null,
        string? drill = null,
        double? minutes = null,
        double? rating = null,
        DeclaredContent? content = null,
        LocalDate? date = null,
        string? key = null,
        params Quantity[] quantities) => new(
        layout,
        date ?? Given.Date,
        key ?? $"{order} {start} {drill}",
        new SessionRow(order, start, sport, drill, minutes, rating, quantities, content));

    public static OwnedRow Set(
        int set,
        string exercise = "squat",
        int? repetitions = 5,
        double? kilograms = 85,
        double? reserve = 1,
        double? hardness = null,
        int? order = null,
        LocalTime? time = null,
        string layout = "gym",
        LocalDate? date = null) => new(
        layout,
        date ?? Given.Date,
        $"{order} {time} {exercise} {set}",
        new SetRow(order, time, exercise, null, set, repetitions, kilograms, null, reserve, hardness, null, SetLoad.Weight, false, false));

    public static Quantity Minutes(double value) => new(QuantityNames.Minutes, value, "min", Estimated: false);

    public static Quantity Distance(double value) => new(QuantityNames.Distance, value, "m", Estimated: false);

    public static Quantity Top(double value) => new(QuantityNames.SpeedTop, value, "m/s", Estimated: false);

    public static RegionStimulus Region(string channel, Grade grade, double? bouts, double? repetitions, BodyRegion region = BodyRegion.Legs) => new(
        region, grade, channel, BandOf(bouts), BandOf(repetitions), repetitions is null ? null : 2, new Band(100, 100, 100), null, null, []);

    private static Band? BandOf(double? value) => value is { } known ? new Band(known, known, known) : null;
}
