using System.Text.Json.Serialization;
using LoadWatch.People;

namespace LoadWatch.Findings;

/// <summary>
/// Why a rule may ask for somebody's attention, after IEC 62682 / ANSI/ISA-18.2 (rationalisation): cause, consequence, response, time to respond, who decides; and
/// the words of its findings. Words describe change and stimulus, never a probability, a diagnosis, a clearance or a debt (I-13).
/// </summary>
public abstract class RuleRecord
{
    /// <summary>The rule in one line: <c>acute load well above the usual</c>.</summary>
    public abstract string Says { get; }

    /// <summary>What usually lies behind it.</summary>
    public abstract string Cause { get; }

    /// <summary>What goes on if nobody looks: of load, stimulus or record, not of health.</summary>
    public abstract string Consequence { get; }

    /// <summary>Within which time a look makes a difference. A choice.</summary>
    public abstract string TimeToRespond { get; }

    /// <summary>Who decides.</summary>
    public abstract Deciders Deciders { get; }

    /// <summary>What ends it.</summary>
    public abstract string Ends { get; }

    /// <summary>Without which it neither raises nor ends.</summary>
    public abstract string DataNeeded { get; }

    /// <summary>Authors, year, title; or <c>a choice</c>.</summary>
    public abstract string Basis { get; }

    /// <summary>Numbers that take part and are no limits: nobody needs to tune them, but a reader may ask. All a choice.</summary>
    public virtual string Fixed => "nothing";

    /// <summary>Which reasons are named first where a brief cannot name everybody; less is graver, each once. A choice.</summary>
    [JsonIgnore]
    public abstract int Rank { get; }

    /// <summary>Whether it is about what somebody trained; else about what came in, or about tests.</summary>
    public virtual bool IsOfTraining => !IsOfHealth;

    /// <summary>Told to clinicians and to the person only.</summary>
    public virtual bool IsOfHealth => false;

    /// <summary>After a count of people: <c>well above their usual</c>.</summary>
    public abstract string Counted(FindingKey key);

    /// <summary>As the thing itself: <c>load well above the usual</c>.</summary>
    public abstract string Named(FindingKey key, bool self);

    /// <summary>What to do about it, after the word "Consider".</summary>
    public abstract string Response(FindingKey key, bool self);

    /// <summary>How an alert ended by itself.</summary>
    public abstract string Returned(FindingKey key, RuleLimits limits, bool self);

    /// <summary>
    /// Days that the rule has given recordings that are missing for a finding; null: it rests on none that are missing. What tells that little was done does, for
    /// a recording to come may hold what is missing; what tells that much was done does only where it was made whole from a part.
    /// </summary>
    public virtual int? WaitedDays(Finding finding, RuleLimits limits) => null;

    /// <summary>Every part of the record that is about no single finding, by what it is called.</summary>
    public IReadOnlyList<(string Name, string Text)> Fields(string rule) =>
    [
        ("cause", Cause),
        ("consequence", Consequence),
        ("response", $"Consider {Response(new FindingKey("", rule, null), self: false)}"),
        ("time to respond", TimeToRespond),
        ("who decides", Deciders.Told),
        ("ends", Ends),
        ("data needed", DataNeeded),
        ("basis", Basis),
        ("fixed", Fixed),
    ];

    /// <summary>Names of the fields that say nothing; a rule with any cannot be registered.</summary>
    public IEnumerable<string> Missing(string rule)
    {
        var key = new FindingKey("", rule, null);
        return Fields(rule)
            .Append(("says", Says))
            .Append(("response", Response(key, self: true)))
            .Concat(Enum.GetValues<ContactRole>().Select(role => ("who decides", Deciders.For(role))))
            .Append(("counted", Counted(key)))
            .Append(("named", Named(key, self: false)))
            .Append(("returned", Returned(key, new RuleLimits(), self: false)))
            .Where(field => string.IsNullOrWhiteSpace(field.Item2))
            .Select(field => field.Item1)
            .Distinct(StringComparer.Ordinal);
    }
}
