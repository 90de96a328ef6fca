using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Stimulus;

namespace LoadWatch.Notices;

/// <summary>
/// What a brief says about each rule: change and stimulus, what to consider and who decides; never a probability, a diagnosis, a clearance or a debt (I-13).
/// <c>self</c> speaks to the person.
/// </summary>
public static class RuleTexts
{
    private const string LoadRatio = "load_ratio";
    private const string StimulusGap = "stimulus_gap";
    private const string Silence = "silence";

    /// <summary>Where a rule stands among the reasons of one person; rules without a text of their own come last.</summary>
    public static int Order(string rule) => rule switch
    {
        LoadRatio => 0,
        StimulusGap => 1,
        Silence => 2,
        _ => 3,
    };

    /// <summary>After a count of people: <c>well above their usual</c>.</summary>
    public static string Counted(FindingKey key) => key.Rule switch
    {
        LoadRatio => "well above their usual",
        StimulusGap => $"without heavy or fast {RegionWork(key.Region)}",
        Silence => "silent",
        _ => $"with {Words(key.Rule)}",
    };

    /// <summary>As the thing itself: <c>load well above the usual</c>.</summary>
    public static string Named(FindingKey key, bool self) => key.Rule switch
    {
        LoadRatio => self ? "load well above your usual" : "load well above the usual",
        StimulusGap => $"no heavy or fast {RegionWork(key.Region)} lately",
        Silence => "expected recordings missing",
        _ => Words(key.Rule),
    };

    /// <summary>After the word "Consider".</summary>
    public static string Consider(FindingKey key, bool self) => key.Rule switch
    {
        LoadRatio => self
            ? "comparing with what you had planned: an easier day, or keeping the plan if it was meant."
            : "comparing with what was planned: an easier day, or keeping the plan if it was meant.",
        StimulusGap =>
            $"a few heavy or fast {RegionSets(key.Region)}, within what {(self ? "you and your" : "the person and their")} clinician allow; no catching up.",
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
    public static string Returned(AlertNews news, RuleLimits limits, bool self) => news.Corrected
        ? $"{Named(news.Alert.Key, self)}: corrected by a later file"
        : Returned(news.Alert.Key, limits, self);

    private static string Returned(FindingKey key, RuleLimits limits, bool self) => key.Rule switch
    {
        LoadRatio => FormattableString.Invariant($"load is back within {limits.LoadRatio.Return:0.##} times {(self ? "your" : "the")} usual week"),
        StimulusGap => $"heavy or fast {RegionWork(key.Region)} is back",
        Silence => "recordings are coming in again",
        _ => $"{Words(key.Rule)}: back to usual",
    };

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
