using System.Security.Cryptography.X509Certificates;

namespace LoadWatch.Chaos.Mail;

/// <summary>How a server behaves. The default one takes everything in clear text.</summary>
public sealed record SmtpScript
{
    /// <summary>An answer that is none: the line is cut instead.</summary>
    public const string Cut = "cut";

    /// <summary>An answer that never comes; the line stays open.</summary>
    public const string Silence = "silence";

    /// <summary>The first line; null for one without an end.</summary>
    public string? Banner { get; init; } = "220 chaos.example.org ESMTP";

    /// <summary>Offered, and spoken after STARTTLS; null for a server that cannot speak TLS.</summary>
    public X509Certificate2? Certificate { get; init; }

    /// <summary>The answer to AUTH; null for a server that offers no login.</summary>
    public string? Login { get; init; }

    /// <summary>The answer to MAIL FROM, by the number of the connection from 1; null takes it.</summary>
    public Func<int, string?> ToSender { get; init; } = _ => null;

    /// <summary>The answer to RCPT TO; null takes it.</summary>
    public Func<string, string?> ToRecipient { get; init; } = _ => null;

    /// <summary>The answer to the final dot of a message, by its number from 1; null takes it. The message is kept whatever the answer.</summary>
    public Func<int, string?> ToMessage { get; init; } = _ => null;

    /// <summary>Between two bytes of every answer.</summary>
    public TimeSpan Drip { get; init; } = TimeSpan.Zero;
}
