namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="TestOverdueRule"/> may ask for attention, and its words.</summary>
internal sealed class TestOverdueRecord : RuleRecord
{
    public override string Says => "a function test was not done again in time";

    public override string Cause => "A visit missed, or a test that nobody had on the list.";

    public override string Consequence => "What the last test said ages, and a fall since then is not seen.";

    public override string TimeToRespond => "At the next visit.";

    public override Deciders Deciders => Deciders.ClinicianAndPerson;

    public override string Ends => "The next test of its kind, also one that could not be done.";

    public override string DataNeeded => "An earlier test of its kind, or a list of tests that everybody is to have.";

    public override string Basis =>
        "A choice.";

    public override int Rank => 12;

    public override bool IsOfHealth => true;

    public override string Counted(FindingKey key) => "with a function test that is due";

    public override string Named(FindingKey key, bool self) => $"{KeyWords.Test(key)} due again";

    public override string Response(FindingKey key, bool self) => "testing at the next visit, with the same hand, device and chair.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        $"{KeyWords.Test(key)} was done again";
}
