using LoadWatch.Delivery;
using LoadWatch.Notices;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A channel that answers as the test says and remembers what it was given.</summary>
internal sealed class ScriptedChannel(string name, Func<string, ChannelOutcome> answer) : INoticeChannel
{
    public string Name => name;

    /// <summary>Key and recipient of each attempt.</summary>
    public List<(string Key, string Recipient)> Attempts { get; } = [];

    public ChannelOutcome Deliver(Notice notice, string recipient)
    {
        Attempts.Add((notice.Key, recipient));
        return answer(recipient);
    }
}
