using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Plans one activity: what each of its recordings gives.</summary>
/// <param name="claimed">The stretches of a recording and channel that belong to other activities.</param>
/// <param name="role">Of a recording; whether one that may give does is found here.</param>
internal sealed class SessionMerging(
    SessionGroup group, Func<RecordingSummary, Channel?, IReadOnlyList<Stretch>> claimed, Func<RecordingSummary, ContributionRole> role)
{
    /// <summary>Each of their readings stands for itself, so two devices may take turns.</summary>
    private static readonly Channel[] Rates = [Channel.HeartRate, Channel.Power, Channel.Speed, Channel.Cadence];

    /// <summary>Totals and heights have a zero of their own in each device: readings of two in a row would tell of a way that nobody went.</summary>
    private static readonly Channel[] Levels = [Channel.Distance, Channel.Altitude];

    private readonly RecordingSummary[] able = [.. group.Recordings.Where(one => role(one) is ContributionRole.Wins or ContributionRole.Gives)];

    public SessionPlan Plan()
    {
        var rates = Rates.SelectMany(RateGifts).ToList();
        var span = new SessionSpan(group.Winner, one => claimed(one, null), rates);
        var sport = SportGiver(span);
        var distance = OfWholeSession(one => one.DistanceMetres is > 0, span, SessionClaims.Ran);
        var sets = SetGivers();
        List<(RecordingSummary Recording, Gift Gift)> gifts =
        [
            .. rates,
            .. Levels.SelectMany(channel => LevelGift(channel, span)),
            .. sets.Select(one => (one, Gift.Of(WholeGift.Sets))),
            .. Others(distance).Select(one => (one, Gift.Of(WholeGift.StatedDistance))),
            .. Others(sport).Select(one => (one, Gift.Of(WholeGift.Sport))),
        ];
        var frame = new SessionFrame(
            span.Start,
            span.ElapsedSeconds,
            span.TimerSeconds,
            sport?.Sport ?? group.Winner.Sport,
            sets.Sum(one => one.Sets),
            distance is null || (distance == group.Winner && span.IsCut) ? null : distance.DistanceMetres);
        return new SessionPlan(group.Winner, frame, Contributions(gifts.ToLookup(gift => gift.Recording, gift => gift.Gift), span.IsCut));
    }

    private IEnumerable<(RecordingSummary Recording, Gift Gift)> RateGifts(Channel channel) =>
        new ChannelGifts(channel, able, group.Winner, one => claimed(one, channel)).Gifts;

    private IEnumerable<(RecordingSummary Recording, Gift Gift)> LevelGift(Channel channel, SessionSpan span)
    {
        var giver = OfWholeSession(one => one.Extent(channel) is { IsUsable: true }, span, one => new Stretch(one.Extent(channel)!.First, one.Extent(channel)!.Last + 1))
            ?? (able.Contains(group.Winner) && group.Winner.Channels[channel] is not null ? group.Winner : null);
        return giver is null ? [] : [(giver, new Gift(channel, null, Stretch.Always.Without(claimed(giver, channel))))];
    }

    /// <summary>
    /// The richest that tells of nine tenths of the session (a choice), else the richest: the total of a device that died after a third is not the
    /// session's. One that ran on through other activities is not asked, as its figure is theirs too.
    /// </summary>
    private RecordingSummary? OfWholeSession(Func<RecordingSummary, bool> tells, SessionSpan span, Func<RecordingSummary, Stretch> extent)
    {
        var telling = able.Where(one => tells(one) && (one == group.Winner || claimed(one, null).Count == 0)).ToList();
        return telling.Find(one => span.IsCoveredBy(extent(one))) ?? telling.FirstOrDefault();
    }

    /// <summary>What the session as a whole was: a short ride in it does not make a match a ride.</summary>
    private RecordingSummary? SportGiver(SessionSpan span)
    {
        var giver = OfWholeSession(one => one.Sport.Name != Sport.Generic.Name, span, SessionClaims.Ran) ?? able.FirstOrDefault(one => one.Sport.Name != Sport.Generic.Name);
        return giver?.Sport == group.Winner.Sport ? group.Winner : giver;
    }

    /// <summary>The richest that holds sets, and besides it those that are no second record of it: two lists of one hour may be two rooms.</summary>
    private List<RecordingSummary> SetGivers()
    {
        var givers = new List<RecordingSummary>();
        foreach (var one in able.Where(one => one.Sets > 0))
        {
            if (!givers.Exists(giver => SessionOverlap.IsOneSession(giver, one)))
            {
                givers.Add(one);
            }
        }

        return givers;
    }

    private IEnumerable<RecordingSummary> Others(RecordingSummary? one) => one is null || one == group.Winner ? [] : [one];

    private List<Contribution> Contributions(ILookup<RecordingSummary, Gift> gifts, bool isCut)
    {
        var others = group.Others.Select(one => (Recording: one, Gifts: gifts[one].ToList())).ToList();
        var isAlone = !isCut && role(group.Winner) == ContributionRole.Wins && others.TrueForAll(one => one.Gifts.Count == 0) && gifts[group.Winner].All(IsWhole);
        return
        [
            new Contribution(group.Winner.Key, role(group.Winner), isAlone ? null : [.. gifts[group.Winner]]) { Source = group.Winner.Source },
            .. others.Select(one => new Contribution(one.Recording.Key, RoleOf(one.Recording, one.Gifts), one.Gifts) { Source = one.Recording.Source }),
        ];
    }

    private ContributionRole RoleOf(RecordingSummary one, List<Gift> gifts) =>
        role(one) == ContributionRole.Gives && gifts.Count == 0 ? ContributionRole.Superseded : role(one);

    private static bool IsWhole(Gift gift) => gift.Channel is null || gift.Stretches is [{ From: null, To: null }];
}
