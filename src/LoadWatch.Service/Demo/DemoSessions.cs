using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>From what is planned to what a device records.</summary>
public static class DemoSessions
{
    private static readonly Sport Water = new("rowing");
    private static readonly Sport Machine = new("rowing", "indoor_rowing");
    private static readonly Sport Weights = new("training", "strength_training");
    private static readonly Sport Road = new("cycling", "road");

    /// <summary>Every session that a device records of the person, oldest first; classes are written down instead.</summary>
    public static IEnumerable<FitActivity> Of(DemoPerson person, int seed, LocalDate until) =>
        person.Part.Group == DemoCast.Class ? [] : DemoTimeline.Of(person.Part, seed, until).Select(planned => Record(person, planned, seed));

    /// <summary>How long the session of <see cref="Record"/> is.</summary>
    public static double Minutes(DemoPerson person, PlannedSession planned, int seed)
    {
        var random = DemoRandom.For(seed, person.Part.Id, planned.Start);
        var minutes = planned.Slot.Minutes * random.Factor(person.Part.Week.LengthDeviation);
        return planned.Slot.Kind switch
        {
            SessionKind.RowIntervals or SessionKind.RideIntervals => Efforts.Intervals(random).Sum(effort => effort.Seconds) / 60.0,
            SessionKind.RowLong => planned.Slot.Minutes,
            _ => minutes,
        };
    }

    public static FitActivity Record(DemoPerson person, PlannedSession planned, int seed)
    {
        var random = DemoRandom.For(seed, person.Part.Id, planned.Start);
        var start = planned.Start.InZoneLeniently(DemoPerson.Zone);
        var minutes = planned.Slot.Minutes * random.Factor(person.Part.Week.LengthDeviation);
        var bare = new FitActivity { Start = start.ToInstant(), LocalOffset = start.Offset, Device = DemoPods.Of(person.Part.Id, planned.Date) ?? person.Device };
        var activity = planned.Slot.Kind switch
        {
            SessionKind.Row => Row(bare, person, Efforts.Steady(random, minutes), random),
            SessionKind.RowLong => Row(bare, person, Efforts.Steady(random, planned.Slot.Minutes), random),
            SessionKind.RowIntervals => Row(bare, person, Efforts.Intervals(random), random),
            SessionKind.Ride => Ride(bare, person, Efforts.Steady(random, minutes), random),
            SessionKind.RideIntervals => Ride(bare, person, Efforts.Intervals(random), random),
            SessionKind.Gym => Strength(bare, person, minutes, random),
            _ => throw new ArgumentException("a class is written down, not recorded", nameof(planned)),
        };
        return planned.HeartRateSeen ? activity : activity with { Samples = [.. activity.Samples.Select(sample => sample with { HeartRate = 0 })] };
    }

    private static FitActivity Row(FitActivity bare, DemoPerson person, IReadOnlyList<Effort> efforts, DemoRandom random) => bare with
    {
        Sport = random.Between(0, 1) < 0.6 ? Water : Machine,
        Samples = EnduranceSession.Row(person, bare.Start, efforts, random),
    };

    private static FitActivity Ride(FitActivity bare, DemoPerson person, IReadOnlyList<Effort> efforts, DemoRandom random) => bare with
    {
        Sport = Road,
        Samples = EnduranceSession.Ride(person, bare.Start, efforts, random),
    };

    private static FitActivity Strength(FitActivity bare, DemoPerson person, double minutes, DemoRandom random)
    {
        var sets = StrengthSession.Sets(person, bare.Start, minutes, random);
        return bare with { Sport = Weights, Sets = sets, Samples = StrengthSession.Samples(person, sets, random) };
    }
}
