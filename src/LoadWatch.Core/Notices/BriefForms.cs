using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Which forms a contact's brief holds on a date.</summary>
public static class BriefForms
{
    /// <summary>Whoever reads on so few days of the week is told of the week. A choice.</summary>
    private const int FewDays = 2;

    /// <summary>What a contact gets who names none. A choice.</summary>
    /// <param name="briefDays">Weekdays of the brief, 1 to 7.</param>
    public static IReadOnlyList<BriefForm> Usual(ContactRole role, int briefDays) => (role, briefDays <= FewDays) switch
    {
        (ContactRole.FrontDesk, _) => [BriefForm.CallList, BriefForm.ClassSheet],
        (ContactRole.Clinician, true) => [BriefForm.Daily, BriefForm.Weekly, BriefForm.CallList],
        (ContactRole.Clinician, false) => [BriefForm.Daily, BriefForm.CallList],
        (_, true) => [BriefForm.Daily, BriefForm.Weekly],
        _ => [BriefForm.Daily],
    };

    /// <summary>
    /// Week and call list come with the first brief of a week, which begins on Monday; between briefs the page keeps what the last one held.
    /// </summary>
    public static IReadOnlySet<BriefForm> On(Contact contact, LocalDate date)
    {
        var isFirst = LastBriefDay(contact, date)?.DayOfWeek == contact.BriefDays.Order().FirstOrDefault();
        return contact.Forms.Where(form => isFirst || form is BriefForm.Daily or BriefForm.ClassSheet).ToHashSet();
    }

    private static LocalDate? LastBriefDay(Contact contact, LocalDate date) =>
        Enumerable.Range(0, 7).Select(back => (LocalDate?)date.PlusDays(-back)).FirstOrDefault(day => contact.BriefDays.Contains(day!.Value.DayOfWeek));
}
