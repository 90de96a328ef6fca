using System.Globalization;
using System.Text;
using NodaTime;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>A working folder with the recordings of some invented people over some years: configuration, roster, reference values and inbox. Made once.</summary>
/// <param name="Root">The working folder.</param>
/// <param name="Files">Recordings in all, shared out evenly.</param>
/// <param name="LastDate">Of the recordings.</param>
/// <param name="Minutes">Mean length of a recording.</param>
internal sealed record Squad(string Root, int People, int Files, int Years, LocalDate LastDate, int Minutes)
{
    private const string Mark = "made.txt";

    public string Inbox => Path.Combine(Root, "inbox");

    public string Data => Path.Combine(Root, "data");

    public string ConfigPath => Path.Combine(Root, "loadwatch.json");

    /// <summary>The morning after the last date.</summary>
    public Instant Morning => LastDate.PlusDays(1).AtMidnight().PlusHours(6).InUtc().ToInstant();

    /// <summary>Writes what is not there yet.</summary>
    public void Make()
    {
        var wanted = string.Create(CultureInfo.InvariantCulture, $"{People} {Files} {Years} {LastDate:uuuu-MM-dd} {Minutes}\n");
        var mark = Path.Combine(Root, Mark);
        if (File.Exists(mark) && File.ReadAllText(mark) == wanted)
        {
            return;
        }

        if (Directory.Exists(Root))
        {
            Directory.Delete(Root, recursive: true);
        }

        WriteTables();
        var each = Files / People;
        Parallel.For(0, People, person => WriteRecordings(person, each + (person < Files % People ? 1 : 0)));
        File.WriteAllText(mark, wanted);
    }

    /// <summary>Back to files that were never taken in.</summary>
    public void ForgetImport()
    {
        foreach (var folder in new[] { "data", "pages", "notices" }.Select(name => Path.Combine(Root, name)).Where(Directory.Exists))
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    public IReadOnlyList<string> Recordings() => [.. Directory.EnumerateFiles(Inbox, "*.fit", SearchOption.AllDirectories).Order(StringComparer.Ordinal)];

    /// <summary>One more recording of a person, of about an hour.</summary>
    public void Add(int person, LocalDate date)
    {
        var path = Path.Combine(Inbox, Id(person), $"{date:uuuu-MM-dd} added.fit");
        File.WriteAllBytes(path, WatchFile.Of((uint)(1000 + person), Noon(date), 3300, isRide: true).Span);
    }

    public static string Id(int person) => string.Create(CultureInfo.InvariantCulture, $"p{person:00}");

    private static Instant Noon(LocalDate date) => date.AtMidnight().PlusHours(12).InUtc().ToInstant();

    private void WriteRecordings(int person, int files)
    {
        var folder = Directory.CreateDirectory(Path.Combine(Inbox, Id(person))).FullName;
        var days = (Years * 365) + 1;
        for (var file = 0; file < files; file++)
        {
            var date = LastDate.PlusDays(-(int)((long)file * days / files));
            var isRide = (person + file) % 2 == 0;
            var seconds = Minutes * 60 * (60 + (((person * 37) + (file * 53)) % 81)) / 100;
            var start = Noon(date) + Duration.FromMinutes(person + (file % 7));
            using var stream = File.Create(Path.Combine(folder, string.Create(CultureInfo.InvariantCulture, $"{date:uuuu-MM-dd} {file:00000}.fit")));
            stream.Write(WatchFile.Of((uint)(1000 + person), start, seconds, isRide).Span);
        }
    }

    private void WriteTables()
    {
        Directory.CreateDirectory(Inbox);
        File.WriteAllText(ConfigPath, """
            {
              "time_zone": "UTC",
              "inboxes": [{ "name": "inbox", "path": "inbox", "take": "leave" }],
              "groups": [{ "id": "squad", "name": "Squad" }],
              "contacts": [{ "id": "staff", "name": "Staff", "groups": ["squad"], "brief_at": "05:00" }]
            }

            """);
        var roster = new StringBuilder("person,name,group,birth_year,sex,time_zone\n");
        var anchors = new StringBuilder("person,date,anchor,value,unit,source,exercise\n");
        foreach (var id in Enumerable.Range(0, People).Select(Id))
        {
            roster.Append(CultureInfo.InvariantCulture, $"{id},Person {id},squad,1994,f,UTC\n");
            anchors.Append(CultureInfo.InvariantCulture, $"{id},,heart_rate_rest,52,bpm,,\n{id},,heart_rate_max,191,bpm,,\n{id},,critical_power,255,W,,\n");
            anchors.Append(CultureInfo.InvariantCulture, $"{id},,w_prime,19000,J,,\n{id},,power_max,980,W,,\n");
        }

        File.WriteAllText(Path.Combine(Root, "roster.csv"), roster.ToString());
        File.WriteAllText(Path.Combine(Root, "anchors.csv"), anchors.ToString());
    }
}
