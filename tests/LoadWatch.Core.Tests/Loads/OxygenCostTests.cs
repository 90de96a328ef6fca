using LoadWatch.Stimulus;

namespace LoadWatch.Loads;

/// <summary>The published examples are in <c>Published/EffortChecks</c>.</summary>
public class OxygenCostTests
{
    /// <summary>20.9 kJ for each litre of oxygen (common practice).</summary>
    private const double JoulesPerMillilitre = 20.9;

    /// <summary>
    /// Two sources that know nothing of each other: what a metre costs above rest by these equations, and by the measured costs that
    /// <see cref="SlopeCost"/> stands on.
    /// </summary>
    [Theory]
    [InlineData(0.0)]
    [InlineData(0.05)]
    [InlineData(0.10)]
    [InlineData(0.15)]
    [InlineData(0.20)]
    public void FromLevelToSteepItAgreesWithTheCostOfSlopesWithinAQuarter(double gradient)
    {
        Assert.InRange(JoulesPerMetre(OxygenCost.Running(3, gradient), 3) / SlopeCost.Running(gradient), 0.75, 1.25);
        Assert.InRange(JoulesPerMetre(OxygenCost.Walking(1.3, gradient), 1.3) / SlopeCost.Walking(gradient), 0.75, 1.25);
    }

    [Fact]
    public void AWayDownCostsAsMuchAsALevelOne() => Assert.Equal(OxygenCost.Walking(1.3, 0), OxygenCost.Walking(1.3, -0.1));

    private static double JoulesPerMetre(double uptake, double metresPerSecond) => (uptake - OxygenCost.Rest) * JoulesPerMillilitre / (metresPerSecond * 60);
}
