using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class NoticeUpdateTests
{
    private static readonly Contact Ada = Contact(ContactRole.Coach);

    [Theory]
    [InlineData(null, "ann", false, NoticeReason.NoBriefYet)]
    [InlineData("ann", "ann", false, NoticeReason.ListUnchanged)]
    [InlineData("", "", false, NoticeReason.ListUnchanged)]
    [InlineData("ann", "ann\nben", false, NoticeReason.ListChanged)]
    [InlineData("ann", "", false, NoticeReason.ListChanged)]
    [InlineData("", "ann", false, NoticeReason.ListChanged)]
    [InlineData("ann", "ann\nben", true, NoticeReason.AlreadyDecided)]
    public void AChangedListIsToldOnceADay(string? told, string standing, bool decided, NoticeReason expected) =>
        Assert.Equal(expected, NoticePolicy.DecideUpdate(Ada, Today, told, standing, key => decided && key == "ada|update|2026-03-01"));

    [Fact]
    public void TheListIsOfPeopleWhoseAlertsStandInAnyOrder()
    {
        Alert[] alerts =
        [
            LoadRatio("ben").Alert, StimulusGap("ben").Alert, Silence("ann", AlertState.Acknowledged).Alert, Over(LoadRatio("cas")).Alert,
        ];

        Assert.Equal("ann\nben", FlaggedList.Of(alerts));
        Assert.Equal("ann\nben", FlaggedList.Of(alerts.Reverse()));
        Assert.Equal("", FlaggedList.Of([]));
    }

    [Fact]
    public void SayingSeenChangesNoList() => Assert.Equal(
        FlaggedList.Of([LoadRatio("ann").Alert]),
        FlaggedList.Of([LoadRatio("ann", Severity.Warning, AlertState.Acknowledged).Alert]));

    [Theory]
    [InlineData("", "ann", "Since the morning brief 1 person came onto the list.")]
    [InlineData("ann\nben", "", "Since the morning brief 2 people left the list.")]
    [InlineData("ann", "ben\ncas", "Since the morning brief 2 people came onto the list and 1 person left the list.")]
    public void TheChangeIsCountedWithoutNames(string told, string now, string expected) => Assert.Equal(expected, FlaggedList.ChangeInWords(told, now));

    [Fact]
    public void ANoticeThatDidNotGetThroughIsNoFileThatNeedsAnAnswer()
    {
        var missed = new BriefLine("Mail to Ada", "not delivered since Sunday 1 March 2026", OfDelivery: true);

        var brief = BriefBuilder.Build(Ada, Today, [Subject("a", "Ann")], [missed, new BriefLine("1.fit", "held")]);

        Assert.Equal("Nothing to act on for 1 person, but 1 question needs an answer. Notices did not get through.", brief.FirstLine);
        Assert.Contains("- Mail to Ada: Not delivered since Sunday 1 March 2026.", BriefText.Write(brief), StringComparison.Ordinal);
    }

    [Fact]
    public void TheSubjectOfAnUpdateHoldsNeitherNamesNorValues() => Assert.Equal(
        "Morning brief, Sunday 1 March 2026: the list changed",
        BriefText.UpdateSubject(BriefBuilder.Build(Ada, Today, [Subject("a", "Ann", LoadRatio("a"))], [])));
}
