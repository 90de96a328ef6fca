using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Everything that rules look at for one person.</summary>
/// <param name="Days">Unbroken days of the person by the group's load, oldest first; each carries what plan and answers say of it.</param>
/// <param name="Limits">Of the person's group.</param>
public sealed record RuleSubject(Person Person, IReadOnlyList<Day> Days, RuleLimits Limits)
{
    /// <summary>The first date to judge; null: that of the first day. The days before it are there to look back at.</summary>
    public LocalDate? From { get; init; }

    /// <summary>What rules kept on the day before <see cref="From"/>, and where they put what they keep.</summary>
    public RuleMemory Memory { get; init; } = new(Carried.Nothing);

    /// <summary>Unit of the group's load, for texts and evidence.</summary>
    public string LoadUnit { get; init; } = LoadRatioRule.ArbitraryUnits;

    /// <summary>Name of the quantity that is the group's load.</summary>
    public string LoadQuantity { get; init; } = QuantityNames.BanisterTrimp;

    /// <summary>The standard deviation that the days' monotony rests on.</summary>
    public LoadDeviation Deviation { get; init; }

    /// <summary>The load that each session counts with on its day, by key of the activity; null where that is the quantity as the activity has it.</summary>
    public IReadOnlyDictionary<string, double?>? SessionLoads { get; init; }

    /// <summary>What counts of the person's training up to the last day, by date, then key; from the look-back before <see cref="From"/> on.</summary>
    public IReadOnlyList<JoinedActivity> Activities { get; init; } = [];

    /// <summary>
    /// Best means of heart rate, power and speed by key of the activity, of the activities from two stretches of <see cref="FallingCapacityLimits.Days"/> before <see cref="From"/> on;
    /// empty where nothing is recorded on a date to judge.
    /// </summary>
    public IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>> BestMeans { get; init; } = NoBestMeans;

    /// <summary>Of no session.</summary>
    public static IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>> NoBestMeans { get; } = new Dictionary<string, IReadOnlyDictionary<Channel, BestMeans>>();

    public PersonPlan Plan { get; init; } = PersonPlan.None;

    /// <summary>Function tests from <see cref="From"/> to the last day, by date.</summary>
    public IReadOnlyList<DatedTest> Tests { get; init; } = [];

    /// <summary>Days by other quantities that the limits name, by name of the quantity; each as long as <see cref="Days"/>.</summary>
    public IReadOnlyDictionary<string, QuantitySeries> Series { get; init; } = new Dictionary<string, QuantitySeries>();

    /// <summary>Index of the first day to judge.</summary>
    internal int First => Days.Count == 0 || From is not { } from ? 0 : Math.Clamp(Period.DaysBetween(Days[0].Date, from), 0, Days.Count);

    /// <summary>The days to judge.</summary>
    internal IEnumerable<Day> Judged => Days.Skip(First);
}

/// <summary>The days of a quantity other than the group's load.</summary>
public sealed record QuantitySeries(string Quantity, string Unit, IReadOnlyList<Day> Days);

/// <summary>A function test or reference value of a date.</summary>
public sealed record DatedTest(LocalDate Date, TestRow Test)
{
    /// <summary>The person on that date; asked of chair stands alone.</summary>
    public BodySize Body { get; init; } = BodySize.Unknown;
}
