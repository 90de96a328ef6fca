using System.Text;
using LoadWatch.Delivery.Log;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Delivery.Tests.Page;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Tests;
using MimeKit;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests;

/// <summary>Every hostile text in every place of a brief that takes one, by every way out.</summary>
public sealed class HostileTextTests
{
    private const string From = "LoadWatch <brief@example.org>";
    private const string Recipient = "ada@example.org";

    public static TheoryData<NamesShown> Levels => [.. Enum.GetValues<NamesShown>()];

    [Fact]
    public void ThereAreThreeHundredAndFortyDifferentTexts() => Assert.Equal(340, HostileTexts.All.Distinct(StringComparer.Ordinal).Count());

    [Theory]
    [MemberData(nameof(Levels))]
    public void APageHoldsNoNewElementOrAttribute(NamesShown names)
    {
        var plain = HtmlSkeleton.Of(PageRenderer.Render(Holding("Plain", names)));
        var empty = HtmlSkeleton.Of(PageRenderer.Render(Holding("", names)));
        foreach (var text in HostileTexts.All)
        {
            var page = PageRenderer.Render(Holding(text, names));

            Assert.Equal(OneLine.Of(text).Length == 0 ? empty : plain, HtmlSkeleton.Of(page));
            Assert.DoesNotContain(page, HostileTexts.IsRaw);
        }
    }

    [Fact]
    public void AMailHoldsNoNewElementOrAttribute()
    {
        var plain = HtmlSkeleton.Of(MailRenderer.Render(Holding("Plain", NamesShown.Full)));
        foreach (var text in HostileTexts.All.Where(text => OneLine.Of(text).Length > 0))
        {
            var mail = MailRenderer.Render(Holding(text, NamesShown.Full));

            Assert.Equal(plain, HtmlSkeleton.Of(mail));
            Assert.DoesNotContain(mail, HostileTexts.IsRaw);
        }
    }

    [Theory]
    [MemberData(nameof(Levels))]
    public void ATextHoldsNothingThatTurnsOrStartsALine(NamesShown names)
    {
        var plain = NoticeLines.Of(NoticeOf("Plain", names)).Count;
        foreach (var text in HostileTexts.All)
        {
            var notice = NoticeOf(text, names);

            Assert.DoesNotContain(notice.Text, HostileTexts.IsRaw);
            Assert.Equal(plain, NoticeLines.Of(notice).Count);
        }
    }

    [Fact]
    public void AMailHasTheSameHeadAndTwoPartsThatReadAsTheNotice()
    {
        var plain = Head(Mail(NoticeOf("Plain", NamesShown.Full)));
        foreach (var text in HostileTexts.All)
        {
            var notice = NoticeOf(text, NamesShown.Full);
            var mail = Mail(notice);

            Assert.Equal(plain, Head(mail));
            var read = MimeMessage.Load(new MemoryStream(mail), TestContext.Current.CancellationToken);
            Assert.Equal((notice.Subject, 2), (read.Subject, read.BodyParts.Count()));
            Assert.Equal(notice.Text, read.TextBody!.ReplaceLineEndings("\n"));
            Assert.Equal(notice.MailHtml!.ReplaceLineEndings("\n"), read.HtmlBody!.ReplaceLineEndings("\n"));
        }
    }

    [Fact]
    public void TheNoticeFileGrowsByTheLinesOfANoticeAndNoOthers()
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-hostile-");
        try
        {
            var expected = new List<string>();
            foreach (var (text, place) in HostileTexts.All.Where((_, place) => place % 4 == 1).Select((text, place) => (text, place)))
            {
                var notice = NoticeOf(text, NamesShown.Full) with { Key = $"ada|brief{place}|2026-03-01" };
                expected.AddRange(NoticeLines.Of(notice));
                Assert.Equal(ChannelResult.Delivered, NoticeFile.Append(folder.FullName, notice).Result);
            }

            var lines = File.ReadAllText(Assert.Single(folder.GetFiles()).FullName).Split('\n');
            Assert.Equal([.. expected, ""], lines);
            Assert.All(lines[..^1], line => Assert.StartsWith("2026-03-01 ada ", line, StringComparison.Ordinal));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    [Theory]
    [InlineData("<p>a<b>c</b></p>", "<p><b></b></p>")]
    [InlineData("<p aria-label=\"x\">&lt;b&#62;</p>", "<p aria-label></p>")]
    public void TheReaderSeesEveryTag(string page, string tags) => Assert.Equal(tags, string.Concat(HtmlSkeleton.Of(page)));

    [Theory]
    [InlineData("a < b")]
    [InlineData("a & b")]
    [InlineData("<p class=x>")]
    [InlineData("<p class='x'>")]
    [InlineData("<P>")]
    [InlineData("<p title=\"<\">")]
    public void TheReaderRefusesWhatABrowserWouldGuessAt(string page) => Assert.Throws<FormatException>(() => HtmlSkeleton.Of(page));

    private static Notice NoticeOf(string text, NamesShown names)
    {
        var brief = Holding(text, names);
        return new Notice("ada|brief|2026-03-01", "ada", Today, BriefText.Subject(brief), BriefText.Write(brief), "", NoticeReason.BriefDue) { MailHtml = MailRenderer.Render(brief) };
    }

    /// <summary>The text as a name, a reason, a remark, a unit and a file, of a squad and of its reader.</summary>
    private static Brief Holding(string text, NamesShown names)
    {
        var group = Squad with { Name = text, LoadQuantity = text };
        var alert = LoadRatio("ann");
        var flagged = Subject("ann", text, alert with { Alert = alert.Alert with { Text = text } }) with { Group = group };
        var returned = Subject("ben", text, Over(LoadRatio("ben"))) with { Group = group, Remarks = [text] };
        var contact = Contact(ContactRole.Coach) with { Name = text };
        BriefLine[] questions = [new(text, text), new($"Mail to {text}", text, OfDelivery: true)];
        var brief = BriefBuilder.Build(contact, Today, [flagged, returned], questions);
        var sent = MailNames.Of(brief, names, [flagged.Person, returned.Person]);

        // Drawing takes a hundred times as long as the rest of a page, and a drawing holds no text from outside.
        return sent with { Flagged = [.. sent.Flagged.Select(person => person with { Picture = null })] };
    }

    private static byte[] Mail(Notice notice)
    {
        using var bytes = new MemoryStream();
        var format = FormatOptions.Default.Clone();
        format.NewLineFormat = NewLineFormat.Dos;
        MailMessageWriter.Write(notice, Recipient, From).WriteTo(format, bytes);
        return bytes.ToArray();
    }

    private static string Head(byte[] mail) => Encoding.ASCII.GetString(mail).Split("\r\n\r\n")[0];
}
