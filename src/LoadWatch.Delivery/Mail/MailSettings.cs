using System.Net;
using System.Text;

namespace LoadWatch.Delivery.Mail;

/// <summary>How the connection to the mail server is kept private. There is no "if offered": a connection stripped of it is refused.</summary>
public enum MailSecurity
{
    /// <summary>A plain beginning, then TLS by the command STARTTLS; usually port 587.</summary>
    Starttls,

    /// <summary>TLS from the first byte; usually port 465.</summary>
    Tls,

    /// <summary>Clear text, only to this machine itself.</summary>
    None,
}

/// <summary>The mail server and how it is spoken to.</summary>
public sealed record MailSettings
{
    public required string Host { get; init; }

    public int Port { get; init; } = 587;

    public MailSecurity Security { get; init; } = MailSecurity.Starttls;

    /// <summary>One mailbox: <c>brief@example.org</c> or <c>LoadWatch &lt;brief@example.org&gt;</c>.</summary>
    public required string From { get; init; }

    /// <summary>Blank to send without a login.</summary>
    public string User { get; init; } = "";

    /// <summary>Null where it could not be read; <see cref="PasswordMissing"/> says why.</summary>
    public string? Password { get; init; }

    /// <summary>Why there is no password, in plain words, or null.</summary>
    public string? PasswordMissing { get; init; }

    /// <summary>PEM file of the authorities that are trusted instead of the machine's own; null for the machine's.</summary>
    public string? CertificateAuthorityFile { get; init; }

    /// <summary>For one message from the first byte to the last answer.</summary>
    public TimeSpan Timeout { get; init; } = TimeSpan.FromSeconds(30);

    /// <summary>Whether a host is this machine, where nothing leaves it even in clear text.</summary>
    public static bool IsLoopback(string host) =>
        string.Equals(host, "localhost", StringComparison.OrdinalIgnoreCase)
        || (IPAddress.TryParse(host, out var address) && IPAddress.IsLoopback(address));

    /// <exception cref="IOException">The file cannot be read.</exception>
    /// <exception cref="System.Security.Cryptography.CryptographicException">It holds no certificate in PEM form.</exception>
    public static void CheckAuthorityFile(string path)
    {
        foreach (var certificate in ServerTrust.Authorities(path))
        {
            certificate.Dispose();
        }
    }

    // The password stays out of whatever prints the settings (I-12).
    private bool PrintMembers(StringBuilder text)
    {
        text.Append(System.Globalization.CultureInfo.InvariantCulture, $"{Host}:{Port}, {Security}");
        return true;
    }
}
