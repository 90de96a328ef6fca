using LoadWatch.Decoding.Fit;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.References;

/// <summary>What a generated part may hold.</summary>
internal enum GeneratedStyle
{
    /// <summary>What every decoder should read: one byte order, full times, one field for one thing.</summary>
    Plain,

    /// <summary>Everything that the format knows.</summary>
    Usual,

    /// <summary>Also what decoders are known to read in different ways.</summary>
    Unusual,
}

/// <summary>
/// A legal part by a number: layouts, byte orders, redefinitions, compressed times, unknown messages, developer fields, sessions, sets, lengths and values up
/// to the ends of their range, in any mixture. The same number always gives the same bytes.
/// </summary>
internal sealed class GeneratedPart
{
    private static readonly FitFieldLayout[] Fields =
    [
        new(3, Unsigned8), new(7, Unsigned16), new(6, Unsigned16), new(73, Unsigned32), new(4, Unsigned8), new(5, Unsigned32), new(2, Unsigned16), new(78, Unsigned32),
        new(0, Signed32), new(1, Signed32), new(13, Signed8), new(53, Unsigned8), new(39, Unsigned16), new(200, Text, 7), new(201, Bytes, 3), new(202, Unsigned16, 0), new(203, Real64),
    ];

    /// <summary>Fields in a type, a size or a place that decoders are known to differ on.</summary>
    private static readonly FitFieldLayout[] Unusual =
    [
        new(8, Bytes, 3), new(3, Unsigned16), new(7, Unsigned32), new(6, Unsigned32), new(5, Real32), new(2, Signed32), new(78, Unsigned16), new(4, Unsigned8, 3), new(7, Unsigned16, 2), new(73, Unsigned64),
    ];

    /// <summary>Words by which a timer stops.</summary>
    private static readonly int[] Stops = [1, 4, 4, 8, 9];

    private readonly Random random;
    private readonly GeneratedStyle style;
    private readonly bool? order;
    private readonly bool hasFullTimes;
    private readonly FitPartWriter writer;
    private long now = 1_000_000_000;

    private GeneratedPart(int number, GeneratedStyle style, bool isEven)
    {
        random = new Random(number);
        this.style = style;
        hasFullTimes = isEven || style == GeneratedStyle.Plain;
        order = hasFullTimes ? OneIn(2) : null;
        now += random.Next(100_000_000);
        writer = new FitPartWriter((FitHeaderStyle)random.Next(3));
    }

    /// <param name="isEven">One byte order, and a full time in every record, whatever the style.</param>
    public static byte[] Make(int number, GeneratedStyle style, bool isEven = false) => new GeneratedPart(number, style, isEven).Write();

    private byte[] Write()
    {
        writer.Define(15, With(0, new(0, Enumeration), new(1, Unsigned16), new(2, Unsigned16), new(3, Unsigned32Z), new(4, Unsigned32)))
            .Message(15, 4, random.Next(1, 65535), random.Next(65535), 1 + random.Next(), now);
        if (random.Next(3) == 0)
            Describe();

        var summaryFirst = random.Next(4) == 0;
        if (summaryFirst)
            Summaries();

        for (var stretch = random.Next(1, 5); stretch > 0; stretch--)
            Records();

        if (!summaryFirst)
            Summaries();

        if (style != GeneratedStyle.Plain && OneIn(3))
            LateBeats();

        return writer.ToBytes();
    }

    private bool BigEndian => order ?? OneIn(3);

    private bool OneIn(int times) => random.Next(times) == 0;

    private FitDefinition With(int message, params FitFieldLayout[] fields) => new(message, fields) { BigEndian = BigEndian };

    private void Describe()
    {
        writer.Define(14, With(207, new(3, Unsigned8), new(1, Bytes, 16))).Message(14, 0, FitValue.None)
            .Define(14, With(206, new(0, Unsigned8), new(1, Unsigned8), new(2, Unsigned8), new(6, Unsigned8), new(3, Text, 16), new(8, Text, 8), new(14, Unsigned16), new(15, Unsigned8)));
        Description(0, 0x84, OneIn(2) ? 10 : FitValue.None, "Leg spring", "kN/m", FitValue.None, FitValue.None);
        if (style == GeneratedStyle.Unusual)
        {
            Description(1, 0x88, FitValue.None, "Power", "watts", 20, 7);
            Description(2, 0x02, FitValue.None, "heart_rate", "bpm", FitValue.None, FitValue.None);
        }
    }

    private void Description(int number, int type, FitValue scale, string name, string unit, FitValue message, FitValue field) =>
        writer.Message(14, 0, number, type, scale, name, unit, message, field);

    private void Records()
    {
        var local = random.Next(0, 14);
        var fields = Fields.Where(_ => OneIn(2)).OrderBy(_ => random.Next()).ToList();
        if (style == GeneratedStyle.Unusual)
            fields.AddRange(Unusual.Where(field => OneIn(4) && fields.TrueForAll(known => known.Number != field.Number)).DistinctBy(field => field.Number));

        if (style == GeneratedStyle.Plain)
            fields.RemoveAll(field => field.Number is 2 or 6);

        var compressed = !hasFullTimes && local < 4 && OneIn(2);
        var developer = OneIn(2) ? new FitDeveloperLayout[] { new(0, Unsigned16, 0), new(1, Real32, 0), new(2, Unsigned8, 0), new(9, Unsigned8, 3, 0) } : [];
        writer.Define((local + 1) % 14, With(20, new FitFieldLayout(253, Unsigned32))).Message((local + 1) % 14, now);
        var time = compressed ? [] : new[] { new FitFieldLayout(253, Unsigned32) };
        var definition = new FitDefinition(20, [.. time, .. fields]) { BigEndian = BigEndian, Developer = developer };
        writer.Define(local, definition);
        for (var row = random.Next(1, 40); row > 0; row--)
        {
            now += OneIn(5) ? random.Next(32) : 1;
            FitValue[] values = [.. fields.Select(Value), .. developer.Select(field => Value(new(field.Number, field.Type, field.Count)))];
            if (compressed)
                writer.Compressed(local, (int)(now & 31), values);
            else
                writer.Message(local, [!hasFullTimes && OneIn(50) ? FitValue.None : now, .. values]);

            if (OneIn(10))
                Stray();
        }
    }

    /// <summary>Messages between the records: one that no profile knows, a timer event, beat intervals.</summary>
    private void Stray()
    {
        switch (random.Next(3))
        {
            case 0:
                writer.Define(14, With(0xFF00 + random.Next(100), new(1, Unsigned32, 1 + random.Next(4)), new(2, Text, 3))).Message(14, random.Next(), "ab");
                break;
            case 1:
                writer.Define(14, With(21, new(253, Unsigned32), new(0, Enumeration), new(1, Enumeration))).Message(14, now, 0, OneIn(2) ? Stops[random.Next(Stops.Length)] : 0);
                break;
            default:
                writer.Define(14, With(78, new FitFieldLayout(0, Unsigned16, 5))).Message(14, FitValue.Many([random.Next(300, 2000), random.Next(300, 65535), null, null, null]));
                break;
        }
    }

    private void Summaries()
    {
        writer.Define(14, With(18, new(253, Unsigned32), new(2, Unsigned32), new(5, Enumeration), new(6, Enumeration), new(7, Unsigned32), new(8, Unsigned32), new(9, Unsigned32)));
        for (var sessions = random.Next(0, style == GeneratedStyle.Plain ? 2 : 3); sessions > 0; sessions--)
            writer.Message(14, now, now - random.Next(200), random.Next(0, 90), random.Next(0, 120), Number(Unsigned32), Number(Unsigned32), Number(Unsigned32));

        writer.Define(14, With(19, new(253, Unsigned32), new(2, Unsigned32))).Message(14, now, now);
        if (OneIn(3))
            writer.Define(13, With(101, new(253, Unsigned32), new(2, Unsigned32), new(7, Unsigned32), new(12, Enumeration))).Message(13, now, now, 25_000, 1).Message(13, now, now, 1, 0);

        if (OneIn(3))
            Sets();

        writer.Define(14, With(34, new(253, Unsigned32), new(1, Unsigned16), new(5, Unsigned32))).Message(14, now, 1, now + (900 * random.Next(-48, 56)));
    }

    /// <summary>Beats of a strap: one that ties its clock to a date, then eight at a time.</summary>
    private void LateBeats()
    {
        writer.Define(14, With(132, new(253, Unsigned32), new(0, Unsigned16), new(9, Unsigned32), new(6, Unsigned8))).Message(14, now, 0, random.Next(1_000_000), random.Next(40, 200));
        writer.Define(14, With(132, new(6, Unsigned8, 8), new(10, Bytes, 12)));
        for (var messages = random.Next(1, 4); messages > 0; messages--)
            writer.Message(14, Many(8, 40, 200), Many(12, 0, 255));
    }

    private FitValue Many(int count, int least, int end) => FitValue.Many([.. Enumerable.Range(0, count).Select(_ => (double?)random.Next(least, end))]);

    private void Sets()
    {
        writer.Define(14, With(225, new(254, Unsigned32), new(6, Unsigned32), new(0, Unsigned32), new(3, Unsigned16), new(4, Unsigned16), new(5, Unsigned8), new(7, Unsigned16, 2)));
        for (var sets = random.Next(1, 6); sets > 0; sets--)
        {
            writer.Message(14, now, OneIn(4) ? FitValue.None : now - sets, Number(Unsigned32), Number(Unsigned16), Number(Unsigned16), random.Next(2),
                FitValue.Many(OneIn(4) ? null : random.Next(0, 48), OneIn(2) ? null : random.Next(0, 48)));
        }
    }

    private FitValue Value(FitFieldLayout field) => field.Type switch
    {
        Text => new[] { "", "a", "abc", "Zug", "sieben7" }[random.Next(5)],
        _ when field.Count == 0 => FitValue.None,
        _ when field.Count > 1 => FitValue.Many([.. Enumerable.Range(0, random.Next(1, field.Count + 1)).Select(_ => Number(field.Type))]),
        _ when style == GeneratedStyle.Plain && field.Number is 73 or 78 => FitValue.Of(Number(Unsigned16)),
        _ => FitValue.Of(Number(field.Type)),
    };

    /// <summary>Any value of a type, often none or one at the ends of its range.</summary>
    private double? Number(FitBaseType type)
    {
        var (least, most) = type switch
        {
            Signed8 => (-128, 126),
            Signed32 => (int.MinValue, int.MaxValue - 1),
            Unsigned16 => (0, 65534),
            Unsigned32 => (0, uint.MaxValue - 1.0),
            Real32 or Real64 => (-1000, 1000),
            Unsigned64 => (0, 1e9),
            _ => (0, 254),
        };
        return random.Next(12) switch
        {
            0 => null,
            1 => least,
            2 => most,
            _ => type is Real32 or Real64 ? Math.Round(least + (random.NextDouble() * (most - least)), 3) : Math.Floor(least + (random.NextDouble() * (most - least))),
        };
    }
}
