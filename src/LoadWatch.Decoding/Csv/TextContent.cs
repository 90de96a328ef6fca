using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>What a CSV holds. The recordings of a long one are not at hand: they are read through, one after the other, as often as they are wanted.</summary>
public sealed class TextContent
{
    private readonly Func<IEnumerable<Recording>> readThrough;

    internal TextContent(DecodedFile file)
    {
        File = file;
        readThrough = () => file.Recordings;
    }

    private TextContent(DecodedFile survey, Func<IEnumerable<Recording>> readThrough)
    {
        IsLong = true;
        File = survey;
        this.readThrough = readThrough;
    }

    /// <summary>Everything but the samples of a long one's recordings.</summary>
    public DecodedFile File { get; }

    /// <summary>Whether the recordings of <see cref="File"/> are without samples.</summary>
    public bool IsLong { get; }

    /// <summary>The recordings with their samples, in the order of their numbers; of a long file each is made as it is asked for.</summary>
    /// <exception cref="IOException">The file could not be read.</exception>
    public IEnumerable<Recording> Recordings() => readThrough();

    /// <param name="begin">Begins to read the file from its start.</param>
    internal static TextContent Of(Func<SampleReading> begin)
    {
        var reading = begin();
        var recordings = new List<Recording>();
        var speeds = new SpeedTally();
        foreach (var recording in reading.Read())
        {
            speeds.Add(recording);
            recordings.Add(reading.IsLong ? recording with { Samples = SampleSeries.Empty } : recording);
        }

        if (reading.IsRefused)
        {
            return new TextContent(reading.File!);
        }

        var outliers = UnitOutliers.Of(speeds);
        var file = UnitOutliers.LeaveOut(reading.File! with { Recordings = recordings }, outliers);
        return reading.IsLong ? new TextContent(file, () => begin().Read().Select(recording => UnitOutliers.LeaveOut(recording, outliers))) : new TextContent(file);
    }
}
