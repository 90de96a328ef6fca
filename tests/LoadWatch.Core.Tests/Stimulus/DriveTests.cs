using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class DriveTests
{
    /// <summary>Computed independently: 350 W held, critical power 250 W, W' 20 kJ, maximum 1000 W; nothing recovers.</summary>
    [Theory]
    [InlineData(0, 0.6967)]
    [InlineData(30, 0.7049)]
    [InlineData(60, 0.7167)]
    [InlineData(90, 0.7348)]
    [InlineData(120, 0.7667)]
    [InlineData(150, 0.8367)]
    [InlineData(174, 1)]
    public void HoldingAPowerAboveTheCriticalOneAsksForMoreAndMore(int second, double drive)
    {
        var capacity = PowerCapacity.On(Given.Date, "p1", Given.Anchors(Given.Cyclist), new Sport("cycling"))!;

        Assert.Equal(drive, Drives(new UsableChannel(Channel.Power, Given.Samples((350, 200)), 1), capacity)[second], 5e-5);
    }

    /// <summary>Morton 1996: time to exhaustion W'/(P - CP) - W'/(Pmax - CP), computed from the equation. There the drive just reaches
    /// 1.</summary>
    [Theory]
    [InlineData(300, 373.33)]
    [InlineData(350, 173.33)]
    [InlineData(400, 106.67)]
    [InlineData(500, 53.33)]
    [InlineData(700, 17.78)]
    [InlineData(1000, 0)]
    public void TheDriveReachesOneAtMortonsTimeToExhaustion(double watts, double seconds)
    {
        Assert.Equal(1, DriveAfter(watts, seconds + 0.01));
        if (seconds > 0)
        {
            Assert.InRange(DriveAfter(watts, seconds - 1), 0.65, 0.9999);
        }
    }

    [Fact]
    public void WithoutAKnownMaximumEverythingAboveReadsAsCritical() => Assert.Equal(0.65, Drive.Of(900, 250, null, 1, 0.65));

    /// <summary>By hand: at the available power the drive is 1, whatever is left.</summary>
    [Theory]
    [InlineData(1)]
    [InlineData(0.5)]
    [InlineData(0.05)]
    public void TheAvailablePowerIsTheMaximumOfTheMoment(double balance)
    {
        var watts = AvailablePower.Watts(250, 1000, balance);

        Assert.Equal(1, Drive.Of(watts, 250, 1000, balance, 0.65), 1e-12);
        Assert.Equal(0.825, Drive.Of((watts + 250) / 2, 250, 1000, balance, 0.65), 1e-12);
    }

    private static double DriveAfter(double watts, double seconds) =>
        Drive.Of(watts, 250, 1000, (20_000 - ((watts - 250) * seconds)) / 20_000, 0.65);

    private static List<double> Drives(UsableChannel power, PowerCapacity capacity)
    {
        var drive = new EnduranceDrive(capacity.Limits, Variant.Mid);
        var drives = new List<double>();
        foreach (var sample in power.Samples)
        {
            drive.Advance(sample.UnixMilliseconds, sample.Value, sample.Milliseconds / 1000.0);
            drives.Add(drive.At(sample.Value));
        }

        return drives;
    }
}
