using System.Collections.Concurrent;
using LoadWatch.Activities;
using LoadWatch.Recordings;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Pipeline;

/// <summary>The recordings at hand while a group is settled: those just decoded, and those that merging reads back from the archive, each content once. Safe to fill from several threads.</summary>
public sealed class RecordingShelf(ArrivalDecoder decoder)
{
    private readonly Dictionary<string, ComputedRecording> fresh = new(StringComparer.Ordinal);
    private readonly ConcurrentDictionary<string, RecordingsAtHand> contents = new(StringComparer.Ordinal);

    /// <summary>Those of the group.</summary>
    public IEnumerable<ComputedRecording> Fresh => fresh.Values;

    public void Add(DecodedArrival arrival)
    {
        foreach (var recording in arrival.Recordings)
        {
            fresh[recording.Summary.Key] = recording;
        }

        if (arrival.Through is { } text)
        {
            contents[arrival.Sha] = new RecordingsAtHand(text);
        }
    }

    /// <summary>One of the group, or null.</summary>
    public ComputedRecording? FreshOf(string key) => fresh.GetValueOrDefault(key);

    /// <summary>Whether <see cref="Find"/> gives one.</summary>
    /// <param name="arrivalOf">The arrival of a content, asked for only where it is not at hand.</param>
    public bool Has(string key, Func<string, Arrival?> arrivalOf) => FreshOf(key) is not null || ContentOf(key, arrivalOf).Has(RecordingKey.Parse(key).Part);

    /// <summary>Null where its original is missing or damaged.</summary>
    /// <exception cref="IOException">The original cannot be read any more.</exception>
    /// <inheritdoc cref="Has"/>
    public Recording? Find(string key, Func<string, Arrival?> arrivalOf) =>
        FreshOf(key)?.Recording ?? ContentOf(key, arrivalOf).Find(RecordingKey.Parse(key).Part);

    /// <summary>Where a recording stands in a content that is read through for it; null where it is at hand.</summary>
    /// <inheritdoc cref="Has"/>
    public (string Sha, int Part)? PlaceInLong(string key, Func<string, Arrival?> arrivalOf) =>
        FreshOf(key) is { Recording: not null } || !ContentOf(key, arrivalOf).IsLong ? null : RecordingKey.Parse(key);

    /// <summary>Ends reading files through.</summary>
    public void Close() => contents.Values.ToList().ForEach(content => content.Dispose());

    private RecordingsAtHand ContentOf(string key, Func<string, Arrival?> arrivalOf) =>
        contents.GetOrAdd(RecordingKey.Parse(key).Sha, sha => arrivalOf(sha) is { } arrival ? decoder.ReadRecordings(arrival) : RecordingsAtHand.None);
}
