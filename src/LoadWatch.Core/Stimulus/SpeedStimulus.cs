using System.Buffers;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>
/// Reads speed on foot: corrected for slope by the ratio of the costs (<see cref="SlopeCost"/>), then relative drive from critical speed, maximal speed and the
/// balance of D', then the pool. Grade C at ten readings a second on the level with tested speeds, else D: at one a second short bouts are lost.
/// </summary>
public static class SpeedStimulus
{
    private const int FastMilliseconds = 100;

    /// <param name="speed">Usable readings, m/s.</param>
    /// <param name="altitude">Usable readings, m, or null.</param>
    public static EnduranceEstimate Of(UsableChannel speed, UsableChannel? altitude, Sport sport, SpeedCapacity capacity, Variants variants)
    {
        var slopes = Gradients.AreKnown(altitude, sport) ? altitude : null;
        var isFast = IsFast(speed.Milliseconds);
        var grade = isFast && slopes is null && capacity.IsTested ? Grade.C : Grade.D;
        IReadOnlyList<string> notSeen = [.. capacity.NotSeen, .. EnduranceRemarks.OfSpeed(sport, altitude is not null, isFast)];
        if (slopes is null)
        {
            return EnduranceReading.Of(new Readings(speed), capacity.Limits, variants, grade, StimulusChannels.Speed, notSeen);
        }

        var room = ArrayPool<double>.Shared.Rent(speed.Count);
        try
        {
            var level = room.AsSpan(0, speed.Count);
            Level(speed, slopes, sport.Name is "walking" or "hiking", level);
            var readings = new Readings(speed.UnixMilliseconds, level, speed.Milliseconds);
            return EnduranceReading.Of(readings, capacity.Limits, variants, grade, StimulusChannels.Speed, notSeen);
        }
        finally
        {
            ArrayPool<double>.Shared.Return(room);
        }
    }

    /// <summary>Fills in the speeds on the level that cost as much.</summary>
    private static void Level(UsableChannel speed, UsableChannel altitude, bool walking, Span<double> level)
    {
        var values = speed.Values;
        Gradients.Along(speed, altitude, level);
        for (var at = 0; at < values.Length; at++)
        {
            level[at] = values[at] * SlopeCost.Ratio(level[at], walking);
        }
    }

    /// <summary>Whether most readings stand for a tenth of a second or less.</summary>
    private static bool IsFast(ReadOnlySpan<int> milliseconds)
    {
        var (fast, held) = (0, 0);
        foreach (var one in milliseconds)
        {
            held += one > 0 ? 1 : 0;
            fast += one is > 0 and <= FastMilliseconds ? 1 : 0;
        }

        return fast > held / 2;
    }
}
