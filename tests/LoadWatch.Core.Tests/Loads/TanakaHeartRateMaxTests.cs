namespace LoadWatch.Loads;

public class TanakaHeartRateMaxTests
{
    /// <summary>Tanaka, Monahan and Seals 2001: 208 - 0.7 age, by hand.</summary>
    [Theory]
    [InlineData(20, 194)]
    [InlineData(40, 180)]
    [InlineData(60, 166)]
    [InlineData(70, 159)]
    [InlineData(80, 152)]
    public void FollowsThePublishedLine(int age, double bpm) => Assert.Equal(bpm, TanakaHeartRateMax.Of(age)!.Value, 1e-9);

    [Theory]
    [InlineData(-1)]
    [InlineData(121)]
    public void AnImpossibleAgeGivesNothing(int age) => Assert.Null(TanakaHeartRateMax.Of(age));
}
