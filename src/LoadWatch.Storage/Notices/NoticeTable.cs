using LoadWatch.Notices;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Notices;

/// <summary>Tables <c>notice</c> and <c>delivery</c>: what was told to whom, and by which way it went out (I-7).</summary>
public sealed class NoticeTable
{
    private const string Columns = "key, contact, date, subject, text, html, reason, decided, flagged, mail_text, mail_html";

    private const string Insert = $"""
        INSERT INTO notice ({Columns}, kind, alert_position)
        VALUES (@Key, @Contact, @Date, @Subject, @Text, @Html, @Reason, @Decided, @Flagged, @MailText, @MailHtml, @Kind, @AlertPosition)
        ON CONFLICT (key) DO NOTHING
        """;

    private const string InsertDelivery =
        "INSERT INTO delivery (notice, channel, recipient, state, attempts) VALUES (@notice, @channel, @recipient, 'pending', 0)";

    private const string SelectOne = $"SELECT {Columns} FROM notice WHERE key = @key";
    private const string CountOne = "SELECT COUNT(*) FROM notice WHERE key = @key";

    private const string SelectLastBrief =
        "SELECT date, alert_position FROM notice WHERE contact = @contactId AND kind = 'brief' AND date < @before ORDER BY date DESC LIMIT 1";

    private const string DeliveryColumns = "d.channel, d.recipient, d.attempts, d.last_error, d.first_attempt, d.state";

    private const string SelectPending = $"""
        SELECT {Columns}, {DeliveryColumns}
        FROM delivery d JOIN notice n ON n.key = d.notice
        WHERE d.state = 'pending' ORDER BY n.date, n.key, d.channel, d.recipient
        """;

    private const string SelectDue = $"""
        SELECT {Columns}, {DeliveryColumns}
        FROM delivery d JOIN notice n ON n.key = d.notice
        WHERE d.state = 'pending' AND (d.next_attempt IS NULL OR d.next_attempt <= @now) ORDER BY n.date, n.key, d.channel, d.recipient
        """;

    private const string SelectMissed = """
        SELECT n.contact, n.date, d.channel, d.first_attempt, d.state, d.last_error
        FROM delivery d JOIN notice n ON n.key = d.notice
        WHERE d.state <> 'delivered' AND d.attempts > 0 AND NOT EXISTS (
            SELECT 1 FROM delivery later JOIN notice m ON m.key = later.notice
            WHERE m.contact = n.contact AND later.channel = d.channel AND later.state = 'delivered' AND m.date > n.date)
        ORDER BY n.contact, d.channel, n.date, n.key, d.recipient
        """;

    private const string Deliver = """
        UPDATE delivery SET state = 'delivered', last_error = NULL, next_attempt = NULL
        WHERE notice = @noticeKey AND channel = @channel AND recipient = @recipient
        """;

    private const string Fail = """
        UPDATE delivery
        SET state = @state, attempts = attempts + 1, last_error = @error, first_attempt = COALESCE(first_attempt, @at), next_attempt = @next
        WHERE notice = @noticeKey AND channel = @channel AND recipient = @recipient AND state = 'pending'
        """;

    private const string SelectBacklog = """
        SELECT COUNT(*) AS number, MIN(n.decided) AS oldest, MIN(CASE WHEN d.channel = 'mail' AND (NOT EXISTS (
            SELECT 1 FROM delivery other JOIN notice m ON m.key = other.notice
            WHERE other.channel = 'mail' AND other.state = 'delivered' AND m.decided >= d.first_attempt)
            OR (SELECT COUNT(DISTINCT mate.recipient) FROM delivery mate
                WHERE mate.channel = 'mail' AND mate.state = 'pending' AND mate.first_attempt IS NOT NULL) > 1) THEN d.first_attempt END) AS mail_tried_since
        FROM delivery d JOIN notice n ON n.key = d.notice WHERE d.state = 'pending'
        """;

    private readonly StoreSession session;

    internal NoticeTable(StoreSession session) => this.session = session;

    public bool Exists(string key) => session.Value<long>(CountOne, new { key }) > 0;

    public Notice? Get(string key) => session.Row<NoticeRow>(SelectOne, new { key })?.ToNotice();

    /// <summary>The contact's latest brief dated before a date, or null.</summary>
    public LastBrief? LastBrief(string contactId, LocalDate before) =>
        session.Row<NoticeRow>(SelectLastBrief, new { contactId, before }) is { } row ? new LastBrief(row.Date, row.AlertPosition) : null;

    /// <summary>Freezes a notice and asks for its deliveries. False, and nothing changed, when one of its key was decided before.</summary>
    /// <param name="alertPosition">The last alert change that it knows of.</param>
    /// <exception cref="ArgumentException">The key is not <c>contact|kind|local date</c> of this notice.</exception>
    public bool Add(Notice notice, long alertPosition, IReadOnlyList<Delivery> deliveries)
    {
        if (session.Execute(Insert, NoticeRow.From(notice, alertPosition)) == 0)
        {
            return false;
        }

        session.ExecuteEach(InsertDelivery, deliveries.Select(way => new { notice = notice.Key, channel = way.Channel, recipient = way.Recipient }));
        return true;
    }

    /// <summary>Every delivery that is still to be made, oldest notice first.</summary>
    public IReadOnlyList<PendingDelivery> PendingDeliveries() => session.Rows<NoticeRow>(SelectPending).ConvertAll(row => row.ToPending());

    /// <summary>How much waits to be delivered.</summary>
    public DeliveryBacklog Backlog()
    {
        var row = session.Row<BacklogRow>(SelectBacklog)!;
        return new DeliveryBacklog(row.Number, row.Oldest, row.MailTriedSince);
    }

    /// <summary>Those of them that are due, oldest notice first.</summary>
    public IReadOnlyList<PendingDelivery> DueDeliveries(Instant now) => session.Rows<NoticeRow>(SelectDue, new { now }).ConvertAll(row => row.ToPending());

    /// <summary>The oldest notice of each contact and channel that was tried and did not get through, unless a later one did.</summary>
    public IReadOnlyList<MissedDelivery> MissedDeliveries() =>
        [.. session.Rows<NoticeRow>(SelectMissed).Select(row => row.ToMissed()).DistinctBy(missed => (missed.Contact, missed.Channel))];

    /// <summary>To be called after the channel took the notice over, never before.</summary>
    public void MarkDelivered(string noticeKey, Delivery delivery) =>
        session.Execute(Deliver, new { noticeKey, channel = delivery.Channel, recipient = delivery.Recipient });

    /// <summary>Counts an attempt that failed; the delivery stays pending.</summary>
    /// <param name="error">What the channel said.</param>
    /// <param name="at">When.</param>
    /// <param name="next">When it is due again.</param>
    public void MarkTryAgain(string noticeKey, Delivery delivery, string error, Instant at, Instant next) =>
        MarkMissed(noticeKey, delivery, error, DeliveryState.Pending, at, next);

    /// <summary>Counts an attempt that was the last one; the delivery stays on record as missed.</summary>
    public void MarkGivenUp(string noticeKey, Delivery delivery, string error, DeliveryState state, Instant at) =>
        MarkMissed(noticeKey, delivery, error, state, at, null);

    private void MarkMissed(string noticeKey, Delivery delivery, string error, DeliveryState state, Instant at, Instant? next) => session.Execute(
        Fail, new { noticeKey, channel = delivery.Channel, recipient = delivery.Recipient, error, state = Words<DeliveryState>.Of(state), at, next });

    private sealed class BacklogRow
    {
        public int Number { get; init; }

        public Instant? Oldest { get; init; }

        public Instant? MailTriedSince { get; init; }
    }
}
