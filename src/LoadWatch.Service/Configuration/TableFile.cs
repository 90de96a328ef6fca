using System.Text;
using CsvHelper;

namespace LoadWatch.Service.Configuration;

/// <summary>A small CSV of people: named columns, comma, semicolon or tab; unknown columns are faults, not silence.</summary>
public sealed class TableFile
{
    private TableFile(string file, IReadOnlyList<TableRow> rows)
    {
        File = file;
        Rows = rows;
    }

    /// <summary>Name for messages.</summary>
    public string File { get; }

    /// <summary>Rows with at least one filled cell, in file order.</summary>
    public IReadOnlyList<TableRow> Rows { get; }

    /// <param name="path">The file; UTF-8 with or without mark, else Windows-1252.</param>
    /// <param name="name">Its name for messages.</param>
    /// <param name="required">Columns that must be there.</param>
    /// <param name="optional">Columns that may be there.</param>
    /// <exception cref="ConfigurationException">The file is missing, unreadable, or its header is wrong.</exception>
    public static TableFile Read(string path, string name, string[] required, string[] optional)
    {
        var options = CsvReaderOptions.Default with { TrackLineNumbers = true, FieldCountMismatch = CsvFieldCountHandling.Allow };
        try
        {
            using var reader = CsvReader.FromText(TextOf(path, name), options);
            var headers = (reader.Headers ?? []).Select(header => header.Trim()).ToArray();
            CheckHeader(name, headers, required, optional);
            var rows = new List<TableRow>();
            var faults = new List<ConfigurationFault>();
            while (reader.Read())
            {
                if (Enumerable.Range(0, reader.FieldCount).Skip(headers.Length).Any(i => reader.GetString(i).Trim().Length > 0))
                {
                    faults.Add(new ConfigurationFault(
                        name, reader.LineNumber, $"{reader.FieldCount} cells for {headers.Length} columns: a cell with a separator in it stands in quotes"));
                    continue;
                }

                var cells = headers.Select((header, i) => (header, cell: i < reader.FieldCount ? reader.GetString(i).Trim() : ""))
                    .ToDictionary(pair => pair.header, pair => pair.cell, StringComparer.Ordinal);
                if (cells.Values.Any(cell => cell.Length > 0))
                {
                    rows.Add(new TableRow(name, reader.LineNumber, cells));
                }
            }

            return faults.Count == 0 ? new TableFile(name, rows) : throw new ConfigurationException(faults);
        }
        catch (CsvFormatException e)
        {
            throw new ConfigurationException(name, e.Message);
        }
    }

    private static void CheckHeader(string name, string[] headers, string[] required, string[] optional)
    {
        var known = required.Concat(optional).ToArray();
        var faults = headers.Where(header => !known.Contains(header, StringComparer.Ordinal))
            .Select(header => new ConfigurationFault(name, 1, $"\"{header}\" is not a column here{Nearest.Hint(header, known)}"))
            .Concat(required.Except(headers, StringComparer.Ordinal)
                .Select(column => new ConfigurationFault(name, 1, $"the column \"{column}\" is missing")))
            .Concat(headers.GroupBy(header => header, StringComparer.Ordinal).Where(same => same.Count() > 1)
                .Select(same => new ConfigurationFault(name, 1, $"the column \"{same.Key}\" stands twice")))
            .ToList();
        if (faults.Count > 0)
        {
            throw new ConfigurationException(faults);
        }
    }

    /// <exception cref="ConfigurationException">The file is missing or unreadable.</exception>
    public static string TextOf(string path, string name)
    {
        byte[] bytes;
        try
        {
            bytes = System.IO.File.ReadAllBytes(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new ConfigurationException(name, $"cannot be read: {e.Message}");
        }

        using var reader = new StreamReader(new MemoryStream(bytes), new UTF8Encoding(false, throwOnInvalidBytes: true));
        try
        {
            return reader.ReadToEnd();
        }
        catch (DecoderFallbackException)
        {
            Encoding.RegisterProvider(CodePagesEncodingProvider.Instance);
            return Encoding.GetEncoding(1252).GetString(bytes);
        }
    }
}

/// <summary>One row with its line; a blank cell is null.</summary>
public sealed record TableRow(string File, long Line, IReadOnlyDictionary<string, string> Cells)
{
    public string? this[string column] => Cells.TryGetValue(column, out var cell) && cell.Length > 0 ? cell : null;

    public ConfigurationFault Fault(string reason) => new(File, Line, reason);
}
