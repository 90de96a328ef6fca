using LoadWatch.Notices;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Tests.Notices;

public sealed class NoticeLinesTests
{
    [Fact]
    public void ANoticeIsOneLineForEachThingSaid() => Assert.Equal(
        [
            "2026-03-01 ada 1/6 [ada|brief|2026-03-01] Morning brief, Sunday 1 March 2026: something to look at",
            "2026-03-01 ada 2/6 Morning brief for Ada Merriweather, Sunday 1 March 2026 Data up to Saturday 28 February 2026",
            "2026-03-01 ada 3/6 1 of 2 to look at: 1 well above their usual. 1 person without a known day in the last week. 1 question needs an answer.",
            "2026-03-01 ada 4/6 to look at: Ann Tarrow (warning, new): Load of the last 7 days is 1.94 times the usual week since 27 February; "
                + "consider comparing with what was planned: an easier day, or keeping the plan if it was meant; when: before the next hard session, within a day; decides: you and the person. "
                + "56 days to 28 Feb. The last 7 days: 480 AU; a usual week: 400 AU, the middle half of 7 weeks. Load on 42 days, the highest 80 AU on 28 Feb; "
                + "none on 14. Heavy or fast leg work on 14 days, the last on 27 Feb.",
            "2026-03-01 ada 5/6 no longer to look at: Ben Ollery: Heavy or fast leg work is back.",
            "2026-03-01 ada 6/6 needs an answer: 2026-02-28.fit: Nobody is named as its owner.",
        ],
        NoticeLines.Of(Notice()));

    [Fact]
    public void ControlCharactersAreStripped()
    {
        var lines = NoticeLines.Of(Notice() with { Text = "a\u001b[2Jb\u0007\r\nc\u202Ed\n\nmore", Subject = "s\r\n2026-03-01 ada 2/2 forged" });
        Assert.Equal(3, lines.Count);
        Assert.All(lines, line => Assert.DoesNotContain(line, letter => char.IsControl(letter) || letter == '\u202E'));
    }

    [Fact]
    public void AWholeNoticeIsRecognisedAmongOthers()
    {
        var other = Notice() with { Key = "bo|brief|2026-03-01", ContactId = "bo" };
        List<string> lines = [.. NoticeLines.Of(other), .. NoticeLines.Of(Notice())];
        Assert.True(NoticeLines.Hold(lines, Notice()));
        Assert.True(NoticeLines.Hold(lines, other));
        Assert.False(NoticeLines.Hold(lines, Notice() with { Key = "ada|brief|2026-03-02" }));
        Assert.False(NoticeLines.Hold([], Notice()));
    }

    [Fact]
    public void ATornNoticeIsNotTakenForAWholeOne()
    {
        var whole = NoticeLines.Of(Notice());
        var other = NoticeLines.Of(Notice() with { ContactId = "bo" });
        for (var kept = 0; kept < whole.Count; kept++)
        {
            Assert.False(NoticeLines.Hold([.. whole.Take(kept)], Notice()));
            Assert.False(NoticeLines.Hold([.. whole.Take(kept), .. other], Notice()));
            Assert.True(NoticeLines.Hold([.. whole.Take(kept), .. whole], Notice()));
        }
    }

    [Fact]
    public void TheSameTextOfALaterVersionIsStillRecognisedByItsKey() =>
        Assert.True(NoticeLines.Hold(NoticeLines.Of(Notice()), Notice() with { Text = "worded otherwise" }));

    private static Notice Notice()
    {
        var brief = BriefTextTests.SmallBrief();
        return new Notice("ada|brief|2026-03-01", "ada", Today, BriefText.Subject(brief), BriefText.Write(brief), "<p>", NoticeReason.BriefDue);
    }
}
