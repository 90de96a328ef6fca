using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Sessions of which a recorded channel has too little usable time. The rule <c>not_usable</c> tells of them; where the group's load, or a best, was read from such a channel, the
/// rules of intensity pass the session over: neither is it judged nor does it count as something to compare with.
/// </summary>
internal sealed class SensorFaults(RuleSubject subject)
{
    private static readonly Channel[] Watched = [Channel.HeartRate, Channel.Power];

    private readonly NotUsableLimits limits = subject.Limits.NotUsable;
    private readonly HashSet<LocalDate> dates = [];
    private bool gathered;

    /// <summary>The channels of a session that are of no use, the poorest first. Heart rate that is not to be used for this person is not missed.</summary>
    public static IEnumerable<KeyValuePair<Channel, double>> Poor(Person person, JoinedActivity activity, double wanted) => activity.UsableShare
        .Where(share => Watched.Contains(share.Key) && share.Value < wanted)
        .Where(share => share.Key != Channel.Power || !activity.Sport.IsOnFoot)
        .Where(share => share.Key != Channel.HeartRate || person.HeartRateIsValidOn(activity.Date))
        .OrderBy(share => share.Value)
        .ThenBy(share => share.Key);

    /// <summary>Whether a quantity of a session was read from a channel that is of no use. A load that something else stands in for was not.</summary>
    public bool Mutes(JoinedActivity activity, string quantity) =>
        ChannelOf(quantity) is { } channel && Mutes(activity, channel) && activity[quantity] is not null;

    /// <summary>Whether a channel of a session is of no use.</summary>
    public bool Mutes(JoinedActivity activity, Channel channel) =>
        limits.Enabled && Poor(subject.Person, activity, limits.UsableShare).Any(poor => poor.Key == channel);

    /// <summary>Whether the group's load of a date rests on such a session.</summary>
    public bool MuteLoadOf(LocalDate date)
    {
        if (!gathered)
        {
            dates.UnionWith(subject.Activities.Where(activity => Mutes(activity, subject.LoadQuantity)).Select(activity => activity.Date));
            gathered = true;
        }

        return dates.Contains(date);
    }

    private static Channel? ChannelOf(string quantity) => quantity switch
    {
        _ when QuantityNames.IsOfHeartRate(quantity) => Channel.HeartRate,
        QuantityNames.PowerTop or QuantityNames.Work => Channel.Power,
        _ => null,
    };
}
