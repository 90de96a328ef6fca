using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// Metres climbed: the sum of the rises of altitude, each from a low to the next high. A turn counts once altitude has left it by 3 m, so the noise
/// of a barometer adds nothing; a sum of all positive steps would grow with every reading. Common practice, no published source; the 3 m are a
/// choice. A rise counts however it came about: a lift and a pause in which one was driven up too.
/// </summary>
public static class Climb
{
    /// <summary>How far altitude must leave a low or a high before that is a turn, metres.</summary>
    public const double TurnMetres = 3;

    /// <summary>Metres, 0 or more.</summary>
    /// <param name="altitude">At least one reading.</param>
    public static double Metres(UsableChannel altitude)
    {
        var climbed = 0.0;
        var low = altitude.Values[0];
        double? high = null;
        foreach (var metres in altitude.Values)
        {
            if (high is not { } top)
            {
                low = Math.Min(low, metres);
                high = Turned(metres - low) ? metres : null;
            }
            else if (Turned(top - metres))
            {
                climbed += top - low;
                (low, high) = (metres, null);
            }
            else
            {
                high = Math.Max(top, metres);
            }
        }

        return Significant.Round(climbed + ((high ?? low) - low));
    }

    /// <summary>Rounded to a micrometre, so that 3 m held as 2.9999999 counts.</summary>
    private static bool Turned(double metres) => metres > TurnMetres - 0.001 && Math.Round(metres, 6) >= TurnMetres;
}
