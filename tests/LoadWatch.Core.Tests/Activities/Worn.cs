using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>A recording of one person with a reading every 10 s, in minutes after <see cref="Given.Start"/>.</summary>
internal sealed record Worn(RecordingSummary Summary, Recording Recording)
{
    public const int Step = 10;

    private static readonly Person Wearer = Given.Person();

    public string Key => Summary.Key;

    /// <param name="file">Names the file; parts of one file share it.</param>
    public static Worn Of(
        string file, double from, double to, IEnumerable<Channel> channels, int part = 1, string sport = "cycling", double? metres = null, int sets = 0, double? elapsed = null) =>
        Of(file, new Recording
        {
            Part = part,
            Sport = new Sport(sport),
            Start = At(from),
            ElapsedSeconds = elapsed ?? (to - from) * 60,
            DistanceMetres = metres,
            Samples = Every(from, to, [.. channels]),
            Sets = [.. Enumerable.Range(0, sets).Select(set => Given.Set("squat", 5 + set, 100) with { Start = At(from) })],
        });

    public static Worn Of(string file, Recording recording) =>
        new(RecordingSummaries.Of(file, new UsableRecording(recording, 0.5), Wearer, null), recording);

    public static Instant At(double minutes) => Given.Start + Duration.FromSeconds(minutes * 60);

    /// <summary>The value of a reading tells the channel, not the recording.</summary>
    public static SampleSeries Every(double from, double to, IReadOnlyList<Channel> channels)
    {
        var rows = to > from ? (int)((to - from) * 60 / Step) + 1 : 0;
        return new SampleSeries(
            [.. Enumerable.Range(0, rows).Select(row => At(from).ToUnixTimeMilliseconds() + (row * Step * 1000L))],
            channels.ToDictionary(channel => channel, channel => Enumerable.Range(0, rows).Select(row => Value(channel, row)).ToArray()));
    }

    public static IReadOnlyList<SessionPlan> Plans(IEnumerable<Worn> worn, params (string File, string By)[] replaced) => SessionPlans.Of(
        [.. worn.Select(one => one.Summary)],
        replaced.GroupBy(one => one.File, one => one.By, StringComparer.Ordinal).ToDictionary(one => one.Key, one => (IReadOnlyList<string>)[.. one], StringComparer.Ordinal),
        new HashSet<string>());

    public static UsableRecording Merged(SessionPlan plan, IEnumerable<Worn> worn) =>
        new(MergedSession.Of(plan, worn.ToDictionary(one => one.Key, one => one.Recording, StringComparer.Ordinal))!, 0.5);

    /// <summary>Time for which usable readings of a channel stand in the activity.</summary>
    public static double Minutes(SessionPlan plan, Channel channel, IEnumerable<Worn> worn) =>
        Merged(plan, worn)[channel] is { } usable ? usable.Samples.Sum(sample => sample.Milliseconds) / 60_000.0 : 0;

    /// <summary>What a plan says, in a line.</summary>
    public static string Text(SessionPlan plan) => $"{plan.Frame} " + string.Join(" + ", plan.Contributions.Select(one =>
        $"{one.Key} {one.Role} [{(one.Gifts is null ? "all" : string.Join(", ", one.Gifts.Select(gift => $"{gift.Channel}{gift.Whole} {string.Join(' ', gift.Stretches)}")))}]"));

    private static double Value(Channel channel, int row) => channel switch
    {
        Channel.HeartRate => 140,
        Channel.Power => 200,
        Channel.Speed => 8,
        Channel.Cadence => 90,
        Channel.Distance => 80.0 * row,
        _ => 100,
    };
}
