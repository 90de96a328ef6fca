using LoadWatch.Days;

namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="LoadRatioRule"/> may ask for attention, and its words.</summary>
internal sealed class LoadRatioRecord : RuleRecord
{
    public override string Says => "acute load well above the usual";

    public override string Cause => "A camp, a congested calendar, a return to full training in large steps, or sessions added beside the plan.";

    public override string Consequence => "The rise goes on; by the fourth week the high load has become the usual that everything is compared with.";

    public override string TimeToRespond => "Before the next hard session, within a day.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "The ratio falls below its return value, on readable dates.";

    public override string DataNeeded => "Known load on most of the last 7 and of the last 28 days, and four weeks since the first known day; the usual week where enough ordinary weeks are known.";

    public override string Basis =>
        "Windt and Gabbett 2018, Br J Sports Med 53:988-990, for the uncoupled ratio; that it is watched and its coverage are a choice; limit, return value and delay were fitted by simulation. It describes change, nothing else.";

    public override string Fixed =>
        $"The ratio is read with {LoadTrend.KnownOf7} known days of the last 7 and {LoadTrend.KnownOf21} of the 21 before; the median of the 28-day load is that of the last {LoadTrend.MedianDays} days; "
            + $"the usual week is the median of the {WeekTrend.UsualWeeks} newest ordinary weeks of {WeekTrend.LookBackWeeks}, with {WeekTrend.WeeksWanted} wanted and {WeekTrend.KnownOf7} days known in each.";

    public override int Rank => 0;

    public override string Counted(FindingKey key) => $"well above their usual{KeyWords.Measure(key)}";

    public override string Named(FindingKey key, bool self) => $"{KeyWords.Load(key)} well above {KeyWords.Your(self)} usual";

    public override string Response(FindingKey key, bool self) => $"comparing with what {(self ? "you had" : "was")} planned: an easier day, or keeping the plan if it was meant.";

    /// <summary>Seven days that were made whole from the known ones.</summary>
    public override int? WaitedDays(Finding finding, RuleLimits limits) => finding.Evidence["coverage_7"] < 1 ? 0 : null;

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        FormattableString.Invariant($"{KeyWords.Load(key)} is back within {limits.LoadRatio.Return:0.##} times {KeyWords.Your(self)} usual week");
}
