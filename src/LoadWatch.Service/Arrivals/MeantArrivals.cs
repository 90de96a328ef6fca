using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>Finds the arrivals that a user means by a word.</summary>
public static class MeantArrivals
{
    private const int FewestDigits = 6;

    /// <summary>Those whose hash begins with the word, or that were seen under it as a path below an inbox; in order of their hash.</summary>
    public static IReadOnlyList<Arrival> Of(StoreSession session, string word) =>
        session.Arrivals.All().Where(arrival => IsMeant(session, arrival, word)).ToList();

    private static bool IsMeant(StoreSession session, Arrival arrival, string word) =>
        (word.Length >= FewestDigits && arrival.Sha.StartsWith(word, StringComparison.OrdinalIgnoreCase))
        || session.Sightings.Of(arrival.Sha).Any(sighting => sighting.Path == word);
}
