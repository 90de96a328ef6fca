using MailKit.Net.Smtp;
using MailKit.Security;
using MimeKit;

namespace LoadWatch.Delivery.Mail;

/// <summary>One connection for one message, within one time limit.</summary>
internal sealed class MailSession(MailSettings settings)
{
    private readonly ServerTrust trust = new(settings.CertificateAuthorityFile);
    private readonly MailWords words = new(settings);
    private MailStage stage = MailStage.Before;

    public async Task<MailReport> SendAsync(MimeMessage message)
    {
        if (settings is { User.Length: > 0, Password: null })
        {
            return Report(ChannelOutcome.TryAgainSlowly(settings.PasswordMissing ?? "there is no password for the mail server"));
        }

        using var limit = new CancellationTokenSource(settings.Timeout);
        using var client = new SmtpClient { Timeout = (int)settings.Timeout.TotalMilliseconds };
        try
        {
            trust.Apply(client);
            return await Talk(client, message, limit.Token);
        }
        catch (Exception e) when (MailTrouble.OutcomeOf(e, stage, trust.Fault, words) is { } outcome)
        {
            return Report(outcome);
        }
    }

    private async Task<MailReport> Talk(SmtpClient client, MimeMessage message, CancellationToken limit)
    {
        stage = MailStage.Connecting;
        await using var line = await ServerStream.Open(settings.Host, settings.Port, limit);
        await client.ConnectAsync(line, settings.Host, settings.Port, Security, limit);
        if (settings.User.Length > 0)
        {
            stage = MailStage.LoggingIn;
            await client.AuthenticateAsync(settings.User, settings.Password!, limit);
        }

        stage = MailStage.Sending;
        var answer = await client.SendAsync(message, limit);
        stage = MailStage.Taken;
        await Leave(client, limit);
        return new MailReport(ChannelOutcome.Delivered, stage, words.Of(answer));
    }

    /// <summary>Never "when available": a stripped STARTTLS would send in the clear without a word.</summary>
    private SecureSocketOptions Security => settings.Security switch
    {
        MailSecurity.Tls => SecureSocketOptions.SslOnConnect,
        MailSecurity.None when MailSettings.IsLoopback(settings.Host) => SecureSocketOptions.None,
        _ => SecureSocketOptions.StartTls,
    };

    /// <summary>The message is taken: how the connection ends changes nothing.</summary>
    private static async Task Leave(SmtpClient client, CancellationToken limit)
    {
        try
        {
            await client.DisconnectAsync(quit: true, limit);
        }
        catch (Exception e) when (e is IOException or OperationCanceledException or SmtpProtocolException or SmtpCommandException)
        {
            // Said goodbye to nobody.
        }
    }

    private MailReport Report(ChannelOutcome outcome) => new(outcome with { Reason = OneLine.Of(outcome.Reason) }, stage, words.LastAnswer);
}
