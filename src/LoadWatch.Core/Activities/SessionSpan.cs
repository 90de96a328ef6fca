using NodaTime;

namespace LoadWatch.Activities;

/// <summary>When an activity was: as long as its winner ran, and as others give readings beyond it.</summary>
internal sealed class SessionSpan
{
    private const double MostOf = 0.9;

    private readonly RecordingSummary winner;
    private readonly IReadOnlyList<Stretch> own;
    private readonly IReadOnlyList<Stretch> all;

    /// <param name="claimed">The time of a recording that belongs to other activities: of two that take different channels from it, one is longer by it.</param>
    /// <param name="gifts">Readings that were given.</param>
    public SessionSpan(
        RecordingSummary winner, Func<RecordingSummary, IReadOnlyList<Stretch>> claimed, IReadOnlyList<(RecordingSummary Recording, Gift Gift)> gifts)
    {
        this.winner = winner;
        var ran = SessionClaims.Ran(winner);
        own = ran.Without(claimed(winner)) is { Count: > 0 } left && ran.From < ran.To ? left : [ran];
        all = own.Concat(gifts.Where(given => given.Recording != winner).SelectMany(given => Given(given).SelectMany(one => one.Without(claimed(given.Recording))))).Joined();
    }

    /// <summary>Whether a part of the winner belongs to a richer activity: so much that what it states of the whole is not of this activity. A choice.</summary>
    public bool IsCut => new[] { SessionClaims.Ran(winner) }.Length() - own.Length() > ChannelGifts.ShortestMilliseconds;

    /// <summary>Of the unbroken stretch in which the winner starts: a part behind another activity does not move a session there.</summary>
    public Instant Start
    {
        get
        {
            var first = all.First(one => one.From <= own[0].From && one.To >= own[0].To).From!.Value;
            return first == SessionClaims.Ran(winner).From ? winner.Start : Instant.FromUnixTimeMilliseconds(first);
        }
    }

    /// <summary>Null where the winner has none and nothing goes beyond it.</summary>
    public double? ElapsedSeconds => IsCut || Beyond > 0 ? all.Length() / 1000.0 : winner.ElapsedSeconds;

    /// <summary>Nothing tells of pauses beyond the winner, so all of that counts.</summary>
    public double? TimerSeconds => IsCut ? null : winner.TimerSeconds + (Beyond / 1000.0);

    /// <summary>Whether a stretch holds nine tenths of it.</summary>
    public bool IsCoveredBy(Stretch stretch) =>
        all.Select(one => one.Within(stretch)).OfType<Stretch>().Length() >= MostOf * all.Length();

    private long Beyond => all.Length() - own.Length();

    /// <summary>From the first to the last usable reading that counts.</summary>
    private static IEnumerable<Stretch> Given((RecordingSummary Recording, Gift Gift) given)
    {
        var extent = given.Recording.Extent(given.Gift.Channel!.Value)!;
        return given.Gift.Stretches.Select(stretch => stretch.Within(new Stretch(extent.First, extent.Last))).OfType<Stretch>();
    }
}
