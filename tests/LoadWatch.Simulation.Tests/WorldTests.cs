using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation.Tests;

/// <summary>The generator keeps what it promises; else its counts would mean nothing.</summary>
public class WorldTests
{
    private static readonly World Squad = new WorldMaker(7, Habits.Squad, new Noise(), Limits.BuiltIn(Habits.Squad)).Healthy(60, 100);

    [Fact]
    public void TheSameSeedGivesTheSameWorldAndAnotherAnother()
    {
        World Of(int seed) => new WorldMaker(seed, Habits.Clinic, new Noise(), Limits.BuiltIn(Habits.Clinic)).Healthy(3, 30);

        Assert.Equal(Of(1).People.SelectMany(person => person.Sessions), Of(1).People.SelectMany(person => person.Sessions));
        Assert.NotEqual(Of(1).People.SelectMany(person => person.Sessions), Of(2).People.SelectMany(person => person.Sessions));
    }

    /// <summary>Standard deviation of the logarithm of a load beside the others of its person and weekday, with n - 1 for each; 60 people with 28 weeks: 0.3 within 0.01.</summary>
    [Fact]
    public void LoadsVaryByTheDeviation()
    {
        var sets = Squad.People
            .SelectMany(person => person.Sessions
                .Where(session => !session.IsMatch && !person.Happenings.Any(one => one.Kind == HappeningKind.Travel && one.Covers(session.Date)))
                .GroupBy(session => session.Date.DayOfWeek))
            .Select(day => day.Select(session => Math.Log(session.Load)).ToList())
            .Where(set => set.Count > 1)
            .ToList();
        var squares = sets.Sum(set => set.Sum(value => Math.Pow(value - set.Average(), 2)));

        Assert.Equal(0.3, Math.Sqrt(squares / sets.Sum(set => set.Count - 1)), 0.01);
    }

    [Fact]
    public void RecordingsAreMissingLateAndFaultyAsOftenAsSaid()
    {
        var sessions = Squad.People.SelectMany(person => person.Sessions).ToList();
        var recorded = sessions.Where(session => session.Recorded is not null).ToList();

        Assert.Equal(0.15, 1 - ((double)recorded.Count / sessions.Count), 0.015);
        Assert.Equal(0.1, recorded.Count(session => session.Recorded!.ArrivesOn > session.Date) / (double)recorded.Count, 0.015);
        Assert.Equal(0.04, recorded.Count(session => session.Recorded!.Load is null) / (double)recorded.Count, 0.01);
        Assert.Equal(0.01, recorded.Count(session => session.Recorded!.Load > session.Load) / (double)recorded.Count, 0.005);
        Assert.Contains(recorded, session => session.Recorded!.Source == "device 2");
    }

    [Fact]
    public void ThereAreJourneysIllnessMovedMatchesAndPeopleWhoNeverDoAnythingFast()
    {
        var kinds = Squad.People.SelectMany(person => person.Happenings).Select(one => one.Kind).ToHashSet();

        Assert.Superset(new HashSet<HappeningKind> { HappeningKind.Ill, HappeningKind.Travel, HappeningKind.NeverFast }, kinds);
        Assert.DoesNotContain(kinds, kind => kind <= HappeningKind.Fade);
        Assert.Contains(Squad.People[0].Sessions, session => session.IsMatch && session.Date.DayOfWeek == NodaTime.IsoDayOfWeek.Sunday);
        Assert.All(Squad.People, person => Assert.DoesNotContain(person.Sessions, session => person.Happenings.Any(one => one.Kind == HappeningKind.Ill && one.Covers(session.Date))));
    }

    [Fact]
    public void EpisodesAreAsLargeAsTheirNames()
    {
        var world = new WorldMaker(7, Habits.Squad, new Noise { LoadDeviation = 0, DistanceDeviation = 0 }, Limits.BuiltIn(Habits.Squad)).WithEpisodes(40, 84);
        foreach (var person in world.People)
        {
            var episode = Assert.Single(person.Happenings, one => one.IsEpisode);
            var within = person.Sessions.Where(session => episode.Covers(session.Date) && !session.IsMatch).ToList();
            var usual = person.Sessions.First(session => !session.IsMatch && session.Date.DayOfWeek == within[^1].Date.DayOfWeek).Load;
            switch (episode.Kind)
            {
                case HappeningKind.DoubleSession:
                    Assert.Equal(2 * person.Sessions.Where(session => session.Date < episode.From && session.Date >= episode.From.PlusDays(-30)).Max(session => session.Load), within.Single().Load, 9);
                    Assert.NotNull(within[0].Recorded!.Load);
                    break;
                case HappeningKind.NothingHeavy:
                    Assert.All(within, session => Assert.InRange(session.HardEfforts, 0, 1));
                    break;
                case HappeningKind.DoubleWeek:
                    Assert.Equal(2 * usual, within[^1].Load, 9);
                    break;
                case HappeningKind.Fade:
                    Assert.Equal(0.4 * usual, within[^1].Load, 9);
                    break;
                default:
                    break;
            }
        }
    }
}
