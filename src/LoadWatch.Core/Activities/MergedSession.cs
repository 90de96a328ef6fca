using System.Globalization;
using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>Makes one recording of those of an activity, as its plan says: every number computed from it is explained by recordings that are named.</summary>
public static class MergedSession
{
    private const double MostOf = 0.9;

    /// <summary>The winner's own recording where it gives everything. Laps, lengths and pauses are the winner's.</summary>
    /// <param name="recordings">By key: at least those that give. Each is judged by itself: what it gives is judged already.</param>
    /// <param name="limits">Null for the defaults.</param>
    /// <returns>Null where no recording gives anything.</returns>
    public static Recording? Of(SessionPlan plan, IReadOnlyDictionary<string, Recording> recordings, QualityLimits? limits = null)
    {
        ArgumentNullException.ThrowIfNull(plan);
        if (plan.Contributions[0] is { Role: ContributionRole.Wins, Gifts: null } winner)
        {
            return recordings[winner.Key];
        }

        var givers = plan.Givers.Select(key => recordings[key]).ToList();
        if (givers.Count == 0)
        {
            return null;
        }

        var judged = plan.Givers.ToDictionary(key => key, key => new JudgedRecording(recordings[key], limits ?? new QualityLimits()), StringComparer.Ordinal);
        var channels = Gifts(plan).Where(one => one.Gift.Channel is not null).ToLookup(one => one.Gift.Channel!.Value);
        return givers[0] with
        {
            Start = plan.Frame.Start,
            LocalOffset = plan.Winner.LocalOffset,
            ElapsedSeconds = plan.Frame.ElapsedSeconds,
            TimerSeconds = plan.Frame.TimerSeconds,
            DistanceMetres = plan.Frame.DistanceMetres,
            Sport = plan.Frame.Sport,
            Samples = SampleSeries.Empty,
            Gathered = channels.ToDictionary(
                channel => channel.Key,
                channel => Series(channel.Key, channel.SelectMany(one => one.Gift.Stretches.Select(stretch => (judged[one.Key][channel.Key], stretch))))),
            GatheredPauses = channels.ToDictionary(channel => channel.Key, channel => Pauses(channel, recordings)),
            LateHeartRates = [],
            Sets = [.. Gifts(plan).Where(one => one.Gift.Whole == WholeGift.Sets).SelectMany(one => recordings[one.Key].Sets)],
        };
    }

    /// <summary>Channels that tell only of a part of a session of several recordings: what is computed of them is of that part.</summary>
    public static IEnumerable<string> Partial(SessionPlan plan, ActivityValues values) => plan.Contributions[0].Gifts is null || plan.Frame.ElapsedSeconds is not { } elapsed
        ? []
        : values.Histograms
            .OrderBy(one => one.Key)
            .Where(one => one.Value.TotalMilliseconds < MostOf * elapsed * 1000)
            .Select(one => $"{ChannelWords.Of(one.Key)} in {Minutes(one.Value.TotalMilliseconds)} of {Minutes(elapsed * 1000)} min: what is computed from it is of those");

    private static string Minutes(double milliseconds) => (milliseconds / 60_000).ToString("0", CultureInfo.InvariantCulture);

    private static IEnumerable<(string Key, Gift Gift)> Gifts(SessionPlan plan) =>
        plan.Contributions.SelectMany(one => (one.Gifts ?? []).Select(gift => (one.Key, gift)));

    private static IReadOnlyList<Pause> Pauses(IEnumerable<(string Key, Gift Gift)> gifts, IReadOnlyDictionary<string, Recording> recordings) =>
        [.. gifts.SelectMany(one => one.Gift.Stretches.SelectMany(stretch => StoppedTimes.Within(recordings[one.Key].Pauses, stretch)))];

    /// <param name="given">Stretches do not overlap.</param>
    private static SampleSeries Series(Channel channel, IEnumerable<(JudgedChannel Readings, Stretch Stretch)> given)
    {
        var rows = new List<(long UnixMilliseconds, double Value)>();
        long? end = null;
        foreach (var (readings, stretch) in given.OrderBy(one => one.Stretch.From is not null).ThenBy(one => one.Stretch.From))
        {
            var next = readings.Rows(stretch).ToList();
            if (next.Count == 0)
            {
                continue;
            }

            if (stretch.From > end)
            {
                rows.RemoveAll(row => StandsBeyond(row.UnixMilliseconds, end.Value));
            }

            rows.AddRange(next);
            end = stretch.To;
        }

        return new SampleSeries(
            [.. rows.Select(row => row.UnixMilliseconds)],
            new Dictionary<Channel, double[]> { [channel] = [.. rows.Select(row => row.Value)] });
    }

    /// <summary>
    /// Where readings go on behind a stretch that another activity counts, the last ones before it would stand for up to 10 s of it. They are left out; the
    /// reading before them stands for their time.
    /// </summary>
    private static bool StandsBeyond(long time, long end) => time > end - UsableSamples.LongestMilliseconds;
}
