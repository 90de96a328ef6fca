using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Reads FIT files. A part that is cut or damaged is refused with the place of the fault and gives no recording; whole parts stand. Whatever the
/// bytes, the answer is a value.
/// </summary>
public sealed class FitDecoder
{
    internal const int ActivityType = 4;
    internal const int UnknownExercise = 65534;
    private const int MostProblems = 16;
    private readonly ReadOnlyMemory<byte> bytes;
    private readonly MemoryBudget budget;
    private readonly List<Recording> recordings = [];
    private readonly List<Problem> problems = [];
    private readonly List<int?> fileTypes = [];
    private readonly List<Recording> worn = [];
    private readonly List<LocalDate> wornDates = [];
    private PartContent? pending;
    private bool isBehindDamage;

    private readonly bool salvages;

    private FitDecoder(ReadOnlyMemory<byte> bytes, bool salvages)
    {
        this.bytes = bytes;
        this.salvages = salvages;
        budget = new MemoryBudget(bytes.Length);
    }

    /// <summary>Whether the bytes begin with the header of a FIT file; whether the file is whole is another question.</summary>
    public static bool LooksLikeFit(ReadOnlySpan<byte> bytes) => FitFrame.HasHeader(bytes);

    /// <summary>Whether the file is whole by its own sizes and checksums.</summary>
    public static FitCompleteness CheckCompleteness(ReadOnlySpan<byte> bytes)
    {
        var offset = 0;
        while (offset < bytes.Length)
        {
            if (!FitFrame.HasHeader(bytes[offset..]) || FitFrame.At(bytes, offset) is var frame && frame.Check(bytes) is not null)
                return FitCompleteness.Suspect;

            offset = (int)frame.End;
        }

        return bytes.IsEmpty ? FitCompleteness.Suspect : FitCompleteness.Complete;
    }

    /// <summary>The recordings of a file, one per session, and what was wrong with it. Never throws for what the bytes hold.</summary>
    /// <param name="salvages">Whether what lies before the end of a part that was cut off or never closed is used.</param>
    public static DecodedFile Decode(ReadOnlyMemory<byte> bytes, bool salvages = false) => new FitDecoder(bytes, salvages).Decode();

    private DecodedFile Decode()
    {
        if (bytes.Length < FitFrame.ShortHeader + FitFrame.CrcSize)
            problems.Add(new Problem(ProblemSeverity.Error, $"too small for a FIT file: {bytes.Length} bytes", 0));
        else
            ReadParts();

        Settle();
        var decoded = new DecodedFile("fit", FileType(), SourceName: null, recordings, problems);
        return worn.Count == 0 ? decoded : decoded with { Table = WornDays.Table(wornDates), Worn = worn };
    }

    private void ReadParts()
    {
        for (long offset = 0; offset < bytes.Length;)
        {
            if (problems.Count >= MostProblems)
            {
                problems.Add(new Problem(ProblemSeverity.Error, $"after {MostProblems} damaged parts the rest is not read", offset));
                return;
            }

            if (!FitFrame.HasHeader(bytes.Span[(int)offset..]))
            {
                NoteStray(offset);
                return;
            }

            offset = ReadPart(FitFrame.At(bytes.Span, (int)offset));
        }
    }

    private void NoteStray(long offset)
    {
        if (offset == 0)
            problems.Add(new Problem(ProblemSeverity.Error, "not a FIT header", 0));
        else if (problems.TrueForAll(problem => problem.Severity == ProblemSeverity.Warning))
            problems.Add(new Problem(ProblemSeverity.Warning, $"{bytes.Length - offset} bytes behind the last whole part, no FIT header", offset));
    }

    /// <summary>Takes a part up, and answers where the next may begin.</summary>
    private long ReadPart(FitFrame frame)
    {
        var reader = new FitPartReader(budget);
        var fault = frame.Check(bytes.Span)
            ?? reader.Read(bytes.Span[frame.DataStart..(int)frame.DataEnd], frame.DataStart);
        if (fault is null)
            Take(reader.Content, frame.Offset);
        else if (salvages && FitSalvage.Read(reader, frame, bytes.Span))
            TakeCutOff(reader.Content, fault, frame.Offset);
        else
            Refuse(fault);

        if (reader.Content != pending)
            reader.Content.Return();

        return fault is not null && frame.IsUnclosed(bytes.Span) ? bytes.Length : frame.End;
    }

    private void TakeCutOff(PartContent content, Problem fault, long offset)
    {
        content.CutOff = fault.Reason;
        problems.Add(fault with { Severity = ProblemSeverity.Warning, Reason = $"{fault.Reason}; what lies before is used" });
        Take(content, offset);
    }

    private void Refuse(Problem fault)
    {
        Settle();
        isBehindDamage = true;
        problems.Add(fault);
    }

    /// <summary>Beats in parts of their own belong to the activity before them, so an activity waits for the part behind it.</summary>
    private void Take(PartContent content, long offset)
    {
        fileTypes.Add(content.FileType);
        if (content.HasOnlyBeats && pending is null)
        {
            var reason = isBehindDamage
                ? "heart beats behind a damaged part are not used: whether they belong to it cannot be told"
                : "heart beats without an activity before them";
            problems.Add(new Problem(ProblemSeverity.Warning, reason, offset));
        }
        else if (content.HasOnlyBeats)
            pending!.Late.Beats.AddRange(content.Late.Beats);
        else if (content.HasTraining)
        {
            Settle();
            budget.Spend(content.Sessions.Count == 0 ? PartContent.SessionCost : 0);
            pending = content;
            isBehindDamage = false;
        }
        else if (!content.Monitoring.IsEmpty)
            TakeMonitoring(content);
    }

    /// <summary>The log of a day or more: its walks and runs, and the dates on which the watch was worn without any (I-6).</summary>
    private void TakeMonitoring(PartContent content)
    {
        Settle();
        var bouts = MonitoredBouts.Of(content, recordings.Count + 1).ToList();
        recordings.AddRange(bouts);
        var dates = WornDays.Of(content, bouts);
        wornDates.AddRange(dates);
        worn.AddRange(WornDays.Witnesses(content, dates));
    }

    private void Settle()
    {
        if (pending is { } content)
        {
            recordings.AddRange(PartRecordings.Of(content, recordings.Count + 1));
            content.Return();
        }

        pending = null;
    }

    private string? FileType()
    {
        var type = fileTypes.Contains(ActivityType) ? ActivityType : fileTypes.FirstOrDefault();
        return type is { } number ? FitWords.FileTypes[number] : null;
    }
}
