namespace LoadWatch.Decoding.Fit;

/// <summary>Plans by the bytes of their definition: devices repeat the same few definitions thousands of times.</summary>
internal sealed class PlanBook
{
    private const int MostKept = 256;
    private readonly Dictionary<byte[], MessagePlan> plans = new(new ByContent());

    public MessagePlan Get(ReadOnlySpan<byte> definition) =>
        plans.GetAlternateLookup<ReadOnlySpan<byte>>().TryGetValue(definition, out var plan) ? plan : Add(definition);

    private MessagePlan Add(ReadOnlySpan<byte> definition)
    {
        if (plans.Count >= MostKept)
            plans.Clear();

        return plans.GetAlternateLookup<ReadOnlySpan<byte>>()[definition] = PlanCompiler.Compile(definition);
    }

    private sealed class ByContent : IEqualityComparer<byte[]>, IAlternateEqualityComparer<ReadOnlySpan<byte>, byte[]>
    {
        public bool Equals(byte[]? x, byte[]? y) => x.AsSpan().SequenceEqual(y);

        public bool Equals(ReadOnlySpan<byte> alternate, byte[] other) => alternate.SequenceEqual(other);

        public int GetHashCode(byte[] obj) => GetHashCode(obj.AsSpan());

        public int GetHashCode(ReadOnlySpan<byte> alternate)
        {
            var hash = new HashCode();
            hash.AddBytes(alternate);
            return hash.ToHashCode();
        }

        public byte[] Create(ReadOnlySpan<byte> alternate) => alternate.ToArray();
    }
}
