using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Csv;

/// <summary>Tells the time of each row, whichever way the layout says it is written; the rows of each person are followed on their own.</summary>
internal sealed class RowClock
{
    private readonly CsvTable table;
    private readonly TimeNotation notation;
    private readonly ZoneClock zone;
    private readonly bool stated;
    private readonly char decimalMark;
    private readonly int timeColumn;
    private readonly int? startColumn;
    private readonly DayClock? days;
    private readonly LineCount backwards = new();
    private readonly LineCount repeated = new();
    private Instant? startOfFile;

    public RowClock(CsvTable table, CsvLayout layout)
    {
        var time = layout.Time;
        this.table = table;
        stated = time.Zone is not null;
        zone = new ZoneClock(stated ? DateTimeZoneProviders.Tzdb[time.Zone!] : DateTimeZone.Utc);
        decimalMark = layout.Decimal;
        timeColumn = table.Find(time.Column)!.Value;
        startColumn = table.Find(time.StartColumn);
        days = time.DateColumn is null ? null : new DayClock(table, time);
        notation = TimeNotation.Of(startColumn is not null ? time.StartFormat : days is null ? time.Format : CsvTimeColumn.Iso8601, layout.Decimal);
    }

    /// <summary>Local time minus UTC as a row or the layout's zone states it, or null.</summary>
    public Offset? LocalOffset(ClockTrack track, Instant start) => track.Offset ?? (stated ? zone.Zone.GetUtcOffset(start) : null);

    /// <returns>Null with the problem, for a row that cannot be dated.</returns>
    public Instant? Read(CsvRows rows, ClockTrack track, out Problem? problem) => (days, startColumn) switch
    {
        ({ } known, _) => OfDay(rows, known, track, out problem),
        (_, { } column) => FromStart(rows, column, track, out problem),
        _ => Moment(rows, timeColumn, track, track.Previous, out problem),
    };

    /// <summary>Takes the time of a row that counts as the one that the next of the same person is compared with.</summary>
    public void Accept(Instant time, ClockTrack track, CsvRows rows)
    {
        if (time < track.Previous)
        {
            backwards.Add(rows.Line);
        }
        else if (time == track.Previous)
        {
            repeated.Add(rows.Line);
        }

        track.Previous = time;
    }

    /// <summary>What is to be known about the times although all rows count.</summary>
    public IEnumerable<Problem> Warnings()
    {
        (LineCount Lines, string Reason)[] all =
        [
            (zone.Skipped, "the local time does not exist in the zone, the clocks went forward: taken as later by the gap"),
            (zone.Ambiguous, "the local time came twice, the clocks went back: taken as the earlier unless rows would run backwards"),
            (backwards, "the time is before that of the row above"),
            (repeated, "the time is that of the row above"),
        ];
        return all.Where(entry => entry.Lines.Count > 0).Select(entry => Warning(entry.Lines, entry.Reason));
    }

    private Instant? OfDay(CsvRows rows, DayClock known, ClockTrack track, out Problem? problem)
    {
        var above = track.Previous?.InZone(zone.Zone).LocalDateTime;
        return known.Read(rows, above, out problem) is { } local ? zone.Place(local, track.Previous, rows) : null;
    }

    private Instant? FromStart(CsvRows rows, int column, ClockTrack track, out Problem? problem)
    {
        if (!TakeStart(rows, column, track, out problem))
        {
            return null;
        }

        if (!StrictNumber.TryRead(rows[timeColumn], decimalMark, out var seconds) || Math.Abs(seconds) > TimeSpan.SecondsPerDay * 366)
        {
            problem = table.Wrong(rows, timeColumn, rows[timeColumn].IsEmpty ? "no time" : "not a number of seconds from the start");
            return null;
        }

        return track.SessionStart!.Value + Duration.FromMilliseconds((long)Math.Round(seconds * 1000));
    }

    /// <summary>The person's first filled cell counts; without one yet, the first of the file.</summary>
    private bool TakeStart(CsvRows rows, int column, ClockTrack track, out Problem? problem)
    {
        problem = null;
        if (rows[column].IsEmpty)
        {
            track.SessionStart ??= startOfFile;
            problem = track.SessionStart is null ? table.Wrong(rows, column, "no start of the session yet") : null;
        }
        else if (Moment(rows, column, track, before: null, out problem) is { } start)
        {
            startOfFile ??= start;
            problem = start == (track.SessionStart ??= start)
                ? null
                : table.Wrong(rows, column, "another start than in the rows above: one file holds one session");
        }

        return problem is null;
    }

    private Instant? Moment(CsvRows rows, int column, ClockTrack track, Instant? before, out Problem? problem)
    {
        problem = null;
        if (!notation.TryRead(rows[column], out var written))
        {
            problem = table.Wrong(rows, column, rows[column].IsEmpty ? "no time" : "not a time as the layout writes it");
            return null;
        }

        track.Offset ??= written.Offset;
        return written.Instant ?? zone.Place(written.Local, before, rows);
    }

    private Problem Warning(LineCount lines, string reason) =>
        new(
            ProblemSeverity.Warning,
            lines.Count == 1 ? reason : $"{reason} ({lines.Count} rows)",
            Line: lines.First,
            Column: timeColumn + 1,
            Field: table.Names[timeColumn]);
}

/// <summary>What the rows of one person have told of time so far.</summary>
internal sealed class ClockTrack
{
    /// <summary>The start from which seconds count.</summary>
    public Instant? SessionStart { get; set; }

    /// <summary>The last row that counts.</summary>
    public Instant? Previous { get; set; }

    /// <summary>Local time minus UTC as a cell wrote it.</summary>
    public Offset? Offset { get; set; }
}
