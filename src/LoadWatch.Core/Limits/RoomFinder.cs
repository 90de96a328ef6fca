// The rules of rising load, inverted: the real rules read the date with one session of a supposed load, and the load is searched at which the first of them would raise.
// Closed forms that the search comes to, with all days known (tests check them): load ratio L = raise x usual - six days; weekly jump
// L = max((1 + raise) x last week, factor x median) - six days; session spike L = (1 + notice) x largest; hard days L = factor x median.
// No published source gives such a figure: a choice, as the limits themselves are.
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;

namespace LoadWatch.Limits;

/// <summary>Finds how much load a date may hold (<see cref="TodaysRoom"/>). Looks at the group's load alone: limits of other quantities and of running distance are not inverted. Pure.</summary>
public static class RoomFinder
{
    private const int LargestOfDays = 30;
    private const int KnownOf7 = 5;

    /// <summary>The search ends when it is so near, as a share of the largest day.</summary>
    private const double Nearness = 0.0001;

    /// <summary>Steps of the search where a limit may be passed by some loads and kept by larger ones. A choice.</summary>
    private const int Steps = 24;

    private static readonly IReadOnlyList<IRule> Rising =
        [.. RuleBook.OfLoad.Where(rule => rule is LoadRatioRule or WeeklyJumpRule or SessionSpikeRule or MonotonyRule or HardDaysRule)];

    /// <param name="before">Unbroken days up to the one before the date, at least one, with their sessions, the last with what it carries; all or as many as look-backs need.</param>
    /// <param name="plan">What is said of the date.</param>
    public static TodaysRoom Of(Person person, Group group, IReadOnlyList<Day> before, PersonPlan plan)
    {
        var date = before[^1].Date.PlusDays(1);
        var largest = before.TakeLast(LargestOfDays).Where(day => day.Load > 0).MaxBy(day => day.Load);
        var bare = new TodaysRoom
        {
            Person = person.Id,
            Date = date,
            LoadQuantity = group.LoadQuantity,
            LargestDay = largest?.Load,
            LargestDayOn = largest?.Date,
            Regions = [.. Weeks(before[^1])],
        };
        var said = plan.On(date);
        if (PlanMutes.Holds(PlannedState.Absent, said) || PlanMutes.Holds(PlannedState.Returning, said))
        {
            return bare with { Reason = said.Absence is null ? NoRoom.Returning : NoRoom.Absent };
        }

        var trial = new TrialDate(person, group, before, date, said);
        return trial.With(0) is not { Acute: not null, ChronicBefore: not null } ? bare with { Reason = NoRoom.TooLittleKnown }
            : largest is null ? bare with { Reason = NoRoom.NoTrainingDay }
            : Within(bare, trial, largest.Load!.Value, group.Limits);
    }

    private static TodaysRoom Within(TodaysRoom bare, TrialDate trial, double largest, RuleLimits limits)
    {
        var (load, heldBy) = (largest, (IRule?)null);
        foreach (var rule in Rising.Where(rule => rule.LimitsOf(limits).Enabled))
        {
            if (Kept(trial, rule, load) is { } kept)
            {
                (load, heldBy) = (kept, rule);
            }
        }

        return bare with { Load = Significant.Round(load), HeldBy = heldBy?.Name, IsPassedAtRest = heldBy is not null && trial.Raises(heldBy, 0) };
    }

    /// <summary>The largest load up to which, from none on, a rule does not raise; null where it raises by no load up to <paramref name="most"/>.</summary>
    private static double? Kept(TrialDate trial, IRule rule, double most)
    {
        if (trial.Raises(rule, 0))
        {
            return 0;
        }

        var low = 0.0;
        foreach (var load in rule is MonotonyRule ? Even(trial, most) : [most])
        {
            if (trial.Raises(rule, load))
            {
                return Between(trial, rule, low, load, Nearness * most);
            }

            low = load;
        }

        return null;
    }

    private static double Between(TrialDate trial, IRule rule, double kept, double raised, double near)
    {
        while (raised - kept > near)
        {
            var middle = (kept + raised) / 2;
            (kept, raised) = trial.Raises(rule, middle) ? (kept, middle) : (middle, raised);
        }

        return kept;
    }

    /// <summary>Monotony rises to a peak, at the sum of squares of the other six loads over their sum, and falls again: looked at in steps, the peak among them.</summary>
    private static IEnumerable<double> Even(TrialDate trial, double most)
    {
        var steps = Enumerable.Range(1, Steps).Select(step => most * step / Steps);
        return (trial.MostEven is { } peak && peak > 0 && peak < most ? steps.Append(peak) : steps).Order();
    }

    private static IEnumerable<HeavyWeek> Weeks(Day last) => BodyRegions.All
        .Select(region => (Region: region, Day: last.Regions.GetValueOrDefault(region, RegionDay.NotCovered)))
        .Where(one => one.Day.DaysSince is not null)
        .Select(one =>
        {
            var usual = Significant.Round(one.Day.Usual14 / 2);
            return new HeavyWeek(one.Region, one.Day.Days7, one.Day.Known7, usual, one.Day.Known7 >= KnownOf7 && usual is > 0 and var wanted ? one.Day.Days7 >= wanted : null);
        });
}
