using System.ComponentModel.DataAnnotations;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Conventions;

public sealed class OptionRangeTests
{
    /// <summary>
    /// Lists of bounds and shares: <see cref="ConfigurationReader"/> wants them rising and says from and to where. Limits of a signal's quality are in the unit
    /// of a user's file.
    /// </summary>
    private static readonly string[] CheckedOtherwise =
    [
        "ComputationEntry.HeartRateReserveBounds", "ComputationEntry.PowerBounds", "ComputationEntry.SpeedBounds", "ComputationEntry.SpeedMaxShares",
        "CsvQuality.AtLeast", "CsvQuality.AtMost",
    ];

    [Fact]
    public void EveryNumberOfTheConfigurationHasARange() => Assert.Equal(CheckedOtherwise, Convention.NumbersWithoutRange(typeof(LoadWatchFile)));

    [Fact]
    public void TheDefaultsLieInTheirRangesAndDoNotContradictEachOther()
    {
        Assert.Empty(RangeCheck.Faults(new LoadWatchFile()));
        Assert.Empty(LimitsCheck.Faults(new LoadWatchFile().Limits));
    }

    [Fact]
    public void TheCheckFindsNumbersWithoutARange() => Assert.Equal(
        ["BadInner.Deep", "BadInner.MaybeDeep", "BadOptions.List", "BadOptions.Plain"], Convention.NumbersWithoutRange(typeof(BadOptions)));

    private sealed record BadOptions(int Plain, [property: Range(0, 1)] int Ranged, string Text, IReadOnlyList<double> List, IReadOnlyList<BadInner>? Inner);

    private sealed record BadInner(long Deep, double? MaybeDeep);
}
