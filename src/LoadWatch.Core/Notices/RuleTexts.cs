using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;

namespace LoadWatch.Notices;

/// <summary>
/// What a brief says about each rule: change and stimulus, what to consider and who decides; never a probability, a diagnosis, a clearance or a debt (I-13).
/// <c>self</c> speaks to the person.
/// </summary>
public static class RuleTexts
{
    private const string LoadRatio = "load_ratio";
    private const string WeeklyJump = "weekly_jump";
    private const string SessionSpike = "session_spike";
    private const string Monotony = "monotony";
    private const string HardDays = "hard_days";
    private const string FallingLoad = "falling_load";
    private const string StimulusGap = "stimulus_gap";
    private const string StimulusLow = "stimulus_low";
    private const string FallingCapacity = "falling_capacity";
    private const string Silence = "silence";
    private const string NotUsable = "not_usable";

    private static readonly string[] Ranks =
    [
        LoadRatio, FunctionTestRule.RuleName, StimulusGap, Silence, WeeklyJump, SessionSpike, HardDays, FallingLoad, FallingCapacity, Monotony, NotUsable, StimulusLow,
    ];

    private static readonly string[] Places = [.. RuleBook.All.Select(rule => rule.Name)];

    /// <summary>Where a rule stands among the reasons of one person: as in <see cref="RuleBook"/>, any other last.</summary>
    public static int Order(string rule) => Array.IndexOf(Places, rule) is >= 0 and var place ? place : Places.Length;

    /// <summary>Which reasons are named first where a brief cannot name everybody; less is graver. A choice.</summary>
    public static int Rank(string rule) => Array.IndexOf(Ranks, rule) is >= 0 and var rank ? rank : Ranks.Length;

    /// <summary>After a count of people: <c>well above their usual</c>.</summary>
    public static string Counted(FindingKey key) => key.Rule switch
    {
        LoadRatio => $"well above their usual{Measure(key)}",
        WeeklyJump => $"with a week far above the last{By(key)}",
        SessionSpike => $"with {OneSession(key)} far beyond their longest",
        Monotony => "in a week above the usual with little variation",
        HardDays => "with many hard days or matches close together",
        FallingLoad => $"well below their usual{Measure(key)}",
        StimulusGap => $"without heavy or fast {RegionWork(key.Region)}",
        StimulusLow => $"with little heavy or fast {RegionWork(key.Region)}",
        FallingCapacity => "with a best of late below the best before",
        Silence => "silent",
        NotUsable => "with recordings that cannot be used",
        FunctionTestRule.RuleName => "with a function test to look at",
        _ => $"with {Words(key.Rule)}",
    };

    /// <summary>As the thing itself: <c>load well above the usual</c>.</summary>
    public static string Named(FindingKey key, bool self) => key.Rule switch
    {
        LoadRatio => $"{Load(key)} well above {(self ? "your" : "the")} usual",
        WeeklyJump => $"{Load(key)} of a week far above the last",
        SessionSpike => $"{OneSession(key)} far beyond {(self ? "your" : "the")} longest of late",
        Monotony => "a week above the usual with little variation",
        HardDays => "many hard days or matches close together",
        FallingLoad => $"{Load(key)} well below {(self ? "your" : "the")} usual",
        StimulusGap => $"no heavy or fast {RegionWork(key.Region)} lately",
        StimulusLow => $"little heavy or fast {RegionWork(key.Region)} lately",
        FallingCapacity => $"{Best(key)} of late below {(self ? "your" : "the")} best before",
        Silence => "expected recordings missing",
        NotUsable => "recordings that cannot be used",
        FunctionTestRule.RuleName => $"{Test(key)} beyond a cut-off or down",
        _ => Words(key.Rule),
    };

    /// <summary>After the word "Consider".</summary>
    public static string Consider(FindingKey key, bool self) => key.Rule switch
    {
        LoadRatio => $"comparing with what {(self ? "you had" : "was")} planned: an easier day, or keeping the plan if it was meant.",
        WeeklyJump => $"comparing with what {(self ? "you had" : "was")} planned: spreading the rise over more weeks, or keeping the plan if it was meant.",
        SessionSpike => "easier next sessions, and longer ones in smaller steps, unless the long one was meant.",
        Monotony => "making hard days and easy days differ more: one clearly easier day or a day off this week.",
        HardDays => "an easier day or a day off next, or keeping the plan if the block was meant.",
        FallingLoad => self
            ? "whether less was meant; if not, going back up in small steps, no catching up."
            : "asking whether less was meant; if not, going back up in small steps, no catching up.",
        StimulusGap =>
            $"a few heavy or fast {RegionSets(key.Region)}, within what {(self ? "you and your" : "the person and their")} clinician allow; no catching up.",
        StimulusLow =>
            $"one more day with a few heavy or fast {RegionSets(key.Region)} a week, within what {(self ? "you and your" : "the person and their")} clinician allow; no catching up.",
        FallingCapacity => "whether an all-out try was made lately; if so, what else went on, before changing anything.",
        NotUsable => "a look at strap, sensor and watch: battery, contact, pairing.",
        FunctionTestRule.RuleName => "testing again under the same conditions, and what it means with a clinician.",
        Silence => self
            ? "a look at strap, watch and upload if you did train: one of them may have failed."
            : "asking whether training went on; a strap, watch or upload may have failed.",
        _ => "a look at the numbers behind it before changing anything.",
    };

    /// <summary>Who decides, as the reader of this role is told.</summary>
    public static string Decides(ContactRole role) => role switch
    {
        ContactRole.Coach => "you and the person",
        ContactRole.Physiotherapist => "the person and their coach, with what you know",
        ContactRole.Clinician => "the person, with you",
        ContactRole.FrontDesk => "the person and their coach or clinician; please pass it on",
        ContactRole.Self => "you, with your clinician where one looks after you",
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };

    /// <summary>How an alert ended.</summary>
    /// <param name="plan">What plan and answers say of the last date: a rule that they turn off has not seen the end.</param>
    public static string Returned(AlertNews news, RuleLimits limits, DayPlan plan, bool self)
    {
        var key = news.Alert.Key;
        return AlertEndings.Of(news) is { } ending ? $"{Named(key, self)}: {ending}"
            : news.Corrected ? $"{Named(key, self)}: corrected by a later file"
            : Pause(key.Rule, plan) is { } pause ? $"{Named(key, self)}: not watched {pause}"
            : Returned(key, limits, self);
    }

    private static string Returned(FindingKey key, RuleLimits limits, bool self) => key.Rule switch
    {
        LoadRatio => FormattableString.Invariant($"{Load(key)} is back within {limits.LoadRatio.Return:0.##} times {(self ? "your" : "the")} usual week"),
        WeeklyJump => $"{Load(key)} of the week is no longer far above the last",
        SessionSpike => $"{OneSession(key)} far beyond the longest lies some days back",
        Monotony => "the week varies again, or is no heavier than the usual",
        HardDays => "the hard days and matches are further apart again",
        FallingLoad => FormattableString.Invariant($"{Load(key)} is back at {100 * limits.FallingLoad.Return:0.##} % of {(self ? "your" : "the")} usual or above"),
        StimulusGap => $"heavy or fast {RegionWork(key.Region)} is back",
        StimulusLow => $"heavy or fast {RegionWork(key.Region)} is back to the expected number of days",
        FallingCapacity => $"{Best(key)} is no longer below the best before",
        NotUsable => "recordings can be used again",
        FunctionTestRule.RuleName => $"{Test(key)} is within the cut-off again, or its result has aged",
        Silence => "recordings are coming in again",
        _ => $"{Words(key.Rule)}: back to usual",
    };

    private static string? Pause(string rule, DayPlan plan) => rule switch
    {
        LoadRatio or WeeklyJump or FallingLoad or StimulusGap or StimulusLow or FallingCapacity when plan.IsAwayOrReturning() => "while away or returning",
        Silence when plan.Absence is not null => "while away",
        FallingLoad when plan.IsLight() => "in light weeks and the off-season",
        _ => null,
    };

    private static string Load(FindingKey key) => key.Quantity is { } quantity ? QuantityWords.Of(quantity) : "load";

    /// <summary>Behind "usual".</summary>
    private static string Measure(FindingKey key) => key.Quantity is { } quantity ? $" {QuantityWords.Of(quantity)}" : "";

    private static string By(FindingKey key) => key.Quantity is { } quantity ? $" by {QuantityWords.Of(quantity)}" : "";

    private static string OneSession(FindingKey key) => key.Quantity == QuantityNames.Distance ? "one run" : "one session";

    private static string Best(FindingKey key) => key.Quantity is { } quantity ? $"best {QuantityWords.Of(quantity)}" : "best";

    private static string Test(FindingKey key) => FunctionTests.Of(key.Quantity ?? "") is { } test ? test.Name.ToLowerInvariant() : "function test";

    private static string RegionWork(BodyRegion? region) => region switch
    {
        BodyRegion.Legs => "leg work",
        BodyRegion.Trunk => "trunk work",
        BodyRegion.Arms => "arm work",
        _ => "work",
    };

    private static string RegionSets(BodyRegion? region) => region switch
    {
        BodyRegion.Legs => "leg sets",
        BodyRegion.Trunk => "trunk sets",
        BodyRegion.Arms => "arm sets",
        _ => "sets",
    };

    private static string Words(string rule) => rule.Replace('_', ' ');
}
