namespace LoadWatch.Storage.Tests;

public sealed class InstanceLockTests : IDisposable
{
    private readonly TemporaryFolder temporary = new();
    private readonly DataFolder folder;

    public InstanceLockTests() => folder = DataFolder.Open(temporary.At("data"));

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void ASecondHolderIsRefusedWithTheFirstOnesProcess()
    {
        using var first = InstanceLock.Take(folder);

        var refused = Assert.Throws<InstanceRunningException>(() => InstanceLock.Take(folder));

        Assert.Equal(Environment.ProcessId, refused.ProcessId);
        Assert.Contains(folder.LockPath, refused.Message, StringComparison.Ordinal);
        Assert.Contains($"process {Environment.ProcessId} ", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void AFreedLockCanBeTakenAgain()
    {
        InstanceLock.Take(folder).Dispose();

        using var second = InstanceLock.Take(folder);

        Assert.Throws<InstanceRunningException>(() => InstanceLock.Take(folder));
    }

    [Fact]
    public void TheHolderRemovesWhatAKilledRunLeftHalfWritten()
    {
        var leftOver = Path.Combine(folder.IncomingPath, "123-1.part");
        File.WriteAllText(leftOver, "half");

        using var taken = InstanceLock.Take(folder);

        Assert.False(File.Exists(leftOver));
    }

    [Fact]
    public void ARefusedSecondHolderRemovesNothing()
    {
        using var first = InstanceLock.Take(folder);
        var beingWritten = Path.Combine(folder.IncomingPath, "123-1.part");
        File.WriteAllText(beingWritten, "half");

        Assert.Throws<InstanceRunningException>(() => InstanceLock.Take(folder));

        Assert.True(File.Exists(beingWritten));
    }
}
