using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// Which readings can be true at all, by channel. Wide on purpose: they cut sensor codes and nonsense, not hard work. Common practice, no
/// published source.
/// </summary>
public static class ChannelLimits
{
    /// <summary>No distance is larger, metres; a hostile one would overflow a sum.</summary>
    private const double Largest = 1e9;

    /// <summary>On foot nobody is faster, m/s; what is, is a jump of the position.</summary>
    private const double FastestOnFoot = 13;

    /// <summary>
    /// Heart rate 25 to 250 bpm (so 0, a lost contact, and 254, a code for none, are out); power 0 to 3000 W; speed 0 to 45 m/s, on foot and in team sports
    /// to 13 m/s; height above -500 m, a zero in a FIT file, up to 12,000 m, beyond which a height below the sea lies that was written without the
    /// zero point; every other channel up to 1e9, above or below 0.
    /// </summary>
    public static (double Least, double Most) Of(Channel channel, Sport sport) => channel switch
    {
        Channel.HeartRate => (25, 250),
        Channel.Power => (0, 3000),
        Channel.Speed => (0, sport.IsOnFoot || sport.IsTeamSport ? FastestOnFoot : 45),
        Channel.Altitude => (-499, 12_000),
        _ => (-Largest, Largest),
    };

    /// <summary>Whether a reading lies within its limits; never true for NaN or infinity.</summary>
    public static bool Usable(Channel channel, double value, Sport sport)
    {
        var (least, most) = Of(channel, sport);
        return value >= least && value <= most;
    }
}
