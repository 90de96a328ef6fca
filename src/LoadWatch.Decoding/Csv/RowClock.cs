using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Csv;

/// <summary>Tells the time of each row, whichever way the layout says it is written.</summary>
internal sealed class RowClock
{
    private readonly CsvTable table;
    private readonly TimeNotation notation;
    private readonly ZoneClock zone;
    private readonly bool stated;
    private readonly char decimalMark;
    private readonly int timeColumn;
    private readonly int? startColumn;
    private readonly LineCount backwards = new();
    private Instant? sessionStart;
    private Instant? previous;

    public RowClock(CsvTable table, CsvLayout layout)
    {
        var time = layout.Time;
        this.table = table;
        stated = time.Zone is not null;
        zone = new ZoneClock(stated ? DateTimeZoneProviders.Tzdb[time.Zone!] : DateTimeZone.Utc);
        decimalMark = layout.Decimal;
        timeColumn = table.Find(time.Column)!.Value;
        startColumn = table.Find(time.StartColumn);
        notation = TimeNotation.Of(startColumn is null ? time.Format : time.StartFormat, layout.Decimal);
    }

    /// <summary>Local time minus UTC as the first dated row or the layout's zone states it, or null.</summary>
    public Offset? LocalOffset { get; private set; }

    /// <returns>Null with the problem, for a row that cannot be dated.</returns>
    public Instant? Read(CsvRows rows, out Problem? problem) =>
        startColumn is { } column ? FromStart(rows, column, out problem) : Moment(rows, timeColumn, previous, out problem);

    /// <summary>Takes the time of a row that counts as the one that the next is compared with.</summary>
    public void Accept(Instant time, long line)
    {
        if (time < previous)
        {
            backwards.Add(line);
        }

        LocalOffset ??= stated && previous is null ? zone.Zone.GetUtcOffset(time) : null;
        previous = time;
    }

    /// <summary>What is to be known about the times although all rows count.</summary>
    public IEnumerable<Problem> Warnings()
    {
        (LineCount Lines, string Reason)[] all =
        [
            (zone.Skipped, "the local time does not exist in the zone, the clocks went forward: taken as later by the gap"),
            (zone.Ambiguous, "the local time came twice, the clocks went back: taken as the earlier unless rows would run backwards"),
            (backwards, "the time is before that of the row above"),
        ];
        return all.Where(entry => entry.Lines.Count > 0).Select(entry => Warning(entry.Lines, entry.Reason));
    }

    private Instant? FromStart(CsvRows rows, int column, out Problem? problem)
    {
        if (!TakeStart(rows, column, out problem))
        {
            return null;
        }

        if (!StrictNumber.TryRead(rows[timeColumn], decimalMark, out var seconds) || Math.Abs(seconds) > TimeSpan.SecondsPerDay * 366)
        {
            problem = table.Wrong(rows, timeColumn, rows[timeColumn].IsEmpty ? "no time" : "not a number of seconds from the start");
            return null;
        }

        return sessionStart!.Value + Duration.FromMilliseconds((long)Math.Round(seconds * 1000));
    }

    private bool TakeStart(CsvRows rows, int column, out Problem? problem)
    {
        problem = null;
        if (rows[column].IsEmpty)
        {
            problem = sessionStart is null ? table.Wrong(rows, column, "no start of the session yet") : null;
        }
        else if (Moment(rows, column, before: null, out problem) is { } start)
        {
            problem = start == (sessionStart ??= start)
                ? null
                : table.Wrong(rows, column, "another start than in the rows above: one file holds one session");
        }

        return problem is null;
    }

    private Instant? Moment(CsvRows rows, int column, Instant? before, out Problem? problem)
    {
        problem = null;
        if (!notation.TryRead(rows[column], out var written))
        {
            problem = table.Wrong(rows, column, rows[column].IsEmpty ? "no time" : "not a time as the layout writes it");
            return null;
        }

        LocalOffset ??= written.Offset;
        return written.Instant ?? zone.Place(written.Local, before, rows.Line);
    }

    private Problem Warning(LineCount lines, string reason) =>
        new(
            ProblemSeverity.Warning,
            lines.Count == 1 ? reason : $"{reason} ({lines.Count} rows)",
            Line: lines.First,
            Column: timeColumn + 1,
            Field: table.Names[timeColumn]);
}
