using System.IO.Compression;
using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Tests.Containers;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Limits;

/// <summary>Contents that cost the most memory or time for their size, about eight megabytes each; packed ones unpack to about as much.</summary>
internal static class WorstInputs
{
    public const int Bytes = 8 << 20;

    public static CsvLayout People { get; } = BuiltInLayouts.Samples with { Name = "people", Header = ["who", "time"], PersonColumn = "who" };

    public static CsvLayout Seconds { get; } = People with { Name = "seconds", Header = ["who", "t"], Time = new CsvTimeColumn { Column = "t", Format = "unix_s" } };

    public static IReadOnlyList<(string Name, Func<byte[]> Make)> All { get; } =
    [
        ("every channel once, then bare rows", () => Csv("who,t,power_w,heart_rate_bpm,speed_m_s,cadence_rpm,distance_m,altitude_m\nA,1791180000,1,1,1,1,1,1\n", "A,1791180000,,,,,,\n")),
        ("shortest rows", () => Csv("t,who,power_w\n", "0,A,1\n")),
        ("every channel in every row", () => Csv("who,t,power_w,heart_rate_bpm,speed_m_s,cadence_rpm,distance_m,altitude_m\n", "A,0,1,1,1,1,1,1\n")),
        ("five hundred people by turns", () => Rows("who,time,power_w\n", row => $"{row % 500},2026-10-05T06:{row / 60 % 60:00}:{row % 60:00}Z,1\n")),
        ("sessions of one row", () => Rows("who,t,power_w\n", row => $"A,{1791180000L + (row * 3601L)},1\n")),
        ("times that run back", () => Rows("who,t,power_w\n", row => $"A,{1791180000L - (row * 7L % 100_000)},1\n")),
        ("bad rows", () => Csv("who,time,power_w\n", "A,x,y\n")),
        ("bad rows of many cells", () => Csv("who,time,power_w\n", new string(',', 200) + "x\n")),
        ("rows that name nobody", () => Rows("who,time,power_w\n", row => $"{row:000000}{new string('n', 60)},2026-10-05T06:00:00Z,1\n")),
        ("one line", () => Csv("time,power_w\n", "1234567,")),
        ("a quote that is never closed", () => Csv("time,power_w\n\"", "2026-10-05T06:00:00Z,1\n")),
        ("long lines of commas", () => Csv("who,time,power_w\n", new string(',', 900_000) + "\n")),
        ("column names without end", () => Csv("", "time,power_w,a,b,c,d,")),
        ("sixteen bits a letter", () => [0xFF, 0xFE, .. Encoding.Unicode.GetBytes(Encoding.ASCII.GetString(Csv("who,t,power_w\n", "A,0,1\n").AsSpan(0, Bytes / 2)))]),
        ("a table of small rows", () => Rows("date,person,exercise,repetitions\n", row => $"2026-10-05,p{row % 50},e{row},1\n")),
        ("a table of very many people", () => Rows("date,person,exercise,repetitions\n", row => $"2026-10-05,p{row},a,1\n")),
        ("a table of different texts", () => Rows("date,person,answer,note\n", row => $"2026-10-05,p{row},rest,{row:0000000}{new string('n', 300)}\n")),
        ("a table of one key", () => Csv("date,exercise,repetitions\n", "2026-10-05,a,1\n")),
        ("gzip near the ratio", () => Packed.Gzip(Packable(), CompressionLevel.SmallestSize)),
        ("gzip of several members", () => [.. Enumerable.Range(0, 8).SelectMany(_ => Packed.Gzip(Noise(1 << 20)))]),
        ("gzip of empty members", () => Repeated([], [0x1F, 0x8B, 8, 0, 0, 0, 0, 0, 0, 3, 3, 0, 0, 0, 0, 0, 0, 0, 0, 0], Bytes / 16)),
        ("zip of many entries", () => Packed.Zip([.. Enumerable.Range(0, 10_000).Select(i => ($"{i}.csv", Noise(700)))])),
        ("zip of one large entry", () => Packed.Zip(CompressionLevel.SmallestSize, ("a.csv", Packable()))),
    ];

    /// <summary>What the pipeline does with a content: unpacked or decoded, one after the other.</summary>
    public static void Read(byte[] bytes)
    {
        var decoders = new DecoderSet([.. BuiltInLayouts.All, People, Seconds]);
        decoders.CheckCompleteness(bytes);
        if (DecoderSet.Recognise(bytes) is ContentKind.Gzip or ContentKind.Zip)
        {
            foreach (var member in decoders.Unpack(bytes, "x").Members)
            {
                decoders.Decode(member.Bytes);
            }
        }
        else
        {
            var file = decoders.Decode(bytes);
            if (file.Recordings.Count == 0 && file is { Table: null, Kind: "csv" or "table" } && !file.Problems.Any(problem => problem.Severity == ProblemSeverity.Error))
            {
                throw new InvalidOperationException("neither a recording nor a reason");
            }
        }
    }

    private static byte[] Csv(string head, string row) => Repeated(Encoding.ASCII.GetBytes(head), Encoding.ASCII.GetBytes(row), Bytes);

    private static byte[] Repeated(byte[] head, byte[] row, int length)
    {
        var bytes = new byte[head.Length + (row.Length * (length / row.Length))];
        head.CopyTo(bytes, 0);
        for (var at = head.Length; at < bytes.Length; at += row.Length)
        {
            row.CopyTo(bytes, at);
        }

        return bytes;
    }

    private static byte[] Rows(string head, Func<int, string> row)
    {
        var bytes = new byte[Bytes];
        var at = Encoding.ASCII.GetBytes(head, bytes);
        for (var number = 0; at < Bytes - 1000; number++)
        {
            at += Encoding.ASCII.GetBytes(row(number), bytes.AsSpan(at));
        }

        return bytes[..at];
    }

    /// <summary>Shrinks to about a 150th.</summary>
    private static byte[] Packable()
    {
        var random = new Random(7);
        return Rows("t,who,power_w\n", row => row % 900 == 0 ? $"0,A,0.{random.NextInt64(long.MaxValue)}\n" : "0,A,1\n");
    }

    private static byte[] Noise(int length)
    {
        var bytes = new byte[length];
        new Random(7).NextBytes(bytes);
        return bytes;
    }
}
