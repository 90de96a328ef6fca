using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Tests.Files;

public sealed class DurableFileTests : IDisposable
{
    private readonly TemporaryFolder temporary = new();

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void AFreeNameIsTaken()
    {
        File.WriteAllText(temporary.At("from"), "new");

        Assert.True(DurableFile.RenameWithoutOverwrite(temporary.At("from"), temporary.At("to")));

        Assert.False(File.Exists(temporary.At("from")));
        Assert.Equal("new", File.ReadAllText(temporary.At("to")));
    }

    [Fact]
    public void ATakenNameIsLeftAlone()
    {
        File.WriteAllText(temporary.At("from"), "new");
        File.WriteAllText(temporary.At("to"), "old");

        Assert.False(DurableFile.RenameWithoutOverwrite(temporary.At("from"), temporary.At("to")));

        Assert.Equal("new", File.ReadAllText(temporary.At("from")));
        Assert.Equal("old", File.ReadAllText(temporary.At("to")));
    }

    [Fact]
    public void AMissingSourceIsAnErrorWithThePath()
    {
        var thrown = Assert.ThrowsAny<IOException>(() => DurableFile.RenameWithoutOverwrite(temporary.At("none"), temporary.At("to")));

        Assert.Contains(temporary.Path, thrown.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void AFolderThatIsGoneCannotBeSynced()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has no such call");
        DurableFile.SyncFolder(temporary.Path);

        Assert.Throws<IOException>(() => DurableFile.SyncFolder(temporary.At("none")));
    }
}
