using NodaTime;

namespace LoadWatch.Notices;

/// <summary>What stood in the way of a delivery that is tried again.</summary>
public enum DeliveryTrouble
{
    /// <summary>Network, time limit, or the other side asked to come back later.</summary>
    Passing,

    /// <summary>Somebody has to change something; trying often could lock the account.</summary>
    Standing,
}

/// <summary>When a delivery is tried again: common practice of mail relays, no published source; five days after RFC 5321, section 4.5.4.1.</summary>
public static class DeliverySchedule
{
    /// <summary>Time from the first attempt after which a delivery is given up and reported.</summary>
    public static readonly Duration GivenUpAfter = Duration.FromDays(5);

    private static readonly Duration AtLeastWhenStanding = Duration.FromMinutes(15);
    private static readonly Duration Longest = Duration.FromMinutes(30);
    private static readonly Duration[] Waits = [.. new[] { 1, 2, 5, 10, 20 }.Select(minutes => Duration.FromMinutes(minutes))];

    /// <param name="firstAttempt">When the delivery was tried first.</param>
    /// <param name="now">When it failed last.</param>
    /// <param name="attempts">How often it failed, this time included; from 1.</param>
    /// <returns>When it is due again, or null when it is given up.</returns>
    public static Instant? Next(Instant firstAttempt, Instant now, int attempts, DeliveryTrouble trouble)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(attempts, 1);
        if (now - firstAttempt >= GivenUpAfter)
        {
            return null;
        }

        var wait = attempts <= Waits.Length ? Waits[attempts - 1] : Longest;
        return now + (trouble == DeliveryTrouble.Standing ? Duration.Max(wait, AtLeastWhenStanding) : wait);
    }
}
