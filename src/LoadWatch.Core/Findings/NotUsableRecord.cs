namespace LoadWatch.Findings;

/// <summary>Why the rule <see cref="NotUsableRule"/> may ask for attention, and its words.</summary>
internal sealed class NotUsableRecord : RuleRecord
{
    public override string Says => "recordings that cannot be used";

    public override string Cause => "Battery, contact, pairing, or a sensor of somebody else nearby.";

    public override string Consequence => "Load and stimulus of the sessions stay unknown, or rest on what stands in for them.";

    public override string TimeToRespond => "Before the next session.";

    public override Deciders Deciders => Deciders.PersonAndDevices;

    public override string Ends => "Few enough of them within the days up to a recorded day.";

    public override string DataNeeded => "A recorded day with heart rate or power.";

    public override string Basis =>
        "A choice; the number of sessions was fitted by simulation.";

    public override bool IsOfTraining => false;

    public override int Rank => 10;

    public override string Counted(FindingKey key) => "with recordings that cannot be used";

    public override string Named(FindingKey key, bool self) => "recordings that cannot be used";

    public override string Response(FindingKey key, bool self) => "a look at strap, sensor and watch: battery, contact, pairing.";

    public override string Returned(FindingKey key, RuleLimits limits, bool self) =>
        "recordings can be used again";
}
