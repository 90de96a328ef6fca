namespace LoadWatch.Stimulus;

public class HardBoutsTests
{
    /// <summary>One letter is one second: h hard, - not. At least 3 s, gaps below 2 s merged.</summary>
    [Theory]
    [InlineData("hh--hh", 0)]
    [InlineData("hhh", 1)]
    [InlineData("h-h", 1)]
    [InlineData("hh-hh--hh", 1)]
    [InlineData("hhh--hhh", 2)]
    [InlineData("hhh-hhh", 1)]
    [InlineData("hh--h--hhhh--h", 1)]
    public void StretchesOfThreeSecondsCount(string seconds, int bouts)
    {
        var counted = new HardBouts();
        for (var second = 0; second < seconds.Length; second++)
        {
            counted.Add(second * 1000, 1000, seconds[second] == 'h' ? 0.70 : 0.69);
        }

        Assert.Equal(bouts, counted.Count);
    }

    [Theory]
    [InlineData(0.7, true)]
    [InlineData(0.69999999999, true)]
    [InlineData(0.699999, false)]
    public void TheLineIsComparedAfterRounding(double drive, bool hard) => Assert.Equal(hard, HardLine.Reached(drive));

    [Fact]
    public void AReadingThatStandsForNoTimeAddsNothing()
    {
        var counted = new HardBouts();
        counted.Add(0, 2000, 1);
        counted.Add(3000, 0, 1);

        Assert.Equal(0, counted.Count);
    }
}
