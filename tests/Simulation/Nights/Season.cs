using LoadWatch.Alerts;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Pipeline;
using LoadWatch.Simulation.Worlds;
using NodaTime;

namespace LoadWatch.Simulation.Nights;

/// <summary>A group's season, night by night, with the brief of one contact every morning.</summary>
public static class Season
{
    private const int DaysInABrief = 60;

    public static SeasonResult Of(World world, Sport sport, Course? course = null)
    {
        var how = course ?? new Course();
        var people = world.People.Select(person => new PersonNights(person, world.Group, sport, how)).ToList();
        var contact = new Contact(
            "contact", "Contact", ContactRole.Coach, [world.Group.Id], [], people[0].Truth.Person.Zone, new LocalTime(6, 30), Enum.GetValues<IsoDayOfWeek>().Where(day => day != IsoDayOfWeek.None).ToHashSet());
        var briefs = new List<Brief>();
        foreach (var night in Nights(world, how))
        {
            var date = DayUpdate.LastDateOver(people[0].Truth.Person, night);
            people.AsParallel().ForAll(person => person.Pass(date));
            var morning = date.PlusDays(1);
            var brief = BriefBuilder.Build(contact, morning, [.. people.Select(person => Subject(person, world.Group, date))], []);
            if (how.StaffAnswer)
            {
                Answer(people, brief, morning);
            }

            if (date >= world.Counted)
            {
                briefs.Add(brief);
            }
        }

        return new SeasonResult(world, people, briefs);
    }

    /// <summary>Every 24 hours, by no clock that is ever put back.</summary>
    private static IEnumerable<Instant> Nights(World world, Course how)
    {
        var first = world.Counted.PlusDays(1 - how.NightsBefore).AtStartOfDayInZone(world.People[0].Person.Zone).ToInstant() + Duration.FromHours(3);
        for (var night = first; night.InUtc().Date <= world.Last.PlusDays(1); night += Duration.FromDays(1))
        {
            for (var times = 0; times < how.TimesANight; times++)
            {
                yield return night;
            }
        }
    }

    /// <summary>New is what came with the last night: there is a brief every morning.</summary>
    private static BriefSubject Subject(PersonNights person, Group group, LocalDate date)
    {
        var news = person.Changes.Reverse().TakeWhile(change => change.Date >= date).ToLookup(change => change.AlertId, StringComparer.Ordinal);
        var alerts = person.Alerts
            .Where(alert => AlertLife.IsActive(alert.State) || news.Contains(alert.Id))
            .Select(alert => new AlertNews(
                alert,
                news[alert.Id].Any(change => change.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain or AlertChangeReason.SeverityRose),
                !AlertLife.IsActive(alert.State),
                news[alert.Id].Any(change => change.Reason == AlertChangeReason.Corrected)));
        return new BriefSubject(person.Truth.Person, group, [.. person.Days.TakeLast(DaysInABrief)], [.. alerts], []);
    }

    /// <summary>Whoever is named is seen by the next night.</summary>
    private static void Answer(List<PersonNights> people, Brief brief, LocalDate morning)
    {
        var byId = people.ToDictionary(person => person.Truth.Person.Id, StringComparer.Ordinal);
        foreach (var named in brief.Flagged)
        {
            foreach (var reason in named.Reasons)
            {
                byId[named.PersonId].Acknowledge(reason.AlertId, morning);
            }
        }
    }
}

/// <summary>What befalls the service itself.</summary>
public sealed record Course
{
    /// <summary>Every night begins from what came in, with nothing computed before.</summary>
    public bool FromNothing { get; init; }

    /// <summary>Sweeps a night: the second finds nothing new.</summary>
    public int TimesANight { get; init; } = 1;

    /// <summary>Nights before the counted ones; all that came before comes in the first of them.</summary>
    public int NightsBefore { get; init; } = 14;

    /// <summary>Whether silence is given the time within which the person's files usually come.</summary>
    public bool WaitsForLateFiles { get; init; } = true;

    /// <summary>Whether anybody says that they have seen anything.</summary>
    public bool StaffAnswer { get; init; } = true;
}

/// <param name="Briefs">Of the counted days.</param>
public sealed record SeasonResult(World World, IReadOnlyList<PersonNights> People, IReadOnlyList<Brief> Briefs);
