using System.Buffers.Binary;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Heart rates delivered in messages of their own. One message ties the strap's clock to a date (the anchor); the beats that follow carry the
/// strap's time, in full or as its low 12 bits, in 1/1024 s. The strap's clock runs over at 32 bits. Slots that were not filled are passed over.
/// </summary>
internal sealed class LateBeats(MemoryBudget budget)
{
    /// <summary>As it is read, as it is handed out, and what putting in order takes.</summary>
    private const int BeatCost = 80;
    private const int Mask = 0xFFF;
    private long? anchorTime;
    private uint anchorEvent;
    private uint eventTime;

    /// <summary>Beats in file order; their times are milliseconds of the FIT epoch or of the device's uptime.</summary>
    public PooledList<(long Time, int BeatsPerMinute)> Beats { get; } = new();

    public void Read(in FitMessage message)
    {
        var rates = message.Values(FitFields.HeartRate.BeatsPerMinute, 1);
        var full = message.Values(FitFields.HeartRate.EventTime, sizeof(uint));
        if (message.Time(FitFields.Timestamp) is { } time && message.UInt(FitFields.HeartRate.EventTime) is { } strapTime)
            Anchor(time + Fraction(message), strapTime);

        if (message.UInt(FitFields.HeartRate.EventTime) is not null)
            ReadFull(full, rates, message.BigEndian);
        else
            ReadPacked(message.Values(FitFields.HeartRate.EventTime12, 1), rates);
    }

    private static long Fraction(in FitMessage message) =>
        message.Int(FitFields.HeartRate.Fraction) is { } fine ? fine * 1000L / 32768
        : message.Int(FitFields.HeartRate.Fraction256) is { } coarse ? coarse * 1000L / 256
        : 0;

    private void Anchor(long time, uint strapTime) => (anchorTime, anchorEvent) = (time, strapTime);

    private void ReadFull(ReadOnlySpan<byte> times, ReadOnlySpan<byte> rates, bool bigEndian)
    {
        for (var i = 0; i < times.Length / sizeof(uint); i++)
        {
            if (FitNumber.UInt32(times[(i * sizeof(uint))..], bigEndian) is var written and not uint.MaxValue)
            {
                eventTime = written;
                Add(rates, i);
            }
        }
    }

    private void ReadPacked(ReadOnlySpan<byte> bytes, ReadOnlySpan<byte> rates)
    {
        for (var i = 0; i < bytes.Length * 2 / 3 && i < rates.Length; i++)
        {
            var pair = BinaryPrimitives.ReadUInt16LittleEndian(bytes[(i * 3 / 2)..]);
            var low = (uint)(i % 2 == 0 ? pair & Mask : pair >> 4);
            if (low != Mask || rates[i] != byte.MaxValue)
            {
                eventTime = unchecked(eventTime + ((low - eventTime) & Mask));
                Add(rates, i);
            }
        }
    }

    private void Add(ReadOnlySpan<byte> rates, int index)
    {
        if (anchorTime is not { } time || index >= rates.Length || rates[index] is 0 or byte.MaxValue)
            return;

        Beats.Add((time + (unchecked(eventTime - anchorEvent) * 1000L / 1024), rates[index]));
        budget.Spend(BeatCost);
    }
}
