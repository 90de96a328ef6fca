namespace LoadWatch.Stimulus;

/// <summary>The words for body regions in files, exports and ids.</summary>
public static class BodyRegions
{
    /// <summary>Legs first.</summary>
    public static IReadOnlyList<BodyRegion> All { get; } = [BodyRegion.Legs, BodyRegion.Trunk, BodyRegion.Arms];

    public static string Word(BodyRegion region) => region switch
    {
        BodyRegion.Legs => "legs",
        BodyRegion.Trunk => "trunk",
        BodyRegion.Arms => "arms",
        _ => throw new ArgumentOutOfRangeException(nameof(region)),
    };

    /// <summary>The region of a word, or null for an unknown word.</summary>
    public static BodyRegion? Parse(string word) => word switch
    {
        "legs" => BodyRegion.Legs,
        "trunk" => BodyRegion.Trunk,
        "arms" => BodyRegion.Arms,
        _ => null,
    };
}
