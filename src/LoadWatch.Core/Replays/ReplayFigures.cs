// What a set of limits would have asked of those who are told. Standing: active for longer than 14 days, a choice.
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Replays;

/// <summary>The figures of one set of limits over the past.</summary>
/// <param name="Days">Dates looked at.</param>
/// <param name="Raised">By rule, then severity, in the order of the rules.</param>
/// <param name="Contacts">In their order.</param>
/// <param name="Wavering">Runs of three changes within 7 days of what one alert is about (<see cref="Chatter"/>).</param>
/// <param name="Corrected">Alerts that a later file undid: none in a replay, which knows every file from its day on.</param>
/// <param name="Standing">Alerts that stand on the last date.</param>
/// <param name="StandingLong">Those of them raised last more than 14 days before it.</param>
/// <param name="Leads">One for each mark.</param>
public sealed record ReplayFigures(
    int Days, IReadOnlyList<RaisedByRule> Raised, IReadOnlyList<RaisedForContact> Contacts, int Wavering, int Corrected, int Standing, int StandingLong, IReadOnlyList<Lead> Leads)
{
    /// <summary>An alert counts as ahead of a mark for so long.</summary>
    public const int LeadDays = 28;

    private const int StandingDays = 14;

    /// <param name="people">By other limits or by today's.</param>
    /// <param name="contacts">With the ids of the people whom each is told about.</param>
    /// <param name="marks">Dates of people before which an alert was wanted.</param>
    public static ReplayFigures Of(
        IReadOnlyList<PersonReplay> people, IReadOnlyList<(Contact Contact, IReadOnlySet<string> People)> contacts, IReadOnlyList<Mark> marks, LocalDate from, LocalDate to)
    {
        var standing = people.SelectMany(person => person.Standing).ToList();
        return new(
            Period.DaysBetween(from, to) + 1,
            [.. people
                .SelectMany(person => person.Raised(from, to).Select(change => (person.Keys[change.AlertId].Rule, change.Severity)))
                .GroupBy(one => one)
                .OrderBy(group => RuleTexts.Order(group.Key.Rule))
                .ThenBy(group => group.Key.Severity)
                .Select(group => new RaisedByRule(group.Key.Rule, group.Key.Severity, group.Count()))],
            [.. contacts.Select(one => ForContact(one.Contact, one.People, people, from, to))],
            people.Sum(person => Chatter.Of(person.Changes.Where(change => change.Date >= from && change.Date <= to), id => person.Keys[id])),
            people.Sum(person => person.Changes.Count(change => change.Reason == AlertChangeReason.Corrected && change.Date >= from && change.Date <= to)),
            standing.Count,
            standing.Count(alert => alert.StandsSince < to.PlusDays(-StandingDays)),
            [.. marks.Select(mark => Before(mark, people))]);
    }

    private static RaisedForContact ForContact(Contact contact, IReadOnlySet<string> told, IReadOnlyList<PersonReplay> people, LocalDate from, LocalDate to)
    {
        var view = RoleView.Of(contact.Role, told.Count);
        var dates = people
            .Where(person => told.Contains(person.Person))
            .SelectMany(person => person.Raised(from, to).Where(change => view.ShowsRule(person.Keys[change.AlertId].Rule)))
            .GroupBy(change => change.Date)
            .Select(date => date.Count())
            .ToList();
        return new RaisedForContact(contact.Id, told.Count, dates.Sum(), (double)dates.Sum() / (Period.DaysBetween(from, to) + 1), dates.DefaultIfEmpty(0).Max());
    }

    /// <summary>The first alert of the stretch before the mark.</summary>
    private static Lead Before(Mark mark, IReadOnlyList<PersonReplay> people) => people
        .Where(person => string.Equals(person.Person, mark.Person, StringComparison.OrdinalIgnoreCase))
        .SelectMany(person => person.Raised(mark.Date.PlusDays(-LeadDays), mark.Date.PlusDays(-1)).Select(change => (change.Date, person.Keys[change.AlertId].Rule)))
        .Where(one => RuleBook.Of(one.Rule)?.Record.IsOfTraining == true)
        .OrderBy(one => one.Date)
        .ThenBy(one => RuleTexts.Order(one.Rule))
        .Select(one => new Lead(mark, Period.DaysBetween(one.Date, mark.Date), one.Rule))
        .FirstOrDefault() ?? new Lead(mark, null, null);
}

/// <param name="Count">How often an alert of the rule was raised with this severity.</param>
public sealed record RaisedByRule(string Rule, Severity Severity, int Count);

/// <param name="People">Whom the contact is told about, count.</param>
/// <param name="Raised">Alerts raised of what the contact may be told, count.</param>
/// <param name="ADay">The same a day.</param>
/// <param name="MostOnADay">The most on one date.</param>
public sealed record RaisedForContact(string Contact, int People, int Raised, double ADay, int MostOnADay);

/// <summary>A date before which an alert was wanted.</summary>
public sealed record Mark(string Person, LocalDate Date);

/// <param name="Days">From the first alert of the 28 days before the mark to it, of those about training; null: there was none.</param>
/// <param name="Rule">By which it was raised.</param>
public sealed record Lead(Mark Mark, int? Days, string? Rule);
