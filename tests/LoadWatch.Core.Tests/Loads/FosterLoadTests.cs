namespace LoadWatch.Loads;

public class FosterLoadTests
{
    /// <summary>By hand, rating times minutes (Foster 1998; Foster et al. 2001).</summary>
    [Theory]
    [InlineData(7, 90, 630)]
    [InlineData(3.5, 60, 210)]
    [InlineData(10, 0.5, 5)]
    [InlineData(0, 30, 0)]
    public void IsTheRatingTimesTheMinutes(double rating, double minutes, double load) => Assert.Equal(load, FosterLoad.Of(rating, minutes));

    [Theory]
    [InlineData(null, 60.0)]
    [InlineData(5.0, null)]
    [InlineData(-0.1, 60.0)]
    [InlineData(10.1, 60.0)]
    [InlineData(5.0, 0.0)]
    [InlineData(5.0, -1.0)]
    [InlineData(double.NaN, 60.0)]
    [InlineData(5.0, double.NaN)]
    [InlineData(5.0, double.PositiveInfinity)]
    [InlineData(10.0, double.MaxValue)]
    public void WhatIsUnknownOrCannotBeGivesNoLoad(double? rating, double? minutes) => Assert.Null(FosterLoad.Of(rating, minutes));
}
