using System.Text.Json;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

public sealed class ReplayCommandTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public ReplayCommandTests()
    {
        folder.Fill(Some.Fortnight());
        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    /// <summary>In the fortnight one person falls silent, and nothing else is raised.</summary>
    [Fact]
    public void OtherLimitsStandBesideTodaysAndNothingChanges()
    {
        var before = folder.Export("alerts") + folder.Export("findings");
        var file = Write("""{ "limits": { "silence": { "enabled": false } } }""");

        var (code, output, errors) = Replay(file, "--json", "--mark", "ANNA@2026-06-16");

        Assert.Equal((ExitCode.Ok, ""), (code, errors));
        var root = JsonDocument.Parse(output).RootElement;
        Assert.Equal("2026-06-14", root.GetProperty("to").GetString());
        var today = root.GetProperty("today");
        Assert.Equal(("silence", 1), (today.GetProperty("raised")[0].GetProperty("rule").GetString(), today.GetProperty("raised")[0].GetProperty("count").GetInt32()));
        Assert.Equal(1, today.GetProperty("standing").GetInt32());
        Assert.Equal(JsonValueKind.Null, today.GetProperty("leads")[0].GetProperty("days").ValueKind);
        Assert.Equal("silence", root.GetProperty("told").GetProperty("raised")[0].GetProperty("rule").GetString());
        Assert.Equal(0, root.GetProperty("told").GetProperty("corrected").GetInt32());
        Assert.Empty(root.GetProperty("file").GetProperty("raised").EnumerateArray());
        Assert.Equal(JsonValueKind.Null, root.GetProperty("file").GetProperty("leads")[0].GetProperty("days").ValueKind);
        Assert.Equal(before, folder.Export("alerts") + folder.Export("findings"));
        var printed = Replay(file).Output;
        Assert.Contains("as if every recording had come on its day", printed, StringComparison.Ordinal);
        Assert.Matches("silence, notice +1 +1 +0\n", printed);
    }

    /// <summary>Anna is the silent one, and her own limits say that she is watched: what a file says of all leaves that as it is, what it says of her does not.</summary>
    [Theory]
    [InlineData("""{ "limits": { "silence": { "enabled": false } } }""", 1)]
    [InlineData("""{ "people": { "Anna": { "limits": { "silence": { "enabled": false } } } } }""", 0)]
    public void LimitsOfOnePersonStayTheirOwn(string file, int raised)
    {
        var configuration = File.ReadAllText(folder.ConfigPath);
        File.WriteAllText(folder.ConfigPath, configuration.Insert(configuration.IndexOf('{') + 1, """ "people": { "anna": { "limits": { "silence": { "enabled": true } } } }, """));

        var (code, output, errors) = Replay(Write(file), "--json");

        Assert.Equal((ExitCode.Ok, ""), (code, errors));
        var root = JsonDocument.Parse(output).RootElement;
        int Raised(string limits) => root.GetProperty(limits).GetProperty("raised").EnumerateArray().Sum(one => one.GetProperty("count").GetInt32());
        Assert.Equal((1, raised), (Raised("today"), Raised("file")));
        root = JsonDocument.Parse(Replay(folder.ConfigPath, "--json").Output).RootElement;
        Assert.Equal(root.GetProperty("today").GetRawText(), root.GetProperty("file").GetRawText());
    }

    [Fact]
    public void AWholeConfigurationIsARuleFileToo()
    {
        var (code, output, _) = Replay(folder.ConfigPath, "--json");

        Assert.Equal(ExitCode.Ok, code);
        var root = JsonDocument.Parse(output).RootElement;
        Assert.Equal(root.GetProperty("today").GetRawText(), root.GetProperty("file").GetRawText());
    }

    [Theory]
    [InlineData("""{ "limits": { "silnce": { "enabled": false } } }""", "\"silnce\" is not a key here")]
    [InlineData("""{ "limits": { "load_ratio": { "raise": 99 } } }""", "limits.load_ratio.raise")]
    [InlineData("""{ "limits": { "load_ratio": { "raise": 1.2, "return": 1.5 } } }""", "1.5 is above raise, which is 1.2")]
    [InlineData("""{ "people": { "bo": { "limits": { "load_ratio": { "raise": 1.2, "return": 1.5 } } } } }""", "people.bo.limits.load_ratio.return: 1.5 is above raise, which is 1.2")]
    [InlineData("""{ "limits": """, "")]
    public void AWrongFileIsRefusedWithItsPlace(string text, string reason)
    {
        var (code, output, errors) = Replay(Write(text));

        Assert.Equal((ExitCode.Configuration, ""), (code, output));
        Assert.Contains(reason, errors, StringComparison.Ordinal);
        Assert.Contains("other.json", errors, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("anna", "no mark such as anna@2026-03-31")]
    [InlineData("nobody@2026-06-01", "not in the roster")]
    public void AWrongMarkIsAMistakeOfUse(string mark, string reason)
    {
        var (code, _, errors) = Replay(folder.ConfigPath, "--mark", mark);

        Assert.Equal(ExitCode.Usage, code);
        Assert.Contains(reason, errors, StringComparison.Ordinal);
    }

    private string Write(string text)
    {
        var path = Path.Combine(folder.Root, "other.json");
        File.WriteAllText(path, text);
        return path;
    }

    private (int Code, string Output, string Errors) Replay(params string[] words)
    {
        var ended = Loadwatch.Run(["replay", .. words, "--config", folder.ConfigPath]);
        return (ended.Code, ended.Output, ended.Errors);
    }
}
