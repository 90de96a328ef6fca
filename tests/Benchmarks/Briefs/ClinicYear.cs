using System.Globalization;
using System.Text;
using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Benchmarks.Briefs;

/// <summary>A working folder with invented people, each with a year of stored days, a score of alerts that are over, and one in five with some that stand.</summary>
internal sealed record ClinicYear(string Root, int People)
{
    private const int DayCount = 365;
    private const int PastAlerts = 20;
    private const int PeopleAtOnce = 100;

    /// <summary>A Monday: week, call list and sheet are there.</summary>
    private static readonly LocalDate Today = new(2026, 6, 1);

    public static Instant Morning => Today.AtMidnight().PlusHours(7).InUtc().ToInstant();

    public string ConfigPath => Path.Combine(Root, "loadwatch.json");

    public void Make()
    {
        Directory.CreateDirectory(Path.Combine(Root, "inbox"));
        File.WriteAllText(ConfigPath, """
            {
              "time_zone": "UTC",
              "groups": [{ "id": "all" }],
              "contacts": [
                { "id": "coach", "forms": ["daily", "weekly"], "mail": "coach@example.org" },
                { "id": "clinician", "role": "clinician", "names": "initials", "mail": "clinician@example.org" },
                { "id": "desk", "role": "front_desk" }
              ],
              "mail": { "host": "mail.example.org", "from": "loadwatch@example.org" }
            }
            """);
        var roster = new StringBuilder("person,name,group,birth_year\n");
        for (var person = 0; person < People; person++)
        {
            roster.Append(CultureInfo.InvariantCulture, $"{Id(person)},Given{person % 97} Family{person},all,{1940 + (person % 60)}\n");
        }

        File.WriteAllText(Path.Combine(Root, "roster.csv"), roster.ToString());
        File.WriteAllText(Path.Combine(Root, "anchors.csv"), "person,date,anchor,value,unit,source,exercise\n");
    }

    public void Store(Store store)
    {
        foreach (var people in Enumerable.Range(0, People).Chunk(PeopleAtOnce))
        {
            store.Write(session =>
            {
                foreach (var person in people)
                {
                    session.Days.Replace(Id(person), Today.PlusDays(-DayCount), [.. Enumerable.Range(1, DayCount).Reverse().Select(back => DayOf(person, back))]);
                    foreach (var alert in AlertsOf(person))
                    {
                        session.Alerts.Put(alert);
                        session.Alerts.Changes.Append(new AlertChange(
                            alert.Id, 1, alert.Raised, AlertState.Normal, alert.State, AlertChangeReason.Raised, alert.Severity, alert.Text, new Evidence("acute / chronic", "a choice", [])));
                    }
                }
            });
        }
    }

    private static string Id(int person) => string.Create(CultureInfo.InvariantCulture, $"p{person:0000}");

    private static IEnumerable<Alert> AlertsOf(int person)
    {
        foreach (var past in Enumerable.Range(0, PastAlerts))
        {
            yield return Of("load_ratio", null, AlertState.Normal, 30 + (past * 15));
        }

        if (person % 5 == 0)
        {
            yield return Of("stimulus_gap", BodyRegion.Legs, AlertState.Unacknowledged, 16);
        }

        if (person % 10 == 0)
        {
            yield return Of("load_ratio", null, AlertState.Unacknowledged, 1);
        }

        Alert Of(string rule, BodyRegion? region, AlertState state, int back) => new(
            new FindingKey(Id(person), rule, region), Today.PlusDays(-back), Today.PlusDays(-1), state, Severity.Warning, "Load of the last 7 days is 1.94 times the usual week.");
    }

    private static Day DayOf(int person, int back)
    {
        var trained = (person + back) % 3 == 0;
        var legs = new RegionDay((person + back) % 9 == 0, 1, 3, (person + back) % 9, 8, 9);
        return new Day
        {
            Person = Id(person),
            Date = Today.PlusDays(-back),
            State = trained ? DayState.Recorded : DayState.Rest,
            StateSource = trained ? "activities" : "inferred from device 1",
            Load = trained ? 60 + ((person * 7 + back * 13) % 50) : 0,
            Acute = 190 + (back % 20),
            Chronic = 185,
            ChronicBefore = 180,
            RatioUncoupled = 1.05,
            Coverage7 = 1,
            Coverage28 = 1,
            DaysSinceFirstCovered = 600 - back,
            DaysSinceRecorded = (person + back) % 3,
            Plan = DayPlan.None,
            Regions = new Dictionary<BodyRegion, RegionDay> { [BodyRegion.Legs] = legs, [BodyRegion.Trunk] = legs, [BodyRegion.Arms] = legs },
        };
    }
}
