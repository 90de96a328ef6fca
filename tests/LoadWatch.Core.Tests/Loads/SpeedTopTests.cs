using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class SpeedTopTests
{
    [Fact]
    public void AtOneReadingASecondItIsTheHighest() => Assert.Equal(8.2, Top(1000, 3, 7.9, 8.2, 4, 4));

    [Fact]
    public void AtLongerStepsItIsTheHighestToo() => Assert.Equal(8.2, Top(5000, 3, 8.2, 4, 4));

    [Fact]
    public void TheLastReadingStandsForNoTime() => Assert.Equal(4, Top(1000, 3, 4, 9));

    /// <summary>By hand: four readings a second; 9 stands for 0.25 s, the four from 7.4 to 7.1 for 1 s.</summary>
    [Fact]
    public void AJumpShorterThanASecondDoesNotCount() => Assert.Equal(7.1, Top(250, 3, 9, 3, 7.4, 7.2, 7.1, 7.3, 3, 3));

    [Fact]
    public void ASecondReadingOfOneMomentDoesNotCount()
    {
        UsableSample[] samples = [new(0, 6, 1000), new(1000, 12, 0), new(1000, 5, 1000), new(2000, 5, 0)];

        Assert.Equal(6, SpeedTop.MetresPerSecond(new UsableChannel(Channel.Speed, samples, 1)));
    }

    [Fact]
    public void LessThanASecondIsUnknown()
    {
        Assert.Null(Top(250, 5, 5, 5, 5));
        Assert.Null(Top(1000, 5));
    }

    /// <summary>The last of the readings stands for 0, as in a recording.</summary>
    private static double? Top(int milliseconds, params double[] speeds) => SpeedTop.MetresPerSecond(new UsableChannel(
        Channel.Speed,
        [.. speeds.Select((speed, at) => new UsableSample(at * (long)milliseconds, speed, at == speeds.Length - 1 ? 0 : milliseconds))],
        1));
}
