using MimeKit;

namespace LoadWatch.Delivery.Mail;

/// <summary>
/// Checks addresses before they come near a mail: beside the library's own care, since holes in that were found before (CVE-2026-30227).
/// </summary>
public static class MailAddresses
{
    /// <summary>Why a text is not one bare address such as <c>ada@example.org</c>, or null when it is.</summary>
    public static string? FaultOf(string text) =>
        IsPlain(text) && MailboxAddress.TryParse(text, out var mailbox) && mailbox.Address == text && HasTwoParts(text)
            ? null
            : "is not one mail address such as ada@example.org";

    /// <summary>Why a text is not one mailbox, with or without a name in front, or null when it is.</summary>
    public static string? FaultOfMailbox(string text) =>
        !text.Any(char.IsControl) && MailboxAddress.TryParse(text, out var mailbox) && FaultOf(mailbox.Address) is null
            ? null
            : "is not one mailbox such as LoadWatch <brief@example.org>";

    private static bool IsPlain(string text) =>
        text.Length is > 0 and <= 254
        && !text.Any(letter => char.IsControl(letter) || char.IsWhiteSpace(letter) || letter is '"' or '<' or '>' or ',' or ';');

    /// <summary>A domain may be written in any script, but few servers take a name before the @ outside ASCII.</summary>
    private static bool HasTwoParts(string text)
    {
        var at = text.LastIndexOf('@');
        return at > 0 && at < text.Length - 1 && text[..at].All(char.IsAscii);
    }
}
