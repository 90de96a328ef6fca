using LoadWatch.Notices;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Notices;

/// <summary>A row of <c>notice</c>, and beside it that of a delivery where one was asked for.</summary>
internal sealed class NoticeRow
{
    public string Key { get; init; } = "";

    public string Contact { get; init; } = "";

    public string Kind { get; init; } = "";

    public LocalDate Date { get; init; }

    public string Subject { get; init; } = "";

    public string Text { get; init; } = "";

    public string Html { get; init; } = "";

    public string Reason { get; init; } = "";

    public long AlertPosition { get; init; }

    public string Channel { get; init; } = "";

    public string Recipient { get; init; } = "";

    public int Attempts { get; init; }

    public string? LastError { get; init; }

    public Instant? FirstAttempt { get; init; }

    public string State { get; init; } = "";

    public Instant? Decided { get; init; }

    public string? Flagged { get; init; }

    public string? MailText { get; init; }

    public string? MailHtml { get; init; }

    public static NoticeRow From(Notice notice, long alertPosition) => new()
    {
        Key = notice.Key,
        Contact = notice.ContactId,
        Kind = KindOf(notice),
        Date = notice.Date,
        Subject = notice.Subject,
        Text = notice.Text,
        Html = notice.Html,
        Reason = Words<NoticeReason>.Of(notice.Reason),
        AlertPosition = alertPosition,
        Decided = notice.Decided,
        Flagged = notice.Flagged,
        MailText = notice.MailText,
        MailHtml = notice.MailHtml,
    };

    public Notice ToNotice() => new(Key, Contact, Date, Subject, Text, Html, Words<NoticeReason>.Parse(Reason))
    {
        Decided = Decided,
        Flagged = Flagged,
        MailText = MailText,
        MailHtml = MailHtml,
    };

    public PendingDelivery ToPending() =>
        new(ToNotice(), new Delivery(Channel, Recipient), Attempts, LastError) { FirstAttempt = FirstAttempt };

    public MissedDelivery ToMissed() => new(Contact, Channel, Date, FirstAttempt, Words<DeliveryState>.Parse(State), LastError ?? "");

    private static string KindOf(Notice notice)
    {
        var head = notice.ContactId + "|";
        var tail = "|" + ColumnTypes.Date.Format(notice.Date);
        var length = notice.Key.Length - head.Length - tail.Length;
        if (length < 1 || !notice.Key.StartsWith(head, StringComparison.Ordinal) || !notice.Key.EndsWith(tail, StringComparison.Ordinal))
        {
            throw new ArgumentException($"the key {notice.Key} is not {head}kind{tail}", nameof(notice));
        }

        return notice.Key.Substring(head.Length, length);
    }
}
