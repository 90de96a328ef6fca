using LoadWatch.Recordings;
using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Stimulus;

public class HeartRateDriveTests
{
    private static readonly HeartRateReserve Reserve = new(50, 150, Estimated: false);

    /// <summary>By hand: the threshold at 130 bpm is 0.8 of the reserve; 90 bpm, 0.4, drives 0.65 x 0.4 / 0.8.</summary>
    [Fact]
    public void TheSecondThresholdSitsAtTheCriticalDrive()
    {
        var drive = HeartRateDrive.On(Given.Date, "p1", Given.Anchors(Given.Anchor(AnchorKind.HeartRateVt2, 130)), Reserve);

        Assert.Equal(0.65, drive.Of(0.8, Variant.Mid), 1e-12);
        Assert.Equal(0.325, drive.Of(0.4, Variant.Mid), 1e-12);
    }

    [Theory]
    [InlineData(40)]
    [InlineData(160)]
    public void AThresholdOutsideTheReserveIsNotUsed(double bpm) =>
        Assert.Equal(0.85, HeartRateDrive.On(Given.Date, "p1", Given.Anchors(Given.Anchor(AnchorKind.HeartRateVt2, bpm)), Reserve).Threshold);

    /// <summary>By hand: after 5 s of 150 bpm behind 100 bpm the mean of the last 15 s is (10 x 100 + 5 x 150) / 15.</summary>
    [Fact]
    public void ReadingsAreSmoothedOverTheFifteenSecondsUpToThem()
    {
        var heartRate = new UsableChannel(Channel.HeartRate, Given.Samples((100, 60), (150, 60)), 1);
        var fractions = new double[heartRate.Count];
        HeartRateDrive.On(Given.Date, "p1", AnchorBook.Empty, Reserve).SmoothFractions(heartRate, fractions);

        Assert.Equal(0.5, fractions[59], 1e-12);
        Assert.Equal(((10 * 0.5) + 5) / 15, fractions[64], 1e-12);
        Assert.Equal(1, fractions[74], 1e-12);
    }
}
