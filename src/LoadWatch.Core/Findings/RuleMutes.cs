namespace LoadWatch.Findings;

/// <summary>Something that keeps rules from telling what they would tell.</summary>
/// <param name="By">A rule's name, or a circumstance in a few words.</param>
/// <param name="Rules">Names of the rules that are muted, in the order of <see cref="RuleBook"/>.</param>
/// <param name="How">What becomes of what they would tell.</param>
public sealed record RuleMute(string By, IReadOnlyList<string> Rules, string How);

/// <summary>What mutes what: every planned state of <see cref="PlanMutes"/>, then what else there is. A choice.</summary>
public static class RuleMutes
{
    private static readonly string[] Trends =
        ["load_ratio", "weekly_jump", "monotony", "hard_days", "falling_load", "stimulus_gap", "stimulus_low", "falling_capacity"];

    public static IReadOnlyList<RuleMute> All { get; } =
    [
        .. Enum.GetValues<PlannedState>().Select(OfPlan),
        new("too few known days", Trends, "neither raised nor ended: the last reading stands"),
        new("not_usable", ["session_spike", "monotony", "hard_days", "falling_capacity"], "sessions whose load or best was read from the failing sensor are passed over"),
        new("stimulus_gap", ["stimulus_low"], "not raised while the gap is long enough to be told by its own rule"),
        new("many of a group silent at once, or an inbox that is away", ["silence"], "told once for the group; nobody is flagged for it alone"),
        new("a match by plan or answers", ["session_spike"], "the session is not judged, but later ones are compared with it"),
        new("rest by plan, answers or day table", ["silence"], "the day is not counted"),
        new("a changed reference value", [.. RuleBook.OfLoad.Select(rule => rule.Name)], "told as a changed reference value, no alert, where only the change makes the limit break"),
        new("another hand, device or chair height", ["function_test"], "told as not compared, no alert"),
    ];

    /// <summary>What mutes a rule.</summary>
    public static IEnumerable<RuleMute> Of(string rule) => All.Where(mute => mute.Rules.Contains(rule, StringComparer.Ordinal));

    private static RuleMute OfPlan(PlannedState state) => new(
        PlanMutes.Word(state),
        [.. RuleBook.All.Select(rule => rule.Name).Where(rule => PlanMutes.Of(rule).Contains(state))],
        "not watched; what would hold is shown as suppressed, and begins anew afterwards");
}
