using System.Text;
using LoadWatch.Delivery.Mail;

namespace LoadWatch.Delivery.Webhook;

/// <summary>Where notices are posted to, and the secret that signs them.</summary>
public sealed record WebhookSettings
{
    /// <summary>By contact's id.</summary>
    public required IReadOnlyDictionary<string, Uri> Addresses { get; init; }

    /// <summary>Null where it could not be read; <see cref="SecretMissing"/> says why.</summary>
    public string? Secret { get; init; }

    /// <summary>Why there is no secret, in plain words, or null.</summary>
    public string? SecretMissing { get; init; }

    /// <summary>For one notice, from the first byte to the answer.</summary>
    public TimeSpan Timeout { get; init; } = TimeSpan.FromSeconds(30);

    /// <summary>What is wrong with an address, for a message that does not show it: an address may hold a secret of its own. Null when it is fine.</summary>
    public static string? FaultOf(string text) => Uri.TryCreate(text, UriKind.Absolute, out var address)
        ? address switch
        {
            { Scheme: not ("http" or "https") } => "is not an address that begins with https://",
            { UserInfo.Length: > 0 } or { Fragment.Length: > 0 } => "holds a user or a #, which are not sent",
            { Scheme: "http" } when !MailSettings.IsLoopback(address.IdnHost.Trim('[', ']')) =>
                "would send health data in clear text; only a server on this machine (localhost) may be spoken to by http",
            _ => null,
        }
        : "is not an address that begins with https://";

    // Neither addresses nor secret stand in whatever prints the settings (I-12).
    private bool PrintMembers(StringBuilder text)
    {
        text.Append(System.Globalization.CultureInfo.InvariantCulture, $"{Addresses.Count} addresses");
        return true;
    }
}
