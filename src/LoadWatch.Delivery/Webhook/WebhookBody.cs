using System.Text;
using System.Text.Json;
using LoadWatch.Notices;
using NodaTime.Text;

namespace LoadWatch.Delivery.Webhook;

/// <summary>A notice as JSON, of what was frozen with it: the same bytes at every attempt (I-7). It names people as the contact's mail does.</summary>
public static class WebhookBody
{
    public const string Format = "loadwatch-notice-1";

    /// <summary>ASCII; letters outside of it are escaped.</summary>
    public static byte[] Of(Notice notice)
    {
        using var bytes = new MemoryStream();
        using (var json = new Utf8JsonWriter(bytes))
        {
            json.WriteStartObject();
            json.WriteString("format", Format);
            json.WriteString("key", notice.Key);
            json.WriteString("contact", notice.ContactId);
            json.WriteString("date", LocalDatePattern.Iso.Format(notice.Date));
            json.WriteString("decided", notice.Decided is { } decided ? InstantPattern.ExtendedIso.Format(decided) : null);
            json.WriteString("reason", JsonNamingPolicy.SnakeCaseLower.ConvertName(notice.Reason.ToString()));
            json.WriteString("subject", OneLine.Of(notice.Subject));
            json.WriteString("text", notice.MailText ?? notice.Text);
            json.WriteEndObject();
        }

        return bytes.ToArray();
    }
}
