using System.Diagnostics;
using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Tests.Files;

public sealed class SafeFileTests : IDisposable
{
    private readonly TemporaryFolder temporary = new();

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void ARegularFileOpensWithItsStamp()
    {
        var path = temporary.At("ride.fit");
        File.WriteAllText(path, "hello");
        File.SetLastWriteTimeUtc(path, new DateTime(2026, 3, 1, 7, 30, 0, 250, DateTimeKind.Utc));

        using var opened = Assert.IsType<OpenedFile>(SafeFile.Open(path));
        using var reader = new StreamReader(opened.Stream);

        Assert.Equal("hello", reader.ReadToEnd());
        Assert.Equal(5, opened.Stamp.Size);
        Assert.Equal(1_772_350_200_250, opened.Stamp.ModifiedUnixMs); // date -u -d 2026-03-01T07:30:00.25Z +%s%3N
        Assert.Equal(opened.Stamp, SafeFile.StampOf(path));
    }

    [Fact]
    public void AFileReplacedUnderItsNameHasAnotherId()
    {
        var path = temporary.At("ride.fit");
        File.WriteAllText(path, "hello");
        var before = SafeFile.StampOf(path)!;
        File.WriteAllText(temporary.At("other"), "olleh");

        File.Move(temporary.At("other"), path, overwrite: true);

        Assert.NotEqual(before.FileId, SafeFile.StampOf(path)!.FileId);
    }

    [Fact]
    public void AMissingFileIsToldSo() => Assert.Equal(FileTrouble.Missing, TroubleOf(temporary.At("none.fit")));

    [Fact]
    public void AFolderIsNoRegularFile()
    {
        Assert.Equal(FileTrouble.NotRegular, TroubleOf(temporary.Path));
        Assert.Null(SafeFile.StampOf(temporary.Path));
    }

    [Fact]
    public void ALinkIsNotFollowed()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "making a link needs a privilege on Windows");
        File.WriteAllText(temporary.At("secret"), "hello");
        File.CreateSymbolicLink(temporary.At("ride.fit"), temporary.At("secret"));

        Assert.Equal(FileTrouble.NotRegular, TroubleOf(temporary.At("ride.fit")));
        Assert.Null(SafeFile.StampOf(temporary.At("ride.fit")));
    }

    [Fact]
    public void APipeIsRefusedWithoutWaitingForAWriter()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "pipes have names on Linux only");
        var path = temporary.At("pipe.fit");
        using (var made = Process.Start("mkfifo", [path]))
        {
            made.WaitForExit();
        }

        Assert.True(File.Exists(path));
        Assert.Equal(FileTrouble.NotRegular, TroubleOf(path));
        Assert.Null(SafeFile.StampOf(path));
    }

    [Fact]
    public void ADeviceIsRefused()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "devices are files on Linux only");

        Assert.Equal(FileTrouble.NotRegular, TroubleOf("/dev/zero"));
    }

    [Fact]
    public void AFileWithoutTheRightToReadItIsToldSo()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has access lists, no modes");
        Assert.SkipWhen(Environment.IsPrivilegedProcess, "the superuser may read everything");
        File.WriteAllText(temporary.At("ride.fit"), "hello");
        File.SetUnixFileMode(temporary.At("ride.fit"), UnixFileMode.None);

        Assert.Equal(FileTrouble.Denied, TroubleOf(temporary.At("ride.fit")));
    }

    /// <summary>The number of a deleted folder is soon given to the next one; its time of birth is not.</summary>
    [Fact]
    public void AFolderMadeAnewInPlaceOfTheOldOneHasAnotherId()
    {
        var path = temporary.At("inbox");
        var ids = new HashSet<string?>();
        for (var i = 0; i < 10; i++)
        {
            Directory.CreateDirectory(path);
            ids.Add(SafeFile.FolderId(path));
            Directory.Delete(path);
        }

        Assert.Equal(10, ids.Count);
    }

    [Fact]
    public void ASocketIsRefused()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "sockets as files are made on Linux only");
        using var socket = new System.Net.Sockets.Socket(System.Net.Sockets.AddressFamily.Unix, System.Net.Sockets.SocketType.Stream, System.Net.Sockets.ProtocolType.Unspecified);
        socket.Bind(new System.Net.Sockets.UnixDomainSocketEndPoint(temporary.At("socket.fit")));

        Assert.Equal(FileTrouble.NotRegular, TroubleOf(temporary.At("socket.fit")));
        Assert.Null(SafeFile.StampOf(temporary.At("socket.fit")));
    }

    [Fact]
    public void AFolderMadeAnewBesideTheOldOneHasAnotherId()
    {
        var path = temporary.At("inbox");
        Directory.CreateDirectory(path);
        var before = SafeFile.FolderId(path);
        Directory.Move(path, temporary.At("old"));

        Directory.CreateDirectory(path);

        Assert.NotNull(before);
        Assert.NotEqual(before, SafeFile.FolderId(path));
        Assert.Null(SafeFile.FolderId(temporary.At("none")));
    }

    private static FileTrouble TroubleOf(string path) => Assert.IsType<UnopenedFile>(SafeFile.Open(path)).Trouble;
}
