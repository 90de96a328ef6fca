using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Simulation.Worlds;

/// <summary>Makes a group of people and their season, with its truth, from a seed.</summary>
/// <param name="limits">Of the rules of the group.</param>
public sealed class WorldMaker(int seed, Habits habits, Noise noise, RuleLimits limits)
{
    /// <summary>A Monday; the clocks of the zone change on 26 October, in the first of the counted weeks.</summary>
    private static readonly LocalDate First = new(2025, 6, 30);

    /// <summary>Days in which rules learn what is usual.</summary>
    private const int LearningDays = 112;

    private static readonly DateTimeZone Zone = DateTimeZoneProviders.Tzdb["Europe/Berlin"];

    /// <summary>People with nothing to find.</summary>
    /// <param name="days">Counted days.</param>
    public World Healthy(int people, int days) => Make(people, days, (_, _) => null);

    /// <summary>People with an episode each, the kinds of their group by turns.</summary>
    public World WithEpisodes(int people, int days) =>
        Make(people, days, (chance, index) => Episode(chance, habits.Episodes[index % habits.Episodes.Count], First.PlusDays(LearningDays), days));

    /// <summary>Some of them stay away for three weeks and tell nobody.</summary>
    public World WithAway(int people, int days, double share) => Make(
        people,
        days,
        (chance, _) => chance.Happens(share) ? Span(HappeningKind.AwayUntold, First.PlusDays(LearningDays + (days / 3) + chance.Below(14)), 21) : null);

    private World Make(int people, int days, Func<Chance, int, Happening?> extra)
    {
        var last = First.PlusDays(LearningDays + days - 1);
        var common = new Chance(seed, habits.Name);
        var group = new Group(habits.Name, habits.Name, habits.LoadQuantity, limits);
        var calendar = Calendar(common, last);
        var made = Enumerable.Range(0, people).Select(index =>
        {
            var chance = common.Stream($"person {index}");
            var person = new Person($"{habits.Name}{index:000}", $"{habits.Name} {index:000}", habits.Name, chance.Stream("birth").Between(habits.BirthYears.First, habits.BirthYears.Last), null, Zone);
            return new PersonMaker(person, habits, noise, calendar, chance).Make(extra(chance.Stream("extra"), index), index);
        });
        return new World(habits.Name, group, [.. made], First, First.PlusDays(LearningDays), last);
    }

    /// <summary>What befalls the whole group: journeys, and matches that are played a day later than planned.</summary>
    private static GroupCalendar Calendar(Chance chance, LocalDate last)
    {
        var journeys = chance.Stream("journeys");
        var travels = new List<Happening>();
        for (var from = First.PlusDays(LearningDays + 10 + journeys.Below(30)); from.PlusDays(4) <= last; from = from.PlusDays(40 + journeys.Below(30)))
        {
            travels.Add(Span(HappeningKind.Travel, from, journeys.Between(3, 5)));
        }

        var moved = chance.Stream("moved matches");
        var weeks = Enumerable.Range(0, (Period.DaysBetween(First, last) / 7) + 1).Where(_ => moved.Happens(0.1)).ToHashSet();
        return new GroupCalendar(First, last, travels, weeks);
    }

    private static Happening Episode(Chance chance, HappeningKind kind, LocalDate counted, int days)
    {
        var length = kind switch
        {
            HappeningKind.DoubleWeek => 7,
            HappeningKind.DoubleSession => 1,
            HappeningKind.NothingHeavy => 14,
            _ => 56,
        };
        return Span(kind, counted.PlusDays(7 + chance.Below(Math.Max(1, days - length - 21))), length);
    }

    private static Happening Span(HappeningKind kind, LocalDate from, int days) => new(kind, from, from.PlusDays(days - 1));
}

/// <param name="MovedWeeks">Weeks from the first date whose match is played on the day after the planned one; nobody corrects the plan.</param>
public sealed record GroupCalendar(LocalDate First, LocalDate Last, IReadOnlyList<Happening> Travels, IReadOnlySet<int> MovedWeeks);
