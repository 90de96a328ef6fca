using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Capacity;

/// <summary>What one session showed at best. Rests on its recordings and on the quality cuts alone, never on a reference value.</summary>
/// <param name="Key">Of the activity.</param>
/// <param name="Date">The local date that it counts for.</param>
/// <param name="Means">Of power, speed and heart rate, where usable.</param>
public sealed record SessionBests(string Key, LocalDate Date, Sport Sport, IReadOnlyDictionary<Channel, BestMeans> Means)
{
    /// <summary>The best mean of a channel over so many seconds, or null.</summary>
    public double? Best(Channel channel, int seconds) => Means.TryGetValue(channel, out var means) ? means[seconds] : null;
}
