using System.Text.Json.Nodes;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>What a monitoring program hears: an exit code and one sentence, whatever is broken.</summary>
public sealed class StatusCommandTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void BeforeAnySweepNothingIsKnownAndNothingIsMade()
    {
        var (code, first) = Status();
        Assert.Equal(3, code);
        Assert.StartsWith("UNKNOWN: No sweep yet", first, StringComparison.Ordinal);
        Assert.False(Directory.Exists(folder.Data));
    }

    [Fact]
    public void AfterASweepAllIsWellUntilItIsOld()
    {
        Sweep();
        Assert.Equal(0, Status().Code);
        Assert.StartsWith("OK: All is well", Status().First, StringComparison.Ordinal);
        Age();
        Assert.Equal(2, Status().Code);
        Assert.Contains("No sweep has ended well since", Status().First, StringComparison.Ordinal);
        Assert.Equal(0, Status("--max-age", "100000000").Code);
        Assert.Equal(64, Status("--max-age", "0").Code);
    }

    [Fact]
    public void ItWorksBesideAWriter()
    {
        Sweep();
        using var running = Workplace.OpenToWork(folder.ConfigPath);
        Assert.Equal(0, Status().Code);
    }

    [Fact]
    public void AnInboxThatIsGoneIsCritical()
    {
        Directory.Delete(folder.Inbox, recursive: true);
        Assert.Equal(0, Loadwatch.Run("sweep", "--config", folder.ConfigPath).Code);
        Assert.Equal((2, "CRITICAL: The inbox \"inbox\" is not available: there is no such folder."), Status());
    }

    [Fact]
    public void AFaultyConfigurationIsSaid()
    {
        folder.Write("loadwatch.json", "{ \"inboxs\": [] }");
        Assert.Equal(2, Status().Code);
        Assert.Contains("inboxs", Status().First, StringComparison.Ordinal);
    }

    [Fact]
    public void ADamagedDatabaseIsSaidAndLeftAsItIs()
    {
        Sweep();
        var path = Path.Combine(folder.Data, "loadwatch.db");
        var bytes = File.ReadAllBytes(path);
        bytes.AsSpan(4096).Clear();
        File.WriteAllBytes(path, bytes);
        var (code, first) = Status();
        Assert.Equal(2, code);
        Assert.Contains("damaged", first, StringComparison.Ordinal);
        Assert.Contains("backup", first, StringComparison.Ordinal);
        Assert.Equal(bytes, File.ReadAllBytes(path));
        File.Delete(path);
        Assert.Equal(2, Status().Code);
        Assert.False(File.Exists(path));
    }

    [Fact]
    public void ForProgramsItIsOneLineOfJson()
    {
        Sweep();
        var ended = Loadwatch.Run("status", "--json", "--config", folder.ConfigPath);
        var json = JsonNode.Parse(ended.Output)!;
        Assert.Equal((0, 0, "OK"), (ended.Code, (int)json["code"]!, (string)json["word"]!));
        Assert.Equal("done", (string)json["service"]!["sweep"]!["result"]!);
        Assert.Equal(1, (int)json["arrivals"]!["stored"]!);
    }

    private void Sweep()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        Assert.Equal(0, Loadwatch.Run("sweep", "--config", folder.ConfigPath).Code);
    }

    /// <summary>As if the sweep had been years ago.</summary>
    private void Age()
    {
        var path = Path.Combine(folder.Data, "status.json");
        var status = JsonNode.Parse(File.ReadAllText(path))!;
        status["last_done"] = "2020-01-01T00:00:00Z";
        File.WriteAllText(path, status.ToJsonString());
    }

    private (int Code, string First) Status(params string[] words)
    {
        var ended = Loadwatch.Run(["status", "--config", folder.ConfigPath, .. words]);
        Assert.DoesNotContain("   at ", ended.Errors, StringComparison.Ordinal);
        return (ended.Code, ended.Output.Split('\n')[0]);
    }
}
