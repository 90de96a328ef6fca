using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>How the same contents may come.</summary>
public enum Variation
{
    /// <summary>In other folders, and so in another order, within one sweep.</summary>
    Shuffled,

    /// <summary>Each file three times under other names.</summary>
    Threefold,

    /// <summary>Bare, gzipped, or in other zips.</summary>
    Repacked,

    /// <summary>Over ten nights in any order.</summary>
    Split,

    /// <summary>The same people named by other folders, in other case, by file names, by name or alias.</summary>
    Renamed,
}

internal static class Variations
{
    public const int Nights = 10;

    private static readonly Dictionary<string, string[]> OtherNames = new(StringComparer.Ordinal)
    {
        ["anna"] = ["Anna Ahola", "nan", "A7", "ANNA"],
        ["bo"] = ["Bo Björk", "boss", "Bo"],
        ["cara"] = ["Cara Costa", "7", "CARA"],
        ["dora"] = ["Dora Dahl", "22", "Dora"],
        ["emil"] = ["Emil Ek", "EMIL"],
    };

    public static IReadOnlyList<Placed> Of(Variation variation, int seed)
    {
        // Seeded, so that a variation is the same whenever it is run; no secret depends on it.
        var random = new Random((1000 * (int)variation) + seed);
        return variation switch
        {
            Variation.Shuffled => [.. SquadFiles.Packed.Select(file => new Placed(Elsewhere(file, random), file.Bytes))],
            Variation.Threefold => [.. SquadFiles.Packed.SelectMany(file => Enumerable.Range(0, 3).Select(_ => new Placed(Elsewhere(file, random), file.Bytes)))],
            Variation.Repacked => [.. Repacked(random)],
            Variation.Split => [.. SquadFiles.Packed.Select(file => new Placed(file.Path, file.Bytes, random.Next(Nights)))],
            Variation.Renamed => [.. SquadFiles.Packed.Select(file => new Placed(Renamed(file, random), file.Bytes))],
            _ => throw new ArgumentOutOfRangeException(nameof(variation)),
        };
    }

    private static string Elsewhere(SquadFile file, Random random)
    {
        var (folder, name) = (random.Next(1_000_000), random.Next(1000));
        return file.Owner.Length == 0 ? $"{folder:000000}/{name:000} {file.Name}" : $"{file.Owner}/{folder:000000}/{name:000} {file.Name}";
    }

    private static string Renamed(SquadFile file, Random random)
    {
        if (file.Owner.Length == 0)
        {
            return Elsewhere(file, random);
        }

        // A folder goes before a file name, so two claims are two only where both are made by folders.
        var others = OtherNames[file.Owner];
        return random.Next(file.Name.StartsWith("claimed", StringComparison.Ordinal) ? 2 : 4) switch
        {
            0 => $"{file.Owner.ToUpperInvariant()}/{file.Name}",
            1 => $"2026/{file.Owner[..1].ToUpperInvariant()}{file.Owner[1..]}/spring/{file.Name}",
            2 => $"sent/{file.Owner}_{file.Name}",
            _ => $"sent/{others[random.Next(others.Length)]}_{file.Name}",
        };
    }

    private static IEnumerable<Placed> Repacked(Random random)
    {
        var left = SquadFiles.Bare.OrderBy(_ => random.Next()).ToList();
        for (var pack = 0; left.Count > 0; pack++)
        {
            var some = left.Take(1 + random.Next(6)).ToList();
            left.RemoveRange(0, some.Count);
            foreach (var placed in random.Next(3) == 0 ? some.Select(file => Alone(file, random)) : [Zipped(some, pack, random)])
            {
                yield return placed;
            }
        }
    }

    private static Placed Alone(SquadFile file, Random random) => random.Next(2) == 0
        ? new Placed(file.Path, file.Bytes)
        : new Placed(file.Path + ".gz", Some.Gzip(file.Bytes));

    /// <summary>Of several people, whom the folders inside name; a zip may hold gzip files, but no zip.</summary>
    private static Placed Zipped(List<SquadFile> files, int pack, Random random) => new(
        $"packs/{pack:000}.zip",
        Some.Zip([.. files.Select(file => random.Next(3) == 0 && !IsPacked(file) ? (file.Path + ".gz", Some.Gzip(file.Bytes)) : (file.Path, file.Bytes))]));

    private static bool IsPacked(SquadFile file) => file.Name.EndsWith(".zip", StringComparison.Ordinal);
}
