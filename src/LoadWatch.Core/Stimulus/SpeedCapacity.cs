using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>What a person could do on foot on a date.</summary>
/// <param name="Critical">Critical speed, m/s.</param>
/// <param name="DPrime">D', m; null reads every moment as fresh.</param>
/// <param name="Maximum">
/// Maximal speed, m/s, only where it is a true one: dated within <see cref="PowerCapacity.RecentDays"/> days before and at least <see cref="LeastRatio"/> times
/// critical speed.
/// </param>
/// <param name="NotSeen">What is missing, in plain words.</param>
public sealed record SpeedCapacity(Anchor Critical, Anchor? DPrime, Anchor? Maximum, IReadOnlyList<string> NotSeen)
{
    /// <summary>A choice.</summary>
    public const double LeastRatio = 1.3;

    public EnduranceLimits Limits => new(Critical, DPrime, Maximum, WPrimeBalance.FittedCriticalWatts / Critical.Value);

    /// <summary>Whether the critical and the maximal speed were measured, with a D' of whatever source.</summary>
    public bool IsTested => Critical.Source == AnchorSource.Measured && Maximum?.Source == AnchorSource.Measured && DPrime is not null;

    /// <summary>Null without a critical speed.</summary>
    public static SpeedCapacity? On(LocalDate date, string person, AnchorBook anchors)
    {
        if (anchors.On(date, person, AnchorKind.CriticalSpeed) is not { Value: > 0 } critical)
        {
            return null;
        }

        var dPrime = anchors.On(date, person, AnchorKind.DPrime) is { Value: > 0 } stated ? stated : null;
        var recent = anchors.Since(date.PlusDays(-PowerCapacity.RecentDays), date, person, AnchorKind.SpeedMax);
        var maximum = recent is not null && Significant.Round(recent.Value) >= Significant.Round(LeastRatio * critical.Value) ? recent : null;
        return new SpeedCapacity(critical, dPrime, maximum, [.. Missing(recent, maximum, dPrime)]);
    }

    private static IEnumerable<string> Missing(Anchor? recent, Anchor? maximum, Anchor? dPrime)
    {
        if (recent is null)
        {
            yield return "bouts and the largest class: no speed_max dated within 183 days before";
        }
        else if (maximum is null)
        {
            yield return "bouts and the largest class: speed_max is below 1.3 times critical_speed, so it is not from a sprint";
        }
        else if (dPrime is null)
        {
            yield return "fatigue above critical speed: no d_prime, a lower bound";
        }
    }
}
