using LoadWatch.Loads;
using LoadWatch.Recordings;

namespace LoadWatch.Tests.Loads;

public class QuantitySportsTests
{
    // Common practice, no published source.
    [Theory]
    [InlineData("kilograms", "running", false)]
    [InlineData("kilograms", "training/strength_training", true)]
    [InlineData("kilograms", "generic", true)]
    [InlineData("distance_above_5_5_m_s", "cycling", false)]
    [InlineData("distance_above_5_5_m_s", "training/strength_training", false)]
    [InlineData("distance_above_5_5_m_s", "soccer", true)]
    [InlineData("distance", "training/strength_training", false)]
    [InlineData("distance", "cycling", true)]
    [InlineData("accelerations", "cycling", false)]
    [InlineData("accelerations", "soccer", true)]
    [InlineData("banister_trimp", "training/strength_training", true)]
    [InlineData("sprints_of_pods", "cycling", true)]
    public void ASessionMayHoldWhatItsSportShows(string quantity, string sport, bool holds) =>
        Assert.Equal(holds, QuantitySports.MayHold(quantity, Sport.Parse(sport)));
}
