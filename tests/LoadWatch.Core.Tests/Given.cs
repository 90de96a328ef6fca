using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch;

/// <summary>Valid recordings, people and anchors of the computation's tests.</summary>
internal static class Given
{
    public static LocalDate Date { get; } = new(2026, 3, 10);

    public static Instant Start { get; } = Instant.FromUtc(2026, 3, 10, 9, 0);

    public static long StartMilliseconds { get; } = Start.ToUnixTimeMilliseconds();

    public static Person Person(Sex? sex = Sex.Male, int? birthYear = null) =>
        new("p1", "Ada Example", "g1", birthYear, sex, DateTimeZone.Utc);

    public static Anchor Anchor(
        AnchorKind kind, double value, LocalDate? date = null, AnchorSource source = AnchorSource.Measured, string? exercise = null) =>
        new("p1", date, kind, value, source, exercise);

    public static AnchorBook Anchors(params Anchor[] anchors) => new(anchors);

    public static Anchor[] Cyclist { get; } =
    [
        Anchor(AnchorKind.CriticalPower, 250),
        Anchor(AnchorKind.WPrime, 20_000),
        Anchor(AnchorKind.PowerMax, 1000, Date.PlusDays(-30)),
    ];

    public static Anchor[] Runner { get; } =
    [
        Anchor(AnchorKind.CriticalSpeed, 4),
        Anchor(AnchorKind.DPrime, 200),
        Anchor(AnchorKind.SpeedMax, 8, Date.PlusDays(-30)),
    ];

    public static Recording Recording(string sport, SampleSeries samples, params StrengthSet[] sets) => new()
    {
        Part = 1,
        Sport = new Sport(sport),
        Start = Start,
        Samples = samples,
        Sets = sets,
    };

    /// <summary>One row a second from the start on.</summary>
    public static SampleSeries EverySecond(params (Channel Channel, double[] Values)[] columns) => new(
        [.. Enumerable.Range(0, columns[0].Values.Length).Select(second => StartMilliseconds + (second * 1000L))],
        columns.ToDictionary(column => column.Channel, column => column.Values));

    /// <summary>Values that each stand for 1 s; one more row ends the last of them.</summary>
    public static double[] Steps(params (double Value, int Seconds)[] steps) =>
        [.. steps.SelectMany(step => Enumerable.Repeat(step.Value, step.Seconds)), steps[^1].Value];

    public static UsableSample[] Samples(params (double Value, int Seconds)[] steps)
    {
        var values = Steps(steps);
        return [.. values.Select((value, second) =>
            new UsableSample(StartMilliseconds + (second * 1000L), value, second == values.Length - 1 ? 0 : 1000))];
    }

    public static Histogram Histogram(params (int Bin, double Minutes)[] bins)
    {
        var histogram = new Histogram();
        foreach (var (bin, minutes) in bins)
        {
            histogram.Add(bin, (long)(minutes * 60_000));
        }

        return histogram;
    }

    public static StrengthSet Set(string? exercise, int? repetitions, double? kilograms, double? reserve = null, bool active = true) =>
        new(Start, 30, active, exercise, repetitions, kilograms, reserve);
}
