namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="FallingLoadRule"/> may ask for attention, and its words.</summary>
internal sealed class FallingLoadRecord : RuleRecord
{
    public override string Says => "the usual load is fading";

    public override string Cause => "Less time, less will, a change of work or family, a device that no longer records everything.";

    public override string Consequence => "What was built up fades over weeks; going back up takes as long.";

    public override string TimeToRespond => "Within a week.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "The mean week of the last 21 days, or as many as the limits say, is back at its return value, on readable dates.";

    public override string DataNeeded => "Known load on seven of ten of those days, and 6 ordinary weeks among the 8 before.";

    public override string Basis =>
        "Spiering, Mujika, Sharp and Foulis 2021, J Strength Cond Res 35:1449-1458, for about a third; the other limits are a choice, the notice and its delay fitted by simulation.";

    public override string Fixed =>
        $"In each of the weeks before {FallingLoadRule.KnownOf7} days are known; the last days are looked for within twice as many.";

    public override int Rank => 7;

    public override string Counted(FindingKey key) => $"well below their usual{KeyWords.Measure(key)}";

    public override string Named(FindingKey key, bool self) => $"{KeyWords.Load(key)} well below {KeyWords.Your(self)} usual";

    public override string Response(FindingKey key, bool self) => self
        ? "whether less was meant; if not, going back up in small steps, no catching up."
        : "asking whether less was meant; if not, going back up in small steps, no catching up.";

    /// <summary>A recording to come adds load.</summary>
    public override int? WaitedDays(Finding finding, RuleLimits limits) => 0;

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        FormattableString.Invariant($"{KeyWords.Load(key)} is back at {100 * limits.FallingLoad.Return:0.##} % of {KeyWords.Your(self)} usual or above");
}
