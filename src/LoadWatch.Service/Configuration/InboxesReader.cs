using LoadWatch.Service.Arrivals;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads the inboxes of <c>loadwatch.json</c>.</summary>
internal static class InboxesReader
{
    /// <param name="resolve">From a path of the file to a full one.</param>
    public static List<Inbox> Read(LoadWatchFile file, Func<string, string> resolve, FaultList faults)
    {
        var inboxes = file.Inboxes.Select(entry => new Inbox(entry.Name, resolve(entry.Path), entry.Take) 
        {
            FilePattern = FilePattern.Parse(entry.FilePattern),
            Marker = entry.Marker.Length > 0 ? entry.Marker : null,
            Salvage = entry.Salvage,
        }).ToList();
        foreach (var (entry, i) in inboxes.Select((entry, i) => (entry, i)))
        {
            if (inboxes.Take(i).Any(above => above.Name == entry.Name))
            {
                faults.Add($"$.inboxes[{i}].name", $"the inbox \"{entry.Name}\" stands above already");
            }

            if (entry.FilePattern is null && file.Inboxes[i].FilePattern is { Length: > 0 } pattern)
            {
                faults.Add($"$.inboxes[{i}].file_pattern", $"\"{pattern}\" must hold {{person}} once and no folder");
            }

            if (entry.Marker is { } marker && (marker is "." or ".." || marker.AsSpan().ContainsAny('/', '\\')))
            {
                faults.Add($"$.inboxes[{i}].marker", $"\"{marker}\" must be the name of one file or folder in the inbox");
            }

            // What the service writes would come in again as new files.
            foreach (var written in new[] { file.Data, file.Pages, file.Notices }.Where(written => IsWithin(resolve(written), entry.Path)))
            {
                faults.Add($"$.inboxes[{i}].path", $"the folder \"{written}\" lies in this inbox: LoadWatch writes there");
            }
        }

        return inboxes;
    }

    private static bool IsWithin(string inner, string outer) =>
        Path.GetRelativePath(outer, inner) is var way
        && way != ".." && !way.StartsWith($"..{Path.DirectorySeparatorChar}", StringComparison.Ordinal) && !Path.IsPathRooted(way);
}
