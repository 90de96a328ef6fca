using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>
/// Three years of an invented person by a number: stretches of steady, rising, fading and no training, two devices and a form, ratings without heart rate, sets,
/// poor recordings; absences, phases, matches and expected sessions; function tests; reference values that change. The same number gives the same history.
/// </summary>
internal sealed class RandomHistory
{
    public const int Days = 1095;

    public static readonly LocalDate First = new(2023, 3, 6);

    private readonly IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, Histogram>> histograms;
    private readonly Dictionary<string, IReadOnlyDictionary<Channel, BestMeans>> bestMeans;
    private ulong state;

    public RandomHistory(uint number)
    {
        state = number + 0x9E3779B97F4A7C15UL;
        Person = new Person("anna", "Anna", "squad", Below(2) == 0 ? 1950 : 1990, null, DateTimeZone.Utc)
        {
            HeartRateInvalid = Below(3) == 0 ? DatePeriods.Of(Enumerable.Range(0, 1 + Below(3)).Select(_ => Invalid())) : DatePeriods.Never,
        };
        Group = MakeGroup();
        Sessions = [.. Stretches().SelectMany(DaysOf)];
        Plan = MakePlan();
        Tests = [.. Enumerable.Range(0, Below(30)).Select(_ => Test(First.PlusDays(Below(Days) - 20)))];
        Anchors = RandomReferences.Anchors(Below, First, Days);
        (Sessions, histograms) = RandomReferences.Computed(Sessions, Person, Anchors, Below);
        bestMeans = Sessions.Where(session => session.Sport.Name == "cycling").ToDictionary(session => session.Key, Bests, StringComparer.Ordinal);
    }

    public Person Person { get; }

    public Group Group { get; }

    public IReadOnlyList<JoinedActivity> Sessions { get; }

    public PersonPlan Plan { get; }

    public IReadOnlyList<DatedTest> Tests { get; }

    public AnchorBook Anchors { get; }

    /// <summary>As known with the reference values up to a date.</summary>
    public ReferenceChanges Changes(LocalDate? through = null)
    {
        var known = new AnchorBook(Anchors.Of(Person.Id).Where(anchor => !(anchor.Date > through)));
        var periods = ReferencePeriods.Of(Person, Group, known);
        return new ReferenceChanges(periods, () => new RestatedSessions(Person, known, new ComputationSettings(), periods.Quantities, histograms));
    }

    /// <summary>Of the sessions of some dates, both ends included.</summary>
    public IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>> BestMeans(LocalDate from, LocalDate to) => Sessions
        .Where(session => session.Date >= from && session.Date <= to && bestMeans.ContainsKey(session.Key))
        .ToDictionary(session => session.Key, session => bestMeans[session.Key], StringComparer.Ordinal);

    /// <summary>A whole number from 0 on, below a limit.</summary>
    public int Below(int limit)
    {
        state ^= state << 13;
        state ^= state >> 7;
        state ^= state << 17;
        return (int)(state % (ulong)limit);
    }

    /// <summary>The session with another load, as a correction brings it.</summary>
    public JoinedActivity Corrected(JoinedActivity session) => session with
    {
        Quantities = [.. session.Quantities.Select(quantity => quantity with { Value = Significant.Round(quantity.Value * (0.5 + (Below(150) / 100.0))) })],
    };

    /// <summary>An effort of a ride, mostly as hard as can be by a critical power that changes from season to season, amid 100 W; often with heart rate.</summary>
    private IReadOnlyDictionary<Channel, BestMeans> Bests(JoinedActivity session)
    {
        int[] efforts = [120, 180, 300, 720, 1200];
        var (seconds, critical) = (efforts[Below(efforts.Length)], Period.DaysBetween(First, session.Date) / 90 % 2 == 0 ? 260 : 215);
        var watts = (critical + (18_000.0 / seconds)) * (Below(4) == 0 ? 0.8 : 1);
        var power = new BestMeans(Capacity.BestMeans.Durations.Select(duration => Significant.Round(duration <= seconds ? watts : 100 + ((watts - 100) * seconds / duration))));
        var heartRate = new BestMeans(Capacity.BestMeans.Durations.Select(_ => 170.0 + Below(4)));
        return Below(3) == 0 ? new Dictionary<Channel, BestMeans> { [Channel.Power] = power } : new Dictionary<Channel, BestMeans> { [Channel.Power] = power, [Channel.HeartRate] = heartRate };
    }

    private DatePeriod Invalid()
    {
        var from = First.PlusDays(Below(Days));
        return new DatePeriod(from, Below(3) == 0 ? null : from.PlusDays(Below(200)));
    }

    private Group MakeGroup()
    {
        string[] watched = ["distance", "minutes"];
        var limits = new RuleLimits
        {
            LoadRatio = new() { Quantities = watched, Raise = 1.3, Return = 1.2 },
            WeeklyJump = new() { Quantities = watched, Raise = 0.2, Return = 0.1, LookBackWeeks = 4 + Below(48), OnDays = 1 + Below(4) },
            FallingLoad = new() { Quantities = watched },
            Monotony = new() { Raise = 1.2, Return = 1.1, LookBackDays = 60 + Below(341) },
            HardDays = new() { Days = 2 },
            StimulusLow = new() { HistoryDays = 28 + Below(338) },
            FallingCapacity = new() { SessionsWanted = 2, SpeedPercent = 3, PowerPercent = 3 },
            Silence = new() { LookBackDays = 28 + Below(373), PlannedWaitDays = Below(4), PlannedMissed = 1 + Below(4) },
            FunctionTest = new() { HoldDays = 30 + Below(900) },
        };
        return Below(3) switch
        {
            0 => new Group("squad", "Squad", QuantityNames.Work, limits) { LoadFallbacks = [QuantityNames.FosterLoad, QuantityNames.BanisterTrimp] },
            1 => new Group("squad", "Squad", QuantityNames.Minutes, limits),
            _ => new Group("squad", "Squad", QuantityNames.BanisterTrimp, limits) { LoadFallbacks = [QuantityNames.EdwardsLoad, QuantityNames.FosterLoad] },
        };
    }

    /// <summary>First day, length, share of days trained in per cent, and size.</summary>
    private IEnumerable<(int From, int Length, int Share, int Size)> Stretches()
    {
        var day = 0;
        while (day < Days)
        {
            var length = Below(8) == 0 ? 100 + Below(500) : 10 + Below(80);
            var kind = Below(6);
            yield return (day, Math.Min(length, Days - day), kind == 0 && day > 0 ? 0 : 20 + Below(80), 40 + Below(120));
            day += length;
        }
    }

    private IEnumerable<JoinedActivity> DaysOf((int From, int Length, int Share, int Size) stretch)
    {
        var found = new List<JoinedActivity>();
        for (var day = stretch.From; day < stretch.From + stretch.Length; day++)
        {
            if (Below(100) < stretch.Share || (day == 0 && stretch.Share > 0))
            {
                found.AddRange(Enumerable.Range(0, Below(8) == 0 ? 2 : 1).Select(order => Session(day, order, stretch.Size)));
            }
        }

        return found;
    }

    private JoinedActivity Session(int day, int order, int size)
    {
        var sport = Below(5) switch { 0 or 1 => "running", 2 => "cycling", 3 => "training", _ => "walking" };
        var load = size * (0.5 + (Below(100) / 100.0)) * (Below(25) == 0 ? 3 : 1);
        return new JoinedActivity
        {
            Key = $"{Below(1000):000}-{day:0000}-{order}",
            Date = First.PlusDays(day),
            Sport = new Sport(sport),
            Sources = Below(10) == 0 ? ["form", "watch"] : Below(6) == 0 ? ["form"] : [day > 600 ? "new watch" : "watch"],
            Quantities = [.. Quantities(sport, load).OrderBy(quantity => quantity.Name, StringComparer.Ordinal)],
            Stimulus = Stimulus(),
            UsableShare = Below(6) == 0 ? new Dictionary<Channel, double> { [Channel.HeartRate] = Below(100) / 100.0, [Channel.Power] = 0.4, [Channel.Speed] = 0.3 } : new Dictionary<Channel, double>(),
            AddsLoad = Below(30) != 0,
        };
    }

    private IEnumerable<Quantity> Quantities(string sport, double load)
    {
        var heartRate = Below(4) != 0;
        if (heartRate)
        {
            yield return Of(QuantityNames.BanisterTrimp, load, "AU");
            yield return Of(QuantityNames.EdwardsLoad, (load * 1.9) + Below(20), "AU");
        }

        if (Below(3) != 0)
        {
            yield return Of(QuantityNames.FosterLoad, (load * 4) + Below(60), "AU");
        }

        if (Below(12) != 0)
        {
            yield return Of(QuantityNames.Minutes, load * 0.7, "min");
        }

        if (sport == "cycling" && Below(4) != 0)
        {
            yield return Of(QuantityNames.Work, load * 9, "kJ");
            yield return Of(QuantityNames.PowerTop, 700 + Below(300), "W");
        }

        if (sport is "running" or "walking")
        {
            yield return Of(QuantityNames.Distance, load * 110, "m");
            yield return Of(QuantityNames.SpeedTop, 6 + (Below(300) / 100.0), "m/s");
        }

        if (sport == "training" && Below(2) == 0)
        {
            yield return Of($"{QuantityNames.OneRepetitionMaxOf}leg_press", 90 + Below(40), "kg");
        }
    }

    private static Quantity Of(string name, double value, string unit) => new(name, Significant.Round(value), unit, Estimated: false);

    private IReadOnlyList<RegionStimulus> Stimulus() => Below(5) switch
    {
        0 => [],
        1 => [new RegionStimulus(BodyRegion.Legs, Grade.E, "heart_rate", null, null, null, null, null, null, ["not seen"])],
        _ => [new RegionStimulus(Below(4) == 0 ? BodyRegion.Arms : BodyRegion.Legs, Grade.B, "power", new Band(1, Below(7), 9), null, null, null, null, null, [])],
    };

    private PersonPlan MakePlan()
    {
        var words = Enum.GetValues<PlanWord>();
        var entries = Enumerable.Range(0, Below(30)).Select(_ => Entry(words[Below(words.Length)], Below(Days), Below(Below(9) == 0 ? 300 : 20))).ToList();
        if (Below(2) == 0)
        {
            var (from, step, count) = (Below(Days), 1 + Below(4), 20 + Below(150));
            entries.AddRange(Enumerable.Range(0, count).Select(at => Entry(PlanWord.TeamSession, from + (at * step), 0) with { RecordingExpected = true }));
        }

        return new PersonPlan
        {
            Entries = [.. entries.OrderBy(entry => entry.From)],
            Absences = [.. MakeAbsences()],
            Returns = [.. Enumerable.Range(0, Below(4)).Select(_ => First.PlusDays(Below(Days))).Distinct().Order()],
            Rests = Enumerable.Range(0, Below(80)).Select(_ => First.PlusDays(Below(Days))).Distinct().ToDictionary(date => date, _ => "days"),
            Attendance = Enumerable.Range(0, Below(40)).Select(_ => First.PlusDays(Below(Days) - 5)).Distinct().ToDictionary(date => date, _ => Below(2) == 0),
        };
    }

    private static PlanEntry Entry(PlanWord word, int from, int length) =>
        new(word, First.PlusDays(from), First.PlusDays(from + length), null, null, word == PlanWord.Match, null);

    private IEnumerable<Absence> MakeAbsences()
    {
        var day = Below(200);
        while (day < Days)
        {
            var length = Below(5) == 0 ? Below(200) : Below(15);
            yield return new Absence((AbsenceWord)Below(3), First.PlusDays(day), Below(12) == 0 && day > 900 ? null : First.PlusDays(day + length));
            day += length + 1 + (Below(3) == 0 ? 0 : Below(250));
        }
    }

    private DatedTest Test(LocalDate date) => new(date, new TestRow(
        Below(2) == 0 ? FunctionTests.Gait : FunctionTests.ChairStands,
        Below(8) == 0 ? null : Below(2) == 0 ? 0.5 + (Below(100) / 100.0) : 8 + Below(12),
        null,
        null,
        null,
        Below(8) == 0 ? TestOutcome.Unable : null,
        null,
        null,
        0.43))
    {
        Body = date.Day % 2 == 0 ? new BodySize(70, 1.6) : BodySize.Unknown,
    };
}
