using System.Collections.Concurrent;
using LoadWatch.Activities;
using LoadWatch.Recordings;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Pipeline;

/// <summary>The recordings at hand while a group is settled: those just decoded, and those that merging reads back from the archive, each once. Safe to fill from several threads.</summary>
public sealed class RecordingShelf(ArrivalDecoder decoder)
{
    private readonly Dictionary<string, ComputedRecording> fresh = new(StringComparer.Ordinal);
    private readonly ConcurrentDictionary<string, IReadOnlyDictionary<int, Recording>> archived = new(StringComparer.Ordinal);

    /// <summary>Those of the group.</summary>
    public IEnumerable<ComputedRecording> Fresh => fresh.Values;

    public void Add(ComputedRecording recording) => fresh[recording.Summary.Key] = recording;

    /// <summary>One of the group, or null.</summary>
    public ComputedRecording? FreshOf(string key) => fresh.GetValueOrDefault(key);

    /// <summary>Null where its original is missing or damaged.</summary>
    /// <param name="arrivalOf">The arrival of a content, asked for only where it is not at hand.</param>
    public Recording? Find(string key, Func<string, Arrival?> arrivalOf)
    {
        if (FreshOf(key) is { } known)
        {
            return known.Recording;
        }

        var (sha, part) = RecordingKey.Parse(key);
        return archived.GetOrAdd(sha, _ => Decode(arrivalOf(sha))).GetValueOrDefault(part);
    }

    private Dictionary<int, Recording> Decode(Arrival? arrival) =>
        arrival is null ? [] : decoder.ReadRecordings(arrival).ToDictionary(recording => recording.Part);
}
