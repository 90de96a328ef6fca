using LoadWatch.Alerts;
using LoadWatch.Stimulus;

namespace LoadWatch.Storage.Findings;

/// <summary>The column <c>about</c>: a body region, else the name of a quantity, else empty.</summary>
internal static class AboutWord
{
    public static string Of(BodyRegion? region, string? quantity) => quantity ?? Alert.RegionWord(region);

    public static BodyRegion? Region(string word) => BodyRegions.Parse(word);

    public static string? Quantity(string word) => word.Length == 0 || Region(word) is not null ? null : word;
}
