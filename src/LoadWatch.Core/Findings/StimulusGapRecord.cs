using LoadWatch.Days;

namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="StimulusGapRule"/> may ask for attention, and its words.</summary>
internal sealed class StimulusGapRecord : RuleRecord
{
    public override string Says => "too long without heavy or fast work of a body region";

    public override string Cause => "Easy endurance work only, a machine out of order, visits without the heavy exercises, or heavy work that nothing records.";

    public override string Consequence => "The large motor units are not called on; strength and speed fade first, and sooner in older people.";

    public override string TimeToRespond => "Within the next two sessions.";

    public override Deciders Deciders => Deciders.WithClinician;

    public override string Ends => "A heavy-or-fast day of the region, and nothing else.";

    public override string DataNeeded => "The region seen by sets, power or speed on most days of the gap.";

    public override string Basis =>
        "Every number is a choice, the days to a notice fitted by simulation; what counts as heavy or fast rests on the size principle (recruitment thresholds, DEVELOPERS.md).";

    public override string Fixed =>
        $"The usual gap is the median of the gaps of the last {StimulusTrend.UsualDays} days, with {StimulusTrend.GapsWanted} wanted.";

    public override int Rank => 2;

    public override string Counted(FindingKey key) => $"without heavy or fast {KeyWords.RegionWork(key)}";

    public override string Named(FindingKey key, bool self) => $"no heavy or fast {KeyWords.RegionWork(key)} lately";

    public override string Response(FindingKey key, bool self) => $"a few heavy or fast {KeyWords.RegionSets(key)}, within what {(self ? "you and your" : "the person and their")} clinician allow; no catching up.";

    /// <summary>A recording to come may hold a heavy-or-fast day.</summary>
    public override int? WaitedDays(Finding finding, RuleLimits limits) => 0;

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        $"heavy or fast {KeyWords.RegionWork(key)} is back";
}
