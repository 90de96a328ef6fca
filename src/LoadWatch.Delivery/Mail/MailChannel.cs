using LoadWatch.Notices;

namespace LoadWatch.Delivery.Mail;

/// <summary>Notices by mail: one message for each recipient, so that one who is refused keeps nobody else's from leaving.</summary>
public sealed class MailChannel(MailSettings settings) : INoticeChannel
{
    public const string ChannelName = "mail";

    public string Name => ChannelName;

    public ChannelOutcome Deliver(Notice notice, string recipient) => Send(notice, recipient).Outcome;

    /// <summary>As <see cref="Deliver"/>, and how far it came.</summary>
    public MailReport Send(Notice notice, string recipient)
    {
        if (MailAddresses.FaultOf(recipient) is { } fault)
        {
            return new MailReport(ChannelOutcome.Failed($"the recipient {fault}"), MailStage.Before, "");
        }

        var message = MailMessageWriter.Write(notice, recipient, settings.From);
        return new MailSession(settings).SendAsync(message).GetAwaiter().GetResult();
    }
}
