using CsvHelper;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// The rows of a text, one at a time, the first line among them; empty lines are passed over. Stops with a <see cref="Fault"/> where going
/// on
/// could give wrong rows.
/// </summary>
internal sealed class CsvRows : IDisposable
{
    private const int LineLimitBytes = 1 << 20;

    private readonly CsvReader reader;
    private readonly NulWatch source;
    private CsvMalformedReason? malformed;

    public CsvRows(CsvText text, char separator)
    {
        var options = new CsvReaderOptions
        {
            HasHeader = false,
            Separator = separator,
            DetectSeparatorHint = false,
            Encoding = text.Encoding,
            TrackLineNumbers = true,
            TrimWhitespace = true,
            MaxRecordSize = LineLimitBytes,
            OnMalformedRecord = record => malformed = record.Reason,
        };

        // Read as a stream: the limit of a line is not kept over an array.
        source = new NulWatch(text.Open());
        reader = CsvReader.Create(source, options);
    }

    /// <summary>Why reading ended before the end of the text, or null.</summary>
    public Problem? Fault { get; private set; }

    /// <summary>The line on which the row starts, from 1.</summary>
    public long Line => reader.LineNumber;

    /// <summary>How many lines the row takes: more than one where a quoted cell holds line ends.</summary>
    public int LineSpan
    {
        get
        {
            var raw = reader.RawRecord;
            return 1 + raw.Count((byte)'\n') + raw.Count((byte)'\r') - raw.Count("\r\n"u8);
        }
    }

    public int CellCount => reader.FieldCount;

    /// <summary>Whether something stands behind the closing quote of a cell, so that the row may hold two.</summary>
    public bool IsQuotedWrongly => malformed == CsvMalformedReason.TextAfterClosingQuote;

    /// <summary>A cell without its quotes and the blanks around it; empty where the row is too short.</summary>
    public ReadOnlySpan<byte> this[int index]
    {
        get
        {
            // Most cells stand in the file as they are meant: the reader's own trimming costs more than all else it does.
            var raw = reader.GetRawSpan(index);
            return raw is [> (byte)' ', .., > (byte)' '] or [> (byte)' '] && !raw.Contains((byte)'"') ? raw : reader.GetSpan(index).Trim(" \t"u8);
        }
    }

    public string Text(int index) => reader.GetString(index).Trim();

    public bool Next()
    {
        malformed = null;
        try
        {
            return Fault is null && reader.Read() && !IsBroken();
        }
        catch (CsvFormatException tooLong)
        {
            Fault = Problem("a line is longer than 1 MB", tooLong.LineNumber);
            return false;
        }
    }

    public void Dispose() => reader.Dispose();

    private bool IsBroken()
    {
        Fault = this switch
        {
            _ when reader.RawRecord.Length > LineLimitBytes => Problem("a line is longer than 1 MB", Line),
            _ when source.HasSeenNul && reader.RawRecord.Contains((byte)0) => Problem("a NUL byte: the file is damaged or no text", Line),
            _ when malformed == CsvMalformedReason.UnterminatedQuote => Problem("a quote opens here and is never closed", Line),
            _ => null,
        };
        return Fault is not null;
    }

    private static Problem Problem(string reason, long line) => new(ProblemSeverity.Error, reason, Line: line);
}
