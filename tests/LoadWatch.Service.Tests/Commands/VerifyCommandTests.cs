using LoadWatch.Service.Tests.Pipeline;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>Rot is found, named, and nothing else is touched.</summary>
public sealed class VerifyCommandTests : IDisposable
{
    private readonly WorkingFolder folder = new();
    private readonly byte[] ride = Some.Fit(Some.Yesterday);

    public VerifyCommandTests()
    {
        folder.Put("anna/ride.fit", ride);
        folder.Put("bo/ride.fit", Some.Fit(Some.Yesterday, 9));
        folder.Sweep();
    }

    private string Original => WorkingFolder.Files(Path.Combine(folder.Data, "archive")).Single(path => Path.GetFileName(path) == WorkingFolder.Sha(ride));

    public void Dispose() => folder.Dispose();

    [Fact]
    public void WhatIsAsItWasWrittenIsSound()
    {
        var ended = Verify();
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.StartsWith("2 originals and 2 activities read: all as they were written.", ended.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void WhatIsComputedAnewIsTheSameAndLeavesNothingBehind()
    {
        var before = folder.Everything();
        var ended = Verify("--deep");
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.Empty(Directory.GetDirectories(folder.Data, "verify-*"));
        Assert.Equal(before, folder.Everything());
    }

    [Fact]
    public void AFlippedBitOfAnOriginalIsNamedWithItsFileAndSession()
    {
        Rot(Original);
        var ended = Verify();
        Assert.Equal(65, ended.Code);
        Assert.Contains($"Original {WorkingFolder.Sha(ride)[..12]} (anna/ride.fit): its bytes are not those", ended.Output, StringComparison.Ordinal);
        Assert.Contains("anna on 2026-06-14", ended.Output, StringComparison.Ordinal);
        Assert.Contains("2 originals and 2 activities read: 1 rotted.", ended.Output, StringComparison.Ordinal);
    }

    /// <summary>The cure that the advice names.</summary>
    [Fact]
    public void TheSameFileArrivingAgainMendsItsOriginal()
    {
        Rot(Original);
        folder.Put("anna/again.fit", ride);
        folder.Sweep();
        Assert.Equal(0, Verify().Code);
    }

    [Fact]
    public void AMissingOriginalIsNamed()
    {
        File.Delete(Original);
        var ended = Verify();
        Assert.Equal(65, ended.Code);
        Assert.Contains("(anna/ride.fit): it is missing", ended.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void AFlippedValueIsNamedAndARebuildMendsIt()
    {
        Run("UPDATE activity SET heart_rate_max_bpm = heart_rate_max_bpm + 1 WHERE person = 'anna'");
        var ended = Verify();
        Assert.Equal(65, ended.Code);
        Assert.Contains("The values of anna's session of 2026-06-14", ended.Output, StringComparison.Ordinal);
        Assert.Contains("loadwatch rebuild", ended.Output, StringComparison.Ordinal);
        folder.Rebuild();
        Assert.Equal(0, Verify().Code);
    }

    /// <summary>A row written wrong has the right checksum, or none: only computing it anew tells.</summary>
    [Fact]
    public void ARowThatWasWrittenWrongIsFoundByComputingItAnew()
    {
        Run("UPDATE activity SET heart_rate_max_bpm = heart_rate_max_bpm + 1, checksum = NULL WHERE person = 'anna'");
        var plain = Verify();
        Assert.Equal(0, plain.Code);
        Assert.Contains("1 activities are of before checksums", plain.Output, StringComparison.Ordinal);
        var deep = Verify("--deep");
        Assert.Equal(65, deep.Code);
        Assert.Contains("anna's session of 2026-06-14 differs from what its originals give now", deep.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutADatabaseThereIsNothingToVerifyAndNothingIsMade()
    {
        File.Delete(Path.Combine(folder.Data, "loadwatch.db"));
        Assert.Equal(65, Verify().Code);
        Assert.False(File.Exists(Path.Combine(folder.Data, "loadwatch.db")));
    }

    private Ended Verify(params string[] words) => Loadwatch.Run(["verify", "--config", folder.ConfigPath, .. words]);

    private static void Rot(string path)
    {
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(path, UnixFileMode.UserRead | UnixFileMode.UserWrite);
        }

        var bytes = File.ReadAllBytes(path);
        bytes[^20] ^= 1;
        File.WriteAllBytes(path, bytes);
    }

    private void Run(string sql)
    {
        using var connection = new SqliteConnection($"Data Source={Path.Combine(folder.Data, "loadwatch.db")};Pooling=False");
        connection.Open();
        using var command = connection.CreateCommand();
        command.CommandText = sql;
        Assert.NotEqual(0, command.ExecuteNonQuery());
    }
}
