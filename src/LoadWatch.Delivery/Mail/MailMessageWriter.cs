using System.Security.Cryptography;
using System.Text;
using LoadWatch.Notices;
using MimeKit;
using MimeKit.Text;

namespace LoadWatch.Delivery.Mail;

/// <summary>
/// A notice as a mail: plain text and HTML side by side, the pictures beside the HTML. The same notice, recipient and sender give the same bytes at every attempt, so a copy sent in
/// doubt is known by its Message-ID (I-7).
/// </summary>
public static class MailMessageWriter
{
    private const int DigestLength = 32;

    /// <param name="recipient">One bare address.</param>
    /// <param name="from">One mailbox.</param>
    public static MimeMessage Write(Notice notice, string recipient, string from)
    {
        var sender = MailboxAddress.Parse(from);
        var digest = Digest(notice.Key, recipient);
        var message = new MimeMessage
        {
            MessageId = $"{digest}@{sender.GetAddress(idnEncode: true).Split('@')[^1]}",
            Date = Date(notice),
            Subject = OneLine.Of(notice.Subject),
            Body = Body(notice, digest),
        };
        message.From.Add(sender);
        message.To.Add(MailboxAddress.Parse(recipient));

        // RFC 3834: answering machines stay silent.
        message.Headers.Add(HeaderId.AutoSubmitted, "auto-generated");
        return message;
    }

    private static string Digest(string key, string recipient) =>
        Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes($"{key}\n{recipient}")))[..DigestLength];

    /// <summary>Frozen with the notice; a notice of before that was kept takes the beginning of its date.</summary>
    private static DateTimeOffset Date(Notice notice) =>
        notice.Decided?.ToDateTimeOffset() ?? new DateTimeOffset(notice.Date.AtMidnight().ToDateTimeUnspecified(), TimeSpan.Zero);

    private static MultipartAlternative Body(Notice notice, string digest)
    {
        var pictures = new List<MimePart>();
        var html = MailPictures.TakeOut(notice.MailHtml ?? notice.Html, digest, pictures);
        var body = new MultipartAlternative { Part(TextFormat.Plain, notice.MailText ?? notice.Text), WithPictures(Part(TextFormat.Html, html), pictures, digest) };
        body.ContentType.Boundary = $"=_{digest}";
        return body;
    }

    private static MimeEntity WithPictures(TextPart html, List<MimePart> pictures, string digest)
    {
        if (pictures.Count == 0)
        {
            return html;
        }

        // RFC 2387: the part that the others belong to comes first.
        var related = new MultipartRelated { html };
        pictures.ForEach(related.Add);
        related.ContentType.Boundary = $"=_{digest}_related";
        related.ContentType.Parameters["type"] = "text/html";
        return related;
    }

    // Fixed here, since the library would else choose by what the server offers.
    private static TextPart Part(TextFormat format, string text) => new(format)
    {
        ContentTransferEncoding = ContentEncoding.QuotedPrintable,
        Text = text,
    };
}
