namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="HardDaysRule"/> may ask for attention, and its words.</summary>
internal sealed class HardDaysRecord : RuleRecord
{
    public override string Says => "many hard days in a row, or matches close together";

    public override string Cause => "A block of hard days that ran longer than planned, or a congested calendar.";

    public override string Consequence => "The next hard session or match comes without an easy day before it.";

    public override string TimeToRespond => "Before the next hard session or match, within a day.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "Days that are clearly easier, or few matches within the days up to the date.";

    public override string DataNeeded => "Known load on the day, and 12 training days known before it; for matches the plan or answers.";

    public override string Basis =>
        "That crowded calendars deserve attention: Soligard et al. 2016, Br J Sports Med 50:1030-1041. Every number is a choice.";

    public override int Rank => 6;

    public override string Counted(FindingKey key) => "with many hard days or matches close together";

    public override string Named(FindingKey key, bool self) => "many hard days or matches close together";

    public override string Response(FindingKey key, bool self) => "an easier day or a day off next, or keeping the plan if the block was meant.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        "the hard days and matches are further apart again";
}
