using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// Shares the readings of one channel among the recordings of an activity. The richest in which the channel is usable gives its readings; beyond its
/// first and last one those of the next richest count, and so on, as long as they lie in no other activity: a bike computer that died goes on by the
/// watch, a watch that ran on into the next session stops there.
/// </summary>
internal sealed class ChannelGifts
{
    /// <summary>What is shorter is not added: the difference between two hands on two buttons. A choice.</summary>
    public const long ShortestMilliseconds = 60_000;

    private readonly Channel channel;
    private readonly Func<RecordingSummary, IReadOnlyList<Stretch>> claimed;
    private readonly List<(RecordingSummary Recording, Stretch Stretch)> shares = [];
    private long? first;
    private long? last;

    /// <param name="recordings">That may give, winner first, then richest first.</param>
    /// <param name="claimed">The stretches of a recording that belong to other activities.</param>
    public ChannelGifts(
        Channel channel, IReadOnlyList<RecordingSummary> recordings, RecordingSummary winner, Func<RecordingSummary, IReadOnlyList<Stretch>> claimed)
    {
        this.channel = channel;
        this.claimed = claimed;
        var usable = recordings.Where(one => Extent(one) is { IsUsable: true } && (one == winner || Free(one, Stretch.Always) > 0)).ToList();
        if (usable.FirstOrDefault() is { } richest)
        {
            Begin(richest);
            usable.Skip(1).ToList().ForEach(Extend);
        }
        else if (recordings.Contains(winner) && Extent(winner) is not null)
        {
            shares.Add((winner, Stretch.Always));
        }
    }

    /// <summary>The stretches that each recording gives; none that gives nothing.</summary>
    public IEnumerable<(RecordingSummary Recording, Gift Gift)> Gifts => shares
        .GroupBy(share => share.Recording, share => share.Stretch)
        .Select(given => (given.Key, new Gift(channel, null, [.. given.OrderBy(one => one.From is not null).ThenBy(one => one.From).SelectMany(one => one.Without(claimed(given.Key)))])))
        .Where(given => given.Item2.Stretches.Count > 0);

    private ChannelExtent? Extent(RecordingSummary recording) => recording.Extent(channel);

    private void Begin(RecordingSummary richest)
    {
        shares.Add((richest, Stretch.Always));
        (first, last) = (Extent(richest)!.First, Extent(richest)!.Last);
    }

    private void Extend(RecordingSummary next)
    {
        var extent = Extent(next)!;
        if (extent.First < first && Free(next, new Stretch(null, first)) >= ShortestMilliseconds)
        {
            Cut(new Stretch(first, null));
            shares.Add((next, new Stretch(null, first)));
            first = extent.First;
        }

        if (extent.Last > last && Free(next, new Stretch(last + 1, null)) >= ShortestMilliseconds)
        {
            Cut(new Stretch(null, last + 1));
            shares.Add((next, new Stretch(last + 1, null)));
            last = extent.Last;
        }
    }

    private void Cut(Stretch to)
    {
        for (var at = 0; at < shares.Count; at++)
        {
            shares[at] = (shares[at].Recording, shares[at].Stretch.Within(to)!);
        }
    }

    /// <summary>How long the recording has usable readings of the channel within the stretch that no other activity claims, milliseconds.</summary>
    private long Free(RecordingSummary recording, Stretch stretch) =>
        new Stretch(Extent(recording)!.First, Extent(recording)!.Last + 1).Within(stretch) is { } own ? own.Without(claimed(recording)).Length() : 0;
}
