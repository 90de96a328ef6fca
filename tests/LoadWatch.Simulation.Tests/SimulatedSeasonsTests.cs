using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Simulation.Counts;
using LoadWatch.Simulation.Nights;
using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation.Tests;

/// <summary>
/// Small seasons of one seed, night by night; <c>dotnet run --project tests/Simulation</c> prints the tables of larger ones, of any seed. Bounds are those that staff
/// can live with: at most one false alert a healthy person and 100 days over all rules, nine of ten episodes found, two rows a quiet day for a squad of 30.
/// </summary>
public class SimulatedSeasonsTests
{
    private const int Seed = 1;

    /// <summary>Of two seeds of 20 people and 56 days.</summary>
    private const int PersonDays = 2 * 20 * 56;

    private static readonly Noise HalfLate = new() { Late = 0.5, LateDays = 6 };

    private static readonly Habits[] All = [Habits.Squad, Habits.Runners, Habits.Clinic];

    private static readonly World Squad = Maker(Habits.Squad).Healthy(30, 56);

    private static readonly Lazy<SeasonResult> Usual = new(() => Season.Of(Squad, Habits.Squad.Sport));

    [Fact]
    public void AHealthySquadIsLeftInPeace()
    {
        Assert.InRange(Score.FalsePerPersonAnd100Days(Usual.Value), 0, 1);
        Assert.InRange(Score.Rows(Usual.Value).Average(), 0, 2);
        Assert.Equal(0, Score.Wavering(Usual.Value));
    }

    /// <summary>
    /// Over several seeds, since a few dozen people of one may be lucky. An alert that grows graver counts as another. Runners have no plan, so nothing tells their rest from a session
    /// that left no recording: over ten seeds of 40 they are at 0.96, the worst at 1.19 (tests/README.md), so here they are held to 1.25.
    /// </summary>
    [Theory]
    [InlineData("squad", 1)]
    [InlineData("clinic", 1)]
    [InlineData("runners", 1.25)]
    public void TheHealthyAreLeftInPeace(string group, double bound)
    {
        var habits = Of(group);
        var seasons = Enumerable.Range(2, 5).Select(seed => Season.Of(Maker(habits, seed).Healthy(16, 56), habits.Sport)).ToList();

        Assert.InRange(seasons.Average(Score.FalsePerPersonAnd100Days), 0, bound);
        Assert.All(seasons, season => Assert.Equal(0, Score.Wavering(season)));
    }

    /// <summary>
    /// Each kind by itself, over several seeds: one that is missed may not hide behind three that are found. Fails where so few, or fewer, would be found once in a hundred times if nine
    /// of ten were: under 24 of 32. In a clinic a doubled week is no episode, since the rules that would tell it are off there (tests/README.md).
    /// </summary>
    [Theory]
    [InlineData("squad", 4)]
    [InlineData("runners", 4)]
    [InlineData("clinic", 3)]
    public void NineOfTenEpisodesOfEachKindAreFound(string group, int kinds)
    {
        var habits = Of(group);
        var found = Score.Episodes([.. Enumerable.Range(1, 4).Select(seed => Season.Of(Maker(habits, seed).WithEpisodes(32, 84), habits.Sport))]);

        Assert.Equal(kinds, found.Count);
        Assert.All(found, kind => Assert.True(kind.ChanceOfSoFew(0.9) > 0.01, kind.ToString()));
    }

    /// <summary>By hand: of 2 at 0.9 none is found with 0.01, at most one with 0.19; of 32 at most 24 with 0.0115, at most 23 with 0.0033 (binomial tables).</summary>
    [Theory]
    [InlineData(2, 0, 0.01)]
    [InlineData(2, 1, 0.19)]
    [InlineData(2, 2, 1)]
    [InlineData(1, 0, 0.1)]
    public void TheMarginIsThatOfTheBinomial(int episodes, int times, double chance) =>
        Assert.Equal(chance, new Found(HappeningKind.Fade, episodes, times, null).ChanceOfSoFew(0.9), 9);

    /// <summary>I-4, I-5, I-14.</summary>
    [Fact]
    public void NoAlertComesOfARestartASecondSweepOrABackFill()
    {
        var few = Squad with { People = [.. Squad.People.Take(8)] };
        var usual = Score.CountedRaises(Season.Of(few, Habits.Squad.Sport));

        Assert.NotEmpty(usual);
        foreach (var course in new[] { new Course { FromNothing = true }, new Course { TimesANight = 2 } })
        {
            Assert.Equal(usual, Score.CountedRaises(Season.Of(few, Habits.Squad.Sport, course)));
        }

        var filled = Season.Of(few, Habits.Squad.Sport, new Course { NightsBefore = 1 });
        Assert.Subset(usual.ToHashSet(), Score.CountedRaises(filled).ToHashSet());
    }

    /// <summary>Staff who never answer are told the same, and of nothing that it stands since a day on which it was over long ago.</summary>
    [Fact]
    public void StaffWhoNeverAnswerAreToldTheSameAndSinceWhenItStands()
    {
        var unanswered = Season.Of(Squad, Habits.Squad.Sport, new Course { StaffAnswer = false });

        Assert.Equal(Score.CountedRaises(Usual.Value), Score.CountedRaises(unanswered));
        var again = unanswered.People.SelectMany(person => person.Alerts.Where(alert => alert.StandsSince != alert.Raised)).ToList();
        Assert.NotEmpty(again);
        Assert.All(unanswered.People, person => Assert.All(person.Alerts, alert => Assert.Equal(
            person.Changes.Last(change => change.AlertId == alert.Id && change.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain).Date,
            alert.StandsSince)));
    }

    /// <summary>
    /// Squads with a plan, runners without; half of their recordings up to six days late. The same seasons with every recording on its day have as many false alerts of each
    /// rule, within three times what chance gives (the root of both counts); without waiting there would be more, and chatter. In the seventh week of
    /// nights: before six dates have come in, nobody knows how late they usually do.
    /// </summary>
    [Theory]
    [InlineData("squad")]
    [InlineData("runners")]
    public void LateFilesRaiseNoMoreOfAnyRule(string group)
    {
        var settled = new Course { NightsBefore = 42 };
        var (onTime, _) = FalseAlerts(group, new Noise { Late = 0 }, settled);
        var (late, chatter) = FalseAlerts(group, HalfLate, settled);
        var (untold, chatterUntold) = FalseAlerts(group, HalfLate, settled with { WaitsForLateFiles = false });

        Assert.All(late.GroupBy(rule => rule), rule => Assert.InRange(rule.Count() - onTime.Count(one => one == rule.Key), int.MinValue, 3 * Math.Sqrt(rule.Count() + onTime.Count(one => one == rule.Key))));
        Assert.True(late.Count < untold.Count);
        Assert.True(chatter <= chatterUntold);
        Assert.InRange(100.0 * late.Count(rule => rule == "silence") / PersonDays, 0, 0.25);
    }

    /// <summary>All that a device holds comes at once, every fourth day.</summary>
    [Fact]
    public void DevicesThatAreReadOutEveryFourDaysRaiseNoSilence() =>
        Assert.InRange(100.0 * FalseAlerts("clinic", new Noise { Late = 0, SyncDays = 4 }, new Course { NightsBefore = 42 }).Rules.Count(rule => rule == "silence") / PersonDays, 0, 0.25);

    [Fact]
    public void AClinicWithAFifthAwayHasTenRowsADayAndCountsTheRest()
    {
        var season = Season.Of(Maker(Habits.Clinic).WithAway(120, 42, 0.2), Habits.Clinic.Sport, new Course { NightsBefore = 7, StaffAnswer = false });

        Assert.All(season.Briefs, brief => Assert.InRange(brief.Flagged.Count, 0, 10));
        Assert.Contains(season.Briefs, brief => brief.FlaggedBeyond > 0);
    }

    /// <summary>The counting can see chatter: the same squad without deadband, delays and holds.</summary>
    [Fact]
    public void WithoutDeadbandAndDelaysChatterRises()
    {
        int Chatter(RuleLimits limits) => Score.Wavering(Season.Of(new WorldMaker(Seed, Habits.Squad, new Noise(), limits).Healthy(30, 84), Habits.Squad.Sport));

        Assert.True(Chatter(Limits.WithoutDeadband(Limits.Before(Habits.Squad))) > Chatter(Limits.Before(Habits.Squad)));
        Assert.True(Chatter(Limits.WithoutDeadband(Limits.BuiltIn(Habits.Squad))) > Chatter(Limits.BuiltIn(Habits.Squad)));
    }

    /// <summary>Of two seeds of 20 people and 56 days: the rule of each false alert, and how much chatter there was.</summary>
    private static (List<string> Rules, int Chatter) FalseAlerts(string group, Noise noise, Course course)
    {
        var habits = Of(group);
        var seasons = Enumerable.Range(Seed, 2).Select(seed => Season.Of(new WorldMaker(seed, habits, noise, Limits.BuiltIn(habits)).Healthy(20, 56), habits.Sport, course)).ToList();
        return ([.. seasons.SelectMany(Score.FalseAlerts).Select(raise => raise.Key.Rule)], seasons.Sum(Score.Wavering));
    }

    private static Habits Of(string group) => All.Single(habits => habits.Name == group);

    private static WorldMaker Maker(Habits habits, int seed = Seed) => new(seed, habits, new Noise(), Limits.BuiltIn(habits));
}
