using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Decides whether a contact is told something now, with the reason. Pure.</summary>
public static class NoticePolicy
{
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

    /// <summary>Decides whether a contact's brief is due.</summary>
    /// <param name="now">The moment of the decision.</param>
    /// <param name="decided">Whether a notice with this key exists.</param>
    public static NoticeReason Decide(Contact contact, Instant now, Func<string, bool> decided)
    {
        var local = now.InZone(contact.Zone);
        if (!contact.BriefDays.Contains(local.DayOfWeek))
        {
            return NoticeReason.NotADay;
        }

        // A brief time that the clocks skip is moved on by the length of the gap.
        if (now < local.Date.At(contact.BriefAt).InZoneLeniently(contact.Zone).ToInstant())
        {
            return NoticeReason.NotYetDue;
        }

        return decided(BriefKey(contact, local.Date)) ? NoticeReason.AlreadyDecided : NoticeReason.BriefDue;
    }
}
