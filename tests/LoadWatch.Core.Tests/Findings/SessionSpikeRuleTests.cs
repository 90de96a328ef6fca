using LoadWatch.Activities;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Plans;
using NodaTime;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;

namespace LoadWatch.Tests.Findings;

public class SessionSpikeRuleTests
{
    private static readonly SessionSpikeRule Rule = new();

    /// <summary>Eight runs of 10 km on the days 0, 3 ... 21.</summary>
    private static readonly JoinedActivity[] Runs = [.. Enumerable.Range(0, 8).Select(one => Run(3 * one, 10_000))];

    /// <summary>Eight rides of 100 AU on the same days.</summary>
    private static readonly JoinedActivity[] Rides = [.. Enumerable.Range(0, 8).Select(one => Ride(3 * one, 100))];

    [Theory]
    [InlineData(10_999, null)]
    [InlineData(11_000, Severity.Notice)]
    [InlineData(12_999, Severity.Notice)]
    [InlineData(13_000, Severity.Warning)]
    public void ARunIsHeldAgainstTheLongest(double metres, Severity? severity) => Assert.Equal(severity, Last([.. Runs, Run(24, metres)])?.Severity);

    [Theory]
    [InlineData(139.9, null)]
    [InlineData(140, Severity.Notice)]
    [InlineData(199.9, Severity.Notice)]
    [InlineData(200, Severity.Warning)]
    public void AnotherSessionIsHeldAgainstTheLargestLoad(double load, Severity? severity) => Assert.Equal(severity, Last([.. Rides, Ride(24, load)])?.Severity);

    [Fact]
    public void SaysWhatItIs()
    {
        var run = Last([.. Runs, Run(24, 13_500)])!;
        var ride = Last([.. Rides, Ride(24, 150)])!;

        Assert.Equal("Run of 13.5 km on 29 January, 35 % beyond the longest of the 30 days before (10.0 km on 5 January); the limit is 30 %.", run.Text);
        Assert.Equal(("distance", 0.35, 0.3, "fraction"), (run.Quantity, run.Value, run.Limit, run.Unit));
        Assert.Equal("Session of 150 AU on 29 January, 50 % beyond the largest of the 30 days before (100 AU on 5 January); the limit is 40 %.", ride.Text);
        Assert.Equal((null, 0.5, 0.4), (ride.Quantity, ride.Value, ride.Limit));
    }

    [Fact]
    public void FewerThanEightSayNothing()
    {
        Assert.Null(Last([.. Runs.Skip(1), Run(24, 20_000)]));
        Assert.Null(Last([.. Rides.Skip(1), Ride(24, 300)]));
        Assert.Null(Last([.. Rides.Skip(1), Ride(1, null), Ride(24, 300)]));
    }

    /// <summary>Day 0 is 31 days before day 31.</summary>
    [Theory]
    [InlineData(30, false)]
    [InlineData(31, true)]
    public void ThirtyDaysAreLookedBack(int day, bool raised) =>
        Assert.Equal(raised, Last([Run(0, 20_000), .. Runs.Select((run, place) => Run(1 + place, 10_000)), Run(day, 12_000)]) is not null);

    [Fact]
    public void ARunWithFewRunsBeforeGoesByItsLoadAgainstAllSessions()
    {
        Assert.Null(Last([.. Rides, Run(22, 5000, 90), Run(24, 15_000, 139)]));
        Assert.Null(Last([.. Rides, Run(22, 5000, 120), Run(24, 15_000, 150)]));
        Assert.Null(Last([.. Rides, Run(22, 5000, 100), Run(24, 15_000, 150)])!.Quantity);
    }

    [Fact]
    public void RowsWhoseLoadIsCountedElsewhereAreNoSessions() =>
        Assert.Null(Last([.. Rides, Ride(24, 300) with { AddsLoad = false }]));

    [Fact]
    public void APlannedMatchIsNotJudgedButLaterSessionsAreComparedWithIt()
    {
        Assert.Null(Last([.. Rides, Ride(24, 300)], Matches(24)));
        Assert.NotNull(Last([.. Rides, Ride(24, 300)], Matches(23)));
        Assert.Null(Last([.. Rides, Ride(24, 300), Ride(26, 290)], Matches(24)));
    }

    [Fact]
    public void ItHoldsOnThreeKnownDatesAfterIt()
    {
        var found = All(30, [.. Rides, Ride(24, 150), Ride(25, 50), Ride(28, 50), Ride(30, 50)]);

        Assert.Equal([On(24), On(25), On(26), On(27)], found.Select(finding => finding.Date));
        Assert.All(found, finding => Assert.Equal(On(24), finding.Since));
    }

    [Fact]
    public void AnUnknownTailDoesNotClearIt() =>
        Assert.Equal([On(24), On(25), On(26), On(27), On(28), On(29)], All(29, [.. Rides, Ride(24, 150)]).Select(finding => finding.Date));

    /// <summary>Day 24: 100 % beyond 100; day 26: 300 is 50 % beyond 200, a notice, and stands until day 29.</summary>
    [Fact]
    public void TheGravestStandsFirstAndTheRunGoesOn()
    {
        var found = All(30, [.. Rides, Ride(24, 200), Ride(26, 300), Ride(28, 50), Ride(30, 50)]);

        Assert.Equal(Enumerable.Range(24, 6).Select(On), found.Select(finding => finding.Date));
        Assert.Equal("WWWWNN", string.Concat(found.Select(finding => finding.Severity.ToString()[0])));
        Assert.All(found, finding => Assert.Equal(On(24), finding.Since));
    }

    [Fact]
    public void TheGroupsOwnQuantityIsTheLoadOfASession()
    {
        var rides = Rides.Append(Ride(24, 100)).Select((ride, place) => ride with { Quantities = [.. ride.Quantities, new Quantity("work", place < 8 ? 500 : 800, "kJ", false)] });
        var found = Rule.Evaluate(Subject(24, rides) with { LoadQuantity = "work", LoadUnit = "kJ" }).ToList();

        Assert.StartsWith("Session of 800 kJ on 29 January, 60 % beyond", Assert.Single(found).Text, StringComparison.Ordinal);
    }

    /// <summary>A converted load, or one that does not count for the person, goes before what the activity says of itself.</summary>
    [Fact]
    public void TheLoadThatCountsForTheDayGoesFirst()
    {
        var subject = Subject(24, [.. Rides, Ride(24, 100)]);
        var counted = subject.Activities.ToDictionary(ride => ride.Key, ride => (double?)(ride.Date == On(24) ? 170 : 100));

        Assert.Equal(0.7, Assert.Single(Rule.Evaluate(subject with { SessionLoads = counted })).Value);
        Assert.Empty(Rule.Evaluate(Subject(24, [.. Rides, Ride(24, 300)]) with { SessionLoads = new Dictionary<string, double?>() }));
    }

    [Fact]
    public void ARunAndARideOfOneDateAreTwoFindings() =>
        Assert.Equal([null, "distance"], All(24, [.. Runs, .. Rides, Ride(24, 200), Run(24, 12_000)]).Select(finding => finding.Quantity));

    private static Finding? Last(IEnumerable<JoinedActivity> sessions, PersonPlan? plan = null)
    {
        var list = sessions.ToList();
        var last = list.Max(session => session.Date);
        return Rule.Evaluate(Subject(Period.DaysBetween(On(0), last), list, plan)).LastOrDefault(finding => finding.Date == last);
    }

    private static List<Finding> All(int through, IEnumerable<JoinedActivity> sessions) => Rule.Evaluate(Subject(through, sessions)).ToList();
}
