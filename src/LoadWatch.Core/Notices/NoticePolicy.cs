using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Decides whether a contact is told something now, with the reason. Pure.</summary>
public static class NoticePolicy
{
    private const int DaysInAWeek = 7;

    /// <summary>The key of the contact's brief of a local date.</summary>
    public static string BriefKey(Contact contact, LocalDate date) => $"{contact.Id}|brief|{date:uuuu-MM-dd}";

    /// <summary>The key of the contact's one update of a local date.</summary>
    public static string UpdateKey(Contact contact, LocalDate date) => $"{contact.Id}|update|{date:uuuu-MM-dd}";

    /// <summary>Decides whether a contact is told a second time on a date.</summary>
    /// <param name="told">The flagged list of the day's brief; null where there is no such brief or it knew nobody's days.</param>
    /// <param name="standing">The flagged list as it stands.</param>
    /// <param name="decided">Whether a notice with this key exists.</param>
    public static NoticeReason DecideUpdate(Contact contact, LocalDate date, string? told, string standing, Func<string, bool> decided)
    {
        if (told is null)
        {
            return NoticeReason.NoBriefYet;
        }

        if (string.Equals(told, standing, StringComparison.Ordinal))
        {
            return NoticeReason.ListUnchanged;
        }

        return decided(UpdateKey(contact, date)) ? NoticeReason.AlreadyDecided : NoticeReason.ListChanged;
    }

    /// <summary>
    /// Decides whether a contact's brief is due: the latest one whose time has come within a week. One that was missed is caught up; a contact without any
    /// brief yet begins with today's.
    /// </summary>
    /// <param name="now">The moment of the decision.</param>
    /// <param name="last">Date of the contact's last brief, or null.</param>
    /// <param name="decided">Whether a notice with this key exists.</param>
    public static NoticeDecision Decide(Contact contact, Instant now, LocalDate? last, Func<string, bool> decided)
    {
        var today = now.InZone(contact.Zone).Date;
        var due = Enumerable.Range(0, last is null ? 1 : DaysInAWeek)
            .Select(back => today.PlusDays(-back))
            .Where(date => contact.BriefDays.Contains(date.DayOfWeek) && now >= TimeOn(contact, date))
            .Select(date => (LocalDate?)date)
            .FirstOrDefault();
        return due switch
        {
            null when contact.BriefDays.Contains(today.DayOfWeek) => new NoticeDecision(NoticeReason.NotYetDue, today),
            null => new NoticeDecision(NoticeReason.NotADay, today),
            { } date when last >= date || decided(BriefKey(contact, date)) => new NoticeDecision(NoticeReason.AlreadyDecided, date),
            { } date => new NoticeDecision(NoticeReason.BriefDue, date),
        };
    }

    /// <summary>A brief time that the clocks skip is moved on by the length of the gap.</summary>
    private static Instant TimeOn(Contact contact, LocalDate date) => date.At(contact.BriefAt).InZoneLeniently(contact.Zone).ToInstant();
}

/// <param name="Date">The local date that the decision is about.</param>
public readonly record struct NoticeDecision(NoticeReason Reason, LocalDate Date);
