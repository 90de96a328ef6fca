using LoadWatch.Service.Tests.Metamorphic;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Endurance;

/// <summary>
/// A history taken in at once and as of today equals the same files taken in night by night: days and findings of every date. So do the alerts that stand,
/// but for when they were raised: an import replays no history, so it raises what stands on the day it ends.
/// </summary>
[Collection(Nightly.Name)]
public sealed class ImportEqualsNightsTests(NightlyService nights) : IDisposable
{
    private readonly WorkingFolder import = Season.Folder();

    public void Dispose() => import.Dispose();

    [Fact]
    public void DaysFindingsAndStandingAlertsAreTheSame()
    {
        foreach (var night in Season.ByNight().OrderBy(night => night.Key))
        {
            import.Fill(night);
        }

        import.Sweep();

        foreach (var table in new[] { "activities", "days", "findings" })
        {
            MetamorphicTests.AssertSame(import.Export(table), nights.Folder.Export(table));
        }

        Assert.Equal(Digest.Standing(import), Digest.Standing(nights.Folder));
        AssertThereIsSomethingToCompare();
    }

    private void AssertThereIsSomethingToCompare()
    {
        var findings = import.Export("findings");
        Assert.All(
            ["load_ratio", "weekly_jump", "silence", "stimulus_gap", "falling_load"],
            rule => Assert.Contains($"\"rule\":\"{rule}\"", findings, StringComparison.Ordinal));
        Assert.NotEmpty(Digest.Standing(import));
        Assert.NotEqual(import.Export("alerts"), nights.Folder.Export("alerts"));
    }
}
