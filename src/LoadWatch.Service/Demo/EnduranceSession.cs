using LoadWatch.Decoding.Fit;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Samples of rowing and riding, one a second: power as intended with its unevenness, and what follows from it.</summary>
internal static class EnduranceSession
{
    private const double PowerDeviation = 0.04;

    public static List<FitSample> Row(DemoPerson person, Instant start, IReadOnlyList<Effort> efforts, DemoRandom random)
    {
        var distance = 0.0;
        return Samples(person, start, efforts, random, (sample, share) =>
        {
            distance += 2.3 + (1.4 * Math.Min(share, 2));
            return sample with { Cadence = (int)Math.Round(13 + (10 * share) + (0.5 * random.Normal())), Distance = Tenths(distance) };
        });
    }

    public static List<FitSample> Ride(DemoPerson person, Instant start, IReadOnlyList<Effort> efforts, DemoRandom random)
    {
        var (distance, altitude, slope) = (0.0, random.Between(40, 90), 0.0);
        return Samples(person, start, efforts, random, (sample, share) =>
        {
            slope += (-0.01 * slope) + (0.001 * random.Normal());
            var speed = Math.Clamp(4.5 + (5 * share) - (60 * slope), 2, 16);
            distance += speed;
            altitude = Math.Clamp(altitude + (speed * slope), 5, 250);
            return sample with
            {
                Speed = Tenths(speed),
                Cadence = (int)Math.Round(84 + (4 * share) + random.Normal()),
                Distance = Tenths(distance),
                Altitude = Math.Round(altitude * 5) / 5,
            };
        });
    }

    private static List<FitSample> Samples(
        DemoPerson person, Instant start, IReadOnlyList<Effort> efforts, DemoRandom random, Func<FitSample, double, FitSample> finish)
    {
        var heart = new Heart(person.HeartRateRestBpm, person.HeartRateMaxBpm, random);
        var critical = person.CriticalPowerWatts;
        var samples = new List<FitSample>(efforts.Sum(effort => effort.Seconds));
        foreach (var effort in efforts)
        {
            for (var second = 0; second < effort.Seconds; second++)
            {
                var share = effort.OfCriticalPower * random.Factor(PowerDeviation);
                var sample = new FitSample(start + Duration.FromSeconds(samples.Count), heart.After(Demand(share), 1), (int)Math.Round(critical * share));
                samples.Add(finish(sample, share));
            }
        }

        return samples;
    }

    /// <summary>Fraction of heart-rate reserve that a power asks for in the end: 0.86 at critical power.</summary>
    private static double Demand(double ofCriticalPower) => Math.Min(1, 0.2 + (0.66 * ofCriticalPower));

    private static double Tenths(double value) => Math.Round(value * 10) / 10;
}
