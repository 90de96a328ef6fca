using MimeKit;

namespace LoadWatch.Chaos.Mail;

/// <summary>One message whose final dot came.</summary>
/// <param name="Raw">As it came, dots unstuffed.</param>
/// <param name="Recipients">Of the envelope.</param>
/// <param name="Answer">What the server said; null where it took the message.</param>
public sealed record ReceivedMail(byte[] Raw, IReadOnlyList<string> Recipients, string? Answer)
{
    public string MessageId => Message().MessageId ?? "";

    /// <summary>Recipient, subject and both bodies, without the moment.</summary>
    public string Content
    {
        get
        {
            var message = Message();
            return $"{string.Join(',', Recipients)}\n{message.Subject}\n{message.TextBody}\n{message.HtmlBody}";
        }
    }

    private MimeMessage Message()
    {
        using var bytes = new MemoryStream(Raw);
        return MimeMessage.Load(bytes);
    }
}
