using NodaTime;

namespace LoadWatch.Activities;

/// <summary>When an activity was: as long as its winner ran, and as others give readings beyond it.</summary>
internal sealed class SessionSpan
{
    private const double MostOf = 0.9;

    private readonly RecordingSummary winner;
    private readonly IReadOnlyList<Stretch> own;
    private readonly IReadOnlyList<Stretch> all;

    /// <param name="claimed">Of the winner: what belongs to richer activities.</param>
    /// <param name="gifts">Readings that were given.</param>
    public SessionSpan(RecordingSummary winner, IReadOnlyList<Stretch> claimed, IReadOnlyList<(RecordingSummary Recording, Gift Gift)> gifts)
    {
        this.winner = winner;
        var ran = SessionClaims.Ran(winner);
        own = ran.Without(claimed) is { Count: > 0 } left && ran.From < ran.To ? left : [ran];
        all = own.Concat(gifts.Where(given => given.Recording != winner).SelectMany(Given)).Joined();
    }

    /// <summary>Whether a part of it belongs to a richer activity.</summary>
    public bool IsCut => own is not [{ } only] || only != SessionClaims.Ran(winner);

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
