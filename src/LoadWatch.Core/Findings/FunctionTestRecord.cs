namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="FunctionTestRule"/> may ask for attention, and its words.</summary>
internal sealed class FunctionTestRecord : RuleRecord
{
    public override string Says => "a function test beyond a published cut-off, or down by more than its error";

    public override string Cause => "Less strength or speed than before, a bad day, or another way of testing.";

    public override string Consequence => "The next look comes with the next test, which may be a year away.";

    public override string TimeToRespond => "Within two weeks, by a test under the same conditions.";

    public override Deciders Deciders => Deciders.PersonAndClinician;

    public override string Ends => "The next test of its kind that is better by some; else the test ages.";

    public override string DataNeeded => "Two tests with the same hand, device and chair height for a fall; for grip the sex.";

    public override string Basis =>
        "Cruz-Jentoft et al. 2019, Age Ageing 48:16-31 (EWGSOP2), for the cut-offs; the errors are from memory.";

    public override int Rank => 1;

    public override bool IsOfHealth => true;

    public override string Counted(FindingKey key) => "with a function test to look at";

    public override string Named(FindingKey key, bool self) => $"{KeyWords.Test(key)} beyond a cut-off or down";

    public override string Response(FindingKey key, bool self) => "testing again under the same conditions, and what it means with a clinician.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        $"{KeyWords.Test(key)} is within the cut-off again, or its result has aged";
}
