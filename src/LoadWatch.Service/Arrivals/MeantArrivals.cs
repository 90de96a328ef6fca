using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>Finds the arrivals that a user means by a word.</summary>
public static class MeantArrivals
{
    private const int FewestDigits = 6;

    /// <summary>Those whose hash begins with the word, or that were seen under it as a path below an inbox; in order of their hash.</summary>
    public static IReadOnlyList<Arrival> Of(StoreSession session, string word) =>
    [
        .. (IsHash(word) ? session.Arrivals.StartingWith(word.ToLowerInvariant()) : [])
            .Concat(session.Sightings.OfPath(word).Select(sighting => session.Arrivals.Get(sighting.Sha)).OfType<Arrival>())
            .DistinctBy(arrival => arrival.Sha)
            .OrderBy(arrival => arrival.Sha, StringComparer.Ordinal),
    ];

    private static bool IsHash(string word) => word.Length >= FewestDigits && word.All(char.IsAsciiHexDigit);
}
