namespace LoadWatch.Storage.Tests;

public sealed class DataFolderTests : IDisposable
{
    private const UnixFileMode OwnerOnly = UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute;

    private readonly TemporaryFolder temporary = new();

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void EveryFolderOfTheArchiveIsMade()
    {
        var folder = DataFolder.Open(temporary.At("data"));

        var names = Directory.GetDirectories(folder.ArchivePath).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal).ToList();

        Assert.Equal(257, names.Count);
        Assert.Equal("00", names[0]);
        Assert.Equal("ff", names[255]);
        Assert.Equal("incoming", names[256]);
    }

    [Fact]
    public void EveryFolderIsPrivate()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has access lists, no modes");
        var folder = DataFolder.Open(temporary.At("data"));

        var folders = Directory.GetDirectories(folder.Root, "*", SearchOption.AllDirectories).Append(folder.Root);

        Assert.All(folders, path => Assert.Equal(OwnerOnly, File.GetUnixFileMode(path)));
    }

    [Fact]
    public void OpeningAgainChangesNothing()
    {
        var folder = DataFolder.Open(temporary.At("data"));
        File.WriteAllText(Path.Combine(folder.IncomingPath, "being-written.part"), "x");

        DataFolder.Open(temporary.At("data"));

        Assert.True(File.Exists(Path.Combine(folder.IncomingPath, "being-written.part")));
    }
}
