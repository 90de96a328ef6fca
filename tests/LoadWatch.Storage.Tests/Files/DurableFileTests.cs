using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Tests.Files;

public sealed class DurableFileTests : IDisposable
{
    private readonly TemporaryFolder temporary = new();

    public void Dispose() => temporary.Dispose();

    public static TheoryData<bool> InOneStepOrByLink => OperatingSystem.IsLinux() ? [true, false] : [true];

    [Theory]
    [MemberData(nameof(InOneStepOrByLink))]
    public void AFreeNameIsTaken(bool inOneStep)
    {
        File.WriteAllText(temporary.At("from"), "new");

        Assert.True(Rename(inOneStep));

        Assert.False(File.Exists(temporary.At("from")));
        Assert.Equal("new", File.ReadAllText(temporary.At("to")));
    }

    [Theory]
    [MemberData(nameof(InOneStepOrByLink))]
    public void ATakenNameIsLeftAlone(bool inOneStep)
    {
        File.WriteAllText(temporary.At("from"), "new");
        File.WriteAllText(temporary.At("to"), "old");

        Assert.False(Rename(inOneStep));

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

    private bool Rename(bool inOneStep) => inOneStep
        ? DurableFile.RenameWithoutOverwrite(temporary.At("from"), temporary.At("to"))
        : DurableFile.RenameByLink(temporary.At("from"), temporary.At("to"));
}
