namespace LoadWatch.Decoding.Fit;

/// <summary>How messages of one local type are laid out.</summary>
/// <param name="Message">Global message number, 0 to 65535.</param>
public sealed record FitDefinition(int Message, params IReadOnlyList<FitFieldLayout> Fields)
{
    public bool BigEndian { get; init; }

    public IReadOnlyList<FitDeveloperLayout> Developer { get; init; } = [];

    internal byte[] ToBytes()
    {
        var bytes = new List<byte> { 0, (byte)(BigEndian ? 1 : 0) };
        var (low, high) = ((byte)(Message & 0xFF), (byte)(Message >> 8));
        bytes.AddRange(BigEndian ? [high, low] : [low, high]);
        bytes.Add((byte)Fields.Count);
        foreach (var field in Fields)
            bytes.AddRange([field.Number, (byte)field.Size, field.Type.ToByte()]);

        if (Developer.Count == 0)
            return [.. bytes];

        bytes.Add((byte)Developer.Count);
        foreach (var field in Developer)
            bytes.AddRange([field.Number, (byte)field.Size, field.DeveloperIndex]);

        return [.. bytes];
    }
}

/// <summary>A field of the profile: <paramref name="Count"/> values of a type, 0 to 255 bytes together.</summary>
public readonly record struct FitFieldLayout(byte Number, FitBaseType Type, int Count = 1)
{
    internal int Size => Type.Size() * Count;
}

/// <summary>A developer field; its type is in its description and repeated here for the writer.</summary>
public readonly record struct FitDeveloperLayout(byte Number, FitBaseType Type, byte DeveloperIndex, int Count = 1)
{
    internal int Size => Type.Size() * Count;
}
