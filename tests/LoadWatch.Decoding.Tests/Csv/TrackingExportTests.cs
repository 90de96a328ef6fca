using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv;

/// <summary>A squad of 25 at ten rows a second, against what the generator says of each.</summary>
public class TrackingExportTests
{
    private static readonly CsvLayout Layout = new()
    {
        Name = "pods",
        Header = ["player", "satellites"],
        PersonColumn = "player",
        Time = new CsvTimeColumn { Column = "time", Format = "dd.MM.yyyy HH:mm:ss.f", Zone = "Europe/Helsinki" },
        Columns =
        [
            new() { Column = "speed", Channel = Channel.Speed, Unit = "m/s" },
            new() { Column = "distance", Channel = Channel.Distance, Unit = "m" },
            new() { Column = "heart rate", Channel = Channel.HeartRate, Unit = "bpm" },
        ],
        Quality = new CsvQuality { Column = "satellites", AtLeast = 6 },
        Sport = "soccer",
    };

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void EveryPlayerComesOutAsWritten(bool inBlocks)
    {
        var export = new TrackingExport(25, 60) { InBlocks = inBlocks };

        var file = CsvFiles.Decode(export.Text(), Layout);

        Assert.Empty(file.Problems);
        Assert.Equal(25, file.Recordings.Count);
        for (var player = 0; player < 25; player++)
        {
            var recording = file.Recordings[player];
            Assert.Equal((player + 1, TrackingExport.Name(player)), (recording.Part, recording.Subject));
            Assert.Equal((Instant.FromUtc(2026, 10, 5, 15, 0), 59.9), (recording.Start, recording.ElapsedSeconds));
            AssertSamples(player, export.RowsOfOne, recording.Samples);
        }
    }

    [Fact]
    public void OnePodInAnotherUnitLosesItsSpeedAndIsNamed()
    {
        var file = CsvFiles.Decode(new TrackingExport(25, 60) { WrongUnitPlayer = 7 }.Text(), Layout);

        var warning = Assert.Single(file.Problems);
        Assert.Equal(ProblemSeverity.Warning, warning.Severity);
        Assert.Matches(@"^Pod 08: speeds 3\.\d times those of the others: another unit\?", warning.Reason);
        Assert.Equal([Channel.HeartRate], file.Recordings[7].Samples.Channels);
        Assert.All(file.Recordings.Where(recording => recording.Part != 8), recording => Assert.True(recording.Samples.Has(Channel.Speed)));
    }

    private static void AssertSamples(int player, int rows, SampleSeries samples)
    {
        Assert.Equal(rows, samples.Count);
        var metres = 0.0;
        for (var row = 0; row < rows; row++)
        {
            metres += TrackingExport.Speed(player, row) / 10;
            var received = TrackingExport.Satellites(player, row) >= 6;
            Assert.Equal(row * 100L, samples.UnixMilliseconds[row] - samples.UnixMilliseconds[0]);
            Assert.Equal(TrackingExport.HeartRate(player, row), samples[Channel.HeartRate][row]);
            Assert.Equal(received ? TrackingExport.Speed(player, row) : double.NaN, samples[Channel.Speed][row]);
            Assert.Equal(received ? metres : double.NaN, samples[Channel.Distance][row], 0.0051);
        }
    }
}
