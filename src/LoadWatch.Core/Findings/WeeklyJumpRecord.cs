namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="WeeklyJumpRule"/> may ask for attention, and its words.</summary>
internal sealed class WeeklyJumpRecord : RuleRecord
{
    public override string Says => "this week far above the last";

    public override string Cause => "Two weeks of training in one, or sessions moved into the same week.";

    public override string Consequence => "The next week is planned from a week that was no ordinary one.";

    public override string TimeToRespond => "Before the next week is planned, within two days.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "The change against the last ordinary week falls below its return value, on readable dates.";

    public override string DataNeeded => "Known load on most days of this week and of the ordinary weeks before.";

    public override string Basis =>
        "That weekly changes are kept small is advice of Soligard et al. 2016, Br J Sports Med 50:1030-1041 (from memory; the evidence is weak). Every number is a choice; raise, return, the factors of the usual and the delays were fitted by simulation.";

    public override string Fixed =>
        $"A plan counts where it expected a recording in this week or one of the {WeeklyJumpRule.PlanWeeks} before; without a plan {WeeklyJumpRule.FullWeeksWanted} weeks with as many training days are wanted, or where there are fewer, those with the most.";

    public override int Rank => 4;

    public override string Counted(FindingKey key) => $"with a week far above the last{KeyWords.By(key)}";

    public override string Named(FindingKey key, bool self) => $"{KeyWords.Load(key)} of a week far above the last";

    public override string Response(FindingKey key, bool self) => $"comparing with what {(self ? "you had" : "was")} planned: spreading the rise over more weeks, or keeping the plan if it was meant.";

    /// <summary>A week that was made whole from the sessions that are there.</summary>
    public override int? WaitedDays(Finding finding, RuleLimits limits) => finding.Evidence["acute"] == finding.Evidence["acute_known"] ? null : 0;

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        $"{KeyWords.Load(key)} of the week is no longer far above the last";
}
