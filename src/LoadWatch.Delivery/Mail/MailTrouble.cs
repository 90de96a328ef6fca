using System.Net.Sockets;
using System.Security.Cryptography;
using MailKit;
using MailKit.Net.Smtp;
using MailKit.Security;

namespace LoadWatch.Delivery.Mail;

/// <summary>
/// The table of outcomes. Only what the server says of this message to this recipient fails for good; whatever concerns the connection, the login or the
/// sender is kept and tried again.
/// </summary>
internal static class MailTrouble
{
    private const string InDoubt = "the connection was lost while the message was handed over, the server may have it: ";

    /// <param name="certificateFault">What was wrong with the server's certificate, or null.</param>
    /// <returns>Null for an exception that is a defect.</returns>
    public static ChannelOutcome? OutcomeOf(Exception trouble, MailStage stage, string? certificateFault, MailWords words) => trouble switch
    {
        SslHandshakeException => ChannelOutcome.TryAgain(certificateFault ?? "the server and LoadWatch did not agree on TLS 1.2 or later"),
        NotSupportedException when stage == MailStage.Connecting =>
            ChannelOutcome.TryAgain("the server does not offer STARTTLS, and nothing is sent in clear text"),
        NotSupportedException when stage == MailStage.LoggingIn =>
            ChannelOutcome.TryAgainSlowly("the server offers no way of logging in that LoadWatch knows"),
        NotSupportedException => ChannelOutcome.TryAgainSlowly("the server cannot take a message of this kind"),
        AuthenticationException refused => ChannelOutcome.TryAgainSlowly($"the server refused user name and password: {words.Of(refused.Message)}"),
        ServiceNotAuthenticatedException => ChannelOutcome.TryAgainSlowly("the server wants a login, and none is configured"),
        SmtpCommandException refused => OfCommand(refused, stage, words),
        OperationCanceledException or TimeoutException => ChannelOutcome.TryAgain(Doubt(stage) + "the server took longer than the time limit"),
        SmtpProtocolException broken => ChannelOutcome.TryAgain(Doubt(stage) + words.Of(broken.Message)),
        IOException or SocketException or ServiceNotConnectedException => ChannelOutcome.TryAgain(Doubt(stage) + words.Of(trouble.Message)),
        CryptographicException => ChannelOutcome.TryAgainSlowly("the file of the certificate authority cannot be read"),
        UnauthorizedAccessException => ChannelOutcome.TryAgainSlowly("the file of the certificate authority may not be read"),
        _ => null,
    };

    private static ChannelOutcome OfCommand(SmtpCommandException refused, MailStage stage, MailWords words)
    {
        var code = (int)refused.StatusCode;
        var answer = $"{code} {words.Of(refused.Message)}";
        return (code, refused.ErrorCode) switch
        {
            (530 or 534 or 535 or 538, _) => ChannelOutcome.TryAgainSlowly($"the server wants another login: {answer}"),
            (>= 500, _) when stage != MailStage.Sending => ChannelOutcome.TryAgain($"the server refused the connection: {answer}"),
            (552, _) => ChannelOutcome.TryAgainSlowly($"mailbox full or message too large: {answer}"),
            (>= 500, SmtpErrorCode.SenderNotAccepted) => ChannelOutcome.TryAgainSlowly($"the server refused the sender: {answer}"),
            (>= 500, SmtpErrorCode.RecipientNotAccepted) => ChannelOutcome.Failed($"the server refused the recipient: {answer}"),
            (>= 500, _) => ChannelOutcome.Failed($"the server refused the message: {answer}"),
            _ => ChannelOutcome.TryAgain($"the server asked to come back later: {answer}"),
        };
    }

    private static string Doubt(MailStage stage) => stage == MailStage.Sending ? InDoubt : "";
}
