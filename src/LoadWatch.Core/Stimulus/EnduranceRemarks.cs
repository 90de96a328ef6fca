using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>What endurance channels do not see, in plain words.</summary>
internal static class EnduranceRemarks
{
    public const string OfHeartRate =
        "bouts and the largest class: heart rate cannot show them; power with critical_power and power_max, speed on foot with critical_speed and speed_max, or logged sets, would";

    public const string NoChannel =
        "nothing to read it from: power with critical_power, speed on foot with critical_speed, or heart rate with heart_rate_rest and heart_rate_max";

    /// <summary>Heavy pedalling: a choice.</summary>
    private const double LowCadenceRpm = 60;

    private const double HeavyShareOfCritical = 0.65;
    private const int LeastSeconds = 60;

    /// <summary>Of speed, where it was read.</summary>
    public static IEnumerable<string> OfSpeed(Sport sport, bool hasAltitude, bool isFast)
    {
        if (sport.Detail == Gradients.Treadmill)
        {
            yield return "incline of the treadmill: read as level";
        }
        else if (!hasAltitude)
        {
            yield return "slope: no usable height, so read as level";
        }

        if (!isFast)
        {
            yield return "sprints and other short efforts: fewer than ten readings of speed a second flatten or miss them, a lower bound";
        }

        if (sport.IsTeamSport)
        {
            yield return "starts, stops and turns: dearer than their speed, a lower bound";
        }
    }

    /// <summary>Of bouts where a part of the session was not seen.</summary>
    public static string OfUnseen(string channel, double share, bool isReached)
    {
        var unseen = (100 * (1 - share)).ToString("0", CultureInfo.InvariantCulture);
        return $"{unseen} % of the session without usable {channel}: {(isReached ? "bouts and the largest class are a lower bound" : "bouts and the largest class are unknown, as hard work may lie there")}";
    }

    /// <summary>How far a poorer channel tells what a better one did not; nothing under a minute.</summary>
    public static IEnumerable<string> OfFill(string better, long milliseconds)
    {
        if (milliseconds >= LeastSeconds * 1000)
        {
            var minutes = (milliseconds / 60_000.0).ToString("0", CultureInfo.InvariantCulture);
            yield return $"{minutes} min without usable {better}: heart rate tells the slow and medium classes there";
        }
    }

    /// <summary>What concerns the sport and its channels, whatever was read.</summary>
    public static IEnumerable<string> OfSession(UsableRecording usable, PowerCapacity? power, SpeedCapacity? speed)
    {
        var sport = usable.Recording.Sport;
        return [.. OfPower(usable, power), .. OfSpeedLeftOut(usable, speed), .. OfPedalling(usable, power), .. OfLengthening(sport)];
    }

    private static IEnumerable<string> OfPower(UsableRecording usable, PowerCapacity? capacity)
    {
        if (usable[Channel.Power] is not null && capacity is null)
        {
            yield return SessionStimulus.ReadsSpeed(usable.Recording.Sport)
                ? "power on foot is a model of the watch and is not read"
                : "power: no critical_power to read it against";
        }
        else if (usable[Channel.Power] is null && usable.Channels.ContainsKey(Channel.Power))
        {
            yield return "power: too little of it is usable";
        }
    }

    private static IEnumerable<string> OfSpeedLeftOut(UsableRecording usable, SpeedCapacity? capacity)
    {
        if (!usable.Channels.ContainsKey(Channel.Speed))
        {
            yield break;
        }

        if (!SessionStimulus.ReadsSpeed(usable.Recording.Sport))
        {
            if (!usable.Channels.ContainsKey(Channel.Power))
            {
                yield return "speed is not read on wheels, water and skis: power with critical_power and power_max, or logged sets, would tell";
            }
        }
        else if (usable[Channel.Speed] is null)
        {
            yield return "speed: too little of it is usable";
        }
        else if (capacity is null)
        {
            yield return "speed: no critical_speed to read it against";
        }
    }

    /// <summary>Force at the pedal follows from cadence, and type II fibres from force (Ahlquist et al. 1992): power alone reads it as a lower bound.</summary>
    private static IEnumerable<string> OfPedalling(UsableRecording usable, PowerCapacity? capacity)
    {
        if (capacity is null || usable[Channel.Power] is not { } power || !IsPedalled(usable.Recording.Sport))
        {
            yield break;
        }

        if (usable[Channel.Cadence] is not { } cadence)
        {
            yield return "heavy pedalling at a low cadence: no usable cadence";
        }
        else if (HeavySeconds(power, cadence, HeavyShareOfCritical * capacity.Critical.Value) is >= LeastSeconds and var seconds)
        {
            var minutes = (seconds / 60).ToString("0", CultureInfo.InvariantCulture);
            yield return $"heavy pedalling: {minutes} min below 60 rpm at 65 % of critical_power or more, where force is more than power tells, a lower bound";
        }
    }

    private static bool IsPedalled(Sport sport) => sport.Name is "cycling" or "e_biking" || sport.Detail == "indoor_cycling";

    private static double HeavySeconds(UsableChannel power, UsableChannel cadence, double watts)
    {
        var times = power.UnixMilliseconds;
        var values = power.Values;
        var milliseconds = power.Milliseconds;
        var known = cadence.UnixMilliseconds;
        var rpm = cadence.Values;
        var (next, seconds) = (0, 0.0);
        for (var at = 0; at < times.Length; at++)
        {
            while (next < known.Length && known[next] <= times[at])
            {
                next++;
            }

            if (values[at] >= watts && next > 0 && rpm[next - 1] is > 0 and < LowCadenceRpm && times[at] - known[next - 1] < UsableSamples.LongestMilliseconds)
            {
                seconds += UsableSamples.Seconds(milliseconds[at]);
            }
        }

        return seconds;
    }

    private static IEnumerable<string> OfLengthening(Sport sport)
    {
        if (sport.IsOnFoot)
        {
            yield return "downhill and other lengthening work: cheap in energy, heavy on the muscle";
        }
    }
}
