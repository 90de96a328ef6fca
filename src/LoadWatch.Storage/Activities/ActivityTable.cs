using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.Recordings;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>Tables <c>activity</c>, <c>histogram</c> and <c>best_mean</c>: what counts, and what was computed of it. An activity is one row, so that a year is some hundred.</summary>
public sealed class ActivityTable
{
    private const string Insert = """
        INSERT INTO activity (
            key, sha, part, person, date, recordings, session, heart_rate_mean_bpm, heart_rate_max_bpm,
            power_mean_watts, power_max_watts, usable_share, times_in_zone, remarks, quantities, stimulus, cuts, checksum)
        VALUES (
            @Key, @Sha, @Part, @Person, @Date, @Recordings, @Session, @HeartRateMeanBpm, @HeartRateMaxBpm,
            @PowerMeanWatts, @PowerMaxWatts, @UsableShare, @TimesInZone, @Remarks, @Quantities, @Stimulus, @Cuts, @Checksum)
        """;

    private const string InsertHistogram = "INSERT INTO histogram (activity, channel, bins) VALUES (@Activity, @Channel, @Bytes)";

    private const string InsertBestMeans = "INSERT INTO best_mean (activity, channel, means) VALUES (@Activity, @Channel, @Bytes)";

    private const string UpdateRecordings = "UPDATE activity SET recordings = @Recordings, checksum = @Checksum WHERE key = @Key";

    private const string Update = "UPDATE activity SET times_in_zone = @TimesInZone, remarks = @Remarks, quantities = @Quantities, checksum = @Checksum WHERE key = @Key";

    // Its histograms and best means go with it.
    private const string Delete = "DELETE FROM activity WHERE key = @key";

    private const string SelectActivities = """
        SELECT r.*, a.key, a.date, a.recordings, a.session, a.heart_rate_mean_bpm, a.heart_rate_max_bpm,
            a.power_mean_watts, a.power_max_watts, a.usable_share, a.times_in_zone, a.remarks, a.quantities, a.stimulus, a.cuts, a.checksum
        FROM activity a JOIN recording r ON r.sha = a.sha AND r.part = a.part
        """;

    private const string SelectMerges = """
        SELECT r.*, a.key, a.date, a.recordings, a.session
        FROM activity a JOIN recording r ON r.sha = a.sha AND r.part = a.part
        WHERE r.person = @person AND r.start >= @from AND r.start <= @to
        ORDER BY r.start, a.key
        """;

    private const string InDates = " WHERE a.date >= @from AND a.date <= @to";
    private const string OfPersonInDates = InDates + " AND a.person = @person";
    private const string SelectFirst = "SELECT MIN(date) AS date FROM activity WHERE person = @person";
    private const string SelectHistogram = "SELECT bins FROM histogram WHERE activity = @key AND channel = @channel";

    private const string SelectPage = SelectActivities + " WHERE a.key > @after ORDER BY a.key LIMIT @most";
    private const string SelectOne = SelectActivities + " WHERE a.key = @key";
    private const string SelectHistograms = "SELECT activity, channel, bins AS bytes FROM histogram WHERE activity >= @first AND activity <= @last ORDER BY activity, channel";

    private const string SelectHistogramsOfPerson = """
        SELECT h.activity, h.channel, h.bins AS bytes FROM activity a JOIN histogram h ON h.activity = a.key
        WHERE a.person = @person AND a.date >= @from AND a.date <= @to AND h.channel IN ('heart_rate', 'speed')
        """;

    private const string SelectBestMeans = "SELECT activity, channel, means AS bytes FROM best_mean WHERE activity >= @first AND activity <= @last ORDER BY activity, channel";

    private const string SelectBestMeansOfPerson = """
        SELECT b.activity, b.channel, b.means AS bytes FROM activity a JOIN best_mean b ON b.activity = a.key
        WHERE a.person = @person AND a.date >= @from AND a.date <= @to
        """;

    private const string SelectMergesInDates = """
        SELECT r.*, a.key, a.date, a.recordings, a.session
        FROM activity a JOIN recording r ON r.sha = a.sha AND r.part = a.part
        WHERE a.person = @person AND a.date >= @from AND a.date <= @to
        ORDER BY a.date, r.start, a.key
        """;

    private const string SelectQuantities = "SELECT date, quantities FROM activity WHERE person = @person AND date >= @from AND date <= @to AND quantities LIKE @part ORDER BY date, key";

    private readonly StoreSession session;

    internal ActivityTable(StoreSession session) => this.session = session;

    /// <summary>Stores an activity in place of the one of the same key. Its winner must be among the recordings.</summary>
    public void Put(StoredActivity activity)
    {
        Remove(activity.Key);
        var row = ActivityRow.From(activity);
        var histograms = ChannelRows(activity.Key, activity.Values.Histograms, HistogramCodec.Write);
        var means = ChannelRows(activity.Key, activity.Values.BestMeans, BestMeansCodec.Write);
        row.Checksum = ActivityChecksum.Of(row, histograms, means);
        session.Execute(Insert, row);
        session.ExecuteEach(InsertHistogram, histograms);
        session.ExecuteEach(InsertBestMeans, means);
    }

    /// <summary>Notes what became of the recordings of an activity whose values stay. Nothing when there is none.</summary>
    public void PutRecordings(StoredMerge merge)
    {
        if (session.Row<ActivityRow>(SelectOne, new { key = merge.Winner.Key }) is { } row)
        {
            row.Recordings = ActivityRow.Text(merge.Contributions);
            row.Checksum = ChecksumOf(row);
            session.Execute(UpdateRecordings, row);
        }
    }

    /// <summary>Stores what histograms and reference values tell in place of what they told; all else stays.</summary>
    public void Renew(StoredActivity activity)
    {
        var row = ActivityRow.From(activity);
        row.Checksum = ChecksumOf(row);
        session.Execute(Update, row);
    }

    /// <summary>Removes an activity; nothing when there is none.</summary>
    public void Remove(string key) => session.Execute(Delete, new { key });

    /// <summary>A person's activities whose date is in the range, both ends included, sorted by date, start and key.</summary>
    public IReadOnlyList<StoredActivity> OfPerson(string person, LocalDate? from = null, LocalDate? to = null) =>
        Select(OfPersonInDates, new { person, from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue });

    /// <summary>Everybody's activities whose date is in the range, both ends included, sorted by date, start and key.</summary>
    public IReadOnlyList<StoredActivity> All(LocalDate? from = null, LocalDate? to = null) =>
        Select(InDates, new { from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue });

    /// <summary>The activity of a key, or null.</summary>
    public StoredActivity? Get(string key) => session.Row<ActivityRow>(SelectOne, new { key })?.ToActivity();

    /// <summary>The first date of a person's activities, or null.</summary>
    public LocalDate? FirstOfPerson(string person) => session.Row<FirstRow>(SelectFirst, new { person })?.Date;

    /// <summary>Time by value of every channel that has one.</summary>
    public IReadOnlyDictionary<Channel, Histogram> Histograms(string key) => session.Rows<ChannelRow>(SelectHistograms, new { first = key, last = key })
        .ToDictionary(row => Words<Channel>.Parse(row.Channel), row => HistogramCodec.Read(row.Bytes));

    /// <summary>Time by heart rate and by speed of a person's activities of the dates, both ends included, by key of the activity.</summary>
    public IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, Histogram>> Histograms(string person, LocalDate from, LocalDate to) =>
        OfPerson(SelectHistogramsOfPerson, person, from, to, bytes => HistogramCodec.Read(bytes));

    /// <summary>How a person's activities were made whose winning recordings start in the range, both ends included, sorted by that start and by key.</summary>
    public IReadOnlyList<StoredMerge> Merges(string person, Instant from, Instant to) =>
        session.Rows<ActivityRow>(SelectMerges, new { person, from, to }).ConvertAll(row => row.ToMerge());

    /// <summary>Time by value of one channel, or null where the activity has none.</summary>
    public Histogram? Histogram(string key, Channel channel) =>
        session.Value<byte[]>(SelectHistogram, new { key, channel = Words<Channel>.Of(channel) }) is { } bins ? HistogramCodec.Read(bins) : null;

    /// <summary>Looks whether activities are what was written, in ordinal order of their keys.</summary>
    /// <param name="after">Only those behind this key.</param>
    public IReadOnlyList<CheckedActivity> Check(string after, int most)
    {
        var rows = session.Rows<ActivityRow>(SelectPage, new { after, most });
        var (histograms, means) = (OfPage(SelectHistograms, rows), OfPage(SelectBestMeans, rows));
        return rows.ConvertAll(row => Check(row, histograms[row.Key], means[row.Key]));
    }

    /// <summary>What a person's activities of the dates, both ends included, showed at best, sorted by date, start and key.</summary>
    public IReadOnlyList<SessionBests> Bests(string person, LocalDate from, LocalDate to)
    {
        var means = BestMeans(person, from, to);
        return
        [
            .. session.Rows<ActivityRow>(SelectMergesInDates, new { person, from, to })
                .Where(row => means.ContainsKey(row.Key))
                .Select(row => new SessionBests(row.Key, row.Date, row.ToMerge().Session.Sport, means[row.Key])),
        ];
    }

    /// <summary>Best means of a person's activities of the dates, both ends included, by key of the activity.</summary>
    public IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>> BestMeans(string person, LocalDate from, LocalDate to) =>
        OfPerson(SelectBestMeansOfPerson, person, from, to, bytes => BestMeansCodec.Read(bytes));

    /// <summary>The quantities of a person's activities of the dates, both ends included, where one's name begins with a prefix; sorted by date.</summary>
    public IReadOnlyList<(LocalDate Date, IReadOnlyList<Quantity> Quantities)> QuantitiesLike(string person, LocalDate from, LocalDate to, string prefix) =>
        session.Rows<QuantitiesRow>(SelectQuantities, new { person, from, to, part = $"%\"{prefix}%" })
            .ConvertAll(row => (row.Date, (IReadOnlyList<Quantity>)JsonText.Read<List<Quantity>>(row.Quantities).Where(one => one.Name.StartsWith(prefix, StringComparison.Ordinal)).ToList()));

    private sealed class FirstRow
    {
        public LocalDate? Date { get; init; }
    }

    private sealed class QuantitiesRow
    {
        public LocalDate Date { get; init; }

        public string Quantities { get; init; } = "";
    }

    private Dictionary<string, IReadOnlyDictionary<Channel, T>> OfPerson<T>(string select, string person, LocalDate from, LocalDate to, Func<byte[], T> read) =>
        session.Rows<ChannelRow>(select, new { person, from, to })
            .GroupBy(row => row.Activity, StringComparer.Ordinal)
            .ToDictionary(
                rows => rows.Key,
                IReadOnlyDictionary<Channel, T> (rows) => rows.ToDictionary(row => Words<Channel>.Parse(row.Channel), row => read(row.Bytes)),
                StringComparer.Ordinal);

    private ILookup<string, ChannelRow> OfPage(string select, List<ActivityRow> rows) =>
        (rows.Count == 0 ? [] : session.Rows<ChannelRow>(select, new { first = rows[0].Key, last = rows[^1].Key })).ToLookup(row => row.Activity, StringComparer.Ordinal);

    private string ChecksumOf(ActivityRow row)
    {
        var only = new { first = row.Key, last = row.Key };
        return ActivityChecksum.Of(row, session.Rows<ChannelRow>(SelectHistograms, only), session.Rows<ChannelRow>(SelectBestMeans, only));
    }

    private static CheckedActivity Check(ActivityRow row, IEnumerable<ChannelRow> histograms, IEnumerable<ChannelRow> means)
    {
        var now = ActivityChecksum.Of(row, histograms, means);
        return new CheckedActivity(row.Key, row.Person, row.Date, row.Sha, now, row.Checksum is { } written ? written == now : null);
    }

    private static List<ChannelRow> ChannelRows<T>(string key, IReadOnlyDictionary<Channel, T> values, Func<T, byte[]> write) =>
    [
        .. values.Select(pair => new ChannelRow { Activity = key, Channel = Words<Channel>.Of(pair.Key), Bytes = write(pair.Value) }).OrderBy(row => row.Channel, StringComparer.Ordinal),
    ];

    private IReadOnlyList<StoredActivity> Select(string where, object values) =>
    [
        .. session.Rows<ActivityRow>(SelectActivities + where, values)
            .Select(row => row.ToActivity())
            .OrderBy(activity => activity.Date)
            .ThenBy(activity => activity.Session.Start)
            .ThenBy(activity => activity.Key, StringComparer.Ordinal),
    ];
}
