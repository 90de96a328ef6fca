using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Stimulus;
using LoadWatch.Tests.Days;

namespace LoadWatch.Tests.Findings;

/// <summary>Builds single days as rules read them; day 0 is Monday, 5 January 2026.</summary>
internal static class Watched
{
    /// <summary>The limits by which rules are tried one by one, easy to reckon with; how the built-in ones do is for the simulation to say.</summary>
    public static readonly RuleLimits Stated = new()
    {
        LoadRatio = new() { Raise = 1.8, Return = 1.6, UsualFactor = 1, OnDays = 1 },
        WeeklyJump = new() { Raise = 0.4, Return = 0.25, UsualFactor = 1.2, UnplannedFactor = 1.2, OnDays = 2, OffDays = 1 },
        SessionSpike = new() { RunNotice = 0.1, RunWarning = 0.3, LoadNotice = 0.4, SessionsWanted = 8 },
        FallingLoad = new() { Notice = 0.6, Days = 14, OnDays = 1 },
        StimulusGap = new() { NoticeDays = 10 },
        StimulusLow = new() { UsualShare = 0.5, OlderFloorDays = 3 },
        Silence = new() { ExtraDays = 2, PlannedMissed = 2 },
        NotUsable = new() { Sessions = 2 },
    };

    /// <summary>A day on which every condition of the load ratio but the ratio itself is met; null is a day of unknown load.</summary>
    public static Day Ratio(int day, double? ratio) => new()
    {
        Person = "anna",
        Date = Training.On(day),
        State = ratio is null ? DayState.Unknown : DayState.Recorded,
        Load = ratio * 30,
        Acute = ratio * 200,
        Chronic = ratio is null ? null : 250,
        ChronicBefore = ratio is null ? null : 200,
        ChronicMedian = 250,
        RatioUncoupled = ratio,
        Coverage7 = 1,
        Coverage28 = 1,
        DaysSinceFirstCovered = 100,
        DaysSinceRecorded = 0,
    };

    public static List<Day> Ratios(params double?[] ratios) => ratios.Select((ratio, day) => Ratio(day, ratio)).ToList();

    public static Day Gap(int day, int gap, int? known = null, bool seen = true, double? usual = null) => new()
    {
        Person = "anna",
        Date = Training.On(day),
        State = seen ? DayState.Recorded : DayState.Unknown,
        Regions = new Dictionary<BodyRegion, RegionDay>
        {
            [BodyRegion.Legs] = new(seen ? gap == 0 : null, 0, 0, gap, known ?? gap, usual),
        },
    };

    /// <summary>A heavy day, then known days without heavy or fast work up to the gap.</summary>
    public static List<Day> GapOf(int days, double? usual = null) => Enumerable.Range(0, days + 1).Select(day => Gap(day, day, usual: usual)).ToList();

    /// <summary>What holds where the rule is watched.</summary>
    public static List<Finding> Of(this IRule rule, IReadOnlyList<Day> days, int? birthYear = 1990, RuleLimits? limits = null) =>
        rule.Evaluate(new RuleSubject(Training.Anna with { BirthYear = birthYear }, days, limits ?? Stated)).Told();

    /// <summary>Without what plan or answers suppress.</summary>
    public static List<Finding> Told(this IEnumerable<Finding> findings) => [.. findings.Where(finding => finding.Severity != Severity.Suppressed)];

    public static List<Finding> Suppressed(this IRule rule, IReadOnlyList<Day> days) =>
        [.. rule.Evaluate(new RuleSubject(Training.Anna, days, Stated)).Where(finding => finding.Severity == Severity.Suppressed)];
}
