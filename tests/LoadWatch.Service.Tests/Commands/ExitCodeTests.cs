using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

public sealed class ExitCodeTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ASecondInstanceEndsWith75AndNamesTheLock()
    {
        using var first = Workplace.OpenToWork(folder.ConfigPath);
        var second = Loadwatch.Run("sweep", "--config", folder.ConfigPath);
        Assert.Equal((75, ""), (second.Code, second.Output));
        Assert.Contains(Path.Combine(folder.Data, "loadwatch.lock"), second.Errors, StringComparison.Ordinal);
        Assert.Contains($"process {Environment.ProcessId} ", second.Errors, StringComparison.Ordinal);
        Assert.Equal(0, Loadwatch.Run("export", "arrivals", "--config", folder.ConfigPath).Code);
    }

    [Theory]
    [InlineData("sweep", "--no-such-option")]
    [InlineData("swep")]
    [InlineData("export", "everything")]
    [InlineData("sweep", "--as-of", "yesterday")]
    public void AWrongCommandLineEndsWith64(params string[] words)
    {
        var ended = Loadwatch.Run(words);
        Assert.Equal((64, ""), (ended.Code, ended.Output));
        Assert.Contains("--help", ended.Errors, StringComparison.Ordinal);
        Assert.Contains(words[^1], ended.Errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("roster.csv", "person,name,group,birth_year,sex,time_zone\nanna,Anna,squad,,,\nbo,Bo,squid,,,\n", "roster.csv:3: ")]
    [InlineData("anchors.csv", "person,date,anchor,value,unit,source,exercise\nanna,,heart_rate_max,1900,bpm,,\n", "anchors.csv:2: ")]
    [InlineData("loadwatch.json", "{\n  \"time_zone\": \"UTC\",\n  \"inboxs\": []\n}\n", "loadwatch.json:3: ")]
    public void AWrongConfigurationEndsWith78AndNamesFileAndLine(string file, string text, string place)
    {
        folder.Write(file, text);
        var ended = Loadwatch.Run("sweep", "--config", folder.ConfigPath);
        Assert.Equal((78, ""), (ended.Code, ended.Output));
        Assert.Contains(place, ended.Errors, StringComparison.Ordinal);
        Assert.False(Directory.Exists(folder.Data), "nothing is touched before the configuration is right");
    }

    [Fact]
    public void ASweepEndsWith0WhateverItRefused()
    {
        folder.Put("anna/cut.fit", Some.Fit(Some.Yesterday)[..200]);
        folder.Put("anna/notes.txt", Some.Text("felt fine\n"));
        folder.Put("nobody.fit", Some.Fit(Some.Yesterday));
        var ended = Loadwatch.Run("sweep", "--config", folder.ConfigPath, "--as-of", WorkingFolder.NowText);
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.StartsWith("3 files in the inboxes, 0 still settling. Arrivals in all: 0 waiting, 0 stored, 0 aside, 1 held (+1), 2 refused (+2).", ended.Output, StringComparison.Ordinal);
        Assert.Contains(Path.Combine(folder.Root, "pages", "staff.html"), ended.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void ADatabaseOfSomebodyElseEndsWith65()
    {
        Directory.CreateDirectory(folder.Data);
        File.WriteAllText(Path.Combine(folder.Data, "loadwatch.db"), new string('x', 8192));
        var ended = Loadwatch.Run("sweep", "--config", folder.ConfigPath);
        Assert.True(ended.Code == 65, ended.Errors);
        Assert.DoesNotContain("   at ", ended.Errors, StringComparison.Ordinal);
    }

    [Fact]
    public void ADatabaseOfANewerVersionEndsWith78()
    {
        folder.Sweep();
        using (var other = new Microsoft.Data.Sqlite.SqliteConnection($"Data Source={Path.Combine(folder.Data, "loadwatch.db")};Pooling=False"))
        {
            other.Open();
            using var command = other.CreateCommand();
            command.CommandText = "PRAGMA user_version=9999";
            command.ExecuteNonQuery();
        }

        foreach (var word in new[] { "sweep", "status" })
        {
            var ended = Loadwatch.Run(word, "--config", folder.ConfigPath);
            Assert.True(ended.Code == (word == "sweep" ? 78 : 2), ended.Errors + ended.Output);
            Assert.Contains("newer LoadWatch (schema 9999", ended.Errors + ended.Output, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void AMissingDatabaseBesideOriginalsEndsWith65AndIsNotMadeAnew()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        var database = Path.Combine(folder.Data, "loadwatch.db");
        File.Delete(database);
        var ended = Loadwatch.Run("sweep", "--config", folder.ConfigPath);
        Assert.True(ended.Code == 65, ended.Errors);
        Assert.Contains("from a backup", ended.Errors, StringComparison.Ordinal);
        Assert.False(File.Exists(database));
    }

    [Fact]
    public void ADamagedDatabaseEndsWith65AndSaysWhatToDo()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        var database = Path.Combine(folder.Data, "loadwatch.db");
        var bytes = File.ReadAllBytes(database);
        bytes.AsSpan(4096).Clear();
        File.WriteAllBytes(database, bytes);
        var ended = Loadwatch.Run("sweep", "--config", folder.ConfigPath);
        Assert.True(ended.Code == 65, ended.Errors);
        Assert.Contains("backup", ended.Errors, StringComparison.Ordinal);
        Assert.Contains("loadwatch rebuild", ended.Errors, StringComparison.Ordinal);
        Assert.Equal(bytes.Length, File.ReadAllBytes(database).Length);
    }

    /// <summary>The provider waits five seconds for another writer.</summary>
    [Fact]
    public void ADecisionWhileAnotherProgramWritesEndsWith75()
    {
        folder.Sweep();
        using var other = new Microsoft.Data.Sqlite.SqliteConnection($"Data Source={Path.Combine(folder.Data, "loadwatch.db")};Pooling=False");
        other.Open();
        using var transaction = other.BeginTransaction(deferred: false);
        var ended = Loadwatch.Run("ack", "anna|load_ratio||2026-06-14", "--config", folder.ConfigPath);
        Assert.True(ended.Code == 75, ended.Errors);
        Assert.Contains("Another program holds the database", ended.Errors, StringComparison.Ordinal);
    }

    [Fact]
    public void TheLockDiesWithItsProcess()
    {
        using var service = Loadwatch.Start(["run", "--config", folder.ConfigPath]);
        Assert.True(SpinWait.SpinUntil(() => File.Exists(Path.Combine(folder.Data, "status.json")), TimeSpan.FromSeconds(60)));
        service.Kill();
        using var next = Workplace.OpenToWork(folder.ConfigPath);
        Assert.NotNull(next);
    }

    [Theory]
    [InlineData(false, "nfs", true)]
    [InlineData(true, "nfs", false)]
    [InlineData(false, null, false)]
    public void ADataFolderOnANetworkFileSystemIsRefusedUnlessItIsAllowed(bool allowed, string? network, bool refused)
    {
        var configuration = LoadWatch.Service.Configuration.ConfigurationReader.Read(folder.ConfigPath) with { AllowNetworkDataFolder = allowed };
        var asked = new List<string>();
        var thrown = Record.Exception(() => RemoteData.Refuse(configuration, path =>
        {
            asked.Add(path);
            return network;
        }));
        Assert.Equal(refused, thrown is LoadWatch.Service.Configuration.ConfigurationException);
        Assert.All(asked, path => Assert.Equal(folder.Root, path));
        Assert.False(Directory.Exists(folder.Data));
    }
}
