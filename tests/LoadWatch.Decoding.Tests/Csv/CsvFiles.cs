using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

/// <summary>Layouts and texts that the tests read.</summary>
internal static class CsvFiles
{
    /// <summary>A layout of a Finnish spreadsheet: semicolons, decimal commas, local times.</summary>
    public static CsvLayout Finnish { get; } = new()
    {
        Name = "mittaus",
        Header = ["aika", "syke"],
        Delimiter = ';',
        Decimal = ',',
        Time = new CsvTimeColumn { Column = "aika", Format = "dd.MM.yyyy HH:mm:ss", Zone = "Europe/Helsinki" },
        Columns =
        [
            new() { Column = "syke", Channel = Channel.HeartRate, Unit = "bpm" },
            new() { Column = "nopeus (km/h)", Channel = Channel.Speed, Unit = "km/h" },
            new() { Column = "kierrosmäärä", Channel = Channel.Cadence, Unit = "rpm" },
        ],
        Sport = "cycling",
    };

    public static DecodedFile Decode(string text, params CsvLayout[] layouts) => Decode(Encoding.UTF8.GetBytes(text), layouts);

    public static DecodedFile Decode(byte[] bytes, params CsvLayout[] layouts) =>
        CsvDecoder.Decode(bytes, layouts.Length == 0 ? [BuiltInLayouts.Samples] : layouts);

    public static Recording Only(DecodedFile file)
    {
        Assert.Equal("csv", file.Kind);
        Assert.DoesNotContain(file.Problems, problem => problem.Severity == ProblemSeverity.Error);
        return Assert.Single(file.Recordings);
    }

    /// <summary>The only problem of a refused file, as text.</summary>
    public static string Refusal(DecodedFile file)
    {
        Assert.Empty(file.Recordings);
        var problem = file.Problems[0];
        Assert.Equal(ProblemSeverity.Error, problem.Severity);
        return problem.ToString();
    }

    /// <summary>Rows of the built-in format, one a second from 2026-10-05T06:00:00Z, with heart rates 100, 101, ...</summary>
    public static List<string> Rows(int count) =>
    [
        .. Enumerable.Range(0, count).Select(second => $"2026-10-05T06:{second / 60:00}:{second % 60:00}Z,{100 + (second % 50)}"),
    ];
}
