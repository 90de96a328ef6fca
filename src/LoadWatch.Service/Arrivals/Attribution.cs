using LoadWatch.People;

namespace LoadWatch.Service.Arrivals;

/// <summary>Who is named as the owner: by a decision, else by where a file was seen.</summary>
public static class Attribution
{
    /// <summary>Marks the step into an archive in a sighting's path: <c>anna/week.zip!/ride.fit</c>.</summary>
    public const string Inside = "!/";

    /// <summary>The owner by decision alone where there is one, in the roster or not: whoever was told to be wrong stays so. Else whom the folders name.</summary>
    /// <param name="decided">Id of the person to whom the content was assigned, or null.</param>
    public static IReadOnlyList<string> Claims(string? decided, IEnumerable<string> paths, IReadOnlyDictionary<string, Person> people) =>
        decided is null ? Claims(paths, people) : [people.GetValueOrDefault(decided)?.Id ?? decided];

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
