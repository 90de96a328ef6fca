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

    /// <summary>By the numbers of errors of Linux (errno-base.h): held by another, input or output, no room, too many handles.</summary>
    [Theory]
    [InlineData(11, true)]
    [InlineData(5, false)]
    [InlineData(28, false)]
    [InlineData(24, false)]
    public void ALockThatADiskOrTheSystemRefusesIsNoOtherProcess(int error, bool isHeld)
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has numbers of its own");
        Assert.Equal(isHeld, InstanceLock.IsHeld(new IOException("the lock cannot be opened", error)));
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
