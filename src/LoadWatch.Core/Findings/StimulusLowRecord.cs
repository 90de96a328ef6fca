using LoadWatch.Days;

namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="StimulusLowRule"/> may ask for attention, and its words.</summary>
internal sealed class StimulusLowRecord : RuleRecord
{
    public override string Says => "too few heavy-or-fast days of a body region";

    public override string Cause => "Visits or sessions missed, or sessions that stay light.";

    public override string Consequence => "The stimulus of the large motor units thins out although there is some.";

    public override string TimeToRespond => "Within a week.";

    public override Deciders Deciders => Deciders.WithClinician;

    public override string Ends => "Enough heavy-or-fast days in 14 again.";

    public override string DataNeeded => "The region seen on most of the 14 days, and for 8 weeks.";

    public override string Basis =>
        "A choice, share and floor from 60 on fitted by simulation. Guidelines ask for muscle strengthening on 2 or more days a week (WHO 2020, Bull et al., Br J Sports Med 54:1451-1462): under 2 in 14 days is less than half of that.";

    public override string Fixed =>
        $"Heavy-or-fast days are counted over {HeavyTally.WindowDays} days, and the usual number is that of the {HeavyTally.UsualDays} days before.";

    public override int Rank => 11;

    public override string Counted(FindingKey key) => $"with little heavy or fast {KeyWords.RegionWork(key)}";

    public override string Named(FindingKey key, bool self) => $"little heavy or fast {KeyWords.RegionWork(key)} lately";

    public override string Response(FindingKey key, bool self) => $"one more day with a few heavy or fast {KeyWords.RegionSets(key)} a week, within what {(self ? "you and your" : "the person and their")} clinician allow; no catching up.";

    /// <summary>A recording to come may hold a heavy-or-fast day.</summary>
    public override int? WaitedDays(Finding finding, RuleLimits limits) => 0;

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        $"heavy or fast {KeyWords.RegionWork(key)} is back to the expected number of days";
}
