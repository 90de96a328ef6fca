using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class RuleTextsTests
{
    private static readonly RuleLimits Limits = new() { LoadRatio = new() { Raise = 1.8, Return = 1.6 } };

    [Fact]
    public void EveryRuleHasWordsOfItsOwn()
    {
        var other = Key("some_new_rule");
        Assert.All(RuleBook.All.Select(rule => Key(rule.Name)), key =>
        {
            var words = key.Rule.Replace('_', ' ');
            Assert.NotEqual($"with {words}", RuleTexts.Counted(key));
            Assert.NotEqual(RuleTexts.Consider(other, self: false), RuleTexts.Consider(key, self: false));
            Assert.NotEqual($"{words}: back to usual", Returned(key));
        });
    }

    [Fact]
    public void ReasonsStandInTheOrderOfTheRuleBookAndWhatIsNotInItLast() =>
        Assert.Equal(
            Enumerable.Range(0, RuleBook.All.Count + 1),
            RuleBook.All.Select(rule => rule.Name).Append("some_new_rule").Select(RuleTexts.Order));

    /// <summary>I-13.</summary>
    [Fact]
    public void WordsDescribeChangeOnly() => Assert.All(
        RuleBook.All.SelectMany(rule => new[] { Key(rule.Name), Key(rule.Name, "distance") }),
        key => PlainWords.Hold(
            string.Join(' ', RuleTexts.Counted(key), RuleTexts.Named(key, self: true), RuleTexts.Consider(key, self: true), RuleTexts.Consider(key, self: false), Returned(key))));

    [Theory]
    [InlineData("load_ratio", "distance", "well above their usual distance", "distance well above the usual", "distance is back within 1.6 times the usual week")]
    [InlineData("weekly_jump", "distance_above_7_m_s", "with a week far above the last by distance at 7 m/s and faster",
        "distance at 7 m/s and faster of a week far above the last", "distance at 7 m/s and faster of the week is no longer far above the last")]
    [InlineData("falling_load", "minutes", "well below their usual training time", "training time well below the usual", "training time is back at 70 % of the usual or above")]
    [InlineData("session_spike", "distance", "with one run far beyond their longest", "one run far beyond the longest of late",
        "one run far beyond the longest lies some days back")]
    [InlineData("session_spike", null, "with one session far beyond their longest", "one session far beyond the longest of late",
        "one session far beyond the longest lies some days back")]
    public void AQuantityIsNamedInPlainWords(string rule, string? quantity, string counted, string named, string returned)
    {
        var key = Key(rule, quantity);
        Assert.Equal((counted, named, returned), (RuleTexts.Counted(key), RuleTexts.Named(key, self: false), Returned(key)));
    }

    [Theory]
    [InlineData(PlanWord.LightWeek, "load well below the usual: not watched in light weeks and the off-season")]
    [InlineData(PlanWord.Camp, "load is back at 70 % of the usual or above")]
    public void AFadeIsNotWatchedWhereLittleIsMeant(PlanWord phase, string expected) =>
        Assert.Equal(expected, Returned(Key("falling_load"), DayPlan.None with { Phases = [phase] }));

    private static FindingKey Key(string rule, string? quantity = null) => new("a", rule, rule == "stimulus_gap" ? BodyRegion.Legs : null, quantity);

    private static string Returned(FindingKey key, DayPlan? plan = null)
    {
        var over = Over(LoadRatio("a"));
        return RuleTexts.Returned(over with { Alert = over.Alert with { Key = key } }, Limits, plan ?? DayPlan.None, self: false);
    }
}
