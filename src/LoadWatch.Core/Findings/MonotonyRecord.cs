namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="MonotonyRule"/> may ask for attention, and its words.</summary>
internal sealed class MonotonyRecord : RuleRecord
{
    public override string Says => "a heavy week without variation";

    public override string Cause => "Every day of the week about equally hard, at more than the usual load.";

    public override string Consequence => "Easy days are missing, and hard ones get less hard.";

    public override string TimeToRespond => "Within this week.";

    public override Deciders Deciders => Deciders.CoachAndPerson;

    public override string Ends => "Monotony falls below its return value, or the week is no heavier than the usual, on readable dates.";

    public override string DataNeeded => "All 7 days known, and strains of 60 days before.";

    public override string Basis =>
        "Foster 1998, Med Sci Sports Exerc 30:1164-1168, for monotony and strain; the limit of monotony is a convention, the others a choice.";

    public override string Fixed =>
        "Monotony and strain are read over 7 days, all of them known.";

    public override int Rank => 9;

    public override string Counted(FindingKey key) => "in a week above the usual with little variation";

    public override string Named(FindingKey key, bool self) => "a week above the usual with little variation";

    public override string Response(FindingKey key, bool self) => "making hard days and easy days differ more: one clearly easier day or a day off this week.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        "the week varies again, or is no heavier than the usual";
}
