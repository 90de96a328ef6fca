using LoadWatch.Anchors;

namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="FallingCapacityRule"/> may ask for attention, and its words.</summary>
internal sealed class FallingCapacityRecord : RuleRecord
{
    public override string Says => "a best of late below the best before";

    public override string Cause => "No all-out try lately, less heavy or fast work, much training in the days before, another device or machine.";

    public override string Consequence => "Limits and loads that rest on the old best say less.";

    public override string TimeToRespond => "Within two weeks, by a try under the same conditions.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "The fall is clearly within the error again, read on recorded days.";

    public override string DataNeeded =>
        "Sessions with the quantity in both stretches, of one sport; for critical power and speed bests of 2 to 20 min that may have been all out, with heart rate, of 3 sessions in each.";

    public override string Basis =>
        "Stretches and errors of speed and power are a choice; the error of an estimated maximum is 10.6 to 13.5 % of the mean in direct tests; critical power and speed: Monod and Scherrer 1965, Moritani et al. 1981, with standard errors of the line.";

    public override string Fixed =>
        FormattableString.Invariant($"Two stretches of critical power or speed are compared where their shortest and longest bests differ by a factor of {CriticalFall.AlikeSpan:0.#} at most, heart rate was not lower by more than {CriticalFall.HeartRateWithinBpm:0.#} bpm, and the later value reaches {AnchorContradiction.ReachWanted:0.##} of the one before.");

    public override int Rank => 8;

    public override string Counted(FindingKey key) =>
        CriticalQuantity.Of(key.Quantity) is { } critical ? $"with {critical.Words} of late below the value before" : "with a best of late below the best before";

    public override string Named(FindingKey key, bool self) => CriticalQuantity.Of(key.Quantity) is { } critical
        ? $"{critical.Words} of late below {KeyWords.Your(self)} value before"
        : $"{KeyWords.Best(key)} of late below {KeyWords.Your(self)} best before";

    public override string Response(FindingKey key, bool self) => CriticalQuantity.Of(key.Quantity) is null
        ? "whether an all-out try was made lately; if so, what else went on, before changing anything."
        : "whether efforts of late were all out, short and long ones; if so, what else went on, before changing anything.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        CriticalQuantity.Of(key.Quantity) is { } critical
            ? $"{critical.Words} is no longer below the value before"
            : $"{KeyWords.Best(key)} is no longer below the best before";
}
