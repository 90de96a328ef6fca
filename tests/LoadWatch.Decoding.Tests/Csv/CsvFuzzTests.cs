using System.Globalization;
using System.Text;
using CsCheck;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

/// <summary>Whatever a CSV of samples holds, the answer is a value. LOADWATCH_FUZZ sets how many files of each kind are tried.</summary>
public class CsvFuzzTests
{
    private static readonly int Tries = int.Parse(Environment.GetEnvironmentVariable("LOADWATCH_FUZZ") ?? "10000", CultureInfo.InvariantCulture);

    private static readonly string[] Cells =
    [
        "2026-10-05T06:00:00Z", "2026-10-05 06:00:01", "2026-10-05T08:00:02.5+02:00", "05.10.2026 06:00:03", "2026-12-31T23:59:60Z", "9999-12-31T23:59:59Z", "0001-01-01T00:00:00", "2027-03-28T02:30:00",
        "0", "-0", "120", "12,5", "12.5", "1e9", "1e308", "1e-308", "-1e400", "NaN", "Infinity", "1.234.567", "0x10", "+5", "", " ", "\t7\t", "\" 8 \"", "\"a\"\"b\"", "\"a\"b", "a\"b", "\"", "\0",
        "A", "Bö", "\u00a0", "\u2028", "cycling", "time", "who", "\"x\ny\"", "ÿ", "😀",
    ];

    private static readonly string[] Heads = ["time,power_w,who", "time;heart_rate_bpm;speed_m_s", "who,time,speed_m_s,heart_rate_bpm,sport", "sep=;\ntime;power_w", "t,who,power_w", "Zeit\tPuls\tTempo"];

    private static readonly CsvLayout[] Layouts =
    [
        .. BuiltInLayouts.All,
        BuiltInLayouts.Samples with { Name = "people", Header = ["who"], PersonColumn = "who", Time = new CsvTimeColumn { Column = "time", Zone = "Europe/Helsinki" } },
        BuiltInLayouts.Samples with { Name = "seconds", Header = ["t"], Time = new CsvTimeColumn { Column = "t", Format = "unix_s" } },
        BuiltInLayouts.Samples with { Name = "semicolons", Delimiter = ';', Decimal = ',' },
        new()
        {
            Name = "tabs", Header = ["Zeit"], Delimiter = '\t', Decimal = ',', Time = new CsvTimeColumn { Column = "Zeit", Format = "dd.MM.yyyy HH:mm:ss", Zone = "Europe/Vienna" },
            Columns = [new() { Column = "Puls", Channel = Channel.HeartRate, Unit = "bpm" }, new() { Column = "Tempo", Channel = Channel.Speed, Unit = "km/h" }],
        },
    ];

    private static readonly Gen<byte[]> Grammatical = Gen.Select(
        Gen.Int[0, Heads.Length - 1], Gen.Int[0, Cells.Length - 1].Array[0, 6].Array[0, 12], Gen.Int[0, 3], Gen.Int[0, 3], Written);

    private static readonly Gen<byte[]> Mutated = Gen.Select(Grammatical, Gen.Select(Gen.Int[0, 4000], Gen.Byte, Gen.Int[0, 2]).Array[1, 6], Changed);

    [Fact]
    public void FilesOfAnyCellsAreSurvived() => Grammatical.Sample(Survives, iter: Tries);

    [Fact]
    public void ChangedFilesAreSurvived() => Mutated.Sample(Survives, iter: Tries);

    private static void Survives(byte[] bytes)
    {
        var file = CsvDecoder.Decode(bytes, Layouts);

        Assert.True(file.Recordings.Count > 0 || file.Table is not null || file.Problems.Any(problem => problem.Severity == ProblemSeverity.Error));
        Assert.InRange(file.Recordings.Sum(recording => recording.Samples.Count), 0, bytes.Length);
        Assert.All(file.Problems, problem => Assert.NotEmpty(problem.Reason));
        foreach (var recording in file.Recordings)
        {
            Assert.All(recording.Samples.Channels, channel => Assert.All(recording.Samples[channel].ToArray(), value => Assert.True(double.IsNaN(value) || Math.Abs(value) <= 1e12)));
        }

        var handed = new List<Recording>();
        var read = CsvDecoder.Read(() => new MemoryStream(bytes), Layouts, handed.Add);
        Assert.True(read.IsRefused || file.Table is not null || handed.Count > 0);
    }

    private static byte[] Written(int head, int[][] rows, int encoding, int end)
    {
        var mark = Heads[head].First(c => c is ',' or ';' or '\t');
        string[] ends = ["\n", "\r\n", "\r", "\n\n"];
        var text = string.Join(ends[end], rows.Select(row => string.Join(mark, row.Select(cell => Cells[cell]))).Prepend(Heads[head])) + (end == 1 ? "" : ends[end]);
        Encoding[] encodings = [new UTF8Encoding(false), new UTF8Encoding(true), new UnicodeEncoding(false, true), Encoding.Latin1];
        return [.. encodings[encoding].GetPreamble(), .. encodings[encoding].GetBytes(text)];
    }

    private static byte[] Changed(byte[] bytes, (int At, byte Value, int How)[] changes)
    {
        var changed = bytes.ToList();
        foreach (var (at, value, how) in changes.Where(_ => changed.Count > 1))
        {
            var place = at % changed.Count;
            if (how == 0)
            {
                changed.Insert(place, value);
            }
            else if (how == 1)
            {
                changed[place] = value;
            }
            else
            {
                changed.RemoveAt(place);
            }
        }

        return [.. changed];
    }
}
