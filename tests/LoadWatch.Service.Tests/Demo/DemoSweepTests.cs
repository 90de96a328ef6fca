using LoadWatch.Activities;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Demo;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Decisions;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Service.Tests.Demo;

/// <summary>The demo once, night by night, as the command goes through it: everybody to whom something happens, and the class.</summary>
public sealed class DemoSweepTests : IDisposable
{
    private static readonly LocalDate Until = new(2026, 11, 27);
    private static readonly LocalTime SweptAt = new(7, 30);

    private static readonly DemoPart[] Cast =
        [.. DemoCast.All.Where(part => part.Plot != DemoPlot.Usual || part.Group != DemoCast.Boat || part.Id is "eero" or "helmi" or "inka" or "sanni")];

    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-demo-");

    public void Dispose() => root.Delete(recursive: true);

    [Fact]
    public void NightAfterNightTheDemoComesToItsStory()
    {
        var demo = new DemoFolder(root.FullName, seed: 1, Until, Cast);
        demo.Arrive(demo.Mornings[0]);
        using var workplace = Workplace.OpenToWork(Path.Combine(root.FullName, "loadwatch.json"));
        Sweep(workplace, demo.Mornings[0]);
        List<int> sets = [];
        foreach (var morning in demo.Mornings.Skip(1))
        {
            demo.Arrive(morning);
            Sweep(workplace, morning);
            sets.Add(workplace.Store.Read(session => session.TableRows.OfPerson("esko", RowKind.Sets).Count(row => row.Content is SetRow { Exercise: "leg_press", Set: 4 })));
        }

        Assert.Equal([1, 1, 0, 0], sets);
        AssertAlerts(workplace);
        AssertAnswers(workplace);
        AssertOwners(workplace);
        AssertPages(workplace);
        AssertExplained(workplace);
    }

    private static void Sweep(Workplace workplace, LocalDate morning)
    {
        var report = workplace.NewSweep((morning + SweptAt).InZoneLeniently(DemoPerson.Zone).ToInstant()).Run(TestContext.Current.CancellationToken);
        Assert.Empty(report.Unreadable);
        Assert.Empty(report.OpenAnswers);
        Assert.Equal(0, report.Settling);
    }

    private static void AssertAlerts(Workplace workplace)
    {
        var standing = workplace.Store.Read(session => Cast
            .OrderBy(part => part.Id, StringComparer.Ordinal)
            .SelectMany(part => session.Alerts.Open(part.Id))
            .Where(alert => AlertLife.IsActive(alert.State))
            .ToList());
        var told = standing
            .Select(alert => new DemoAlert(alert.Key.Person, alert.Key.Rule, alert.Key.Region, alert.Severity))
            .OrderBy(alert => alert.Person, StringComparer.Ordinal)
            .ThenBy(alert => alert.Rule, StringComparer.Ordinal);
        Assert.Equal(string.Join('\n', DemoStory.Alerts), string.Join('\n', told.Except(DemoStory.Possible)));
        Assert.Equal(
            [("ilmari", "stimulus_gap")],
            standing.Where(alert => AlertLife.IsAcknowledged(alert.State)).Select(alert => (alert.Key.Person, alert.Key.Rule)));
    }

    private static void AssertAnswers(Workplace workplace)
    {
        var decisions = workplace.Store.Read(session => session.Decisions.InForce()).Select(decision => (decision.Person, decision.Kind)).Order();
        Assert.Equal(
            [
                ("ilmari", DecisionKind.Acknowledge), ("niilo", DecisionKind.Ill), ("niilo", DecisionKind.Returning), ("saku", DecisionKind.Assign), ("vieno", DecisionKind.Away),
            ],
            decisions);
    }

    /// <summary>Pods by serial and date; the file on the laptop by its answer; the guest's by nothing.</summary>
    private static void AssertOwners(Workplace workplace)
    {
        foreach (var id in new[] { "inka", "sanni", "saku" })
        {
            var person = DemoPerson.Draw(DemoCast.All.Single(part => part.Id == id), 1, Until);
            var expected = DemoSessions.Of(person, 1, Until).Select(activity => activity.Start).ToList();
            var taken = workplace.Store.Read(session => session.Activities.OfPerson(id)).Select(activity => activity.Winner.Start).Order();
            Assert.Equal((id, string.Join(' ', expected)), (id, string.Join(' ', taken)));
        }

        var held = workplace.Store.Read(session => session.Arrivals.InState(ArrivalState.Held).SelectMany(arrival => session.Sightings.Of(arrival.Sha)).ToList());
        Assert.StartsWith("_unknown-upload/", Assert.Single(held).Path, StringComparison.Ordinal);
    }

    private void AssertPages(Workplace workplace)
    {
        var whole = Page("coach");
        var coach = whole[..whole.IndexOf("How to read this page", StringComparison.Ordinal)];
        Assert.DoesNotContain("Grip", coach, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain(" ill", coach, StringComparison.OrdinalIgnoreCase);
        Assert.Contains("Niilo Karikallas", coach, StringComparison.Ordinal);
        Assert.Contains("A rating of 6 of", coach, StringComparison.Ordinal);
        Assert.Contains("A rating of 4 of", coach, StringComparison.Ordinal);

        Assert.Contains("Grip strength", Page("clinic"), StringComparison.Ordinal);
        Assert.DoesNotContain("Grip strength", Page("physio"), StringComparison.Ordinal);
        Assert.Equal(4, workplace.Configuration.Contacts.Count);
    }

    /// <summary>I-13: of everybody the last day, every rule, every alert with its history and the last sessions.</summary>
    private static void AssertExplained(Workplace workplace)
    {
        var archive = new Archive(workplace.Folder);
        var told = workplace.Store.Read(session => Cast.SelectMany(part => new[] { DayExplanation.Of(workplace.Configuration, session, part.Id, date: null) }
            .Concat(RuleBook.All.Select(rule => FindingExplanation.Of(workplace.Configuration, session, part.Id, rule.Name, date: null)))
            .Concat(session.Alerts.All(part.Id).Select(alert => AlertExplanation.Of(session, alert.Id)))
            .Concat(session.Activities.OfPerson(part.Id).TakeLast(3).Select(activity => SessionExplanation.Of(workplace.Configuration, archive, session, activity.Key)))
            .OfType<string>()).ToList());

        Assert.True(told.Count > 10 * Cast.Length);
        Assert.All(told, PlainWords.Hold);
    }

    private string Page(string contact) => File.ReadAllText(Path.Combine(root.FullName, "pages", $"{contact}.html"));
}
