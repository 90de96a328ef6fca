using System.Buffers.Binary;
using LoadWatch.Decoding.References;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Files that were changed on purpose, and files that follow the grammar of the format with contents that no device writes. By a number, always the same.</summary>
internal static class HostileParts
{
    private static readonly byte[] Edges = [0, 1, 2, 3, 4, 0x0D, 0x0E, 0x10, 0x20, 0x40, 0x60, 0x7F, 0x80, 0xE0, 0xFD, 0xFE, 0xFF];
    private static readonly int[] Messages = [0, 12, 18, 19, 20, 20, 20, 21, 23, 34, 55, 78, 101, 103, 132, 162, 206, 207, 225, 0xFF00];
    private static readonly byte[] Types = [0, 1, 2, 0x83, 0x84, 0x85, 0x86, 7, 0x88, 0x89, 0x0A, 0x8B, 0x8C, 0x0D, 0x8E, 0x8F, 0x90, 0x11, 0xFF, 4, 6];

    /// <summary>Of fields above the first twelve that are read: wide ones, of developer fields, of monitoring, types of sets.</summary>
    private static readonly byte[] HighFields = [14, 15, 24, 26, 27, 73, 78];

    /// <summary>Fields (number, bytes, type) as devices define them, of messages that say little unless several of their fields are there.</summary>
    private static readonly Dictionary<int, (byte Number, byte Size, byte Type)[]> Usual = new()
    {
        [18] = [(2, 4, 0x86), (5, 1, 0), (6, 1, 0), (7, 4, 0x86), (8, 4, 0x88), (9, 4, 0x86)],
        [20] = [(253, 4, 0x86), (2, 2, 0x84), (3, 1, 2), (5, 4, 0x86), (7, 2, 0x84), (8, 3, 0x0D), (73, 4, 0x86), (78, 4, 0x86)],
        [55] = [(253, 4, 0x86), (26, 2, 0x84), (24, 1, 0x0D), (5, 1, 0), (3, 4, 0x86), (27, 1, 2)],
        [103] = [(253, 4, 0x86), (0, 4, 0x86)],
        [132] = [(253, 4, 0x86), (0, 2, 0x84), (9, 4, 0x86), (6, 8, 2), (10, 12, 0x0D)],
        [206] = [(0, 1, 2), (1, 1, 2), (2, 1, 2), (6, 1, 2), (8, 4, 7), (14, 2, 0x84), (15, 1, 2)],
        [225] = [(254, 4, 0x86), (6, 4, 0x86), (0, 4, 0x86), (3, 2, 0x84), (4, 2, 0x84), (5, 1, 2), (7, 4, 0x84)],
    };
    private static readonly byte[][] Seeds =
    [
        .. FitVectors.All,
        .. Enumerable.Range(0, 48).Select(number => GeneratedPart.Make(number, (GeneratedStyle)(number % 3))),
        [.. Parts.Activity(), .. Parts.Activity()],
        Walk(),
        WornDay(),
        [.. Parts.Activity(), .. Beats()],
        Stated(),
    ];

    /// <summary>What changed files were.</summary>
    public static IReadOnlyList<byte[]> AllSeeds => Seeds;

    /// <summary>A whole file after a few changes; most have right sizes and checksums again, so that the changes reach the messages.</summary>
    public static byte[] Mutated(uint number)
    {
        var random = new Random(unchecked((int)number));
        var bytes = new List<byte>(Seeds[random.Next(Seeds.Length)]);
        for (var changes = 1 << random.Next(5); changes > 0 && bytes.Count > 0; changes--)
            Change(bytes, random);

        return random.Next(8) == 0 || bytes.Count < 16 ? [.. bytes] : Closed([.. bytes]);
    }

    /// <summary>Definitions and messages of the kinds that are read, in any order, with any layout and any values; right sizes and checksums.</summary>
    public static byte[] Grammatical(uint number)
    {
        var random = new Random(unchecked((int)number));
        var bytes = new List<byte>(Header());
        var sizes = new int?[16];
        for (var messages = random.Next(1, 60); messages > 0; messages--)
        {
            var local = random.Next(random.Next(2) == 0 ? 3 : 16);
            if (sizes[local] is { } size && random.Next(5) > 0)
                Message(bytes, random, local, size);
            else
                sizes[local] = Define(bytes, random, local);
        }

        return Closed([.. bytes, 0, 0]);
    }

    /// <summary>A day's log by short times: a walk of a quarter of an hour with heart rates.</summary>
    private static byte[] Walk()
    {
        var part = Log().Define(1, new(55, new(26, Unsigned16), new(24, Bytes), new(3, Unsigned32))).Define(2, new(55, new(26, Unsigned16), new(27, Unsigned8)));
        for (var minute = 0; minute <= 15; minute++)
            part.Message(1, (Parts.Base + (60 * minute)) & 0xFFFF, 6 | 0x60, 100 * minute).Message(2, (Parts.Base + (60 * minute)) & 0xFFFF, 90 + minute);

        return part.ToBytes();
    }

    /// <summary>A day's log by full times without a step.</summary>
    private static byte[] WornDay()
    {
        var part = Log().Define(1, new(55, new(253, Unsigned32), new(27, Unsigned8)));
        for (var hour = 0; hour < 20; hour++)
            part.Message(1, Parts.Base + (3600 * hour), 60);

        return part.ToBytes();
    }

    private static FitPartWriter Log() =>
        Parts.Begin(fileType: 32).Define(0, new(103, new(253, Unsigned32), new(0, Unsigned32))).Message(0, Parts.Base, Parts.Base + 3600);

    /// <summary>A strap's beats in a part of their own.</summary>
    private static byte[] Beats() => new FitPartWriter()
        .Define(0, new(132, new(253, Unsigned32), new(0, Unsigned16), new(9, Unsigned32), new(6, Unsigned8))).Message(0, Parts.Base, 16_384, 0x0FF0, 70)
        .Define(1, new(132, new(6, Unsigned8, 8), new(10, Bytes, 12)))
        .Message(1, FitValue.Many(71, 72, 73, 74, 75, 76, 77, 78), FitValue.Many(0xEA, 0x40, 0x1E, 0xDE, 0x82, 0x3C, 0xD2, 0xC5, 0x5A, 0xC6, 0x06, 0x79))
        .ToBytes();

    /// <summary>Power and totals by developer fields, beside the device's own and instead of them.</summary>
    private static byte[] Stated() => Parts.Begin()
        .Define(2, new(206, new(0, Unsigned8), new(1, Unsigned8), new(2, Unsigned8), new(6, Unsigned8), new(8, Text, 4), new(14, Unsigned16), new(15, Unsigned8)))
        .Message(2, 0, 0, 0x84, FitValue.None, "W", 20, 7).Message(2, 0, 1, 0x88, FitValue.None, "s", 18, 7).Message(2, 0, 2, 0x86, 10, "km", 18, 9)
        .Define(0, new(20, new(253, Unsigned32), new(73, Unsigned32), new(78, Unsigned32), new(7, Unsigned16)) { Developer = [new(0, Unsigned16, 0)] })
        .Message(0, Parts.Base, 3000, 2600, 200, 230).Message(0, Parts.Base + 1, 3100, 2601, FitValue.None, 240)
        .Define(1, new(18, new(2, Unsigned32), new(7, Unsigned32), new(9, Unsigned32)) { Developer = [new(1, Real32, 0), new(2, Unsigned32, 0)] })
        .Message(1, Parts.Base, 1000, FitValue.None, 1.5, 20)
        .ToBytes();

    private static byte[] Header() => [14, 0x20, 0, 0, 0, 0, 0, 0, .. ".FIT"u8, 0, 0];

    private static void Message(List<byte> bytes, Random random, int local, int size)
    {
        bytes.Add((byte)(local < 4 && random.Next(3) == 0 ? 0x80 | (local << 5) | random.Next(32) : local));
        for (var i = 0; i < size; i++)
            bytes.Add(random.Next(3) == 0 ? Edges[random.Next(Edges.Length)] : (byte)random.Next(256));
    }

    private static int Define(List<byte> bytes, Random random, int local)
    {
        var (message, big, developer) = (Messages[random.Next(Messages.Length)], random.Next(2), random.Next(4) == 0);
        bytes.AddRange([(byte)(0x40 | (developer ? 0x20 : 0) | local), 0, (byte)big]);
        bytes.AddRange(big != 0 ? [(byte)(message >> 8), (byte)(message & 0xFF)] : [(byte)(message & 0xFF), (byte)(message >> 8)]);
        return (Usual.TryGetValue(message, out var usual) && random.Next(2) == 0 ? UsualFields(bytes, random, usual) : Fields(bytes, random, native: true))
            + (developer ? Fields(bytes, random, native: false) : 0);
    }

    /// <summary>Most of the usual ones, in any order.</summary>
    private static int UsualFields(List<byte> bytes, Random random, (byte Number, byte Size, byte Type)[] usual)
    {
        var fields = usual.Where(_ => random.Next(6) > 0).OrderBy(_ => random.Next()).ToList();
        bytes.Add((byte)fields.Count);
        fields.ForEach(field => bytes.AddRange([field.Number, field.Size, field.Type]));
        return fields.Sum(field => field.Size);
    }

    private static int Fields(List<byte> bytes, Random random, bool native)
    {
        var (count, total) = (random.Next(8), 0);
        bytes.Add((byte)count);
        for (var i = 0; i < count; i++)
        {
            var size = random.Next(6) == 0 ? random.Next(256) : 1 << random.Next(4);
            var number = random.Next(8) switch
            {
                0 or 1 => random.Next(250, 256),
                2 or 3 when native => HighFields[random.Next(HighFields.Length)],
                _ => random.Next(12),
            };
            bytes.AddRange([(byte)number, (byte)size, native ? Types[random.Next(Types.Length)] : (byte)random.Next(2)]);
            total += size;
        }

        return total;
    }

    private static void Change(List<byte> bytes, Random random)
    {
        var at = random.Next(bytes.Count);
        var count = Math.Min(random.Next(1, 40), bytes.Count - at);
        switch (random.Next(6))
        {
            case 0:
                bytes[at] ^= (byte)(1 << random.Next(8));
                break;
            case 1:
                bytes[at] = Edges[random.Next(Edges.Length)];
                break;
            case 2:
                bytes.RemoveRange(at, count);
                break;
            case 3:
                bytes.InsertRange(at, bytes.GetRange(at, count));
                break;
            case 4:
                bytes.InsertRange(at, Seeds[random.Next(Seeds.Length)].Take(random.Next(200)));
                break;
            default:
                bytes[at] = (byte)random.Next(256);
                break;
        }
    }

    /// <summary>The bytes as one part: the size and the checksum set right.</summary>
    private static byte[] Closed(byte[] part)
    {
        Header().CopyTo(part, 0);
        BinaryPrimitives.WriteInt32LittleEndian(part.AsSpan(4), part.Length - 16);
        BinaryPrimitives.WriteUInt16LittleEndian(part.AsSpan(part.Length - 2), FitCrc.Of(part.AsSpan(..^2)));
        return part;
    }
}
