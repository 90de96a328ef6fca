using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>What a person could do with power on a date.</summary>
/// <param name="Critical">Critical power, W.</param>
/// <param name="WPrime">W', J; null reads every moment as fresh.</param>
/// <param name="Maximum">
/// Maximal power of 1 s, W, only where it is a true one: dated within <see cref="RecentDays"/> days before and at least <see
/// cref="LeastRatio"/> times
/// critical power. Otherwise people who never sprint would look as if they always did.
/// </param>
/// <param name="NotSeen">What is missing, in plain words.</param>
public sealed record PowerCapacity(Anchor Critical, Anchor? WPrime, Anchor? Maximum, IReadOnlyList<string> NotSeen)
{
    /// <summary>Six months. A choice.</summary>
    public const int RecentDays = 183;

    /// <summary>A choice.</summary>
    public const double LeastRatio = 2.5;

    /// <summary>
    /// A: everything measured. D: a true maximum without W', so that fatigue is not seen (a lower bound). C: an anchor by a population
    /// equation. Else B.
    /// </summary>
    public Grade Grade
    {
        get
        {
            if (Maximum is not null && WPrime is null)
            {
                return Grade.D;
            }

            List<Anchor> used = [.. new[] { Critical, Maximum, Maximum is null ? null : WPrime }.OfType<Anchor>()];
            return used.Exists(anchor => anchor.Source == AnchorSource.Estimated) ? Grade.C
                : used.Count == 3 && used.TrueForAll(anchor => anchor.Source == AnchorSource.Measured) ? Grade.A
                : Grade.B;
        }
    }

    public EnduranceLimits Limits => new(Critical, WPrime, Maximum, WattsPerUnit: 1);

    /// <summary>Null without a critical power.</summary>
    public static PowerCapacity? On(LocalDate date, string person, AnchorBook anchors, Sport sport)
    {
        if (anchors.On(date, person, AnchorKind.CriticalPower, sport) is not { Value: > 0 } critical)
        {
            return null;
        }

        var wPrime = anchors.On(date, person, AnchorKind.WPrime, sport) is { Value: > 0 } stated ? stated : null;
        var recent = anchors.Since(date.PlusDays(-RecentDays), date, person, AnchorKind.PowerMax, sport);
        var maximum = recent is not null && Significant.Round(recent.Value) >= Significant.Round(LeastRatio * critical.Value) ? recent : null;
        return new PowerCapacity(critical, wPrime, maximum, [.. Missing(recent, maximum, wPrime)]);
    }

    private static IEnumerable<string> Missing(Anchor? recent, Anchor? maximum, Anchor? wPrime)
    {
        if (recent is null)
        {
            yield return "bouts and the largest class: no power_max dated within 183 days before";
        }
        else if (maximum is null)
        {
            yield return "bouts and the largest class: power_max is below 2.5 times critical_power, so it is not from a sprint";
        }
        else if (wPrime is null)
        {
            yield return "fatigue above critical power: no w_prime, a lower bound";
        }
    }
}
