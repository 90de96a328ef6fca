using System.Security.Cryptography;
using System.Text;
using LoadWatch.Storage.Archives;

namespace LoadWatch.Storage.Tests.Archives;

public sealed class ArchiveTests : IDisposable
{
    // FIPS 180-4, example of SHA-256 for the message "abc".
    private const string ShaOfAbc = "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad";

    private readonly TemporaryFolder temporary = new();
    private readonly DataFolder folder;
    private readonly Archive archive;

    public ArchiveTests()
    {
        folder = DataFolder.Open(temporary.At("data"));
        archive = new Archive(folder);
    }

    public void Dispose() => temporary.Dispose();

    [Fact]
    public void AStagedCopyKnowsItsContentAndHasNoNameYet()
    {
        var copy = Stage("abc");

        Assert.Equal(ShaOfAbc, copy.Sha);
        Assert.Equal(3, copy.Size);
        Assert.Equal("abc"u8.ToArray(), copy.Bytes.ToArray());
        Assert.Equal("abc", File.ReadAllText(copy.TemporaryPath));
        Assert.False(archive.Exists(ShaOfAbc));
    }

    [Fact]
    public void ACommittedCopyIsNamedByItsContentAndLeavesNothingBehind()
    {
        archive.Commit([Stage("abc")]);

        Assert.True(File.Exists(Path.Combine(folder.ArchivePath, "ba", ShaOfAbc)));
        Assert.Empty(Directory.GetFiles(folder.IncomingPath));
        Assert.Equal("abc"u8.ToArray(), archive.Read(ShaOfAbc));
        Assert.True(archive.Verify(ShaOfAbc));
    }

    [Fact]
    public void ASecondCommitOfTheSameContentDeletesItsCopy()
    {
        archive.Commit([Stage("abc")]);
        var second = Stage("abc");

        archive.Commit([second]);

        Assert.False(File.Exists(second.TemporaryPath));
        Assert.Single(Directory.GetFiles(folder.ArchivePath, "*", SearchOption.AllDirectories));
    }

    [Fact]
    public void TheSameContentTwiceInOneCommitIsOneObject()
    {
        archive.Commit([Stage("abc"), Stage("abc"), Stage("abd")]);

        Assert.Equal(2, Directory.GetFiles(folder.ArchivePath, "*", SearchOption.AllDirectories).Length);
    }

    [Fact]
    public void ADamagedObjectIsReplacedByAWholeCopy()
    {
        archive.Commit([Stage("abc")]);
        var path = Path.Combine(folder.ArchivePath, "ba", ShaOfAbc);
        File.Delete(path);
        File.WriteAllText(path, "abx");
        Assert.False(archive.Verify(ShaOfAbc));

        archive.Commit([Stage("abc")]);

        Assert.True(archive.Verify(ShaOfAbc));
        Assert.Empty(Directory.GetFiles(folder.IncomingPath));
    }

    [Fact]
    public void ASourceOverTheLimitIsToldSoAndLeavesNothing()
    {
        var staged = archive.Stage(new MemoryStream(new byte[1001]), 1000, cancel: TestContext.Current.CancellationToken);

        Assert.Equal(new OverLimit(1000), staged);
        Assert.Empty(Directory.GetFiles(folder.IncomingPath));
    }

    [Fact]
    public void ASourceAtTheLimitIsTaken() =>
        Assert.IsType<StagedCopy>(archive.Stage(new MemoryStream(new byte[1000]), 1000, cancel: TestContext.Current.CancellationToken));

    [Fact]
    public void ASourceOfManyBuffersIsCopiedWhole()
    {
        var bytes = Enumerable.Range(0, 1_000_003).Select(number => (byte)(number / 7 % 251)).ToArray();

        var copy = Assert.IsType<StagedCopy>(archive.Stage(new MemoryStream(bytes), 2_000_000, cancel: TestContext.Current.CancellationToken));
        archive.Commit([copy]);

        Assert.Equal(Convert.ToHexStringLower(SHA256.HashData(bytes)), copy.Sha);
        Assert.Equal(bytes, copy.Bytes.ToArray());
        Assert.Equal(bytes, archive.Read(copy.Sha));
    }

    [Fact]
    public void ASourceThatFailsLeavesNothing()
    {
        Assert.Throws<SourceUnreadableException>(() => archive.Stage(new FailingStream(), 1000, cancel: TestContext.Current.CancellationToken));

        Assert.Empty(Directory.GetFiles(folder.IncomingPath));
    }

    [Fact]
    public void ACancelledCopyLeavesNothing()
    {
        Assert.Throws<OperationCanceledException>(() => archive.Stage(new MemoryStream(new byte[10]), 1000, cancel: new CancellationToken(canceled: true)));

        Assert.Empty(Directory.GetFiles(folder.IncomingPath));
    }

    [Fact]
    public void AnObjectCanOnlyBeReadAndOnlyByItsOwner()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has access lists, no modes");

        archive.Commit([Stage("abc")]);

        Assert.Equal(UnixFileMode.UserRead, File.GetUnixFileMode(Path.Combine(folder.ArchivePath, "ba", ShaOfAbc)));
    }

    [Theory]
    [InlineData("../../etc/passwd")]
    [InlineData("BA7816BF8F01CFEA414140DE5DAE2223B00361A396177A9CB410FF61F20015AD")]
    [InlineData("")]
    public void ANameThatIsNoShaIsRefused(string name) => Assert.Throws<ArgumentException>(() => archive.Exists(name));

    [Fact]
    public void AnObjectIsReadWholeOrNotAtAll()
    {
        Assert.Null(archive.ReadWhole(ShaOfAbc));
        archive.Commit([Stage("abc")]);
        Assert.Equal("abc"u8.ToArray(), archive.ReadWhole(ShaOfAbc));

        var path = archive.PathOf(ShaOfAbc);
        File.Delete(path);
        File.WriteAllText(path, "abx");
        Assert.Null(archive.ReadWhole(ShaOfAbc));
    }

    [Fact]
    public void MemoryThatIsGivenBackShowsNothingOfTheNextFile()
    {
        var copy = Stage("abc");
        copy.Dispose();
        using var next = Stage("xyz");

        Assert.Throws<ObjectDisposedException>(() => copy.Bytes);
        Assert.Equal("xyz"u8.ToArray(), next.Bytes.ToArray());
    }

    [Fact]
    public void ASourceThatDoesNotTellItsLengthIsCopiedWhole()
    {
        var bytes = Enumerable.Range(0, 3_000_001).Select(number => (byte)(number / 11 % 251)).ToArray();
        using var copy = Assert.IsType<StagedCopy>(archive.Stage(new Unseekable(bytes), 4_000_000, cancel: TestContext.Current.CancellationToken));
        Assert.Equal(bytes, copy.Bytes.ToArray());
        Assert.Equal(bytes, File.ReadAllBytes(copy.TemporaryPath));
    }

    [Fact]
    public void ACopyThatIsNotToBeHeldIsHashedAndWrittenAllTheSame()
    {
        var bytes = Enumerable.Range(0, 3_000_001).Select(number => (byte)(number / 11 % 251)).ToArray();
        var sha = Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(bytes));
        var copy = Assert.IsType<StagedCopy>(archive.Stage(new MemoryStream(bytes), 3_000_001, isHeld: false, TestContext.Current.CancellationToken));
        Assert.Equal((sha, 3_000_001, 0), (copy.Sha, copy.Size, copy.Bytes.Length));
        archive.Commit([copy]);
        Assert.Equal(bytes, archive.ReadWhole(sha));
        Assert.Equal(3_000_001, archive.SizeOf(sha));
        Assert.Equal(new OverLimit(3_000_000), archive.Stage(new MemoryStream(bytes), 3_000_000, isHeld: false, TestContext.Current.CancellationToken));
        Assert.Null(archive.SizeOf(ShaOfAbc));
    }

    [Fact]
    public void AMissingObjectIsAnError()
    {
        Assert.False(archive.Verify(ShaOfAbc));
        Assert.Throws<FileNotFoundException>(() => archive.Read(ShaOfAbc));
    }

    private StagedCopy Stage(string content) =>
        Assert.IsType<StagedCopy>(archive.Stage(new MemoryStream(Encoding.UTF8.GetBytes(content)), 1000, cancel: TestContext.Current.CancellationToken));

    private sealed class Unseekable(byte[] bytes) : MemoryStream(bytes)
    {
        public override bool CanSeek => false;
    }

    private sealed class FailingStream : MemoryStream
    {
        private bool begun;

        public override int Read(Span<byte> buffer)
        {
            if (begun)
            {
                throw new IOException("the share is gone");
            }

            begun = true;
            return 1;
        }
    }
}
