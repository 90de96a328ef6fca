namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="SilenceRule"/> may ask for attention, and its words.</summary>
internal sealed class SilenceRecord : RuleRecord
{
    public override string Says => "expected recordings did not come";

    public override string Cause => "A dead strap, watch or upload; somebody who stopped coming; an inbox that is away.";

    public override string Consequence => "Nothing else can be said of the person: every other rule waits.";

    public override string TimeToRespond => "Within two days.";

    public override Deciders Deciders => Deciders.PersonAndUploads;

    public override string Ends => "The next recording.";

    public override string DataNeeded => "The person's own rhythm of 6 gaps or more, or a plan that says which sessions bring a recording. Whose files usually come late is given that time.";

    public override string Basis =>
        "A choice; missed sessions and extra days were fitted by simulation.";

    public override string Fixed =>
        FormattableString.Invariant($"A plan is gone by where it expected enough sessions in the last {PlannedSessions.WatchedDays} days and told {PlannedSessions.ToldShare:0.##} of the recordings that came; else the rhythm of the recordings is.");

    public override bool IsOfTraining => false;

    public override int Rank => 3;

    public override string Counted(FindingKey key) => "silent";

    public override string Named(FindingKey key, bool self) => "expected recordings missing";

    public override string Response(FindingKey key, bool self) => self
        ? "a look at strap, watch and upload if you did train: one of them may have failed."
        : "asking whether training went on; a strap, watch or upload may have failed.";

    /// <summary>A planned session was given some days already, the rhythm gives none.</summary>
    public override int? WaitedDays(Finding finding, RuleLimits limits) => finding.Unit == SilenceRule.OfPlan ? limits.Silence.PlannedWaitDays : 0;

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        "recordings are coming in again";
}
