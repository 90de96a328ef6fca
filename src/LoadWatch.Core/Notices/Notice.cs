using NodaTime;

namespace LoadWatch.Notices;

/// <summary>What one contact is told, frozen when it was decided (I-7).</summary>
/// <param name="Key"><c>contact|kind|local date</c>: unique, so a missed schedule is caught up and a double one does nothing.</param>
/// <param name="Subject">Holds neither names nor values.</param>
/// <param name="Text">Plain text that stands alone.</param>
/// <param name="Html">One self-contained page.</param>
/// <param name="Reason">Why now.</param>
public sealed record Notice(
    string Key,
    string ContactId,
    LocalDate Date,
    string Subject,
    string Text,
    string Html,
    NoticeReason Reason)
{
    /// <summary>When it was decided; null for one of before this was kept.</summary>
    public Instant? Decided { get; init; }

    /// <summary>The <see cref="FlaggedList"/> of that moment; null where nobody had a day yet.</summary>
    public string? Flagged { get; init; }

    /// <summary>The text as it may leave the machine, frozen like the other; null where that is <see cref="Text"/> itself.</summary>
    public string? MailText { get; init; }

    /// <summary>The HTML of its mail, with the pictures in it; null where no mail goes out, and for one of before mails had their own.</summary>
    public string? MailHtml { get; init; }
}

/// <summary>Why a notice is told, or not.</summary>
public enum NoticeReason
{
    /// <summary>The scheduled brief is due.</summary>
    BriefDue,

    /// <summary>The brief's time has not come.</summary>
    NotYetDue,

    /// <summary>Not one of the contact's days.</summary>
    NotADay,

    /// <summary>It was decided before.</summary>
    AlreadyDecided,

    /// <summary>The people to look at are others than in the brief of the day.</summary>
    ListChanged,

    /// <summary>They are the same.</summary>
    ListUnchanged,

    /// <summary>The day has no brief with data that could have changed.</summary>
    NoBriefYet,

    /// <summary>The daily report on the service itself is due.</summary>
    ServiceReportDue,

    /// <summary>The service itself is in trouble.</summary>
    ServiceTrouble,
}
