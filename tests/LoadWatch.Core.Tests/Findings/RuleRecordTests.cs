using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Stimulus;

namespace LoadWatch.Tests.Findings;

public class RuleRecordTests
{
    [Fact]
    public void EveryRuleSaysWhyItMayAskForAttention() => Assert.All(RuleBook.All, rule =>
    {
        Assert.Empty(rule.Record.Missing(rule.Name));
        Assert.Equal(
            ["cause", "consequence", "response", "time to respond", "who decides", "ends", "data needed", "basis", "fixed"],
            rule.Record.Fields(rule.Name).Select(field => field.Name));
        Assert.EndsWith(".", rule.Record.Basis, StringComparison.Ordinal);
    });

    [Fact]
    public void ARuleWithABlankPartCannotBeRegistered()
    {
        var refused = Assert.Throws<ArgumentException>(() => RuleBook.Registered(new LoadRatioRule(), new Bare()));

        Assert.StartsWith("bare has no cause; bare has no time to respond", refused.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void TwoRulesOfOneNameCannotBeRegistered() =>
        Assert.StartsWith(
            "name silence stands twice; rank 3 stands twice",
            Assert.Throws<ArgumentException>(() => RuleBook.Registered(new SilenceRule(), new SilenceRule())).Message,
            StringComparison.Ordinal);

    /// <summary>I-13.</summary>
    [Fact]
    public void WordsDescribeChangeOnly() => Assert.All(
        RuleBook.All.SelectMany(rule => rule.Record.Fields(rule.Name).Select(field => field.Text).Append(rule.Record.Says)).Concat(FixedNumbers.All),
        PlainWords.Hold);

    [Theory]
    [InlineData("It is likely to go on.", "likely")]
    [InlineData("The probability of it is 20 %.", "probability")]
    [InlineData("Cleared to train.", "Cleared")]
    [InlineData("She is overtrained.", "overtrained")]
    [InlineData("He should rest.", "should")]
    [InlineData("It returns to the usual and ends below 1.6.", null)]
    public void AWordThatClaimsMoreIsFound(string text, string? word) => Assert.Equal(word, PlainWords.FirstBanned(text));

    [Fact]
    public void CautionsMaySayWhatLoadWatchDoesNot() => PlainWords.Hold(string.Join('\n', ReadingNotes.Cautions));

    /// <summary>Who decides is of the record: heavy work of somebody older is no matter of the coach alone, a dead strap none of training.</summary>
    [Theory]
    [InlineData("load_ratio", ContactRole.Coach, "you and the person")]
    [InlineData("load_ratio", ContactRole.Clinician, "the person and their coach, with what you know")]
    [InlineData("load_ratio", ContactRole.Self, "you, with your coach or clinician where you have one")]
    [InlineData("stimulus_gap", ContactRole.Coach, "you and the person, with their clinician where one looks after them")]
    [InlineData("stimulus_low", ContactRole.Clinician, "the person, with you")]
    [InlineData("not_usable", ContactRole.Coach, "the person, and whoever looks after the devices")]
    [InlineData("silence", ContactRole.FrontDesk, "the person, and whoever looks after devices and uploads, please pass it on")]
    [InlineData("test_overdue", ContactRole.Clinician, "you, with the person")]
    [InlineData("function_test", ContactRole.Self, "you, with your clinician")]
    public void WhoDecidesIsToldByTheRuleAndToTheReader(string rule, ContactRole role, string decides) =>
        Assert.Equal(decides, RuleBook.Of(rule)!.Record.Deciders.For(role));

    [Fact]
    public void NoReaderIsToldOfThemselvesAsOfSomebodyElse() => Assert.All(RuleBook.All, rule =>
    {
        Assert.DoesNotContain("the person", rule.Record.Deciders.Self, StringComparison.Ordinal);
        Assert.DoesNotContain("their coach", rule.Record.Deciders.Coach, StringComparison.Ordinal);
        Assert.DoesNotContain("clinician", rule.Record.Deciders.Clinician, StringComparison.Ordinal);
    });

    [Fact]
    public void OnlyRulesOfTestsAreOfHealth() =>
        Assert.Equal(["function_test", "test_overdue"], RuleBook.All.Where(rule => rule.Record.IsOfHealth).Select(rule => rule.Name));

    [Fact]
    public void WordsNameTheRegion() =>
        Assert.Equal("no heavy or fast arm work lately", RuleBook.Of("stimulus_gap")!.Record.Named(new FindingKey("a", "stimulus_gap", BodyRegion.Arms), self: false));

    private sealed class Bare : IRule
    {
        public string Name => "bare";

        public RuleRecord Record { get; } = new BareRecord();

        public IRuleLimits LimitsOf(RuleLimits limits) => limits.Silence;

        public IEnumerable<Finding> Evaluate(RuleSubject subject) => [];
    }

    private sealed class BareRecord : RuleRecord
    {
        public override string Says => "bare";

        public override string Cause => " ";

        public override string Consequence => "some";

        public override string TimeToRespond => "";

        public override Deciders Deciders => new("some", "some", "some", "some", "some", "some");

        public override string Ends => "some";

        public override string DataNeeded => "some";

        public override string Basis => "some";

        public override int Rank => 99;

        public override string Counted(FindingKey key) => "some";

        public override string Named(FindingKey key, bool self) => "some";

        public override string Response(FindingKey key, bool self) => "some";

        public override string Returned(FindingKey key, RuleLimits limits, bool self) => "some";
    }
}
