using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Every table of the demo's inbox, in its versions.</summary>
public sealed class DemoTables(IReadOnlyList<DemoPerson> people, int seed, LocalDate until)
{
    private readonly ClassLog log = new(people, seed, until);
    private readonly RatingForm ratings = new(people, seed, until);
    private readonly DemoAnswers answers = new(people, seed, until);

    /// <summary>As they stand in the end: path below the folder, content.</summary>
    public IEnumerable<(string Path, byte[] Bytes)> Last => Standing.Concat(Grown(until)).Select(file => (file.Path, file.Bytes));

    /// <summary>Those that were there from the first morning on.</summary>
    internal IEnumerable<DemoFile> Standing => [DemoPlanTable.Of(until), DemoTests.Of(people, seed, until)];

    /// <summary>Versions of the night before a morning.</summary>
    internal IEnumerable<DemoFile> Grown(LocalDate morning) => [log.Version(morning), ratings.Version(morning), answers.Version(morning)];
}
