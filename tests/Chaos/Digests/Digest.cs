using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Digests;

/// <summary>Everything that a place has come to, as lines to be compared: archive, database, notices, and the pages where the clock is fixed.</summary>
public sealed class Digest
{
    private const int Shown = 6;
    private const int ShownLength = 300;

    private readonly List<string> lines;

    private Digest(List<string> lines) => this.lines = lines;

    /// <summary>Takes the digest of a place at which nothing runs.</summary>
    /// <exception cref="ChaosFailureException">The database is damaged, or an object of the archive is not what it is named by.</exception>
    public static Digest Of(Place place)
    {
        ArgumentNullException.ThrowIfNull(place);
        var texts = Folder(place.At("notices"));
        return new Digest(
        [
            .. Objects(Path.Combine(place.Data, "archive")),
            .. StoreDump.Lines(place.DatabasePath),
            .. (place.Clock.IsFixed ? texts.Concat(Folder(place.At("pages"))) : texts).SelectMany(file => File.ReadAllLines(file).Select(line => $"{Path.GetFileName(file)}: {line}")),
        ]);
    }

    /// <exception cref="ChaosFailureException">They differ; the sentence shows where.</exception>
    public void MustEqual(Digest other)
    {
        ArgumentNullException.ThrowIfNull(other);
        var (missing, added) = (Less(other.lines, lines), Less(lines, other.lines));
        if (missing.Count + added.Count > 0)
        {
            throw new ChaosFailureException($"differs from the undisturbed run: {Show("lacks", missing)}{Show("has besides", added)}");
        }
    }

    private static List<string> Less(List<string> from, List<string> what)
    {
        var left = what.GroupBy(line => line, StringComparer.Ordinal).ToDictionary(same => same.Key, same => same.Count(), StringComparer.Ordinal);
        return [.. from.Where(line => !left.TryGetValue(line, out var count) || (left[line] = count - 1) < 0)];
    }

    private static string Show(string what, List<string> differing) => differing.Count == 0
        ? ""
        : $"{Environment.NewLine}{what} {differing.Count} lines:{string.Concat(differing.Take(Shown).Select(line => Environment.NewLine + "  " + (line.Length > ShownLength ? line[..ShownLength] + "…" : line)))}";

    private static IEnumerable<string> Objects(string archive) => Folder(archive).Select(path =>
    {
        var name = Path.GetFileName(path);
        return Truth.Sha(File.ReadAllBytes(path)) == name ? $"archive {name}" : throw new ChaosFailureException($"{path} does not hold what it is named by");
    });

    private static IEnumerable<string> Folder(string path) => Directory.Exists(path)
        ? Directory.EnumerateFiles(path, "*", SearchOption.AllDirectories).Order(StringComparer.Ordinal)
        : [];
}
