using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Sets of a gym session with the rests between them, and a heart rate every five seconds.</summary>
internal static class StrengthSession
{
    private const int SampleSeconds = 5;
    private const double LeastShare = 0.75;
    private const double MostShare = 0.82;

    private static readonly Lift[] RowersLifts = [new("squat", 3, 6), new("deadlift", 3, 5), new("row", 3, 8), new("bench_press", 3, 8)];

    /// <summary>The sets in time order, rests as sets that are not active.</summary>
    public static IReadOnlyList<StrengthSet> Sets(DemoPerson person, Instant start, double minutes, DemoRandom random)
    {
        var turn = minutes * 60 / RowersLifts.Sum(lift => lift.Sets);
        List<StrengthSet> sets = [];
        var at = start;
        foreach (var lift in RowersLifts)
        {
            var kilograms = Kilograms(person, lift, random);
            for (var set = 0; set < lift.Sets; set++)
            {
                var work = Math.Round(lift.Repetitions * random.Between(3, 4));
                sets.Add(new StrengthSet(at, work, Active: true, lift.Exercise, lift.Repetitions, kilograms));
                at += Duration.FromSeconds(work);
                var rest = Math.Round(Math.Max(45, (turn - work) * random.Factor(0.1)));
                sets.Add(new StrengthSet(at, rest, Active: false, null, null, null));
                at += Duration.FromSeconds(rest);
            }
        }

        return sets;
    }

    public static List<FitSample> Samples(DemoPerson person, IReadOnlyList<StrengthSet> sets, DemoRandom random)
    {
        var heart = new Heart(person.HeartRateRestBpm, person.HeartRateMaxBpm, random);
        var start = sets[0].Start!.Value;
        var samples = new List<FitSample>();
        foreach (var set in sets)
        {
            var end = set.Start!.Value + Duration.FromSeconds(set.DurationSeconds!.Value);
            for (var at = start + Duration.FromSeconds(samples.Count * SampleSeconds); at < end; at += Duration.FromSeconds(SampleSeconds))
                samples.Add(new FitSample(at, heart.After(set.Active ? 0.75 : 0.35, SampleSeconds)));
        }

        return samples;
    }

    /// <summary>
    /// Between three quarters and a little above four fifths of the maximum, in the steps of the plates: hard from the first repetition, also where
    /// nobody logs how many more would have gone.
    /// </summary>
    private static double Kilograms(DemoPerson person, Lift lift, DemoRandom random)
    {
        var most = person.OneRepetitionMaxKilograms(lift.Exercise);
        var step = most > 40 ? 2.5 : 0.5;
        return Math.Ceiling(most * random.Between(LeastShare, MostShare) / step) * step;
    }

    private sealed record Lift(string Exercise, int Sets, int Repetitions);
}
