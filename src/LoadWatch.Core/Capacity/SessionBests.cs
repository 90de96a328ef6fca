using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Capacity;

/// <summary>What one session showed at best. Rests on its recordings and on the quality cuts alone, never on a reference value.</summary>
/// <param name="Key">Of the activity.</param>
/// <param name="Date">The local date that it counts for.</param>
/// <param name="Means">Of power, speed and heart rate, where usable.</param>
public sealed record SessionBests(string Key, LocalDate Date, Sport Sport, IReadOnlyDictionary<Channel, BestMeans> Means)
{
    /// <summary>
    /// The kind of movement whose critical power, or speed, its bests may tell; null: none. On foot power is a model of the watch; on an electric bicycle it may be the
    /// motor's; speed counts on foot alone, since on wheels wind and slope make it.
    /// </summary>
    public static string? CriticalSport(Sport sport, Channel channel)
    {
        ArgumentNullException.ThrowIfNull(sport);
        return channel switch
        {
            Channel.Power => sport is { IsOnFoot: false, Family: not "running", Name: not "e_biking" } ? sport.Family : null,
            Channel.Speed => sport.Family == "running" ? sport.Family : null,
            _ => null,
        };
    }

    /// <summary>Those that may tell a critical power, or speed, by their <see cref="CriticalSport"/>, in the order of its name.</summary>
    /// <param name="channel">Power, or speed.</param>
    public static IEnumerable<IGrouping<string, SessionBests>> BySport(IEnumerable<SessionBests> sessions, Channel channel) => sessions
        .Where(session => session.Means.ContainsKey(channel) && CriticalSport(session.Sport, channel) is not null)
        .GroupBy(session => session.Sport.Family, StringComparer.Ordinal)
        .OrderBy(sport => sport.Key, StringComparer.Ordinal);

    /// <summary>The best mean of a channel over so many seconds, or null.</summary>
    public double? Best(Channel channel, int seconds) => Means.TryGetValue(channel, out var means) ? means[seconds] : null;
}
