using LoadWatch.People;

namespace LoadWatch.Stimulus;

/// <summary>What an endurance channel is read against.</summary>
/// <param name="Critical">Critical power, W, or critical speed, m/s.</param>
/// <param name="Whole">W', J, or D', m; null reads every moment as fresh.</param>
/// <param name="Maximum">A true maximum, W or m/s, or null.</param>
/// <param name="WattsPerUnit">What a unit of intensity below the critical one recovers like, W (<see cref="WPrimeBalance"/>).</param>
public sealed record EnduranceLimits(Anchor Critical, Anchor? Whole, Anchor? Maximum, double WattsPerUnit);
