using LoadWatch.Alerts;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage.Findings;

/// <summary>A region within a key: empty where a rule has none, since a key holds no null.</summary>
internal static class RegionWord
{
    public static string Of(BodyRegion? region) => Alert.RegionWord(region);

    public static BodyRegion? Parse(string word) => word.Length == 0 ? null : Words<BodyRegion>.Parse(word);
}
