using System.Text.Json;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.Service.Tests.Configuration;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

public sealed class RulesCommandTests : IDisposable
{
    private readonly ConfigurationFolder folder = new();

    public RulesCommandTests() => folder.Write("loadwatch.json", """
        { "limits": { "load_ratio": { "raise": 2.5 } },
          "groups": [ { "id": "squad", "limits": { "load_ratio": { "return": 2 } } }, { "id": "class", "kind": "clinic" } ],
          "people": { "ben": { "limits": { "load_ratio": { "raise": 3 }, "silence": { "enabled": false } } } } }
        """);

    public void Dispose() => folder.Dispose();

    [Fact]
    public void EveryRuleIsPrintedWithItsReasonsWhatMutesItAndItsLimits()
    {
        var printed = Run();

        Assert.StartsWith("Limits: those common to all groups.", printed, StringComparison.Ordinal);
        Assert.All(RuleBook.All, rule =>
        {
            Assert.Contains($"\n{rule.Name}: {rule.Record.Says}\n", printed, StringComparison.Ordinal);
            Assert.All(rule.Record.Fields(rule.Name), field => Assert.Contains(field.Text, printed, StringComparison.Ordinal));
        });
        Assert.Contains("enabled true, quantities [], raise 2.5, return 1.8, history_days 28", printed, StringComparison.Ordinal);
        Assert.Contains("on_days 2, off_days 1, severity warning", printed, StringComparison.Ordinal);
        Assert.Contains("regions [\"legs\"]", printed, StringComparison.Ordinal);
        Assert.Contains("What mutes what:", printed, StringComparison.Ordinal);
        Assert.All(RuleMutes.All, mute => Assert.Contains(mute.How, printed, StringComparison.Ordinal));
        Assert.All(FixedNumbers.All, sentence => Assert.Contains(sentence, printed, StringComparison.Ordinal));
        Assert.Contains("told 0.7 of the recordings that came", printed, StringComparison.Ordinal);
        Assert.DoesNotContain(" \n", printed, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("squad", 2.5, 2, true, true)]
    [InlineData("class", 2.5, 1.8, true, false)]
    [InlineData("anna", 2.5, 2, true, true)]
    [InlineData("BEN", 3, 2, false, true)]
    public void ProgramsGetTheLimitsInForce(string whose, double raise, double back, bool silence, bool monotony)
    {
        var rules = JsonDocument.Parse(Run(whose, "--json")).RootElement.GetProperty("rules").EnumerateArray().ToDictionary(rule => rule.GetProperty("rule").GetString()!);

        Assert.Equal(RuleBook.All.Select(rule => rule.Name), rules.Keys);
        var ratio = rules["load_ratio"].GetProperty("limits");
        Assert.Equal((raise, back), (ratio.GetProperty("raise").GetDouble(), ratio.GetProperty("return").GetDouble()));
        Assert.Equal((silence, monotony), (IsOn("silence"), IsOn("monotony")));
        Assert.Equal(
            [
                "rule", "says", "of_health", "cause", "consequence", "response", "time_to_respond", "who_decides", "ends", "data_needed", "basis", "fixed", "muted_by", "limits", "limits_hash",
            ],
            rules["silence"].EnumerateObject().Select(property => property.Name));

        bool IsOn(string rule) => rules[rule].GetProperty("limits").GetProperty("enabled").GetBoolean();
    }

    [Fact]
    public void ARuleThatIsOffSaysSo() => Assert.Contains("monotony: a heavy week without variation (off)", Run("class"), StringComparison.Ordinal);

    [Fact]
    public void AWordThatIsNobodysIsAWrongCommandLine()
    {
        var ended = Loadwatch.Run("rules", "sqaud", "--config", folder.At("loadwatch.json"));

        Assert.Equal((64, "\"sqaud\" is neither a group nor in the roster; did you mean \"squad\"?"), (ended.Code, ended.Errors.Trim()));
    }

    private string Run(params string[] words)
    {
        var ended = Loadwatch.Run(["rules", .. words, "--config", folder.At("loadwatch.json")]);

        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        return ended.Output.ReplaceLineEndings("\n");
    }
}
