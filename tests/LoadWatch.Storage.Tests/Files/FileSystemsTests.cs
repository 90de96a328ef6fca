using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Tests.Files;

public sealed class FileSystemsTests
{
    /// <summary>Numbers of the manual page statfs(2): NFS, SMB2, 9p; ext4, tmpfs, xfs, btrfs, overlay, FUSE.</summary>
    [Theory]
    [InlineData(0x6969u, "nfs")]
    [InlineData(0xFE534D42u, "smb2")]
    [InlineData(0x01021997u, "9p")]
    [InlineData(0xEF53u, null)]
    [InlineData(0x01021994u, null)]
    [InlineData(0x58465342u, null)]
    [InlineData(0x9123683Eu, null)]
    [InlineData(0x794C7630u, null)]
    [InlineData(0x65735546u, null)]
    [InlineData(null, null)]
    public void AFileSystemIsKnownByItsNumber(uint? type, string? network) => Assert.Equal(network, FileSystems.NetworkOfType(type));

    [Fact]
    public void TheFolderOfTemporaryFilesIsOnThisMachine()
    {
        using var temporary = new TemporaryFolder();
        Assert.Null(FileSystems.NetworkOf(temporary.Path));
        Assert.Null(FileSystems.NetworkOf(temporary.At("none")));
    }
}
