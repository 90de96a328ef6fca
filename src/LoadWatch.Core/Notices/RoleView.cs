using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;

namespace LoadWatch.Notices;

/// <summary>
/// What a reader may be told of somebody's health: a coach and a front desk see "away", never illness, tests or reasons of health (I-12).
/// </summary>
public sealed record RoleView
{
    private readonly ContactRole role;

    private RoleView(ContactRole role) => this.role = role;

    /// <summary>Whether reasons of health may be shown at all.</summary>
    public bool ShowsHealth => role is ContactRole.Clinician or ContactRole.Physiotherapist or ContactRole.Self;

    public static RoleView Of(ContactRole role) => new(role);

    /// <summary>Of a brief about so many people: who reads as "self" about others than one person is shown no more than a coach.</summary>
    public static RoleView Of(ContactRole role, int people) => new(role == ContactRole.Self && people != 1 ? ContactRole.Coach : role);

    /// <summary>Whether alerts of a rule reach the reader: those about tests of function are told to clinicians and to the person.</summary>
    /// <param name="rule">Name of the rule: <c>load_ratio</c>.</param>
    public bool ShowsRule(string rule) => RuleBook.Of(rule)?.Record.IsOfHealth != true || role is ContactRole.Clinician or ContactRole.Self;

    /// <summary>Why somebody is not training, in one word: <c>ill</c>, <c>injured</c>, <c>away</c>; to coach and front desk always the last.</summary>
    public string Word(AbsenceWord absence) => (ShowsHealth, absence) switch
    {
        (true, AbsenceWord.Ill) => "ill",
        (true, AbsenceWord.Injured) => "injured",
        _ => "away",
    };

    /// <summary>Whether the reader is told the same of both: where reasons of health are hidden, a change from one to the other is, too.</summary>
    public bool TellsTheSame(AbsenceWord? one, AbsenceWord other) => one is { } absence && Word(absence) == Word(other);
}
