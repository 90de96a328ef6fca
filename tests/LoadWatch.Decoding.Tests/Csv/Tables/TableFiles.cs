using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using LoadWatch.Rows;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

/// <summary>Layouts and texts of tables that the tests read.</summary>
internal static class TableFiles
{
    /// <summary>A set log of a German spreadsheet: semicolons, decimal commas, day before month.</summary>
    public static CsvLayout German { get; } = new()
    {
        Name = "kraft",
        Kind = CsvKind.Sets,
        Header = ["Datum", "Übung"],
        Delimiter = ';',
        Decimal = ',',
        PersonColumn = "Name",
        DateColumn = "Datum",
        DateFormat = "dd.MM.yyyy",
        Fields = [Field("Übung", "exercise"), Field("Satz", "set"), Field("Wdh", "repetitions"), Field("Gewicht", "kilograms")],
    };

    public static CsvField Field(string column, string field, string? unit = null) => new() { Column = column, Field = field, Unit = unit };

    public static CsvField Quantity(string column, string quantity, string? unit) =>
        new() { Column = column, Field = "quantity", Quantity = quantity, Unit = unit };

    public static DecodedFile Decode(string text, params CsvLayout[] layouts) => Decode(Encoding.UTF8.GetBytes(text), layouts);

    public static DecodedFile Decode(byte[] bytes, params CsvLayout[] layouts) =>
        new DecoderSet(layouts.Length == 0 ? BuiltInLayouts.All : layouts).Decode(bytes);

    /// <summary>The rows of a file without problems.</summary>
    public static IReadOnlyList<TableRow> Rows(string text, params CsvLayout[] layouts)
    {
        var file = Decode(text, layouts);
        Assert.Empty(file.Problems);
        return file.Table!.Rows;
    }

    /// <summary>What the rows of a file without problems say.</summary>
    public static IReadOnlyList<T> Contents<T>(string text, params CsvLayout[] layouts)
        where T : RowContent => [.. Rows(text, layouts).Select(row => Assert.IsType<T>(row.Content))];

    public static IReadOnlyList<string> Keys(string text, params CsvLayout[] layouts) => [.. Rows(text, layouts).Select(row => row.Key)];

    /// <summary>The first problem of a file that gives no table, as text.</summary>
    public static string Refusal(DecodedFile file)
    {
        Assert.Null(file.Table);
        Assert.Equal(ProblemSeverity.Error, file.Problems[0].Severity);
        return file.Problems[0].ToString();
    }
}
