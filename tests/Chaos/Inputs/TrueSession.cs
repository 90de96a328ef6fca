using NodaTime;

namespace LoadWatch.Chaos.Inputs;

/// <summary>
/// One session as it was: a sample a second, the heart rate in steps whose zones are plain. What must come out of it is computed here, by counting.
/// </summary>
/// <param name="Local">Local start, whole seconds.</param>
/// <param name="Steps">Heart rate (bpm) and for how many seconds.</param>
public sealed record TrueSession(string Person, LocalDateTime Local, DateTimeZone Zone, IReadOnlyList<(int Bpm, int Seconds)> Steps)
{
    /// <summary>Inner bounds of the zones as shares of the heart-rate reserve (Garber et al. 2011); no step lies near one.</summary>
    private static readonly double[] Bounds = [0.30, 0.40, 0.60, 0.90];

    public LocalDate Date => Local.Date;

    public Instant Start => Local.InZoneStrictly(Zone).ToInstant();

    /// <summary>From the first sample to the last.</summary>
    public int Seconds => Steps.Sum(step => step.Seconds);

    /// <summary>Heart rate of each second, the last one's once more at the end.</summary>
    public IReadOnlyList<int> HeartRates => [.. Steps.SelectMany(step => Enumerable.Repeat(step.Bpm, step.Seconds)), Steps[^1].Bpm];

    /// <summary>Seconds in each of the five zones.</summary>
    public IReadOnlyList<int> ZoneSeconds
    {
        get
        {
            var (rest, max) = Cast.HeartRates(Person);
            var seconds = new int[Bounds.Length + 1];
            foreach (var (bpm, length) in Steps)
            {
                var share = (bpm - rest) / (double)(max - rest);
                seconds[Bounds.Count(bound => share >= bound)] += length;
            }

            return seconds;
        }
    }

    /// <summary>A session of three steps, told apart from any other by its numbers.</summary>
    public static TrueSession Make(string person, LocalDate date, LocalTime at, DateTimeZone zone, Random random)
    {
        ArgumentNullException.ThrowIfNull(random);
        var (rest, max) = Cast.HeartRates(person);
        int At(double share) => (int)Math.Round(rest + (share * (max - rest)));
        return new TrueSession(
            person,
            date + at,
            zone,
            [(At(0.35), 40 + random.Next(40)), (At(0.5), 60 + random.Next(60)), (At(0.75), 60 + random.Next(60))]);
    }
}
