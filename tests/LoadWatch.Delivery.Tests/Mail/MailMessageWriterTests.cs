using System.Text;
using LoadWatch.Delivery.Mail;
using LoadWatch.Notices;
using MimeKit;
using NodaTime;

namespace LoadWatch.Delivery.Tests.Mail;

public sealed class MailMessageWriterTests
{
    private const string From = "LoadWatch <brief@example.org>";

    private static readonly Notice Notice = new(
        "ada|brief|2026-03-01",
        "ada",
        new LocalDate(2026, 3, 1),
        "Morning brief, Sunday 1 March 2026: all quiet",
        "Håkon Lysefjord, 3 days — 12 %\n.\nFrom the start\n",
        "<p>Håkon Lysefjord &lt;b&gt;</p>\n",
        NoticeReason.BriefDue)
    {
        Decided = Instant.FromUtc(2026, 3, 1, 5, 30, 7),
    };

    [Fact]
    public void TheSameNoticeGivesTheSameBytes()
    {
        Assert.Equal(Bytes(Notice, "ada@example.org"), Bytes(Notice, "ada@example.org"));
        Assert.NotEqual(Bytes(Notice, "ada@example.org"), Bytes(Notice, "ben@example.org"));
    }

    [Fact]
    public void WhatMayLeaveTheMachineIsWhatIsMailed()
    {
        var message = Message(Notice with { MailText = "H. L.\n", MailHtml = "<p>H. L.</p>\n" }, "ada@example.org");

        Assert.Equal(("H. L.\n", "<p>H. L.</p>\n"), (message.TextBody?.ReplaceLineEndings("\n"), message.HtmlBody?.ReplaceLineEndings("\n")));
    }

    // First 32 digits of: printf 'ada|brief|2026-03-01\nada@example.org' | sha256sum
    [Fact]
    public void TheMessageIdNamesNoticeAndRecipient()
    {
        Assert.Equal("a4b37600bb3581dc9795743080bc4005@example.org", Message(Notice, "ada@example.org").MessageId);
        Assert.NotEqual(Message(Notice, "ada@example.org").MessageId, Message(Notice, "ben@example.org").MessageId);
        Assert.NotEqual(
            Message(Notice, "ada@example.org").MessageId,
            Message(Notice with { Key = "ada|update|2026-03-01" }, "ada@example.org").MessageId);
    }

    [Fact]
    public void TheHeadersAreTheseAndNoOthers()
    {
        var head = Encoding.ASCII.GetString(Bytes(Notice, "ada@example.org")).Split("\r\n\r\n")[0];

        Assert.Equal(
            [
                "Auto-Submitted: auto-generated",
                "Content-Type: multipart/alternative; boundary=\"=_a4b37600bb3581dc9795743080bc4005\"",
                "Date: Sun, 01 Mar 2026 05:30:07 +0000",
                "From: LoadWatch <brief@example.org>",
                "MIME-Version: 1.0",
                "Message-Id: <a4b37600bb3581dc9795743080bc4005@example.org>",
                "Subject: Morning brief, Sunday 1 March 2026: all quiet",
                "To: ada@example.org",
            ],
            head.Replace("\r\n\t", " ", StringComparison.Ordinal).Split("\r\n").Order(StringComparer.Ordinal));
    }

    [Fact]
    public void TextComesBeforeHtmlAndBothReadAsTheyWere()
    {
        var body = Assert.IsType<MultipartAlternative>(Message(Notice, "ada@example.org").Body);

        Assert.Equal(["text/plain", "text/html"], body.Select(part => part.ContentType.MimeType));
        Assert.Equal(Notice.Text, body.TextBody!.ReplaceLineEndings("\n"));
        Assert.Equal(Notice.Html, body.HtmlBody!.ReplaceLineEndings("\n"));
    }

    [Fact]
    public void APictureBecomesAPartThatTheHtmlNames()
    {
        byte[] first = [137, 80, 78, 71, 1], second = [137, 80, 78, 71, 2];
        var html = $"<p><img src=\"data:image/png;base64,{Convert.ToBase64String(first)}\" alt=\"one\"><img src=\"data:image/png;base64,{Convert.ToBase64String(second)}\" alt=\"two\"></p>\n";

        using var bytes = new MemoryStream(Bytes(Notice with { MailHtml = html }, "ada@example.org"));
        var body = Assert.IsType<MultipartAlternative>(MimeMessage.Load(bytes, TestContext.Current.CancellationToken).Body);

        var related = Assert.IsType<MultipartRelated>(body[1]);
        Assert.Equal("text/html", related.ContentType.Parameters["type"]);
        Assert.Equal(["text/html", "image/png", "image/png"], related.Select(part => part.ContentType.MimeType));
        var pictures = related.Skip(1).Cast<MimePart>().ToList();
        Assert.Equal([first, second], pictures.Select(Content));
        Assert.All(pictures, picture => Assert.Equal((ContentDisposition.Inline, ContentEncoding.Base64), (picture.ContentDisposition!.Disposition, picture.ContentTransferEncoding)));
        Assert.Equal(
            $"<p><img src=\"cid:{pictures[0].ContentId}\" alt=\"one\"><img src=\"cid:{pictures[1].ContentId}\" alt=\"two\"></p>\n",
            body.HtmlBody!.ReplaceLineEndings("\n"));
        Assert.Equal(2, pictures.Select(picture => picture.ContentId).Distinct().Count());
    }

    [Fact]
    public void AMailWithPicturesHasTheSameBytesAtEveryAttempt()
    {
        var notice = Notice with { MailHtml = "<img src=\"data:image/png;base64,iVBORw==\" alt=\"x\">" };

        Assert.Equal(Bytes(notice, "ada@example.org"), Bytes(notice, "ada@example.org"));
    }

    [Fact]
    public void WhatOnlyLooksLikeAPictureInATextStaysText()
    {
        const string Html = "<p>&lt;img src=&quot;data:image/png;base64,iVBORw==&quot;</p>\n";

        Assert.Equal(Html, Message(Notice with { MailHtml = Html }, "ada@example.org").HtmlBody?.ReplaceLineEndings("\n"));
    }

    [Fact]
    public void TheBytesAreAsciiInShortLines()
    {
        var text = Encoding.Latin1.GetString(Bytes(Notice with { Html = new string('ä', 5000) }, "ada@example.org"));

        Assert.All(text, letter => Assert.InRange(letter, '\t', '~'));
        Assert.All(text.Split("\r\n"), line => Assert.InRange(line.Length, 0, 78));
    }

    [Fact]
    public void ANoticeWithoutItsMomentTakesTheBeginningOfItsDate() =>
        Assert.Equal(new DateTimeOffset(2026, 3, 1, 0, 0, 0, TimeSpan.Zero), Message(Notice with { Decided = null }, "ada@example.org").Date);

    [Fact]
    public void ADomainOutsideAsciiGivesAnAsciiMessageId() =>
        Assert.EndsWith("@xn--bcher-kva.example", MailMessageWriter.Write(Notice, "ada@example.org", "brief@bücher.example").MessageId, StringComparison.Ordinal);

    [Theory]
    [InlineData("ada@example.org", true)]
    [InlineData("ada.merriweather+brief@mail.example.org", true)]
    [InlineData("ada@bücher.example", true)]
    [InlineData("ädä@example.org", false)]
    [InlineData("", false)]
    [InlineData("ada", false)]
    [InlineData("ada@", false)]
    [InlineData("@example.org", false)]
    [InlineData("ada@example.org, ben@example.org", false)]
    [InlineData("ada@example.org;ben@example.org", false)]
    [InlineData("Ada <ada@example.org>", false)]
    [InlineData("ada@example.org\r\nBcc: eve@example.org", false)]
    [InlineData("ada@example.org\n", false)]
    [InlineData("\"ada\r\nBcc: eve\"@example.org", false)]
    [InlineData("\"ada merriweather\"@example.org", false)]
    [InlineData("ada @example.org", false)]
    [InlineData("ada@exam\u0000ple.org", false)]
    public void OnlyOneBareAddressIsAnAddress(string text, bool fine) => Assert.Equal(fine, MailAddresses.FaultOf(text) is null);

    [Theory]
    [InlineData("brief@example.org", true)]
    [InlineData("LoadWatch <brief@example.org>", true)]
    [InlineData("LoadWatch\r\nBcc: eve@example.org <brief@example.org>", false)]
    [InlineData("LoadWatch", false)]
    [InlineData("", false)]
    [InlineData("a@example.org, b@example.org", false)]
    public void ASenderMayHaveAName(string text, bool fine) => Assert.Equal(fine, MailAddresses.FaultOfMailbox(text) is null);

    private static byte[] Content(MimePart part)
    {
        using var bytes = new MemoryStream();
        part.Content!.DecodeTo(bytes, TestContext.Current.CancellationToken);
        return bytes.ToArray();
    }

    private static MimeMessage Message(Notice notice, string recipient) => MailMessageWriter.Write(notice, recipient, From);

    private static byte[] Bytes(Notice notice, string recipient)
    {
        using var bytes = new MemoryStream();
        var format = FormatOptions.Default.Clone();
        format.NewLineFormat = NewLineFormat.Dos;
        Message(notice, recipient).WriteTo(format, bytes, TestContext.Current.CancellationToken);
        return bytes.ToArray();
    }
}
