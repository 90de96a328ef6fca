using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// The recordings of one content by their numbers. Those of a long one are read through anew for whichever is wanted, the others passed over; so it is asked in
/// the order of the numbers, and then the file is read once. Safe to use from several threads.
/// </summary>
public sealed class RecordingsAtHand : IDisposable
{
    private readonly Lock reading = new();
    private readonly Dictionary<int, Recording> known;
    private readonly TextContent? longOne;
    private IEnumerator<Recording>? through;

    public RecordingsAtHand(IEnumerable<Recording> recordings) => known = recordings.ToDictionary(recording => recording.Part);

    public RecordingsAtHand(TextContent longOne)
        : this(longOne.File.Recordings) => this.longOne = longOne;

    public static RecordingsAtHand None { get; } = new([]);

    /// <summary>Whether looking one up reads the file.</summary>
    public bool IsLong => longOne is not null;

    public bool Has(int part) => known.ContainsKey(part);

    /// <summary>Null where there is none of this number.</summary>
    /// <exception cref="IOException">The file could not be read.</exception>
    public Recording? Find(int part)
    {
        if (longOne is null || !Has(part))
        {
            return known.GetValueOrDefault(part);
        }

        lock (reading)
        {
            return Reach(part);
        }
    }

    /// <summary>Ends reading; a recording that is wanted later is read from the start.</summary>
    public void Dispose()
    {
        lock (reading)
        {
            through?.Dispose();
            through = null;
        }
    }

    private Recording Reach(int part)
    {
        if (through?.Current.Part > part)
        {
            Dispose();
        }

        if (through is null)
        {
            through = longOne!.Recordings().GetEnumerator();
            through.MoveNext();
        }

        while (through.Current.Part < part && through.MoveNext())
        {
        }

        return through.Current.Part == part ? through.Current : throw new IOException($"recording {part} is not where it was: the file has changed");
    }
}
