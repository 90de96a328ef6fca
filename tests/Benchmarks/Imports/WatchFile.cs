using System.Buffers.Binary;
using LoadWatch.Decoding.Fit;
using NodaTime;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>
/// FIT files as a watch or bike computer writes them: one record a second of twelve fields, position, distance, height, speed, heart rate, cadence and,
/// on a bicycle, power among them. The same session always becomes the same bytes. Written in place, since the encoder of the project serves tests, not gigabytes.
/// </summary>
internal sealed class WatchFile
{
    private const int Header = 14;
    private const int RecordBytes = 32;
    private const int OtherBytes = 512;
    private const byte Unsigned8 = 0x02;
    private const byte Signed8 = 0x01;
    private const byte Enumeration = 0x00;
    private const byte Unsigned16 = 0x84;
    private const byte Signed32 = 0x85;
    private const byte Unsigned32 = 0x86;
    private const byte Unsigned32Z = 0x8C;
    private const byte Time = 253;
    private const byte Power = 7;
    private const byte StanceTime = 41;

    private static readonly Instant Epoch = Instant.FromUtc(1989, 12, 31, 0, 0);

    private readonly byte[] bytes;
    private int at = Header;

    private WatchFile(int seconds) => bytes = new byte[Header + OtherBytes + (RecordBytes * (seconds + 1))];

    /// <param name="serial">Of the device; decides the course of the values with the start.</param>
    /// <param name="seconds">Length.</param>
    public static ReadOnlyMemory<byte> Of(uint serial, Instant start, int seconds, bool isRide)
    {
        var file = new WatchFile(seconds);
        var first = (uint)(start - Epoch).TotalSeconds;
        file.Begin(serial, first, isRide);
        var distance = file.Records(new Course(serial, first, isRide), first, seconds);
        file.End(first, seconds, distance, isRide);
        return file.Framed();
    }

    private void Begin(uint serial, uint first, bool isRide)
    {
        Define(0, 0, new(0, 1, Enumeration), new(1, 2, Unsigned16), new(2, 2, Unsigned16), new(3, 4, Unsigned32Z), new(4, 4, Unsigned32));
        Put8(0);
        Put8(4);
        Put16(255);
        Put16(7);
        Put32(serial);
        Put32(first);
        Define(1, 21, new(Time, 4, Unsigned32), new(0, 1, Enumeration), new(1, 1, Enumeration));
        Timer(first, 0);
        Define(
            3, 20, new(Time, 4, Unsigned32), new(0, 4, Signed32), new(1, 4, Signed32), new(5, 4, Unsigned32), new(78, 4, Unsigned32), new(73, 4, Unsigned32),
            new(isRide ? Power : StanceTime, 2, Unsigned16), new(3, 1, Unsigned8), new(4, 1, Unsigned8), new(13, 1, Signed8), new(31, 1, Unsigned8), new(53, 1, Unsigned8));
    }

    /// <returns>Centimetres.</returns>
    private uint Records(Course course, uint first, int seconds)
    {
        for (var second = 0; second <= seconds; second++)
        {
            course.Step(second);
            Put8(3);
            Put32(first + (uint)second);
            Put32((uint)course.Latitude);
            Put32((uint)course.Longitude);
            Put32(course.Centimetres);
            Put32(course.Height);
            Put32(course.SpeedMillimetres);
            Put16(course.PowerOrStance);
            Put8(course.HeartRate);
            Put8(course.Cadence);
            Put8(18);
            Put8(3);
            Put8((byte)(second & 127));
        }

        return course.Centimetres;
    }

    private void End(uint first, int seconds, uint distance, bool isRide)
    {
        var last = first + (uint)seconds;
        var milliseconds = (uint)seconds * 1000;
        Timer(last, 4);
        Define(4, 19, new(Time, 4, Unsigned32), new(2, 4, Unsigned32), new(7, 4, Unsigned32));
        Put8(4);
        Put32(last);
        Put32(first);
        Put32(milliseconds);
        Define(
            5, 18, new(Time, 4, Unsigned32), new(2, 4, Unsigned32), new(5, 1, Enumeration), new(6, 1, Enumeration), new(7, 4, Unsigned32), new(8, 4, Unsigned32), new(9, 4, Unsigned32));
        Put8(5);
        Put32(last);
        Put32(first);
        Put8((byte)(isRide ? 2 : 1));
        Put8(0);
        Put32(milliseconds);
        Put32(milliseconds);
        Put32(distance);
        Define(6, 34, new(Time, 4, Unsigned32), new(1, 2, Unsigned16), new(5, 4, Unsigned32));
        Put8(6);
        Put32(last);
        Put16(1);
        Put32(last);
    }

    private ReadOnlyMemory<byte> Framed()
    {
        var end = at;
        bytes[0] = Header;
        bytes[1] = 0x20;
        BinaryPrimitives.WriteUInt16LittleEndian(bytes.AsSpan(2), 2132);
        BinaryPrimitives.WriteInt32LittleEndian(bytes.AsSpan(4), end - Header);
        ".FIT"u8.CopyTo(bytes.AsSpan(8));
        BinaryPrimitives.WriteUInt16LittleEndian(bytes.AsSpan(12), FitCrc.Of(bytes.AsSpan(0, 12)));
        Put16(FitCrc.Of(bytes.AsSpan(0, end)));
        return bytes.AsMemory(0, at);
    }

    private void Timer(uint time, byte kind)
    {
        Put8(1);
        Put32(time);
        Put8(0);
        Put8(kind);
    }

    private void Define(byte local, ushort message, params ReadOnlySpan<FieldLayout> fields)
    {
        Put8((byte)(0x40 | local));
        Put16(0);
        Put16(message);
        Put8((byte)fields.Length);
        foreach (var (number, size, type) in fields)
        {
            Put8(number);
            Put8(size);
            Put8(type);
        }
    }

    private void Put8(byte value) => bytes[at++] = value;

    private void Put16(ushort value)
    {
        BinaryPrimitives.WriteUInt16LittleEndian(bytes.AsSpan(at), value);
        at += 2;
    }

    private void Put32(uint value)
    {
        BinaryPrimitives.WriteUInt32LittleEndian(bytes.AsSpan(at), value);
        at += 4;
    }

    private readonly record struct FieldLayout(byte Number, byte Size, byte Type);
}
