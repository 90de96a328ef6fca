using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>
/// An invented working folder: configuration, roster, reference values and twelve weeks of recordings and tables in an inbox. They come as in life: first the
/// folder is set up, then all that was kept so far comes in, then night after night, each with a further version of the tables that grow.
/// </summary>
public sealed class DemoFolder
{
    private readonly string folder;
    private readonly int seed;
    private readonly LocalDate until;
    private readonly IReadOnlyList<DemoPerson> people;
    private readonly DemoTables tables;
    private readonly Dictionary<string, long> written = new(StringComparer.Ordinal);
    private List<DemoFile>? later;

    /// <summary>The same seed and date always give the same bytes; another seed gives other numbers and the same story.</summary>
    /// <param name="folder">Made if missing; must be empty.</param>
    /// <param name="until">The morning of the brief: the last session is of the day before.</param>
    /// <param name="cast">Null for everybody.</param>
    /// <exception cref="IOException">The folder holds something already.</exception>
    public DemoFolder(string folder, int seed, LocalDate until, IReadOnlyList<DemoPart>? cast = null)
    {
        if (Directory.Exists(folder) && Directory.EnumerateFileSystemEntries(folder).Any())
            throw new IOException($"{folder} is not empty");

        (this.folder, this.seed, this.until) = (folder, seed, until);
        people = [.. (cast ?? DemoCast.All).Select(part => DemoPerson.Draw(part, seed, until))];
        tables = new DemoTables(people, seed, until);
    }

    /// <summary>The mornings to which files come, the last that of the brief.</summary>
    public IReadOnlyList<LocalDate> Mornings => DemoCalendar.Mornings(until);

    /// <summary>Of what was written so far.</summary>
    public DemoSummary Summary => new(
        folder, until, people.Count, written.Count, written.Values.Sum(), [.. DemoStory.Lines, .. DeliveryPlan.Lines], DemoStory.Alerts);

    /// <summary>Everything, in the end as after the last night.</summary>
    /// <inheritdoc cref="DemoFolder(string, int, LocalDate, IReadOnlyList{DemoPart}?)"/>
    public static DemoSummary Write(string folder, int seed, LocalDate until, IReadOnlyList<DemoPart>? cast = null)
    {
        var demo = new DemoFolder(folder, seed, until, cast);
        foreach (var morning in demo.Mornings)
            demo.Arrive(morning);

        return demo.Summary;
    }

    /// <summary>Writes what came since the morning before. Mornings in their order, each once.</summary>
    /// <exception cref="IOException">A file cannot be written.</exception>
    public void Arrive(LocalDate morning)
    {
        if (morning == Mornings[0])
        {
            Keep(DemoConfiguration.Files(people, until).Concat(tables.Standing).Select(Save));
            return;
        }

        Keep(later is null ? History(morning) : later.Where(file => file.Modified <= DemoCalendar.Written(morning) && file.Modified > DemoCalendar.Written(morning.PlusDays(-1))).Select(Save));
        Keep(tables.Grown(morning).Select(Save));
    }

    /// <summary>Saves all up to a morning; what is younger waits for its own.</summary>
    private List<(string Path, long Bytes)> History(LocalDate morning)
    {
        var files = people.AsParallel().AsOrdered()
            .Select(person => Deliveries.Of(person, seed, until).Select(file => SaveUpTo(file, morning)).ToList())
            .AsEnumerable()
            .SelectMany(files => files)
            .Concat(StrayFiles.All(seed, until).Select(file => SaveUpTo(file, morning)))
            .ToList();
        later = [.. files.Where(file => file.Later is not null).Select(file => file.Later!)];
        return [.. files.Where(file => file.Later is null).Select(file => file.Saved)];
    }

    private ((string, long) Saved, DemoFile? Later) SaveUpTo(DemoFile file, LocalDate morning) =>
        file.Modified <= DemoCalendar.Written(morning) ? (Save(file), null) : (default, file);

    private (string Path, long Bytes) Save(DemoFile file)
    {
        var path = Path.Combine([folder, .. file.Path.Split('/')]);
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        File.WriteAllBytes(path, file.Bytes);
        File.SetLastWriteTimeUtc(path, file.Modified.ToDateTimeUtc());
        return (file.Path, file.Bytes.Length);
    }

    private void Keep(IEnumerable<(string Path, long Bytes)> saved)
    {
        foreach (var (path, bytes) in saved)
            written[path] = bytes;
    }
}
