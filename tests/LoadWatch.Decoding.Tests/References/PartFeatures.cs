using System.Buffers.Binary;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.References;

/// <summary>
/// What the bytes of a part hold that decoders are known to read in different ways: found by a walk of its own over definitions and messages, so that an
/// excuse for a difference is given only where its cause is there. The part must be whole.
/// </summary>
internal sealed class PartFeatures
{
    private readonly byte[] part;
    private readonly Definition?[] live = new Definition?[16];
    private readonly Dictionary<(byte Developer, byte Number), Description> described = [];

    private PartFeatures(byte[] part) => this.part = part;

    /// <summary>Channels of record messages by what is special about a field of theirs.</summary>
    public HashSet<(Difference Kind, Channel Channel)> Channels { get; } = [];

    public HashSet<Difference> Kinds { get; } = [];

    /// <summary>Channels with a wide and a narrow field in one definition.</summary>
    public HashSet<Channel> ChannelsOfBabel { get; } = [];

    /// <summary>What GPSBabel alone reads otherwise.</summary>
    public HashSet<Difference> OfBabel { get; } = [];

    public static PartFeatures Of(byte[] part)
    {
        var features = new PartFeatures(part);
        features.Walk(part[0], part[0] + BinaryPrimitives.ReadInt32LittleEndian(part.AsSpan(4)));
        return features;
    }

    /// <summary>The parts of a whole chained file.</summary>
    public static IEnumerable<byte[]> Split(byte[] file)
    {
        for (var at = 0; at < file.Length;)
        {
            var size = file[at] + BinaryPrimitives.ReadInt32LittleEndian(file.AsSpan(at + 4)) + 2;
            yield return file[at..(at + size)];
            at += size;
        }
    }

    private void Walk(int at, int end)
    {
        var timed = false;
        var orders = new HashSet<bool>();
        while (at < end)
        {
            var header = part[at++];
            if ((header & 0xC0) == 0x40)
            {
                orders.Add(part[at + 1] != 0);
                at = Define(header, at);
                continue;
            }

            var definition = live[(header & 0x80) != 0 ? (header >> 5) & 3 : header & 15]!;
            Look(definition, at, (header & 0x80) != 0, timed, header);
            timed |= definition.Fields.Any(field => field.Number == 253);
            at += definition.Size;
        }

        if (orders.Count > 1)
            OfBabel.Add(Difference.ByteOrderOfEachDefinition);
    }

    private int Define(byte header, int at)
    {
        var big = part[at + 1] != 0;
        var message = big ? BinaryPrimitives.ReadUInt16BigEndian(part.AsSpan(at + 2)) : BinaryPrimitives.ReadUInt16LittleEndian(part.AsSpan(at + 2));
        var (fields, offset) = (new List<Field>(), 0);
        var count = part[at + 4];
        at += 5;
        for (var i = 0; i < count; i++, at += 3)
        {
            fields.Add(new Field(part[at], part[at + 1], part[at + 2], offset));
            offset += part[at + 1];
        }

        var own = new List<Field>();
        if ((header & 0x20) != 0)
        {
            count = part[at++];
            for (var i = 0; i < count; i++, at += 3)
            {
                own.Add(new Field(part[at], part[at + 1], part[at + 2], offset));
                offset += part[at + 1];
            }
        }

        live[header & 15] = new Definition(message, fields, own, offset);
        return at;
    }

    private void Look(Definition definition, int at, bool compressed, bool timed, byte header)
    {
        if (!compressed && (header & 0x30) != 0)
            Kinds.Add(Difference.ReservedBitsOfAHeader);

        var time = definition.Fields.Find(field => field.Number == 253);
        if (compressed)
            OfBabel.Add(Difference.CompressedTimes);

        if (compressed && (!timed || time is not null))
            Kinds.Add(Difference.CompressedTimes);

        if (time is null or { Size: not 4 } || (part.AsSpan(at + time.Offset, 4) is var bytes && (Math.Min(bytes[0], bytes[3]) < 0x10 || !bytes.ContainsAnyExcept((byte)0xFF))))
            Kinds.Add(Difference.NotADate);

        if (definition.Message == 206)
            Describe(definition, at);
        else if (definition.Message == 20)
            LookAtRecord(definition);
    }

    private void LookForPairs(Definition definition)
    {
        foreach (var pair in definition.Fields.Where(field => Known.ContainsKey(field.Number)).GroupBy(field => Known[field.Number].Channel).Where(pair => pair.Count() > 1))
            ChannelsOfBabel.Add(pair.Key);
    }

    private void Describe(Definition definition, int at)
    {
        byte Value(byte number, byte missing) =>
            definition.Fields.Find(field => field.Number == number) is { Size: > 0 } field ? part[at + field.Offset] : missing;
        string Text(byte number) => definition.Fields.Find(field => field.Number == number) is { } field
            ? System.Text.Encoding.UTF8.GetString(part, at + field.Offset, field.Size).TrimEnd('\0') : "";

        described[(Value(0, 255), Value(1, 255))] = new Description(Text(3), Value(15, 255));
    }

    private void LookAtRecord(Definition definition)
    {
        LookForPairs(definition);
        foreach (var field in definition.Fields)
        {
            if (field.Number == 8)
                Channels.UnionWith([(Difference.PackedSpeedAndDistance, Channel.Speed), (Difference.PackedSpeedAndDistance, Channel.Distance)]);

            if (Known.TryGetValue(field.Number, out var known) && field.Size > 0)
            {
                if (field.Type != known.Type)
                    Channels.Add((Difference.OtherBaseTypeThanTheProfile, known.Channel));

                if (field.Size > known.Size)
                    Channels.Add((Difference.SeveralValuesInOne, known.Channel));
            }
        }

        foreach (var field in definition.Developer)
        {
            if (!described.TryGetValue((field.Type, field.Number), out var description))
                continue;

            if (Known.TryGetValue(description.NativeField, out var stands))
                Channels.Add((Difference.DeveloperFields, stands.Channel));

            if (Names.TryGetValue(description.Name, out var named))
                Channels.Add((Difference.DeveloperFields, named));
        }
    }

    private static readonly Dictionary<byte, (Channel Channel, byte Type, int Size)> Known = new()
    {
        [2] = (Channel.Altitude, 0x84, 2),
        [3] = (Channel.HeartRate, 0x02, 1),
        [4] = (Channel.Cadence, 0x02, 1),
        [5] = (Channel.Distance, 0x86, 4),
        [6] = (Channel.Speed, 0x84, 2),
        [7] = (Channel.Power, 0x84, 2),
        [73] = (Channel.Speed, 0x86, 4),
        [78] = (Channel.Altitude, 0x86, 4),
    };

    private static readonly Dictionary<string, Channel> Names = new(StringComparer.Ordinal)
    {
        ["heart_rate"] = Channel.HeartRate,
        ["power"] = Channel.Power,
        ["speed"] = Channel.Speed,
        ["enhanced_speed"] = Channel.Speed,
        ["cadence"] = Channel.Cadence,
        ["distance"] = Channel.Distance,
        ["altitude"] = Channel.Altitude,
    };

    private sealed record Field(byte Number, byte Size, byte Type, int Offset);

    private sealed record Definition(int Message, List<Field> Fields, List<Field> Developer, int Size);

    private sealed record Description(string Name, byte NativeField);
}
