namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="SessionSpikeRule"/> may ask for attention, and its words.</summary>
internal sealed class SessionSpikeRecord : RuleRecord
{
    public override string Says => "one session far beyond the longest of the days before";

    public override string Cause => "A long run or ride of a new length, a race, or a session much harder than meant.";

    public override string Consequence => "The next sessions are done as if it had been an ordinary one.";

    public override string TimeToRespond => "Before the next session of its kind, within a day.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "Some known days after the session, by itself.";

    public override string DataNeeded => "Enough sessions with a load, or runs with a distance, in the days before.";

    public override string Basis =>
        "The bands of runs from 10 % and from 30 % are those of Schuster Brandt Frandsen et al. 2025, Br J Sports Med (from memory); that the higher one raises a notice, and every other number, is a choice, fitted by simulation but for the doubled load.";

    public override int Rank => 5;

    public override string Counted(FindingKey key) => $"with {KeyWords.OneSession(key)} far beyond their longest";

    public override string Named(FindingKey key, bool self) => $"{KeyWords.OneSession(key)} far beyond {KeyWords.Your(self)} longest of late";

    public override string Response(FindingKey key, bool self) => "easier next sessions, and longer ones in smaller steps, unless the long one was meant.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        $"{KeyWords.OneSession(key)} far beyond the longest lies some days back";
}
