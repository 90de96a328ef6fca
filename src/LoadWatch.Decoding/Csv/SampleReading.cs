using System.Text;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv;

/// <summary>Reads the rows of one file by one layout; no more of them are held at once than <see cref="RowsHeld"/>.</summary>
internal sealed class SampleReading
{
    /// <summary>A day at 20 Hz and more, or 25 people for two hours at 10 Hz; with every channel filled the columns stay near 110 MB.</summary>
    public const int RowsHeld = 2_000_000;

    // Where making room frees fewer, it would be made at every other row.
    private const int RoomWanted = RowsHeld / 64;

    // Of that many rows one of a person is to be expected, where the person goes on.
    private const int RowsOfAbsence = RowsHeld / 4;

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
    private readonly HandingOn handingOn;
    private readonly Queue<Recording> ended = new();
    private readonly List<Problem> leftOut = [];
    private long goodRows;
    private long openRows;
    private long changes;
    private SampleSubject? before;
    private int recordings;

    /// <param name="table">The file.</param>
    /// <param name="layout">Of samples.</param>
    /// <param name="handingOn">When recordings leave it.</param>
    public SampleReading(CsvTable table, CsvLayout layout, HandingOn handingOn)
    {
        this.handingOn = handingOn;
        this.table = table;
        this.layout = layout;
        clock = new RowClock(table, layout);
        subjects = new SampleSubjects(table, layout);
        readings = new ReadingCells(table, layout);
        sport = new SportCell(table, layout);
        timeName = Encoding.UTF8.GetBytes(layout.Time.Column);
    }

    /// <summary>What was read, without the recordings; known once all of them were asked for.</summary>
    public DecodedFile? File { get; private set; }

    /// <summary>The file cannot be used, whatever was handed on before that was seen.</summary>
    public bool IsRefused { get; private set; }

    /// <summary>More rows than can be held: from now on every recording is cut at long gaps and numbered as it leaves. Known before the first of them does.</summary>
    public bool IsLong { get; private set; }

    private int Most => IsLong || handingOn == HandingOn.AsTheyEnd ? HandedOnAtMost : RecordingsAtMost;

    /// <summary>The recordings; to be asked for once.</summary>
    public IEnumerable<Recording> Read()
    {
        Problem? refusal = null;
        using (var rows = table.Rows())
        {
            while (refusal is null && rows.Next())
            {
                refusal = Take(rows);
                while (ended.TryDequeue(out var recording))
                {
                    yield return recording;
                }
            }

            refusal ??= rows.Fault ?? TooManyBad();
        }

        if (refusal is not null)
        {
            File = Refused(refusal);
            yield break;
        }

        foreach (var subject in subjects.InOrder.Where(one => one.Samples.Count > 0).TakeWhile(_ => recordings <= Most))
        {
            HandOn(subject);
            while (ended.TryDequeue(out var recording))
            {
                yield return recording;
            }
        }

        File = recordings <= Most
            ? new("csv", FileType: null, layout.Name, [], [.. leftOut, .. problems.Close(), .. clock.Warnings()])
            : Refused(TooManyRecordings());
    }

    /// <summary>Null where reading can go on, else why the file cannot be used.</summary>
    private Problem? Take(CsvRows rows)
    {
        if ((openRows >= RowsHeld || recordings > Most) && HoldsNothing(rows))
        {
            return null;
        }

        if (openRows >= RowsHeld && MakeRoom(rows) is { } full)
        {
            return full;
        }

        if (recordings > Most)
        {
            return TooManyRecordings();
        }

        return ReadRow(rows) is { } problem && !HoldsNothing(rows) ? PutAside(rows, problem) : null;
    }

    /// <summary>
    /// Hands on what has ended: first all sessions but the one of each person that the last row is of, then those of people who seem to be gone. A session that
    /// fills the memory alone is left out.
    /// </summary>
    private Problem? MakeRoom(CsvRows rows)
    {
        if (handingOn == HandingOn.AtTheEnd)
        {
            return Refusal($"more than {RowsHeld} rows", rows.Line);
        }

        IsLong = true;
        foreach (var subject in subjects.InOrder.Where(one => one.HasGap))
        {
            openRows -= subject.Samples.Count;
            HandOn(subject, subject.EndAllButLast(Most - recordings));
            openRows += subject.Samples.Count;
        }

        if (IsFull)
        {
            subjects.InOrder.Where(one => one.Samples.Count > 0 && IsGone(one)).ToList().ForEach(HandOn);
        }

        if (IsFull && subjects.InOrder.MaxBy(one => one.Samples.Count) is { } longest && longest.Samples.Count >= RowsHeld / 2)
        {
            LeaveOut(longest, rows);
        }

        return IsFull ? Refusal($"more than {RowsHeld} rows of sessions that are under way at the same time: cut the file by person or by time", rows.Line) : null;
    }

    private bool IsFull => openRows > RowsHeld - RoomWanted;

    /// <summary>Whether no row of a person has come for long, although time went on, or although rows stand person by person.</summary>
    private bool IsGone(SampleSubject subject) => goodRows - subject.LastRow > RowsOfAbsence
        && (Math.Abs(before!.LastTime - subject.LastTime) > SessionGaps.LongestMilliseconds || changes - subject.LastChange <= subjects.InOrder.Count);

    private void LeaveOut(SampleSubject subject, CsvRows rows)
    {
        var whose = subject.Name is { } name ? $" of {name}" : "";
        var start = Instant.FromUnixTimeMilliseconds(subject.Samples.Earliest!.Value);
        leftOut.Add(Refusal($"the recording{whose} that begins at {InstantPattern.General.Format(start)} is left out: {subject.Samples.Count} rows until here without a pause of 60 min are too many to be held", rows.Line));
        openRows -= subject.Samples.Count;
        subject.LeaveOut();
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

        if (subjects.Of(rows, out var problem) is not { } subject || clock.Read(rows, subject.Clock, out problem) is not { } time)
        {
            return problem;
        }

        var milliseconds = time.ToUnixTimeMilliseconds();
        if ((problem = readings.Take(rows) ?? TooLate(rows, subject, milliseconds)) is not null)
        {
            return problem;
        }

        if (sport.Take(rows) is { } doubt)
        {
            problems.Add(doubt);
        }

        clock.Accept(time, subject.Clock, rows);
        goodRows++;
        changes += before == subject ? 0 : 1;
        before = subject;
        Add(subject, milliseconds);
        return null;
    }

    private void Add(SampleSubject subject, long time)
    {
        if (handingOn == HandingOn.AsTheyEnd && subject.Name is not null && subject.IsBeyond(time))
        {
            HandOn(subject);
        }

        if (subject.Add(time, readings.Values, goodRows, changes))
        {
            openRows++;
        }
    }

    /// <summary>Not null for a row of a session that is gone.</summary>
    private static Problem? TooLate(CsvRows rows, SampleSubject subject, long time) => subject.IsGone(time)
        ? Refusal("of a session whose rows had come to an end above: a file so large is read in the order of its sessions", rows.Line)
        : null;

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

    /// <summary>All that is held of a person. Rows of a file without names are one recording as long as they can be held.</summary>
    private void HandOn(SampleSubject subject)
    {
        openRows -= subject.Samples.Count;
        HandOn(subject, subject.End(IsLong || subject.Name is not null ? Most - recordings : null));
    }

    private void HandOn(SampleSubject subject, IEnumerable<SampleSeries> sessions)
    {
        foreach (var series in sessions)
        {
            ended.Enqueue(ToRecording(++recordings, subject, series));
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
        return new("csv", FileType: null, layout.Name, [], [refusal, .. leftOut, .. problems.Close()]);
    }

    private Problem TooManyRecordings() =>
        new(ProblemSeverity.Error, $"more than {Most} recordings: too many rows lie more than 60 min apart");

    private Problem WrongCount(CsvRows rows) => Refusal($"{rows.CellCount} cells for {table.Names.Count} columns", rows.Line);

    private static Problem Refusal(string reason, long line) => new(ProblemSeverity.Error, reason, Line: line);
}

/// <summary>When the recordings of a file leave it.</summary>
internal enum HandingOn
{
    /// <summary>Once all rows are read; a file with more of them than can be held is refused.</summary>
    AtTheEnd,

    /// <summary>The same, but of a file with more rows those that have ended as soon as room is wanted.</summary>
    WhenFull,

    /// <summary>Those of named people with the first row of their next.</summary>
    AsTheyEnd,
}
