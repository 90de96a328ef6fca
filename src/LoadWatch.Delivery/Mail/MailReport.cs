namespace LoadWatch.Delivery.Mail;

/// <summary>What an attempt to send was doing when it ended.</summary>
public enum MailStage
{
    /// <summary>Nothing was sent to the server yet.</summary>
    Before,

    /// <summary>Reaching the server and agreeing on TLS.</summary>
    Connecting,

    /// <summary>Logging in.</summary>
    LoggingIn,

    /// <summary>Handing the message over.</summary>
    Sending,

    /// <summary>The server has taken the message.</summary>
    Taken,
}

/// <summary>One attempt to send.</summary>
/// <param name="Stage">How far it came.</param>
/// <param name="Answer">What the server said last, as one line without addresses; empty where it said nothing.</param>
public sealed record MailReport(ChannelOutcome Outcome, MailStage Stage, string Answer);
