using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Writes an invented working folder: configuration, roster, reference values and twelve weeks of recordings in an inbox.</summary>
public static class DemoFolder
{
    /// <summary>The same seed and date always give the same bytes; another seed gives other numbers and the same story.</summary>
    /// <param name="folder">Made if missing; must be empty.</param>
    /// <param name="until">The morning of the brief: the last session is of the day before.</param>
    /// <exception cref="IOException">The folder holds something already, or cannot be written.</exception>
    public static DemoSummary Write(string folder, int seed, LocalDate until) => Write(folder, seed, until, DemoCast.All);

    /// <summary>The same with fewer people.</summary>
    public static DemoSummary Write(string folder, int seed, LocalDate until, IReadOnlyList<DemoPart> cast)
    {
        if (Directory.Exists(folder) && Directory.EnumerateFileSystemEntries(folder).Any())
            throw new IOException($"{folder} is not empty");

        var people = cast.Select(part => DemoPerson.Draw(part, seed, until)).ToList();
        var counts = people.AsParallel().Select(person => Save(folder, Deliveries.Of(person, seed, until))).ToList();
        counts.Add(Save(folder, DemoConfiguration.Files(people, until).Concat(StrayFiles.All(seed, until))));
        return new DemoSummary(
            folder,
            until,
            people.Count,
            counts.Sum(count => count.Files),
            counts.Sum(count => count.Bytes),
            [.. DemoStory.Lines, .. DeliveryPlan.Lines],
            DemoStory.Alerts);
    }

    private static (int Files, long Bytes) Save(string folder, IEnumerable<DemoFile> files)
    {
        var (count, bytes) = (0, 0L);
        foreach (var file in files)
        {
            var path = Path.Combine([folder, .. file.Path.Split('/')]);
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
            File.WriteAllBytes(path, file.Bytes);
            File.SetLastWriteTimeUtc(path, file.Modified.ToDateTimeUtc());
            (count, bytes) = (count + 1, bytes + file.Bytes.Length);
        }

        return (count, bytes);
    }
}
