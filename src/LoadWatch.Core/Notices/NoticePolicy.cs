using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>Decides whether a contact's brief is due, with the reason. Pure.</summary>
public static class NoticePolicy
{
    /// <summary>The key of the contact's brief of a local date.</summary>
    public static string BriefKey(Contact contact, LocalDate date) => $"{contact.Id}|brief|{date:uuuu-MM-dd}";

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
