namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Plans by the bytes of their definition: devices repeat the same few definitions thousands of times, within a file and from file to file. One book serves
/// the files that a thread decodes, one after the other.
/// </summary>
internal sealed class PlanBook
{
    private const int MostKept = 512;

    [ThreadStatic]
    private static PlanBook? ofThread;
    private readonly Dictionary<byte[], MessagePlan> plans = new(new ByteContent());

    public static PlanBook OfThread => ofThread ??= new PlanBook();

    public MessagePlan Get(ReadOnlySpan<byte> definition) =>
        plans.GetAlternateLookup<ReadOnlySpan<byte>>().TryGetValue(definition, out var plan) ? plan : Add(definition);

    private MessagePlan Add(ReadOnlySpan<byte> definition)
    {
        if (plans.Count >= MostKept)
            plans.Clear();

        return plans.GetAlternateLookup<ReadOnlySpan<byte>>()[definition] = PlanCompiler.Compile(definition);
    }
}
