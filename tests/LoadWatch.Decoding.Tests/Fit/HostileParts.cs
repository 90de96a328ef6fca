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
    private static readonly byte[][] Seeds =
    [
        .. FitVectors.All,
        .. Enumerable.Range(0, 48).Select(number => GeneratedPart.Make(number, (GeneratedStyle)(number % 3))),
        [.. Parts.Activity(), .. Parts.Activity()],
    ];

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
        return Fields(bytes, random, native: true) + (developer ? Fields(bytes, random, native: false) : 0);
    }

    private static int Fields(List<byte> bytes, Random random, bool native)
    {
        var (count, total) = (random.Next(8), 0);
        bytes.Add((byte)count);
        for (var i = 0; i < count; i++)
        {
            var size = random.Next(6) == 0 ? random.Next(256) : 1 << random.Next(4);
            var number = random.Next(4) == 0 ? random.Next(250, 256) : random.Next(12);
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
