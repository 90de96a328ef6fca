using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Tests.Alerts;

public class StaleAlertsTests
{
    private static readonly LocalDate Monday = new(2026, 3, 2);

    private static readonly Alert Standing = MorningExamples.LoadRatio("a").Alert with { StandsSince = Monday.PlusDays(-15) };

    [Fact]
    public void WhatStandsForMoreThanFourteenDaysUnseenIsStale()
    {
        Assert.True(StaleAlerts.IsStale(Standing, Monday));
        Assert.False(StaleAlerts.IsStale(Standing with { StandsSince = Monday.PlusDays(-14) }, Monday));
        Assert.False(StaleAlerts.IsStale(Standing with { State = AlertState.Acknowledged }, Monday));
        Assert.False(StaleAlerts.IsStale(Standing with { State = AlertState.Returned }, Monday));
        Assert.False(StaleAlerts.IsStale(Standing with { ShelvedUntil = Monday }, Monday));
        Assert.False(StaleAlerts.IsStale(Standing with { Watch = AlertWatch.SuppressedByDesign }, Monday));
    }

    [Fact]
    public void TheFirstBriefOfAWeekAsksAboutIt()
    {
        var contact = MorningExamples.Contact(ContactRole.Coach);
        var subject = MorningExamples.Subject("a", "Ada Quill", new AlertNews(Standing, IsNew: false, ReturnedSince: false, Corrected: false));

        var asked = Assert.Single(BriefBuilder.Build(contact, Monday, [subject], []).Questions);
        Assert.Equal("Ada Quill", asked.Subject);
        Assert.Contains("since 15 February, and nobody has said that it was seen", asked.Sentence, StringComparison.Ordinal);
        Assert.Empty(BriefBuilder.Build(contact, Monday.PlusDays(1), [subject], []).Questions);
        Assert.Single(BriefBuilder.Build(contact with { BriefDays = new HashSet<IsoDayOfWeek> { IsoDayOfWeek.Tuesday, IsoDayOfWeek.Friday } }, Monday.PlusDays(1), [subject], []).Questions);
    }

    [Fact]
    public void FiveAreNamedTheLongestFirstAndTheRestIsCounted()
    {
        var subjects = Enumerable.Range(0, 8).Select(at => MorningExamples.Subject(
            $"p{at}", $"Person {at}", new AlertNews(MorningExamples.LoadRatio($"p{at}").Alert with { StandsSince = Monday.PlusDays(-20 - at) }, IsNew: false, ReturnedSince: false, Corrected: false)));

        var asked = BriefBuilder.Build(MorningExamples.Contact(ContactRole.Coach), Monday, [.. subjects], []).Questions;

        Assert.Equal(["Person 7", "Person 6", "Person 5", "Person 4", "Person 3", "Standing alerts"], asked.Select(line => line.Subject));
        Assert.StartsWith("3 more", asked[^1].Sentence, StringComparison.OrdinalIgnoreCase);
    }
}
