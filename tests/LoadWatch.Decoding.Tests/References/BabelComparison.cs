using System.Globalization;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.References;

/// <summary>The records of a part as LoadWatch and as GPSBabel give them. GPSBabel rounds, and gives neither distances nor sessions.</summary>
internal sealed class BabelComparison(ReferencePart ours, IReadOnlyList<double?[]>? theirs, PartFeatures features)
{
    /// <summary>All bits of a time, as milliseconds since 1970: what GPSBabel makes of no time.</summary>
    public const double AllBits = (uint.MaxValue + 631_065_600.0) * 1000;

    private readonly List<string> faults = [];

    /// <summary>How many values were equal.</summary>
    public int Equal { get; private set; }

    /// <summary>What differs without a reason; nothing is looked at where GPSBabel mistakes the bytes of a whole part.</summary>
    public IReadOnlyList<string> Run()
    {
        if (ours.Error is not null || ours.Records.Count == 0 || features.OfBabel.Count > 0)
            return [];

        if (theirs is null)
            return ["refused by the reference alone"];

        if (ours.Records.Count != theirs.Count)
            return [$"{ours.Records.Count} and {theirs.Count} records"];

        foreach (var (one, other) in InTimeOrder(ours.Records).Zip(InTimeOrder(theirs)))
            Compare(one, other);

        return faults;
    }

    /// <summary>Ours are in the order of their sessions where there are several.</summary>
    private IEnumerable<double?[]> InTimeOrder(IReadOnlyList<double?[]> records) =>
        ours.Sessions.Count > 1 ? records.OrderBy(record => record[0] ?? AllBits) : records;

    private void Compare(double?[] one, double?[] other)
    {
        if (one[0] == other[0] || (one[0] is null && features.Kinds.Contains(Difference.NotADate)))
            Equal++;
        else
            faults.Add(string.Create(CultureInfo.InvariantCulture, $"time {one[0]} and {other[0]}"));

        foreach (var (channel, i) in OurParts.Channels.Select((channel, i) => (channel, i + 1)).Where(pair => pair.channel != Channel.Distance))
        {
            if (IsSame(channel, one[i], other[i]))
                Equal++;
            else if (!IsExcused(channel, one[i]))
                faults.Add(string.Create(CultureInfo.InvariantCulture, $"{channel} at {one[0]}: {one[i]} and {other[i]}"));
        }
    }

    private bool IsExcused(Channel channel, double? own) =>
        features.ChannelsOfBabel.Contains(channel)
        || features.Channels.Any(special => special.Channel == channel)
        || (channel == Channel.Speed && own > ushort.MaxValue / 1000.0)
        || (channel == Channel.Altitude && own > (ushort.MaxValue / 5.0) - 500);

    private static bool IsSame(Channel channel, double? one, double? other) =>
        one == other
        || (one == 0 && other is null)
        || Math.Abs((one - other) ?? double.NaN) <= Babel.RoundedTo(channel);
}
