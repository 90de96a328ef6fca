using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Verifications;

/// <summary>Says of a rotten or missing original which files and sessions it stands for.</summary>
internal static class OriginalRot
{
    private const int MostNamed = 10;

    public static Rot Of(StoreSession session, string sha, IReadOnlyList<Arrival> kept, string how)
    {
        var names = session.Sightings.Of(sha).Select(sighting => OneLine.Of(sighting.Path)).Distinct(StringComparer.Ordinal).ToList();
        var sessions = kept
            .SelectMany(arrival => session.Recordings.OfArrival(arrival.Sha))
            .Select(recording => $"{recording.Person} on {recording.Date:uuuu-MM-dd}")
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)
            .ToList();
        return new Rot(sha, $"Original {sha[..12]} ({Listed(names)}): {how}. Sessions: {(sessions.Count == 0 ? "none" : Listed(sessions))}", Advice.Object);
    }

    private static string Listed(List<string> all) =>
        string.Join(", ", all.Take(MostNamed)) + (all.Count > MostNamed ? $" and {all.Count - MostNamed} more" : "");
}
