namespace LoadWatch.Decoding.Fit;

/// <summary>The small hand-made files of Data/Fit/vectors.txt, by the number in their name.</summary>
internal static class FitVectors
{
    private static readonly Dictionary<string, byte[]> Files = File.ReadAllLines(Path.Combine(Root(), "Data", "Fit", "vectors.txt"))
        .Select(line => line.Split(' '))
        .ToDictionary(words => words[0][..3], words => Convert.FromHexString(words[1]), StringComparer.Ordinal);

    public static byte[] Get(string number) => Files[number];

    public static IEnumerable<byte[]> All => Files.Values;

    private static string Root()
    {
        var folder = new DirectoryInfo(AppContext.BaseDirectory);
        while (!File.Exists(Path.Combine(folder!.FullName, "LoadWatch.Decoding.Tests.csproj")))
            folder = folder.Parent;

        return folder.FullName;
    }
}
