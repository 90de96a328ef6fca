using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>A rule that holds for a person on a date.</summary>
/// <param name="Rule">Name of the rule, such as <c>load_ratio</c>.</param>
/// <param name="Region">For stimulus rules.</param>
/// <param name="Since">First date of the unbroken run of this finding.</param>
/// <param name="Value">The value on the date, rounded to 9 significant digits.</param>
/// <param name="Limit">The limit that it passed.</param>
/// <param name="Unit">Of value and limit; <c>ratio</c>, <c>fraction</c> (0.4 is 40 % more), <c>days</c> or <c>matches</c>.</param>
/// <param name="Text">One sentence without a name: what, since when, against the usual.</param>
public sealed record Finding(
    string Person,
    LocalDate Date,
    string Rule,
    BodyRegion? Region,
    Severity Severity,
    LocalDate Since,
    double Value,
    double Limit,
    string Unit,
    string Text,
    Evidence Evidence)
{
    /// <summary>Name of the quantity that the rule looked at where it is not the group's load; null for the load.</summary>
    public string? Quantity { get; init; }

    /// <summary>The same where a planned state turns the rule off: no alert, and it says why. Null: the rule is watched.</summary>
    public Finding Unless(Muting? muted) => muted is null ? this : this with
    {
        Severity = Severity.Suppressed,
        Text = $"{Text} Not watched: {PlanMutes.Word(muted.State)} since {Wording.Date(muted.Since, Date)}.",
        Evidence = Evidence with
        {
            Inputs =
            [
                .. Evidence.Inputs,
                new("not_watched", Period.DaysBetween(muted.Since, Date) + 1, "days", $"{PlanMutes.Word(muted.State)} since {Wording.IsoDate(muted.Since)}"),
            ],
        },
    };

    /// <summary>What the finding is about, the same on every date.</summary>
    public FindingKey Key => new(Person, Rule, Region, Quantity);
}

/// <summary>What a finding or an alert is about: a person, a rule, for stimulus rules a region, and a quantity where it is not the group's load.</summary>
public readonly record struct FindingKey(string Person, string Rule, BodyRegion? Region, string? Quantity = null);

/// <summary>What a number rests on (I-8), enough to compute it again.</summary>
/// <param name="Formula">In words and symbols.</param>
/// <param name="Source">Authors, year, title; or <c>a choice</c>.</param>
/// <param name="Inputs">Inputs and intermediate values.</param>
public sealed record Evidence(string Formula, string Source, IReadOnlyList<EvidenceItem> Inputs)
{
    /// <summary>The value of an input; null where it is unknown or there is none of the name.</summary>
    public double? this[string name] => Inputs.FirstOrDefault(item => item.Name == name)?.Value;
}

/// <summary>One number of the evidence; null is unknown.</summary>
public sealed record EvidenceItem(string Name, double? Value, string Unit, string? Note = null);
