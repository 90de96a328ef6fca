using System.Buffers.Binary;
using LoadWatch.Decoding.Fit;

namespace LoadWatch.Decoding.Tests.Limits;

/// <summary>FIT files that are accepted and make the decoder keep as much as it keeps of any file of their size; the rest of them is messages that nobody knows.</summary>
internal static class WorstFits
{
    /// <summary>A full minute in seconds of the FIT epoch.</summary>
    private const uint Start = 1_000_000_020;

    private const byte Local = 0;
    private const int Header = 14;

    /// <summary>A definition of one field and the header byte of its message.</summary>
    private const int Unknown = 10;
    private const int Rest = 64;

    private static byte[] OneRecord { get; } = [0x41, 0, 0, 20, 0, 1, 253, 4, 0x86, 1, .. BitConverter.GetBytes(Start)];

    private static byte[] Anchor { get; } = [0x42, 0, 0, 132, 0, 3, 253, 4, 0x86, 9, 4, 0x86, 6, 1, 2, 2, .. BitConverter.GetBytes(Start), 0, 0, 0, 0, 70];

    /// <summary>A record of heart rate, power, speed, cadence, distance and altitude, behind its definition; the message is the last 13 bytes.</summary>
    private static byte[] EveryChannel { get; } =
        [0x41, 0, 0, 20, 0, 6, 3, 1, 2, 7, 2, 0x84, 6, 2, 0x84, 4, 1, 2, 5, 4, 0x86, 2, 2, 0x84, 1, 90, 200, 0, 16, 39, 80, 0, 0, 1, 0, 0, 12];

    private static byte[] TwoSessions { get; } =
        [0x42, 0, 0, 18, 0, 1, 2, 4, 0x86, 2, .. BitConverter.GetBytes(Start), 2, .. BitConverter.GetBytes(Start + 1)];

    private static byte[] Zone { get; } = [0x43, 0, 0, 103, 0, 2, 253, 4, 0x86, 0, 4, 0x86, 3, .. BitConverter.GetBytes(Start), .. BitConverter.GetBytes(Start)];

    /// <summary>How much of what the decoder keeps at most they take.</summary>
    public const double Full = 0.97;

    /// <summary>Those of which no file holds as many as the decoder keeps.</summary>
    public static IReadOnlyList<string> LimitedBySize { get; } = ["records of two sessions by turns", "empty parts"];

    /// <summary>Each made for a number of bytes, and for a share of what the decoder keeps at most of a file of that size.</summary>
    public static IReadOnlyList<(string Name, Func<int, double, byte[]> Make)> All { get; } =
    [
        ("records that say nothing", (bytes, share) => Fullest(bytes, Messages(bytes, share, 16), [0x40, 0, 0, 20, 0, 0], _ => [Local])),
        ("records of two bytes", (bytes, share) => Fullest(bytes, Messages(bytes, share, 32), [0x40, 0, 0, 20, 0, 1, 3, 1, 2], _ => [Local, 90])),
        ("every channel once, then records that say nothing", (bytes, share) => Fullest(bytes, Messages(bytes, share, 64), [.. EveryChannel, 0x40, 0, 0, 20, 0, 0], _ => [Local])),
        ("records that say nothing, then every channel once", (bytes, share) => Fullest(
            bytes, Messages(bytes, share, 64), [0x40, 0, 0, 20, 0, 0, .. EveryChannel[..^13]], i => i == Messages(bytes, share, 64) - 1 ? EveryChannel[^13..] : [Local])),
        ("records of two sessions by turns", (bytes, share) => Fullest(
            bytes, Messages(bytes, share, 16), [.. TwoSessions, 0x40, 0, 0, 20, 0, 1, 253, 4, 0x86], i => [Local, .. BitConverter.GetBytes(Start + (uint)(i % 2))])),
        ("records with a developer's power beside their own", (bytes, share) => Fullest(
            bytes,
            Messages(bytes, share, 40),
            [
                0x44, 0, 0, 206, 0, 5, 0, 1, 2, 1, 1, 2, 2, 1, 2, 14, 2, 0x84, 15, 1, 2, 4, 0, 0, 2, 20, 0, 7,
                0x60, 0, 0, 20, 0, 1, 7, 1, 2, 1, 0, 1, 0,
            ],
            _ => [Local, 200, 210])),
        ("sessions", (bytes, share) => Fullest(bytes, Messages(bytes, share, 1200), [0x40, 0, 0, 18, 0, 0], _ => [Local])),
        ("sets", (bytes, share) => Fullest(bytes, Messages(bytes, share, 320), [0x40, 0, 0, 225, 0, 0], _ => [Local])),
        ("laps", (bytes, share) => Fullest(bytes, Messages(bytes, share, 64), [.. OneRecord, 0x40, 0, 0, 19, 0, 0], _ => [Local])),
        ("stops and starts", (bytes, share) => Fullest(
            bytes, Messages(bytes, share, 128), [.. OneRecord, 0x40, 0, 0, 21, 0, 3, 253, 4, 0x86, 0, 1, 0, 1, 1, 0], i => [Local, .. BitConverter.GetBytes(Start + (uint)i), 0, (byte)(1 - (i % 2))])),
        ("beat intervals", (bytes, share) => Fullest(bytes, Messages(bytes, share, 32), [.. OneRecord, 0x40, 0, 0, 78, 0, 1, 0, 2, 0x84], _ => [Local, 0x20, 3])),
        ("beats of a strap", (bytes, share) => Fullest(
            bytes, Messages(bytes, share, 160), [.. OneRecord, .. Anchor, 0x40, 0, 0, 132, 0, 2, 6, 2, 2, 10, 3, 0x0D], i => [Local, 70, 71, (byte)(i & 0xFF), 0x40, (byte)((i >> 4) & 0xFF)])),
        ("minutes of heart rate", (bytes, share) => Fullest(bytes, Messages(bytes, share, 160), [.. Zone, 0x40, 0, 0, 55, 0, 2, 253, 4, 0x86, 27, 1, 2], i => [Local, .. BitConverter.GetBytes(Start + (60 * (uint)i)), 60])),
        ("one walk without end", (bytes, share) => Fullest(bytes, Messages(bytes, share, 660), [.. Zone, 0x40, 0, 0, 55, 0, 3, 253, 4, 0x86, 5, 1, 0, 3, 4, 0x86], i => Walked(i, i))),
        ("walks of ten minutes", (bytes, share) => Fullest(bytes, Messages(bytes, share, 660 * 10 / 14), [.. Zone, 0x40, 0, 0, 55, 0, 3, 253, 4, 0x86, 5, 1, 0, 3, 4, 0x86], i => Walked(i, i - (4 * (i / 14)) - Math.Max(0, (i % 14) - 10)))),
        ("parts of one set", (bytes, share) => Parts(bytes, Messages(bytes, share, 1520), [0x40, 0, 0, 225, 0, 0, 0])),
        ("parts of one session", (bytes, share) => Parts(bytes, Messages(bytes, share, 1200), [0x40, 0, 0, 18, 0, 0, 0])),
        ("empty parts", (bytes, share) => Parts(bytes, Messages(bytes, share, 1), [])),
    ];

    private static byte[] Walked(int minute, int counted) => [Local, .. BitConverter.GetBytes(Start + (60 * (uint)minute)), 6, .. BitConverter.GetBytes((uint)counted * 100)];

    /// <summary>How many of a thing the decoder takes, by what one of it costs.</summary>
    private static int Messages(int bytes, double share, int cost) => (int)(share * ((52L << 20) + (bytes * 3L)) / cost);

    /// <summary>Made in the place where it stays: its making must take less memory than reading it.</summary>
    private static byte[] Fullest(int bytes, int messages, byte[] head, Func<int, byte[]> message)
    {
        var file = new byte[bytes];
        head.CopyTo(file, Header);
        var at = Header + head.Length;
        for (var i = 0; i < messages && at + message(i).Length <= bytes - Rest; i++)
        {
            var one = message(i);
            one.CopyTo(file, at);
            at += one.Length;
        }

        Close(file, 0, at);
        return file;
    }

    /// <summary>Parts of the same data, one behind the other, as many as there is room for, and one that fills the file.</summary>
    private static byte[] Parts(int bytes, int most, byte[] data)
    {
        byte[] part = [14, 0x20, 0, 0, .. BitConverter.GetBytes(data.Length), .. ".FIT"u8, 0, 0, .. data, 0, 0];
        BinaryPrimitives.WriteUInt16LittleEndian(part.AsSpan(part.Length - 2), FitCrc.Of(part.AsSpan(..^2)));
        var file = new byte[bytes];
        var at = 0;
        for (var i = 0; i < most && at + part.Length <= bytes - Header - Rest; i++, at += part.Length)
        {
            part.CopyTo(file, at);
        }

        Close(file, at, at + Header);
        return file;
    }

    /// <summary>Makes a part of all bytes from <paramref name="from"/> on; those behind <paramref name="at"/> become messages that nobody knows.</summary>
    private static void Close(byte[] file, int from, int at)
    {
        byte[] header = [14, 0x20, 0, 0, .. BitConverter.GetBytes(file.Length - from - Header - 2), .. ".FIT"u8, 0, 0];
        header.CopyTo(file, from);
        var end = file.Length - 2;
        while (at < end)
        {
            var size = Math.Min(byte.MaxValue, end - at - Unknown);
            size = end - at - Unknown - size is > 0 and < Unknown ? size - Unknown : size;
            byte[] one = [0x45, 0, 0, 0, 0xFF, 1, 1, (byte)size, 0x0D, 5];
            one.CopyTo(file, at);
            at += Unknown + size;
        }

        BinaryPrimitives.WriteUInt16LittleEndian(file.AsSpan(end), FitCrc.Of(file.AsSpan(from, end - from)));
    }
}
