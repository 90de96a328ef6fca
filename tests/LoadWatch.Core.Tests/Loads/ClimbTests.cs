using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class ClimbTests
{
    /// <summary>By hand; the 3 m are a choice.</summary>
    [Theory]
    [InlineData(0, new[] { 100.0 })]
    [InlineData(0, new[] { 100.0, 102.9 })]
    [InlineData(3, new[] { 100.0, 103 })]
    [InlineData(3, new[] { 100.4, 101, 103.4 })]
    [InlineData(0, new[] { 100.0, 50 })]
    [InlineData(25, new[] { 100.0, 95, 120, 110 })]
    [InlineData(20, new[] { 100.0, 112, 110, 120 })]
    [InlineData(24, new[] { 100.0, 112, 108, 120 })]
    [InlineData(10, new[] { 100.0, 110, 105, 107, 104, 106.5 })]
    [InlineData(0, new[] { 100.0, 102, 100, 102, 100, 102, 99.5 })]
    public void SumsTheRisesFromALowToTheNextHigh(double metres, double[] altitude) => Assert.Equal(metres, Metres(altitude));

    [Fact]
    public void NeverLessThanTheLargestRiseNorMoreThanAllRises() =>
        Gen.Double[-50, 50].Array[1, 60].Sample(altitude =>
        {
            var climbed = Metres(altitude);
            var largest = altitude.Select((low, at) => altitude.Skip(at).Max() - low).Max();
            var all = altitude.Zip(altitude.Skip(1)).Sum(pair => Math.Max(0, pair.Second - pair.First));
            return climbed <= all + 1e-6 && (largest < Climb.TurnMetres || climbed >= largest - 1e-6);
        });

    [Fact]
    public void WithoutUsableReadingsItIsUnknown()
    {
        Assert.Null(Quantity(Given.EverySecond((Channel.Power, [100, 100]))));
        Assert.Null(Quantity(Given.EverySecond((Channel.Altitude, [100, double.NaN, double.NaN, double.NaN, double.NaN]))));
        Assert.Equal(new Quantity("climb", 12, "m", Estimated: false), Quantity(Given.EverySecond((Channel.Altitude, [100, 105, 112]))));
    }

    private static Quantity? Quantity(SampleSeries samples) =>
        ExternalLoads.Of(new UsableRecording(Given.Recording("cycling", samples), shareWanted: 0.5)).SingleOrDefault(one => one.Name == QuantityNames.Climb);

    private static double Metres(double[] altitude) =>
        Climb.Metres(new UsableChannel(Channel.Altitude, [.. altitude.Select((metres, at) => new UsableSample(at * 1000L, metres, 1000))], 1));
}
