using LoadWatch.Notices;

namespace LoadWatch.Delivery;

/// <summary>One way by which a notice reaches its contact. Delivering the same notice again changes nothing.</summary>
public interface INoticeChannel
{
    /// <summary>One lower-case word, part of the record of deliveries: <c>page</c>.</summary>
    string Name { get; }

    /// <summary>Trouble with the outside is an outcome, not an exception.</summary>
    /// <param name="recipient">As the channel addresses it: a mail address; the contact's id on disk.</param>
    ChannelOutcome Deliver(Notice notice, string recipient);
}
