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

    /// <summary>Every session of the person, oldest first.</summary>
    public static IEnumerable<FitActivity> Of(DemoPerson person, int seed, LocalDate until) =>
        DemoTimeline.Of(person.Part, seed, until).Select(planned => Record(person, planned, seed));

    public static FitActivity Record(DemoPerson person, PlannedSession planned, int seed)
    {
        var random = DemoRandom.For(seed, person.Part.Id, planned.Start);
        var start = planned.Start.InZoneLeniently(DemoPerson.Zone);
        var minutes = planned.Slot.Minutes * random.Factor(person.Part.Week.LengthDeviation);
        var bare = new FitActivity { Start = start.ToInstant(), LocalOffset = start.Offset, Device = person.Device };
        var activity = planned.Slot.Kind switch
        {
            SessionKind.Row => Row(bare, person, Efforts.Steady(random, minutes), random),
            SessionKind.RowIntervals => Row(bare, person, Efforts.Intervals(random), random),
            SessionKind.Ride => Ride(bare, person, Efforts.Steady(random, minutes), random),
            SessionKind.RideIntervals => Ride(bare, person, Efforts.Intervals(random), random),
            _ => Strength(bare, person, planned.Slot.Kind, minutes, random),
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

    private static FitActivity Strength(FitActivity bare, DemoPerson person, SessionKind kind, double minutes, DemoRandom random)
    {
        var sets = StrengthSession.Sets(person, kind, bare.Start, minutes, random);
        return bare with { Sport = Weights, Sets = sets, Samples = StrengthSession.Samples(person, sets, random) };
    }
}
