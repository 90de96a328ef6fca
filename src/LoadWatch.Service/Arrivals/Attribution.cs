using LoadWatch.People;

namespace LoadWatch.Service.Arrivals;

/// <summary>Who is named as the owner by where a file was seen.</summary>
public static class Attribution
{
    /// <summary>Marks the step into an archive in a sighting's path: <c>anna/week.zip!/ride.fit</c>.</summary>
    public const string Inside = "!/";

    /// <summary>Ids of the people whom any folder of any path names, sorted; folders inside archives count, file names do not.</summary>
    /// <param name="paths">Paths below their inbox, <c>/</c> between folders.</param>
    public static IReadOnlyList<string> Claims(IEnumerable<string> paths, IReadOnlyDictionary<string, Person> people) =>
        paths.SelectMany(Folders)
            .Select(folder => people.GetValueOrDefault(folder)?.Id)
            .OfType<string>()
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal)
            .ToList();

    private static IEnumerable<string> Folders(string path) =>
        path.Split(Inside).SelectMany(stretch => stretch.Split('/').SkipLast(1));
}
