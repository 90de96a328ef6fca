namespace LoadWatch.Recordings;

/// <summary>How fast the people of a file moved, counted in steps of 0.01 m/s, so that no reading is kept. People in the order in which they came.</summary>
public sealed class SpeedTally
{
    private const double Steps = 100;

    // 1000 m/s: no unit writes what moves so that it is beyond.
    private const int Fastest = 100_000;

    private readonly Dictionary<string, int[]> counts = new(StringComparer.Ordinal);
    private readonly List<string> people = [];

    public IReadOnlyList<string> People => people;

    /// <summary>Counts the readings from <see cref="UnitOutliers.MovingFrom"/> on, where the recording is of a named person.</summary>
    public void Add(Recording recording)
    {
        ArgumentNullException.ThrowIfNull(recording);
        if (recording.Subject is not { } person || recording.Samples[Channel.Speed] is not { IsEmpty: false } speeds)
        {
            return;
        }

        var known = CountsOf(person);
        foreach (var speed in speeds)
        {
            if (speed >= UnitOutliers.MovingFrom)
            {
                var step = (int)Math.Min((speed * Steps) + 0.5, Fastest);
                if (step >= known.Length)
                {
                    Array.Resize(ref known, Math.Max(step + 1, known.Length * 2));
                }

                known[step]++;
            }
        }

        counts[person] = known;
    }

    /// <summary>Median, m/s; null where the person never moved.</summary>
    public double? Median(string person) => Share(person, 0.5);

    /// <summary>99th percentile, m/s; null where the person never moved.</summary>
    public double? High(string person) => Share(person, 0.99);

    /// <summary>By the nearest rank.</summary>
    private double? Share(string person, double share)
    {
        var known = counts[person];
        var rank = Math.Max(1, (long)Math.Ceiling(share * known.Sum(count => (long)count)));
        for (var step = 0; step < known.Length; step++)
        {
            rank -= known[step];
            if (rank <= 0)
            {
                return step / Steps;
            }
        }

        return null;
    }

    private int[] CountsOf(string person)
    {
        if (!counts.TryGetValue(person, out var known))
        {
            counts[person] = known = new int[1024];
            people.Add(person);
        }

        return known;
    }
}
