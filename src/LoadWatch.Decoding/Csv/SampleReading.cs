using System.Text;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Reads the rows of one file by one layout.</summary>
internal sealed class SampleReading
{
    /// <summary>A day at 20 Hz and more, or 25 people for two hours at 10 Hz; with every channel filled the columns stay near 110 MB.</summary>
    public const int RowsAtMost = 2_000_000;

    // A squad for a season; without a limit a file of rows an hour apart would give a recording a row.
    private const int RecordingsAtMost = 2_000;

    // Several seasons, where none is kept.
    private const int HandedOnAtMost = 100_000;

    private readonly CsvTable table;
    private readonly CsvLayout layout;
    private readonly RowClock clock;
    private readonly SampleSubjects subjects;
    private readonly RowProblems problems = new();
    private readonly ReadingCells readings;
    private readonly SportCell sport;
    private readonly byte[] timeName;
    private readonly Action<Recording>? take;
    private long goodRows;
    private long openRows;
    private int recordings;

    /// <param name="table">The file.</param>
    /// <param name="layout">Of samples.</param>
    /// <param name="take">Gets each recording of a person as it ends, so that no more than the sessions under way are held. Null: all are kept to the end.</param>
    public SampleReading(CsvTable table, CsvLayout layout, Action<Recording>? take = null)
    {
        this.take = take;
        this.table = table;
        this.layout = layout;
        clock = new RowClock(table, layout);
        subjects = new SampleSubjects(table, layout);
        readings = new ReadingCells(table, layout);
        sport = new SportCell(table, layout);
        timeName = Encoding.UTF8.GetBytes(layout.Time.Column);
    }

    /// <summary>The file cannot be used, whatever was handed on before that was seen.</summary>
    public bool IsRefused { get; private set; }

    private int Most => take is null ? RecordingsAtMost : HandedOnAtMost;

    public DecodedFile Read()
    {
        if ((ReadRows() ?? TooManyBad()) is { } refusal)
        {
            return Refused(refusal);
        }

        var kept = new List<Recording>();
        foreach (var subject in subjects.InOrder.Where(one => one.Samples.Count > 0).TakeWhile(_ => recordings <= Most))
        {
            HandOn(subject, take ?? kept.Add);
        }

        return recordings <= Most
            ? new("csv", FileType: null, layout.Name, kept, [.. problems.Close(), .. clock.Warnings()])
            : Refused(TooManyRecordings());
    }

    /// <summary>Null once all rows are read, else why the file cannot be used.</summary>
    private Problem? ReadRows()
    {
        using var rows = table.Rows();
        while (rows.Next())
        {
            if (HoldsNothing(rows))
            {
                continue;
            }

            if (openRows == RowsAtMost)
            {
                return Refusal($"more than {RowsAtMost} rows{(take is null ? "" : " of sessions that have not ended")}", rows.Line);
            }

            if (recordings > Most)
            {
                return TooManyRecordings();
            }

            if (ReadRow(rows) is { } problem && PutAside(rows, problem) is { } refusal)
            {
                return refusal;
            }
        }

        return rows.Fault;
    }

    /// <summary>Lists a row that gives no sample; not null where the file cannot be used because of it.</summary>
    private Problem? PutAside(CsvRows rows, Problem problem)
    {
        var again = NamesAgain(rows);
        switch (again?.Severity)
        {
            case null:
                problems.AddBad(problem, rows.LineSpan);
                return null;
            case ProblemSeverity.Warning:
                problems.Add(again);
                return null;
            default:
                return again;
        }
    }

    private static bool HoldsNothing(CsvRows rows)
    {
        for (var index = 0; index < rows.CellCount; index++)
        {
            if (!rows[index].IsEmpty)
            {
                return false;
            }
        }

        return true;
    }

    private Problem? ReadRow(CsvRows rows)
    {
        if (ShapeProblem(rows) is { } shape)
        {
            return shape;
        }

        if (subjects.Of(rows, out var problem) is not { } subject
            || clock.Read(rows, subject.Clock, out problem) is not { } time
            || (problem = readings.Take(rows) ?? EndSession(rows, subject, time.ToUnixTimeMilliseconds())) is not null)
        {
            return problem;
        }

        if (sport.Take(rows) is { } doubt)
        {
            problems.Add(doubt);
        }

        clock.Accept(time, subject.Clock, rows);
        subject.Samples.Add(time.ToUnixTimeMilliseconds(), readings.Values);
        goodRows++;
        openRows++;
        return null;
    }

    /// <summary>Hands a session on before the first row of the next; not null for a row that comes too late for one that is gone.</summary>
    private Problem? EndSession(CsvRows rows, SampleSubject subject, long time)
    {
        if (take is null || subject.Name is null)
        {
            return null;
        }

        if (time - subject.EndedAt <= SessionGaps.LongestMilliseconds)
        {
            return Refusal("of a session whose rows had come to an end above: a file so large is read in the order of time", rows.Line);
        }

        if (time - subject.Samples.Latest > SessionGaps.LongestMilliseconds)
        {
            HandOn(subject, take);
        }

        return null;
    }

    private Problem? ShapeProblem(CsvRows rows)
    {
        if (rows.IsQuotedWrongly)
        {
            return Refusal("text behind a closing quote", rows.Line);
        }

        for (var index = table.Names.Count; index < rows.CellCount; index++)
        {
            if (!rows[index].IsEmpty)
            {
                return WrongCount(rows);
            }
        }

        return rows.CellCount < table.Names.Count ? WrongCount(rows) : null;
    }

    /// <summary>
    /// For a row of column names in the middle: a warning where they are those of the first line, an error where they are others.
    /// </summary>
    private Problem? NamesAgain(CsvRows rows) => rows switch
    {
        _ when !HoldsTimeName(rows) => null,
        _ when Enumerable.Range(0, rows.CellCount).Select(rows.Text).SequenceEqual(table.Names) =>
            Refusal("the column names come again: rows above and below are taken as one session", rows.Line)
                with { Severity = ProblemSeverity.Warning },
        _ => Refusal("other column names begin here: two files in one", rows.Line),
    };

    private bool HoldsTimeName(CsvRows rows)
    {
        for (var index = 0; index < rows.CellCount; index++)
        {
            if (rows[index].SequenceEqual(timeName))
            {
                return true;
            }
        }

        return false;
    }

    private Problem? TooManyBad()
    {
        var all = goodRows + problems.BadLines;
        return goodRows switch
        {
            0 when all == 0 => Refusal("no rows below the column names", table.Line ?? 1),
            0 => new Problem(ProblemSeverity.Error, $"none of {all} rows can be used"),
            _ when problems.BadLines * 100 > all =>
                new Problem(ProblemSeverity.Error, $"{problems.BadLines} of {all} rows cannot be used, more than 1 %"),
            _ => null,
        };
    }

    private void HandOn(SampleSubject subject, Action<Recording> taker)
    {
        openRows -= subject.Samples.Count;
        foreach (var series in subject.End(subject.Name is null ? null : times => SessionGaps.Sessions(times, Math.Max(1, Most - recordings))))
        {
            taker(ToRecording(++recordings, subject, series));
        }
    }

    private Recording ToRecording(int part, SampleSubject subject, SampleSeries series)
    {
        var start = series.First!.Value;
        return new Recording
        {
            Part = part,
            Subject = subject.Name,
            Sport = sport.Found,
            Start = start,
            LocalOffset = clock.LocalOffset(subject.Clock, start),
            ElapsedSeconds = (series.Last!.Value - start).TotalSeconds,
            Samples = series,
        };
    }

    private DecodedFile Refused(Problem refusal)
    {
        IsRefused = true;
        return new("csv", FileType: null, layout.Name, [], [refusal, .. problems.Close()]);
    }

    private Problem TooManyRecordings() =>
        new(ProblemSeverity.Error, $"more than {Most} recordings: too many rows lie more than 60 min apart");

    private Problem WrongCount(CsvRows rows) => Refusal($"{rows.CellCount} cells for {table.Names.Count} columns", rows.Line);

    private static Problem Refusal(string reason, long line) => new(ProblemSeverity.Error, reason, Line: line);
}
