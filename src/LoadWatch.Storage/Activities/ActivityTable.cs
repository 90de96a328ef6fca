using LoadWatch.Activities;
using LoadWatch.Recordings;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>Tables <c>activity</c> and <c>histogram</c>: what counts, and what was computed of it. An activity is one row, so that a year is some hundred.</summary>
public sealed class ActivityTable
{
    private const string Insert = """
        INSERT INTO activity (
            key, sha, part, person, date, recordings, heart_rate_mean_bpm, heart_rate_max_bpm,
            power_mean_watts, power_max_watts, usable_share, times_in_zone, remarks, quantities, stimulus)
        VALUES (
            @Key, @Sha, @Part, @Person, @Date, @Recordings, @HeartRateMeanBpm, @HeartRateMaxBpm,
            @PowerMeanWatts, @PowerMaxWatts, @UsableShare, @TimesInZone, @Remarks, @Quantities, @Stimulus)
        """;

    private const string InsertHistogram = "INSERT INTO histogram (activity, channel, bins) VALUES (@activity, @channel, @bins)";

    private const string Update = "UPDATE activity SET times_in_zone = @TimesInZone, remarks = @Remarks, quantities = @Quantities WHERE key = @Key";

    // Its histograms go with it.
    private const string Delete = "DELETE FROM activity WHERE key = @key";

    private const string SelectActivities = """
        SELECT r.*, a.key, a.date, a.recordings, a.heart_rate_mean_bpm, a.heart_rate_max_bpm,
            a.power_mean_watts, a.power_max_watts, a.usable_share, a.times_in_zone, a.remarks, a.quantities, a.stimulus
        FROM activity a JOIN recording r ON r.sha = a.sha AND r.part = a.part
        """;

    private const string InDates = " WHERE a.date >= @from AND a.date <= @to";
    private const string OfPersonInDates = InDates + " AND a.person = @person";
    private const string SelectHistograms = "SELECT channel, bins FROM histogram WHERE activity = @key";
    private const string SelectHistogram = "SELECT bins FROM histogram WHERE activity = @key AND channel = @channel";

    private readonly StoreSession session;

    internal ActivityTable(StoreSession session) => this.session = session;

    /// <summary>Stores an activity in place of the one of the same key. Its winner must be among the recordings.</summary>
    public void Put(StoredActivity activity)
    {
        Remove(activity.Key);
        session.Execute(Insert, ActivityRow.From(activity));
        session.ExecuteEach(InsertHistogram, HistogramRows(activity));
    }

    /// <summary>Stores what histograms and reference values tell in place of what they told; all else stays.</summary>
    public void Renew(StoredActivity activity) => session.Execute(Update, ActivityRow.From(activity));

    /// <summary>Removes an activity; nothing when there is none.</summary>
    public void Remove(string key) => session.Execute(Delete, new { key });

    /// <summary>A person's activities whose date is in the range, both ends included, sorted by date, start and key.</summary>
    public IReadOnlyList<StoredActivity> OfPerson(string person, LocalDate? from = null, LocalDate? to = null) =>
        Select(OfPersonInDates, new { person, from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue });

    /// <summary>Everybody's activities whose date is in the range, both ends included, sorted by date, start and key.</summary>
    public IReadOnlyList<StoredActivity> All(LocalDate? from = null, LocalDate? to = null) =>
        Select(InDates, new { from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue });

    /// <summary>Time by value of every channel that has one.</summary>
    public IReadOnlyDictionary<Channel, Histogram> Histograms(string key)
    {
        var histograms = new Dictionary<Channel, Histogram>();
        session.EachRow(SelectHistograms, new { key }, row => histograms[Words<Channel>.Parse(row.GetString(0))] = HistogramCodec.Read((byte[])row.GetValue(1)));
        return histograms;
    }

    /// <summary>Time by value of one channel, or null where the activity has none.</summary>
    public Histogram? Histogram(string key, Channel channel) =>
        session.Value<byte[]>(SelectHistogram, new { key, channel = Words<Channel>.Of(channel) }) is { } bins ? HistogramCodec.Read(bins) : null;

    private static IEnumerable<object> HistogramRows(StoredActivity activity) =>
        activity.Values.Histograms
            .OrderBy(pair => pair.Key)
            .Select(pair => new { activity = activity.Key, channel = Words<Channel>.Of(pair.Key), bins = HistogramCodec.Write(pair.Value) });

    private List<StoredActivity> Select(string where, object values) =>
        session.Rows<ActivityRow>(SelectActivities + where + " ORDER BY a.date, r.start, a.key", values).ConvertAll(row => row.ToActivity());
}
