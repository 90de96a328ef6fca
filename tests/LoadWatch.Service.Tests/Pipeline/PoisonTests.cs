using LoadWatch.Recordings;
using LoadWatch.Service.Pipeline;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-4: what brings the process down is tried in a child first, and refused when three children died of it.</summary>
public sealed class PoisonTests : IDisposable
{
    private readonly WorkingFolder folder = new();
    private readonly byte[] poison = Some.Fit(Some.Yesterday);
    private readonly byte[] good = Some.Fit(Some.Yesterday, 10);

    public PoisonTests()
    {
        folder.Put("anna/poison.fit", poison);
        folder.Put("anna/good.fit", good);
        Assert.NotEqual(0, Loadwatch.RunAndKillAt("waiting", "sweep", "--config", folder.ConfigPath, "--as-of", WorkingFolder.NowText).Code);
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ThreeDeadChildrenRefuseTheArrivalAndTheOthersGoOn()
    {
        Assert.Equal([ArrivalState.Waiting, ArrivalState.Waiting], folder.Arrivals().Select(arrival => arrival.State));
        var probe = new DyingProbe(WorkingFolder.Sha(poison), deaths: int.MaxValue);
        folder.Sweep(probe: probe);
        Assert.Equal((ArrivalState.Waiting, 1, 1), (folder.Arrival(poison)!.State, folder.Arrival(poison)!.Attempts, probe.Deaths));
        Assert.True(File.Exists(Path.Combine(folder.Root, "pages", "staff.html")), "a suspect keeps nobody from the brief");
        folder.Sweep(probe: probe);
        folder.Sweep(probe: probe);
        var refused = folder.Arrival(poison)!;
        Assert.Equal((ArrivalState.Refused, 3, 3), (refused.State, refused.Attempts, probe.Deaths));
        Assert.StartsWith("poisonous", refused.Reason);
        Assert.Equal((ArrivalState.Stored, 0), (folder.Arrival(good)!.State, folder.Arrival(good)!.Attempts));
        Assert.Single(folder.Export("activities").Split('\n', StringSplitOptions.RemoveEmptyEntries));
        folder.Sweep();
        Assert.Equal(refused, folder.Arrival(poison));
    }

    [Fact]
    public void AChildThatSurvivesTheThirdTimeStoresTheArrival()
    {
        var probe = new DyingProbe(WorkingFolder.Sha(poison), deaths: 2);
        folder.Sweep(probe: probe);
        folder.Sweep(probe: probe);
        folder.Sweep(probe: probe);
        Assert.Equal((ArrivalState.Stored, 2), (folder.Arrival(poison)!.State, folder.Arrival(poison)!.Attempts));
    }

    [Fact]
    public void ARebuildLeavesAPoisonousArrivalAlone()
    {
        var probe = new DyingProbe(WorkingFolder.Sha(poison), deaths: int.MaxValue);
        folder.Sweep(probe: probe);
        folder.Sweep(probe: probe);
        folder.Sweep(probe: probe);
        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());
    }

    [Fact]
    public void ARealChildProbesWhatWasWaiting()
    {
        var ended = Loadwatch.Run("sweep", "--config", folder.ConfigPath, "--as-of", WorkingFolder.NowText);
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.All(folder.Arrivals(), arrival => Assert.Equal((ArrivalState.Stored, 0), (arrival.State, arrival.Attempts)));
        Assert.Equal(2, folder.Arrivals().Count);
    }
}
