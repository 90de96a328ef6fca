using System.Numerics;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>The record messages of a part as columns, in file order.</summary>
internal sealed class SampleColumns
{
    private static readonly int ChannelCount = Enum.GetValues<Channel>().Length;
    private readonly SparseColumn<long> times;
    private readonly SparseColumn<double>[] channels;
    private readonly MemoryBudget budget;
    private SparseColumn<double>[]? shadowed;
    private PackedSpeedDistance packed;

    /// <summary>Bits of the columns that hold a value.</summary>
    private int begun;

    /// <summary>Of a row in the columns that are handed out, each of which has all rows; the blocks that they are copied from are spent as they are lent.</summary>
    private int rowBytes = sizeof(long);

    public SampleColumns(MemoryBudget budget)
    {
        this.budget = budget;
        times = new(SampleSeries.Undated, budget);
        channels = Empty();
    }

    public int Count { get; private set; }

    /// <summary>Milliseconds of the FIT epoch or of the device's uptime, or <see cref="SampleSeries.Undated"/>.</summary>
    public SparseColumn<long> Times => times;

    public SparseColumn<double> this[Channel channel] => channels[(int)channel];

    /// <summary>What developer fields hold where a channel of the row is filled already; null where they never do.</summary>
    public SparseColumn<double>? Shadowed(Channel channel) => shadowed?[(int)channel] is { IsEmpty: false } column ? column : null;

    /// <summary>Adds a row. A channel takes the first of its sources that holds a value.</summary>
    public void Add(MessagePlan plan, ReadOnlySpan<byte> payload, long time)
    {
        var row = Count++;
        times.Set(row, time);
        var filled = Fill(plan.Native, plan, payload, row, 0);
        if (Filled(filled, Channel.Distance))
            packed.Restart(this[Channel.Distance][row]);

        if (plan.PackedOffset >= 0)
            filled = Unpack(payload.Slice(plan.PackedOffset, PackedSpeedDistance.Size), row, filled);

        if (plan.Developer.Length > 0)
            filled = FillByDeveloper(plan, payload, row, filled);

        Spend(1, filled);
    }

    /// <summary>Adds the rows of a run, each channel of which has one source.</summary>
    public void Add(in RecordRun run)
    {
        for (var row = 0; row < run.Rows; row++)
            times.Set(Count + row, run.Timestamp(row) is { } seconds ? seconds * 1000L : SampleSeries.Undated);

        var filled = 0;
        foreach (ref readonly var source in run.Sources)
        {
            var last = run.Read(source, channels[(int)source.Channel], Count);
            if (!double.IsFinite(last))
                continue;

            filled |= 1 << (int)source.Channel;
            if (source.Channel == Channel.Distance)
                packed.Restart(last);
        }

        Count += run.Rows;
        Spend(run.Rows, filled);
    }

    /// <summary>Gives all memory back; the columns are empty then.</summary>
    public void Return()
    {
        times.Return();
        Array.ForEach(channels, channel => channel.Return());
        Array.ForEach(shadowed ?? [], channel => channel.Return());
        Count = 0;
    }

    private SparseColumn<double>[] Empty()
    {
        var columns = new SparseColumn<double>[ChannelCount];
        for (var i = 0; i < columns.Length; i++)
            columns[i] = new(double.NaN, budget);

        return columns;
    }

    /// <summary>A column that begins late takes the rows before it too.</summary>
    private void Spend(int rows, int filled)
    {
        budget.Spend((long)rows * rowBytes);
        if ((filled & ~begun) is not (not 0 and var more))
            return;

        var bytes = BitOperations.PopCount((uint)more) * sizeof(double);
        budget.Spend((long)Count * bytes);
        rowBytes += bytes;
        begun |= more;
    }

    private int Fill(ChannelSource[] sources, MessagePlan plan, ReadOnlySpan<byte> payload, int row, int filled)
    {
        foreach (ref readonly var source in sources.AsSpan())
        {
            if (!Filled(filled, source.Channel) && source.Read(payload, plan.BigEndian) is var value && double.IsFinite(value))
                filled |= Set(source.Channel, row, value);
        }

        return filled;
    }

    private int FillByDeveloper(MessagePlan plan, ReadOnlySpan<byte> payload, int row, int filled)
    {
        foreach (ref readonly var source in plan.Developer.AsSpan())
        {
            var value = source.Read(payload, plan.BigEndian);
            if (!double.IsFinite(value))
                continue;

            if (Filled(filled, source.Channel))
                (shadowed ??= Empty())[(int)source.Channel].Set(row, value);
            else
                filled |= Set(source.Channel, row, value);
        }

        return filled;
    }

    private int Unpack(ReadOnlySpan<byte> bytes, int row, int filled)
    {
        if (!PackedSpeedDistance.IsValid(bytes))
            return filled;

        if (!Filled(filled, Channel.Speed))
            filled |= Set(Channel.Speed, row, PackedSpeedDistance.SpeedMetresPerSecond(bytes));

        if (!Filled(filled, Channel.Distance))
            filled |= Set(Channel.Distance, row, packed.Advance(bytes));

        return filled;
    }

    private static bool Filled(int filled, Channel channel) => (filled & (1 << (int)channel)) != 0;

    private int Set(Channel channel, int row, double value)
    {
        channels[(int)channel].Set(row, value);
        return 1 << (int)channel;
    }
}
