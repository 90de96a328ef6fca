using System.Text.Json;
using System.Text.Json.Serialization;
using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Service.Pipeline;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>
/// Days and findings computed behind what is stored are the same as computed from the first day on, to the last bit, with all rules on. How many histories are
/// tried: environment variable <c>LOADWATCH_HISTORIES</c>.
/// </summary>
public sealed class DaysFromAnyDateTests
{
    private static readonly JsonSerializerOptions Text = new()
    {
        WriteIndented = false,
        Converters = { new JsonStringEnumConverter(), new JsonDates<LocalDate>(LocalDatePattern.Iso) },
    };

    private static readonly int Histories = int.TryParse(Environment.GetEnvironmentVariable("LOADWATCH_HISTORIES"), out var wanted) ? wanted : 8;

    [Fact]
    public void TheyGoOnBehindAnyDate() => Gen.UInt.Sample(number =>
    {
        var history = new RandomHistory(number);
        var last = RandomHistory.First.PlusDays(RandomHistory.Days - 1);
        var whole = PersonSeries.Of(history.Person, history.Group, history.Sessions, history.Tests, history.Plan, last, history.Changes(), history.BestMeans(RandomHistory.First, last));
        foreach (var cut in Enumerable.Range(0, 6).Select(_ => history.Below(whole.Days.Count - 1)))
        {
            var stored = whole.Days.Take(cut + 1).Select(Stored).ToList();
            var again = Continue(history, stored, history.Sessions, last, last);
            Same(whole.Days.Skip(cut + 1), again.Days);
            Same(whole.Findings.Where(finding => finding.Date > stored[^1].Date), again.Findings);
        }
    }, iter: Histories);

    /// <summary>What the limits leave open behind any date is the same of the stored days that are read for it as of all.</summary>
    [Fact]
    public void WhatTheLimitsLeaveOpenIsTheSameOfStoredDays() => Gen.UInt.Sample(number =>
    {
        var history = new RandomHistory(number);
        var last = RandomHistory.First.PlusDays(RandomHistory.Days - 1);
        var whole = PersonSeries.Of(history.Person, history.Group, history.Sessions, history.Tests, history.Plan, last, history.Changes(), history.BestMeans(RandomHistory.First, last));
        foreach (var cut in Enumerable.Range(0, 6).Select(_ => history.Below(whole.Days.Count)))
        {
            var next = whole.Days[cut].Date.PlusDays(1);
            var first = TodaysLimits.First(history.Changes().Periods, next);
            var stored = whole.Days.Take(cut + 1).Where(day => day.Date >= first).Select(day => Stored(day.Date == whole.Days[cut].Date ? day : day with { Carried = Carried.Nothing })).ToList();
            Assert.Equal(
                JsonSerializer.Serialize(TodaysLimits.Behind(history.Person, history.Group, [.. whole.Days.Take(cut + 1)], history.Plan, history.Changes()), Text),
                JsonSerializer.Serialize(TodaysLimits.Behind(history.Person, history.Group, stored, From(history.Plan, next), history.Changes()), Text));
        }
    }, iter: Histories);

    /// <summary>A reference value of a later date changes nothing of an earlier one (I-5).</summary>
    [Fact]
    public void NightByNightTheyAreTheSameAsLookedAtLater() => Gen.UInt.Sample(number =>
    {
        var history = new RandomHistory(number);
        var last = RandomHistory.First.PlusDays(RandomHistory.Days - 1);
        var whole = PersonSeries.Of(history.Person, history.Group, history.Sessions, history.Tests, history.Plan, last, history.Changes(), history.BestMeans(RandomHistory.First, last));
        foreach (var night in Enumerable.Range(0, 4).Select(_ => RandomHistory.First.PlusDays(30 + history.Below(RandomHistory.Days - 30))))
        {
            var known = PersonSeries.Of(
                history.Person, history.Group, [.. history.Sessions.Where(session => session.Date <= night)], [.. history.Tests.Where(test => test.Date <= night)], history.Plan, night, history.Changes(night), history.BestMeans(RandomHistory.First, night));
            var settled = night.PlusDays(-LoadCalendar.SettledDaysBack);
            Same(whole.Days.Where(day => day.Date <= settled), known.Days.Where(day => day.Date <= settled));
            Same(whole.Findings.Where(finding => finding.Date <= settled), known.Findings.Where(finding => finding.Date <= settled));
        }
    }, iter: Histories);

    /// <summary>Else the properties below would say little.</summary>
    [Fact]
    public void TheHistoriesHoldFindingsOfEveryRule()
    {
        var last = RandomHistory.First.PlusDays(RandomHistory.Days - 1);
        var found = Enumerable.Range(0, 20)
            .Select(number => new RandomHistory((uint)number))
            .SelectMany(history => PersonSeries.Of(history.Person, history.Group, history.Sessions, history.Tests, history.Plan, last, history.Changes(), history.BestMeans(RandomHistory.First, last)).Findings)
            .ToList();

        Assert.Equal(RuleBook.All.Select(rule => rule.Name).Order(StringComparer.Ordinal), found.Select(finding => finding.Rule).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal));
        Assert.Contains(found, finding => finding is { Rule: "load_ratio", Quantity: "distance" });
        Assert.Contains(found, finding => finding is { Rule: "falling_capacity", Quantity: "critical_power", Severity: Severity.Notice });
        Assert.Contains(found, finding => Period.DaysBetween(finding.Since, finding.Date) > LoadCalendar.LookBackDays);
        Assert.Contains(found, finding => finding.Severity == Severity.Note);
        Assert.Contains(found, finding => finding.Severity > Severity.Note && finding.Evidence.Inputs.Any(item => item.Name == "heart_rate_max_before"));
    }

    /// <summary>As a person's stretches are computed: each settled by the 7 days behind it.</summary>
    [Fact]
    public void StretchByStretchTheyAreTheSame() => Gen.UInt.Sample(number =>
    {
        var history = new RandomHistory(number);
        var last = RandomHistory.First.PlusDays(RandomHistory.Days - 1);
        var whole = PersonSeries.Of(history.Person, history.Group, history.Sessions, history.Tests, history.Plan, last, history.Changes(), history.BestMeans(RandomHistory.First, last));
        var (days, findings) = (new List<Day>(), new List<Finding>());
        for (var to = whole.Days[0].Date.PlusDays(history.Below(40)); days.Count < whole.Days.Count; to = LocalDate.Min(last, to.PlusDays(1 + history.Below(300))))
        {
            var part = Continue(history, days, history.Sessions, to, last);
            days.AddRange(part.Days.Select(Stored));
            findings.AddRange(part.Findings);
        }

        Same(whole.Days, days);
        Same(whole.Findings, findings);
    }, iter: Histories);

    /// <summary>Sessions come in any order and in portions, some come again with other values and some are taken back, while days pass (I-5).</summary>
    [Fact]
    public void InWhateverOrderSessionsComeTheyEndTheSame() => Gen.UInt.Sample(number =>
    {
        var history = new RandomHistory(number);
        var known = new Dictionary<string, JoinedActivity>(StringComparer.Ordinal);
        List<Day> days = [];
        List<Finding> findings = [];
        var through = RandomHistory.First.PlusDays(300);
        foreach (var portion in Portions(history))
        {
            var dirty = portion.Min(change => change.Date);
            foreach (var change in portion)
            {
                if (!known.Remove(change.Key) || history.Below(3) == 0)
                {
                    known[change.Key] = history.Below(4) == 0 ? history.Corrected(change) : change;
                }
            }

            var next = LocalDate.Min(RandomHistory.First.PlusDays(RandomHistory.Days - 1), through.PlusDays(history.Below(60)));
            var from = LocalDate.Min(dirty, through.PlusDays(1)).PlusDays(-LoadCalendar.SettledDaysBack);
            days.RemoveAll(day => day.Date >= from);
            findings.RemoveAll(finding => finding.Date >= from);
            through = next;
            var sessions = known.Values.OrderBy(session => session.Date).ThenBy(session => session.Key, StringComparer.Ordinal).ToList();
            var part = Continue(history, days, sessions, through, through);
            days.AddRange(part.Days.Select(Stored));
            findings.AddRange(part.Findings);
            if (history.Below(5) == 0 || through == RandomHistory.First.PlusDays(RandomHistory.Days - 1))
            {
                var whole = PersonSeries.Of(history.Person, history.Group, sessions, history.Tests, history.Plan, through, history.Changes(), history.BestMeans(RandomHistory.First, through));
                Same(whole.Days, days);
                Same(whole.Findings, findings);
            }
        }
    }, iter: Histories);

    private static IEnumerable<IReadOnlyList<JoinedActivity>> Portions(RandomHistory history)
    {
        var left = history.Sessions.OrderBy(session => session.Date.PlusDays(history.Below(10) == 0 ? history.Below(600) : history.Below(12))).ToList();
        while (left.Count > 0)
        {
            var portion = left.Take(1 + history.Below(80)).ToList();
            left.RemoveRange(0, portion.Count);
            yield return history.Below(3) == 0 ? [.. portion, history.Sessions[history.Below(history.Sessions.Count)]] : portion;
        }
    }

    /// <summary>With no more than what is read of the store for it.</summary>
    private static PersonSeries Continue(RandomHistory history, List<Day> stored, IReadOnlyList<JoinedActivity> sessions, LocalDate to, LocalDate through)
    {
        var changes = history.Changes();
        var next = stored.Count == 0 ? LocalDate.MaxIsoValue : stored[^1].Date.PlusDays(1);
        var wanted = stored.Count == 0 ? next : changes.Periods.Reach(next) ?? next.PlusDays(-LoadCalendar.LookBackDays);
        var before = stored.Where(day => day.Date >= wanted).Select(day => day.Date == next.PlusDays(-1) ? day : day with { Carried = Carried.Nothing }).ToList();
        var from = before.Count == 0 ? LocalDate.MinIsoValue : before[^1].Date.PlusDays(1);
        return PersonSeries.Continue(
            history.Person,
            history.Group,
            before,
            [.. sessions.Where(session => session.Date >= from && session.Date <= through && session.Date <= to.PlusDays(LoadCalendar.SettledDaysBack))],
            [.. history.Tests.Where(test => test.Date >= from && test.Date <= to)],
            before.Count == 0 ? history.Plan : From(history.Plan, from),
            to,
            changes,
            history.BestMeans(before.Count == 0 ? RandomHistory.First : from.PlusDays(-2 * history.Group.Limits.FallingCapacity.Days), to));
    }

    private static PersonPlan From(PersonPlan plan, LocalDate from) => new()
    {
        Entries = [.. plan.Entries.Where(entry => entry.Until >= from)],
        Absences = [.. plan.Absences.Where(absence => !(absence.Until < from.PlusDays(-28)))],
        Returns = [.. plan.Returns.Where(date => date >= from.PlusDays(-28))],
        Rests = plan.Rests.Where(rest => rest.Key >= from).ToDictionary(),
        Attendance = plan.Attendance.Where(day => day.Key >= from).ToDictionary(),
    };

    /// <summary>As the store gives it back.</summary>
    private static Day Stored(Day day) => day with
    {
        Carried = Carried.Read(Carried.Write(day.Carried)),
        Sessions = JsonSerializer.Deserialize<List<DaySession>>(JsonSerializer.Serialize(day.Sessions, Text), Text)!,
    };

    private static void Same(IEnumerable<Day> expected, IEnumerable<Day> actual) =>
        Assert.Equal(expected.Select(Line), actual.Select(Line));

    private static void Same(IEnumerable<Finding> expected, IEnumerable<Finding> actual) =>
        Assert.Equal(expected.Select(finding => JsonSerializer.Serialize(finding, Text)), actual.Select(finding => JsonSerializer.Serialize(finding, Text)));

    private static string Line(Day day) => JsonSerializer.Serialize(day with { Carried = Carried.Nothing }, Text) + Carried.Write(day.Carried);
}
