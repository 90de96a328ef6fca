using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class ExternalLoadsTests
{
    private static readonly SampleSeries FromSixHundred = Given.EverySecond((Channel.Distance, [600.5, 603, 612.5]));

    [Fact]
    public void DistanceIsWhatTheSessionStates() => Assert.Equal(11.8, Distance(Given.Recording("running", FromSixHundred) with { DistanceMetres = 11.8 }));

    [Fact]
    public void WithoutAStatedDistanceTheTotalRunOnFromAnEarlierSessionIsTakenOff() => Assert.Equal(12, Distance(Given.Recording("running", FromSixHundred)));

    [Fact]
    public void AStatedDistanceOfNoughtIsNoDistance() => Assert.Equal(12, Distance(Given.Recording("running", FromSixHundred) with { DistanceMetres = 0 }));

    [Fact]
    public void WithoutReadingsDistanceIsUnknown() => Assert.Null(Distance(Given.Recording("running", SampleSeries.Empty)));

    private static double? Distance(Recording recording) =>
        ExternalLoads.Of(new UsableRecording(recording, shareWanted: 0.5)).SingleOrDefault(quantity => quantity.Name == QuantityNames.Distance)?.Value;
}
