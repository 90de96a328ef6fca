using System.Buffers.Binary;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Record messages of one definition that follow each other, read field by field rather than message by message: so the type of a field is asked once for
/// all of them.
/// </summary>
internal readonly ref struct RecordRun
{
    /// <summary>No longer, so that the memory budget is looked at from time to time.</summary>
    private const int MostRows = 2048;

    private readonly MessagePlan plan;
    private readonly ReadOnlySpan<byte> messages;
    private readonly int stride;

    /// <param name="bytes">At least one whole message is in front; those with the same header behind it belong to the run.</param>
    public RecordRun(MessagePlan plan, ReadOnlySpan<byte> bytes)
    {
        this.plan = plan;
        stride = 1 + plan.PayloadSize;
        var most = Math.Min(MostRows, bytes.Length / stride);
        Rows = 1;
        while (Rows < most && bytes[Rows * stride] == bytes[0])
            Rows++;

        messages = bytes[..(Rows * stride)];
    }

    /// <summary>Whether the whole message in front is followed by another of its header.</summary>
    public static bool Begins(MessagePlan plan, ReadOnlySpan<byte> bytes) =>
        1 + plan.PayloadSize is var stride && bytes.Length >= 2 * stride && bytes[stride] == bytes[0];

    public int Rows { get; }

    public ReadOnlySpan<ChannelSource> Sources => plan.Native;

    /// <summary>Bytes of the run.</summary>
    public int Length => messages.Length;

    /// <summary>The last time that one of the messages states, seconds of the FIT epoch or of the device's uptime, or null.</summary>
    public uint? LastTimestamp
    {
        get
        {
            for (var row = Rows - 1; row >= 0; row--)
            {
                if (Timestamp(row) is { } seconds)
                    return seconds;
            }

            return null;
        }
    }

    public uint? Timestamp(int row) => plan.Timestamp(messages[((row * stride) + 1)..]);

    /// <summary>Sets what the messages hold for a channel; the last value of them is the answer, NaN where there is none.</summary>
    public double Read(in ChannelSource source, SparseColumn<double> column, int firstRow) => (source.Width, plan.BigEndian) switch
    {
        (sizeof(byte), _) => Read<OneByte>(source, column, firstRow),
        (sizeof(ushort), false) => Read<TwoBytes>(source, column, firstRow),
        (sizeof(uint), false) => Read<FourBytes>(source, column, firstRow),
        _ => ReadAny(source, column, firstRow),
    };

    private double Read<TNumber>(in ChannelSource source, SparseColumn<double> column, int row)
        where TNumber : IWholeNumber
    {
        var (last, scale, shift) = (double.NaN, source.Scale, source.Shift);
        for (var at = 1 + source.Slot.Offset; at < messages.Length; at += stride)
        {
            var raw = TNumber.Read(messages[at..]);
            if (raw != TNumber.NoValue)
            {
                last = (raw / scale) - shift;
                column.Set(row, last);
            }

            row++;
        }

        return last;
    }

    private double ReadAny(in ChannelSource source, SparseColumn<double> column, int row)
    {
        var last = double.NaN;
        for (var at = 1; at < messages.Length; at += stride)
        {
            if (source.Read(messages[at..], plan.BigEndian) is var value && double.IsFinite(value))
            {
                last = value;
                column.Set(row, last);
            }

            row++;
        }

        return last;
    }

    /// <summary>The usual types, little-endian.</summary>
    private interface IWholeNumber
    {
        static abstract uint NoValue { get; }

        static abstract uint Read(ReadOnlySpan<byte> bytes);
    }

    private readonly struct OneByte : IWholeNumber
    {
        public static uint NoValue => byte.MaxValue;

        public static uint Read(ReadOnlySpan<byte> bytes) => bytes[0];
    }

    private readonly struct TwoBytes : IWholeNumber
    {
        public static uint NoValue => ushort.MaxValue;

        public static uint Read(ReadOnlySpan<byte> bytes) => BinaryPrimitives.ReadUInt16LittleEndian(bytes);
    }

    private readonly struct FourBytes : IWholeNumber
    {
        public static uint NoValue => uint.MaxValue;

        public static uint Read(ReadOnlySpan<byte> bytes) => BinaryPrimitives.ReadUInt32LittleEndian(bytes);
    }
}
