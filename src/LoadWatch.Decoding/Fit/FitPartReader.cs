using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>Reads the messages of one part in one pass.</summary>
internal sealed class FitPartReader
{
    private const int LocalTypes = 16;
    private const int CompressedBit = 0x80;
    private const int DefinitionBit = 0x40;
    private const int DeveloperBit = 0x20;
    private readonly MessagePlan?[] live = new MessagePlan?[LocalTypes];
    private readonly DeveloperFields developer = new();
    private readonly PlanBook plans = PlanBook.OfThread;
    private readonly MemoryBudget budget;
    private uint? clock;
    private string? fault;

    public FitPartReader(MemoryBudget budget)
    {
        this.budget = budget;
        Content = new PartContent(budget, developer);
    }

    public PartContent Content { get; }

    /// <summary>Whether a definition or message ran past the end of the data: all before it is whole.</summary>
    public bool RanOut { get; private set; }

    /// <summary>Reads the data of a part; what stopped it is the answer, or null.</summary>
    /// <param name="offset">Where the data begins in the file.</param>
    public Problem? Read(ReadOnlySpan<byte> data, long offset)
    {
        for (var at = 0; at < data.Length;)
        {
            var length = (data[at] & (CompressedBit | DefinitionBit)) == DefinitionBit ? Define(data[at..]) : ReadData(data[at..]);
            if (fault is not null)
                return new Problem(ProblemSeverity.Error, fault, offset + at);

            at += length;
        }

        return null;
    }

    private int Define(ReadOnlySpan<byte> bytes)
    {
        var size = DefinitionSize(bytes);
        if (size > bytes.Length)
            return RunOut("a definition runs past the end of the data");

        live[bytes[0] & 0xF] = plans.Get(bytes[1..size]);
        return size;
    }

    /// <summary>Bytes of the definition at the front, header included; more than there are if it is not whole.</summary>
    private static int DefinitionSize(ReadOnlySpan<byte> bytes)
    {
        var size = 1 + PlanCompiler.FixedSize;
        if (bytes.Length < size)
            return size;

        size += bytes[PlanCompiler.FixedSize] * PlanCompiler.FieldSize;
        if ((bytes[0] & DeveloperBit) == 0)
            return size;

        return bytes.Length <= size ? size + 1 : size + 1 + (bytes[size] * PlanCompiler.FieldSize);
    }

    private int ReadData(ReadOnlySpan<byte> bytes)
    {
        var header = bytes[0];
        var isCompressed = (header & CompressedBit) != 0;
        var local = isCompressed ? (header >> 5) & 3 : header & 0xF;
        if (live[local] is not { } plan)
            return Fail($"local message type {local} is not defined");

        if (plan.PayloadSize >= bytes.Length)
            return RunOut("a message runs past the end of the data");

        if (plan.IsPassedOver && !isCompressed)
            return PassOver(plan, bytes);

        if (plan.IsColumnar && !isCompressed && RecordRun.Begins(plan, bytes))
            return ReadRun(new RecordRun(plan, bytes));

        var payload = bytes.Slice(1, plan.PayloadSize);
        var seconds = plan.Timestamp(payload) ?? (isCompressed ? Advanced(header & 0x1F) : null);
        clock = seconds ?? clock;
        Take(plan, payload, seconds * 1000L);
        return 1 + plan.PayloadSize;
    }

    /// <summary>Messages of one definition that follow each other; only their times matter.</summary>
    private int PassOver(MessagePlan plan, ReadOnlySpan<byte> bytes)
    {
        var (header, stride, at) = (bytes[0], 1 + plan.PayloadSize, 0);
        do
        {
            if (plan.TimestampOffset >= 0)
                clock = plan.Timestamp(bytes[(at + 1)..]) ?? clock;

            at += stride;
        }
        while (at + stride <= bytes.Length && bytes[at] == header);

        return at;
    }

    private int ReadRun(in RecordRun run)
    {
        Content.Samples.Add(run);
        clock = run.LastTimestamp ?? clock;
        CheckBudget();
        return run.Length;
    }

    /// <summary>The clock moved on to the next time with these low five bits.</summary>
    private uint? Advanced(int lowBits) => clock is { } now ? unchecked(now + (((uint)lowBits - now) & 0x1F)) : null;

    private void Take(MessagePlan plan, ReadOnlySpan<byte> payload, long? time)
    {
        if (plan.Message == FitMessages.Record)
        {
            plan.Bind(developer);
            Content.Samples.Add(plan, payload, time ?? SampleSeries.Undated);
        }
        else if (plan.Message == FitMessages.FieldDescription)
            developer.Describe(new FitMessage(plan, payload));
        else if (FitMessages.IsRead(plan.Message))
            Content.Read(new FitMessage(plan, payload), plan.Message, plan.Message == FitMessages.BeatIntervals ? clock * 1000L : time);

        CheckBudget();
    }

    private void CheckBudget()
    {
        if (budget.Overspent)
            fault = "more messages than a file of this size can hold in reason";
    }

    private int RunOut(string reason)
    {
        RanOut = true;
        return Fail(reason);
    }

    private int Fail(string reason)
    {
        fault = reason;
        return 0;
    }
}
