using LoadWatch.Loads;

namespace LoadWatch.Tests.Loads;

public class LoadUnitsTests
{
    [Theory]
    [InlineData("individual_trimp", "AU")]
    [InlineData("lucia_load", "AU")]
    [InlineData("foster_load", "AU")]
    [InlineData("stagno_load", "AU")]
    [InlineData("climb", "m")]
    [InlineData("distance_above_5_5_m_s", "m")]
    [InlineData("distance_above_8_25_m_s", "m")]
    [InlineData("distance_above_80_percent_speed_max", "m")]
    [InlineData("repetitions", "repetitions")]
    [InlineData("own_count", "own count")]
    public void AQuantityHasItsUnitOrItsNameInWords(string quantity, string unit) => Assert.Equal(unit, LoadUnits.Of(quantity));

    [Fact]
    public void WhatMayBeALoadHasAUnitUnlessItIsACount() =>
        Assert.Equal(
            [QuantityNames.Accelerations, QuantityNames.Decelerations, QuantityNames.Sets, QuantityNames.Repetitions],
            QuantityNames.AllWith([2, 5.5, 7], [0.8, 0.9]).Where(quantity => LoadUnits.Of(quantity) == quantity.Replace('_', ' ')));
}
