using LoadWatch.Loads;
using LoadWatch.Stimulus;

namespace LoadWatch.Findings;

/// <summary>What a finding is about, in the words of the rules' records.</summary>
internal static class KeyWords
{
    public static string Load(FindingKey key) => key.Quantity is { } quantity ? QuantityWords.Of(quantity) : "load";

    /// <summary>Behind "usual".</summary>
    public static string Measure(FindingKey key) => key.Quantity is { } quantity ? $" {QuantityWords.Of(quantity)}" : "";

    public static string By(FindingKey key) => key.Quantity is { } quantity ? $" by {QuantityWords.Of(quantity)}" : "";

    public static string OneSession(FindingKey key) => key.Quantity == QuantityNames.Distance ? "one run" : "one session";

    public static string Best(FindingKey key) => key.Quantity is { } quantity ? $"best {QuantityWords.Of(quantity)}" : "best";

    public static string Test(FindingKey key) => FunctionTests.Of(key.Quantity ?? "") is { } test ? test.Name.ToLowerInvariant() : "function test";

    public static string Your(bool self) => self ? "your" : "the";

    public static string RegionWork(FindingKey key) => key.Region switch
    {
        BodyRegion.Legs => "leg work",
        BodyRegion.Trunk => "trunk work",
        BodyRegion.Arms => "arm work",
        _ => "work",
    };

    public static string RegionSets(FindingKey key) => key.Region switch
    {
        BodyRegion.Legs => "leg sets",
        BodyRegion.Trunk => "trunk sets",
        BodyRegion.Arms => "arm sets",
        _ => "sets",
    };
}
