using LoadWatch.Notices;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Tests.Notices;

/// <summary>2026-03-01 is a Sunday; the brief comes at 06:30 Helsinki, 04:30 UTC in winter.</summary>
public class NoticePolicyTests
{
    private static readonly LocalDate Sunday = new(2026, 3, 1);

    [Theory]
    [InlineData("2026-03-01T04:29:59Z", null, NoticeReason.NotYetDue, "2026-03-01")]
    [InlineData("2026-03-01T04:30:00Z", null, NoticeReason.BriefDue, "2026-03-01")]
    [InlineData("2026-03-01T04:30:00Z", "2026-02-28", NoticeReason.BriefDue, "2026-03-01")]
    [InlineData("2026-03-01T23:00:00Z", "2026-03-01", NoticeReason.AlreadyDecided, "2026-03-01")]
    [InlineData("2026-03-01T04:00:00Z", "2026-02-27", NoticeReason.BriefDue, "2026-02-28")]
    public void ADailyBriefIsDueAtItsTimeAndCaughtUp(string now, string? last, NoticeReason reason, string date) =>
        Assert.Equal(new NoticeDecision(reason, Date(date)), Decide(Daily, now, last));

    [Theory]
    [InlineData("2026-03-03T10:00:00Z", "2026-02-23", NoticeReason.BriefDue, "2026-03-02")]
    [InlineData("2026-03-03T10:00:00Z", "2026-03-02", NoticeReason.AlreadyDecided, "2026-03-02")]
    [InlineData("2026-03-03T10:00:00Z", null, NoticeReason.NotADay, "2026-03-03")]
    [InlineData("2026-03-02T10:00:00Z", null, NoticeReason.BriefDue, "2026-03-02")]
    public void AMissedMondayIsCaughtUpWithinTheWeek(string now, string? last, NoticeReason reason, string date) =>
        Assert.Equal(new NoticeDecision(reason, Date(date)), Decide(Weekly, now, last));

    [Fact]
    public void WhatWasDecidedUnderItsKeyIsNotDecidedAgain() =>
        Assert.Equal(
            NoticeReason.AlreadyDecided,
            NoticePolicy.Decide(Daily, Moment("2026-03-01T05:00:00Z"), Sunday.PlusDays(-1), key => key == "ada|brief|2026-03-01").Reason);

    private static Contact Daily { get; } = With(Enum.GetValues<IsoDayOfWeek>().Where(day => day != IsoDayOfWeek.None));

    private static Contact Weekly { get; } = With([IsoDayOfWeek.Monday]);

    private static NoticeDecision Decide(Contact contact, string now, string? last) =>
        NoticePolicy.Decide(contact, Moment(now), last is null ? null : Date(last), _ => false);

    private static Instant Moment(string text) => NodaTime.Text.InstantPattern.ExtendedIso.Parse(text).Value;

    private static LocalDate Date(string text) => NodaTime.Text.LocalDatePattern.Iso.Parse(text).Value;

    private static Contact With(IEnumerable<IsoDayOfWeek> days) => new(
        "ada", "Ada", ContactRole.Coach, ["boat"], [], DateTimeZoneProviders.Tzdb["Europe/Helsinki"], new LocalTime(6, 30), days.ToHashSet());
}
