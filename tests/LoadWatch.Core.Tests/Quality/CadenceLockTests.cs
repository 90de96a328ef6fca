using LoadWatch.Recordings;

namespace LoadWatch.Quality;

public class CadenceLockTests
{
    private const int Before = 60;
    private const int Locked = 60;

    private static readonly double[] Faster = [.. Enumerable.Range(0, Before + Locked + 1).Select(second => 2 + (second / 40.0))];

    /// <summary>85 cycles of two steps are 170 steps a minute.</summary>
    [Fact]
    public void OnFootAHeartRateThatStepsOntoTheStepsIsCut()
    {
        var cut = Assert.Single(Cuts("running", 85, Steps(130, 170), Faster));

        Assert.Equal((CutReason.LockedToCadence, 60.0, Locked + 1), (cut.Reason, cut.From(), cut.Readings));
    }

    [Fact]
    public void OnABicycleOnlyTheCadenceItselfIsFollowed()
    {
        Assert.Empty(Cuts("cycling", 85, Steps(130, 170), Faster));
        Assert.Equal(CutReason.LockedToCadence, Assert.Single(Cuts("cycling", 85, Steps(130, 87), Faster)).Reason);
    }

    [Fact]
    public void AHeartRateThatRisesToTheStepsByAndByIsTrue() =>
        Assert.Empty(Cuts("running", 85, [.. Enumerable.Range(0, Before + Locked + 1).Select(second => Math.Min(170.0, 130 + second))], Faster));

    [Fact]
    public void AtASteadyLoadNothingSaysThatItIsNotTheHeart() =>
        Assert.Empty(Cuts("running", 85, Steps(130, 170), Given.Steps((3, Before + Locked))));

    [Theory]
    [InlineData(173, true)]
    [InlineData(174, false)]
    public void ItFollowsWithinThree(double bpm, bool cut) => Assert.Equal(cut, Cuts("running", 85, Steps(130, bpm), Faster).Count > 0);

    [Fact]
    public void HalfAMinuteIsWanted()
    {
        double[] bpm = [.. Given.Steps((130, Before - 1)), .. Given.Steps((170, 28)), .. Given.Steps((150, Locked - 29))];

        Assert.Empty(Cuts("running", 85, bpm, Faster));
    }

    private static double[] Steps(double before, double after) => Given.Steps((before, Before), (after, Locked));

    private static IReadOnlyList<Cut> Cuts(string sport, double cadence, double[] bpm, double[] speed) =>
        Judging.Cuts(sport, (Channel.HeartRate, bpm), (Channel.Cadence, Given.Steps((cadence, Before + Locked))), (Channel.Speed, speed));
}
