using System.Globalization;
using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

/// <summary>A CSV of more rows than are held at once (2,000,000) gives what its sessions give as files of their own.</summary>
public class LongCsvTests
{
    private const int Minute = 60;
    private const long Start = 1_790_000_000;

    private static readonly CsvLayout Pulse = new()
    {
        Name = "pulse",
        Header = ["t", "hr"],
        Time = new CsvTimeColumn { Column = "t", Format = "unix_s" },
        Columns = [new() { Column = "hr", Channel = Channel.HeartRate, Unit = "bpm" }, new() { Column = "v", Channel = Channel.Speed, Unit = "m/s" }],
    };

    private static readonly CsvLayout Squad = Pulse with { Header = ["who", "t", "hr"], PersonColumn = "who" };

    [Fact]
    public void ASquadsSeasonGivesTheRecordingsOfItsDays()
    {
        var day = CsvDecoder.Decode(Whole(new SquadStream(10, 1)), [SquadOfStream]);

        var season = CsvDecoder.Open(() => new SquadStream(10, 40), [SquadOfStream]);

        Assert.True(season.IsLong);
        Assert.Empty(season.File.Problems);
        Assert.Equal(Enumerable.Range(1, 400), season.File.Recordings.Select(recording => recording.Part));
        Assert.All(season.File.Recordings, recording => Assert.Equal(0, recording.Samples.Count));
        var days = season.Recordings().ToList();
        Assert.Equal(season.File.Recordings.Select(Known), days.Select(Known));
        foreach (var first in day.Recordings)
        {
            var same = days.Where(one => one.Subject == first.Subject).ToList();
            Assert.Equal(40, same.Count);
            AssertSame(first, same[0]);
            Assert.All(same, one => Assert.Equal(first.Samples[Channel.Speed].ToArray(), one.Samples[Channel.Speed].ToArray()));
        }
    }

    [Fact]
    public void OnePersonsSeasonIsCutAtPausesOfAnHour()
    {
        // 41 sessions of 50,000 rows, 2.05 million in all; a pause of 59 min within each, 61 min and more between.
        var bytes = Rows("t,hr\n", Enumerable.Range(0, 41).SelectMany(session => Seconds(session * 86_400L, 25_000).Concat(Seconds((session * 86_400L) + 25_000 + (59 * Minute), 25_000))));

        var content = CsvDecoder.Open(bytes, [Pulse]);

        Assert.Empty(content.File.Problems);
        Assert.Equal(Enumerable.Range(0, 41).Select(session => (session + 1, Start + (session * 86_400L), 50_000)), content.Recordings().Select(Shape));
        Assert.All(content.File.Recordings, recording => Assert.Null(recording.Subject));
    }

    [Fact]
    public void UpToTheRowsHeldAFileWithoutNamesIsOneRecordingWhateverItsPauses()
    {
        var content = CsvDecoder.Open(Rows("t,hr\n", Seconds(0, 10).Concat(Seconds(100_000, 10))), [Pulse]);

        Assert.False(content.IsLong);
        Assert.Equal(20, Assert.Single(content.Recordings()).Samples.Count);
    }

    [Fact]
    public void TheNewestSessionMayStandFirst()
    {
        var bytes = Rows("t,hr\n", Enumerable.Range(0, 41).Reverse().SelectMany(session => Seconds(session * 86_400L, 50_000)));

        var content = CsvDecoder.Open(bytes, [Pulse]);

        Assert.DoesNotContain(content.File.Problems, problem => problem.Severity == ProblemSeverity.Error);
        Assert.Equal(Enumerable.Range(0, 41).Select(session => Start + (session * 86_400L)), content.Recordings().Select(one => Shape(one).Start).Order());
        Assert.All(content.Recordings(), recording => Assert.Equal(50_000, recording.Samples.Count));
    }

    [Fact]
    public void ARecordingTooLongToBeHeldIsLeftOutWithItsPlaceAndTheOthersCount()
    {
        var bytes = Rows("t,hr\n", Seconds(0, 100).Concat(Seconds(100_000, 2_100_000)).Concat(Seconds(9_000_000, 200)));

        var content = CsvDecoder.Open(bytes, [Pulse]);

        Assert.Equal([(1, Start, 100), (2, Start + 9_000_000, 200)], content.Recordings().Select(Shape));
        Assert.Equal(
            "line 2000002: the recording that begins at 2026-09-22T18:00:00Z is left out: 1999900 rows until here without a pause of 60 min are too many to be held",
            Assert.Single(content.File.Problems).ToString());
    }

    [Fact]
    public void PeopleMayStandOneBelowTheOther()
    {
        // 42 people in the same hours: nobody's session ends by a later one.
        var bytes = Rows("who,t,hr\n", Enumerable.Range(0, 42).SelectMany(person => Seconds(person % 3, 50_000).Select(row => $"P{person:00},{row}")));

        var content = CsvDecoder.Open(bytes, [Squad]);

        Assert.Empty(content.File.Problems);
        Assert.Equal(Enumerable.Range(0, 42).Select(person => $"P{person:00} {50_000}"), content.Recordings().Select(one => $"{one.Subject} {one.Samples.Count}").Order(StringComparer.Ordinal));
    }

    [Fact]
    public void MoreRowsUnderWayAtTheSameTimeThanCanBeHeldAreRefused()
    {
        var bytes = Rows("who,t,hr\n", Seconds(0, 42_000).SelectMany(row => Enumerable.Range(0, 50).Select(person => $"P{person:00},{row}")));

        var content = CsvDecoder.Open(bytes, [Squad]);

        Assert.Empty(content.Recordings());
        Assert.Equal("line 2000002: more than 2000000 rows of sessions that are under way at the same time: cut the file by person or by time", Assert.Single(content.File.Problems).ToString());
    }

    [Fact]
    public void ARowOfASessionThatIsGoneIsABadRow()
    {
        var bytes = Rows("t,hr\n", Enumerable.Range(0, 41).SelectMany(session => Seconds(session * 86_400L, 50_000)).Append($"{Start + 50_003},120"));

        var content = CsvDecoder.Open(bytes, [Pulse]);

        Assert.Equal(41, content.Recordings().Count());
        Assert.StartsWith("line 2050002: of a session whose rows had come to an end above", Assert.Single(content.File.Problems, problem => problem.Severity == ProblemSeverity.Error).ToString());
    }

    [Fact]
    public void SpeedsInAnotherUnitAreFoundOverTheWholeFile()
    {
        var bytes = Rows("who,t,hr,v\n", Enumerable.Range(0, 9).SelectMany(day => Seconds(day * 86_400L, 40_000)
            .SelectMany((row, at) => Enumerable.Range(0, 6).Select(person => $"P{person},{row},{(person == 3 ? 9 : 2) + (at % 3 / 10.0)}"))));

        var content = CsvDecoder.Open(bytes, [Squad]);

        Assert.True(content.IsLong);
        Assert.Equal("P3: speeds 4.3 times those of the others: another unit? Neither speed nor distance is used", Assert.Single(content.File.Problems).ToString());
        Assert.All(content.Recordings(), one => Assert.Equal(one.Subject != "P3", one.Samples.Has(Channel.Speed)));
    }

    private static CsvLayout SquadOfStream => Squad with
    {
        Header = ["player"],
        PersonColumn = "player",
        Time = new CsvTimeColumn { Column = "time" },
        Columns = [new() { Column = "speed", Channel = Channel.Speed, Unit = "m/s" }, new() { Column = "heart rate", Channel = Channel.HeartRate, Unit = "bpm" }],
    };

    private static IEnumerable<string> Seconds(long from, int count) => Enumerable.Range(0, count).Select(second => string.Create(CultureInfo.InvariantCulture, $"{Start + from + second},{100 + (second % 50)}"));

    private static byte[] Rows(string names, IEnumerable<string> rows)
    {
        using var bytes = new MemoryStream();
        using (var writer = new StreamWriter(bytes, new UTF8Encoding(false)))
        {
            writer.Write(names);
            foreach (var row in rows)
            {
                writer.Write(row);
                writer.Write('\n');
            }
        }

        return bytes.ToArray();
    }

    private static byte[] Whole(Stream stream)
    {
        using var copy = new MemoryStream();
        stream.CopyTo(copy);
        return copy.ToArray();
    }

    private static (int Part, long Start, int Rows) Shape(Recording one) => (one.Part, one.Start!.Value.ToUnixTimeSeconds(), one.Samples.Count);

    private static (int Part, string? Subject, NodaTime.Instant? Start, double? ElapsedSeconds) Known(Recording one) => (one.Part, one.Subject, one.Start, one.ElapsedSeconds);

    private static void AssertSame(Recording expected, Recording actual)
    {
        Assert.Equal((expected.Subject, expected.Start, expected.ElapsedSeconds), (actual.Subject, actual.Start, actual.ElapsedSeconds));
        Assert.Equal(expected.Samples.UnixMilliseconds.ToArray(), actual.Samples.UnixMilliseconds.ToArray());
        Assert.Equal(expected.Samples[Channel.HeartRate].ToArray(), actual.Samples[Channel.HeartRate].ToArray());
    }
}
