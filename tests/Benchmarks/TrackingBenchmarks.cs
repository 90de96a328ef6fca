using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using BenchmarkDotNet.Attributes;
using CsvHelper;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Benchmarks;

/// <summary>
/// Decoding CSV against the library's bare read of the same bytes: with every cell looked at, and with those cells parsed that a decoder uses. The files are
/// a squad's match at ten rows a second, 1.35 million rows, and a day and a half of one person at one a second, 130,000 rows.
/// </summary>
[MemoryDiagnoser]
public class TrackingBenchmarks
{
    private const int Seconds = 130_000;

    private static readonly CsvReaderOptions Options = new() { HasHeader = false, Separator = ',' };

    private static readonly CsvLayout Pods = new()
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

    private byte[] file = [];

    [Params("match", "one person")]
    public string Content { get; set; } = "";

    [GlobalSetup]
    public void Write() => file = IsMatch ? new TrackingExport(25, 5400).Text() : OnePerson();

    [Benchmark]
    public byte[] Sha256() => SHA256.HashData(file);

    [Benchmark]
    public long ReadCells()
    {
        using var reader = CsvReader.Create(new MemoryStream(file), Options);
        var length = 0L;
        while (reader.Read())
        {
            for (var cell = 0; cell < reader.FieldCount; cell++)
            {
                length += reader.GetSpan(cell).Length;
            }
        }

        return length;
    }

    /// <summary>The time and the numbers; names of people as spans.</summary>
    [Benchmark(Baseline = true)]
    public double ReadAndParse()
    {
        using var reader = CsvReader.Create(new MemoryStream(file), Options);
        var sum = 0.0;
        reader.Read();
        while (reader.Read())
        {
            sum += IsMatch
                ? reader.GetSpan(0).Length + reader.ParseExact<DateTime>(1, "dd.MM.yyyy HH:mm:ss.f").Second
                : reader.Parse<DateTimeOffset>(0).Second;
            for (var cell = 2; cell < 6; cell++)
            {
                sum += reader.Parse<double>(cell);
            }
        }

        return sum;
    }

    [Benchmark]
    public DecodedFile Decode() => CsvDecoder.Decode(file, [IsMatch ? Pods : BuiltInLayouts.Samples]);

    private bool IsMatch => Content == "match";

    private static byte[] OnePerson()
    {
        var text = new StringBuilder("time,sport,heart_rate_bpm,power_w,speed_m_s,cadence_rpm\n");
        var start = new DateTime(2026, 10, 5, 6, 0, 0, DateTimeKind.Utc);
        for (var row = 0; row < Seconds; row++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{start.AddSeconds(row):yyyy-MM-ddTHH:mm:ss}Z,cycling,{120 + (row % 40)},{200 + (row % 77)},{8 + (row % 100 / 100.0):0.00},{85 + (row % 10)}\n");
        }

        return Encoding.UTF8.GetBytes(text.ToString());
    }
}
