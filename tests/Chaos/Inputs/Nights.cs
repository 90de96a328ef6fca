using System.Globalization;
using NodaTime;

namespace LoadWatch.Chaos.Inputs;

/// <summary>A file for the inbox.</summary>
/// <param name="Path">Below the inbox, <c>/</c> between folders.</param>
public sealed record InboxFile(string Path, byte[] Bytes);

/// <summary>
/// What arrives: a fortnight that is in already, and tonight. Dan has been silent for so long by yesterday that tonight raises an alert, and a brief is due.
/// </summary>
public sealed class Nights
{
    private static readonly LocalTime Noon = new(12, 0);

    private readonly Clock clock;
    private readonly Random random;
    private readonly LocalDate yesterday;
    private readonly List<InboxFile> before = [];
    private readonly List<InboxFile> tonight = [];

    /// <summary>The fortnight alone; what comes tonight is added by the caller.</summary>
    public Nights(Clock clock, int seed)
    {
        ArgumentNullException.ThrowIfNull(clock);
        this.clock = clock;
        random = new Random(seed);
        yesterday = clock.Today.PlusDays(-1);
        foreach (var ago in Enumerable.Range(4, 8))
        {
            before.Add(new InboxFile($"dan/{ago}.fit", Truth.Must(Truth.Stored, Files.Fit(Session("dan", ago)))));
        }

        foreach (var ago in new[] { 2, 5, 8, 11 })
        {
            before.Add(new InboxFile($"bo/{ago}.fit.gz", Gzipped(Session("bo", ago))));
        }

        foreach (var ago in new[] { 3, 7, 10 })
        {
            before.Add(new InboxFile($"cara/{ago}.csv", Truth.Must(Truth.Stored, Files.Csv(Session("cara", ago)))));
        }
    }

    public Truth Truth { get; } = new() { Alerts = [("silence", "dan")] };

    /// <summary>Taken in by the sweep of the morning before.</summary>
    public IReadOnlyList<InboxFile> Before => before;

    /// <summary>To be taken in by the sweep that is disturbed.</summary>
    public IReadOnlyList<InboxFile> Tonight => tonight;

    /// <summary>Tonight with every way in: plain, packed, twice, from two devices, of nobody, cut, a note, tables.</summary>
    public static Nights Full(Clock clock, int seed)
    {
        var nights = new Nights(clock, seed);
        nights.AddRecordings();
        nights.AddPacked();
        nights.AddStrays();
        nights.AddTables();
        return nights;
    }

    /// <summary>Tonight one recording, in its person's folder.</summary>
    public static Nights OneFile(Clock clock, int seed)
    {
        var nights = new Nights(clock, seed);
        nights.Add("anna/ride.fit", Files.Fit(nights.Session("anna", 0)), Truth.Stored);
        return nights;
    }

    /// <summary>A new session that counts.</summary>
    /// <param name="daysAgo">Before yesterday.</param>
    /// <param name="minutes">After noon.</param>
    public TrueSession Session(string person, int daysAgo, int minutes = 0) =>
        Truth.Happened(TrueSession.Make(person, yesterday.PlusDays(-daysAgo), Noon.PlusMinutes(minutes), clock.TimeZone, random));

    /// <summary>Adds a file of tonight.</summary>
    /// <param name="state">The state that its content must end in; null where that is told elsewhere.</param>
    public byte[] Add(string path, byte[] bytes, string? state = null)
    {
        tonight.Add(new InboxFile(path, bytes));
        return state is null ? bytes : Truth.Must(state, bytes);
    }

    private void AddRecordings()
    {
        foreach (var ago in Enumerable.Range(0, 6))
        {
            Add($"anna/{ago}.fit", Files.Fit(Session("anna", ago)), Truth.Stored);
        }

        var twoDevices = Session("cara", 1);
        Add("cara/watch.fit", Files.Fit(twoDevices), Truth.Stored);
        Add("cara/computer.fit", Files.Fit(twoDevices, product: 2), Truth.Stored);
    }

    private void AddPacked()
    {
        var (one, two, three) = (Session("bo", 3), Session("bo", 4, 30), Session("bo", 6));
        var plain = Truth.Must(Truth.Stored, Files.Fit(one));
        Add("bo/week.zip", Files.Zip(("one.fit", plain), ("two.csv", Truth.Must(Truth.Stored, Files.Csv(two))), ("three.fit.gz", Gzipped(three))));
        Add("bo/again.fit", plain);
        Add("bo/late.fit.gz", Gzipped(Session("bo", 9)));
    }

    private void AddStrays()
    {
        var stranger = TrueSession.Make("anna", yesterday.PlusDays(-9), Noon, clock.TimeZone, random);
        Add("nobody.fit", Files.Fit(stranger), Truth.Held);
        Add("anna/cut.fit", Files.Fit(TrueSession.Make("anna", yesterday.PlusDays(-10), Noon, clock.TimeZone, random))[..^9], Truth.Refused);
        Add("anna/notes.txt", Files.Text("felt fine\n"), Truth.Refused);
    }

    private void AddTables()
    {
        var date = yesterday.ToString("uuuu-MM-dd", CultureInfo.InvariantCulture);
        var sets = $"date,person,exercise,set,repetitions,kilograms\n{date},bo,leg_press,1,10,80\n{date},bo,leg_press,2,8,90\n";
        Truth.Lifts("bo", yesterday, (10 * 80) + (8 * 90));
        Add("sets.csv", Files.Text(sets), Truth.Stored);
        Add("plan.csv", Files.Text($"from,person,plan,start,end\n{date},bo,class,10:00,11:00\n"), Truth.Stored);
    }

    private byte[] Gzipped(TrueSession session) => Files.Gzip(Truth.Must(Truth.Stored, Files.Fit(session)));
}
