using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class PersonSentenceTests
{
    [Fact]
    public void OneFindingIsOneSentenceFromWhatToWhoDecides() => Assert.Equal(
        "Load of the last 7 days is 1.94 times the usual week since 27 February; consider comparing with what was planned: an easier day, or keeping the plan if it was meant; "
            + "when: before the next hard session, within a day; decides: you and the person.",
        Told(LoadRatio("a")).Sentence);

    /// <summary>Two weeks of training in one raise several rules at once: it is one thing to think about.</summary>
    [Fact]
    public void ARampUpThatRaisesFourRulesIsOneSentenceWithTheGravestFirst()
    {
        var person = Told(
            News("a", "monotony", null, Severity.Notice, AlertState.Unacknowledged, "load varies little", isNew: true),
            News("a", "weekly_jump", null, Severity.Notice, AlertState.Unacknowledged, "this week is 52 % above the last", isNew: false),
            News("a", "session_spike", null, Severity.Notice, AlertState.Acknowledged, "a session of 300 AU", isNew: false),
            LoadRatio("a"));
        Assert.StartsWith("Load of the last 7 days is 1.94 times the usual week since 27 February; also load of a week far above the last, ", person.Sentence, StringComparison.Ordinal);
        Assert.Contains(" and 1 more; consider comparing", person.Sentence, StringComparison.Ordinal);
        Assert.Equal("load_ratio", person.Reasons[0].Rule);
        Assert.Equal("session_spike", person.Reasons[^1].Rule);
        Assert.DoesNotMatch(@"\. \p{Lu}", person.Sentence);
    }

    [Fact]
    public void WhatWasSeenAndWhatIsNewIsMarked()
    {
        var person = Told(LoadRatio("a", isNew: false), StimulusGap("a", isNew: true));
        Assert.Equal("since 27 Feb", person.Since);
        Assert.EndsWith("; also no heavy or fast leg work lately (new)", person.What, StringComparison.Ordinal);
        Assert.Equal("new", Told(LoadRatio("a")).Since);
    }

    [Fact]
    public void AFindingOfTwoSentencesIsFolded() => Assert.Equal(
        "No recording for 12 days; usually one at least every 4 days; last there on 3 March, by the list of attendance",
        Told(News("a", "silence", null, Severity.Notice, AlertState.Unacknowledged, "No recording for 12 days; usually one at least every 4 days. Last there on 3 March, by the list of attendance.", true)).What);

    private static FlaggedPerson Told(params AlertNews[] alerts) => Assert.Single(BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann", alerts)], []).Flagged);
}
