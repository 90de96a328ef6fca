using LoadWatch.Storage.Files;

namespace LoadWatch.Storage.Tests.Files;

public sealed class PrivateFilesTests : IDisposable
{
    private const UnixFileMode OwnerFile = UnixFileMode.UserRead | UnixFileMode.UserWrite;

    private readonly TemporaryFolder temporary = new();

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void WhatOthersCreateAfterTheUmaskIsPrivateToo()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "Windows has access lists, no modes");
        var before = LinuxCalls.Umask(0);
        try
        {
            PrivateFiles.SetUmask();
            File.WriteAllText(temporary.At("plain"), "x");

            Assert.Equal(OwnerFile, File.GetUnixFileMode(temporary.At("plain")));
        }
        finally
        {
            _ = LinuxCalls.Umask(before);
        }
    }

    [Fact]
    public void AFileCreatedOnceCannotBeCreatedAgain()
    {
        PrivateFiles.CreateOnce(temporary.At("copy")).Dispose();

        Assert.Throws<IOException>(() => PrivateFiles.CreateOnce(temporary.At("copy")));
    }
}
