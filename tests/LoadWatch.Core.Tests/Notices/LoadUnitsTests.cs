using LoadWatch.Loads;

namespace LoadWatch.Notices;

public class LoadUnitsTests
{
    [Theory]
    [InlineData("individual_trimp", "AU")]
    [InlineData("lucia_load", "AU")]
    [InlineData("stagno_load", "AU")]
    [InlineData("climb", "m")]
    [InlineData("distance_above_5_5_m_s", "m")]
    [InlineData("distance_above_8_25_m_s", "m")]
    [InlineData("repetitions", "repetitions")]
    [InlineData("own_count", "own count")]
    public void AQuantityHasItsUnitOrItsNameInWords(string quantity, string unit) => Assert.Equal(unit, LoadUnits.Of(quantity));

    [Fact]
    public void WhatMayBeALoadHasAUnitUnlessItIsACount() =>
        Assert.Equal(
            [QuantityNames.Sets, QuantityNames.Repetitions],
            QuantityNames.AllWith([2, 5.5, 7]).Where(quantity => LoadUnits.Of(quantity) == quantity.Replace('_', ' ')));
}
