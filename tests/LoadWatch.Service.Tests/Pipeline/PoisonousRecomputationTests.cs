using LoadWatch.Recordings;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-4: what a process ended amid while it was decoded again is tried in a child first; a content that was stored once may end the next version.</summary>
public sealed class PoisonousRecomputationTests : IDisposable
{
    private readonly WorkingFolder folder = new();
    private readonly byte[] poison = Some.Fit(Some.Yesterday);
    private readonly byte[] good = Some.Fit(Some.Yesterday, minutesAfterNoon: 180);

    public PoisonousRecomputationTests()
    {
        folder.Put("anna/poison.fit", poison);
        folder.Put("anna/good.fit", good);
        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ARebuildThatEndsTheProcessLeavesTheRowsAndRefusesTheContentAfterThreeDeadChildren()
    {
        EndARebuild();
        var probe = new DyingProbe(WorkingFolder.Sha(poison), deaths: int.MaxValue);
        Assert.Equal(1, folder.Sweep(probe: probe).Recomputed);
        Assert.Equal((ArrivalState.Stored, 1, 1), (folder.Arrival(poison)!.State, folder.Arrival(poison)!.Attempts, probe.Deaths));
        Assert.Equal(2, Activities());
        folder.Sweep(probe: probe);
        folder.Sweep(probe: probe);
        Assert.Equal((ArrivalState.Refused, 3, 3), (folder.Arrival(poison)!.State, folder.Arrival(poison)!.Attempts, probe.Deaths));
        Assert.StartsWith("poisonous", folder.Arrival(poison)!.Reason);
        Assert.Equal((ArrivalState.Stored, 0), (folder.Arrival(good)!.State, folder.Arrival(good)!.Attempts));
        Assert.Equal(1, Activities());
        Assert.Equal(0, Left());
    }

    [Fact]
    public void AContentWhoseChildrenLiveIsDecodedAgainAndNothingIsTriedAfterwards()
    {
        EndARebuild();
        var probe = new DyingProbe(WorkingFolder.Sha(poison), deaths: 1);
        folder.Sweep(probe: probe);
        Assert.Equal(1, folder.Sweep(probe: probe).Recomputed);
        Assert.Equal((ArrivalState.Stored, 1), (folder.Arrival(poison)!.State, folder.Arrival(poison)!.Attempts));
        Assert.Equal(0, Left());
        probe.Tried.Clear();
        Assert.Equal(2, folder.Rebuild().Recomputed);
        folder.Sweep(probe: probe);
        Assert.Empty(probe.Tried);
    }

    [Fact]
    public void ARealChildTriesWhatARebuildEndedAmid()
    {
        EndARebuild();
        var ended = Loadwatch.Run("rebuild", "--config", folder.ConfigPath);
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.Equal((2, 0), (Activities(), Left()));
    }

    private void EndARebuild()
    {
        Assert.NotEqual(0, Loadwatch.RunAndKillAt("decoded", "rebuild", "--config", folder.ConfigPath).Code);
        Assert.Equal(2, Left());
    }

    private int Left() => folder.Read((_, session) => session.Outdated.Count());

    private int Activities() => folder.Export("activities").Split('\n', StringSplitOptions.RemoveEmptyEntries).Length;
}
