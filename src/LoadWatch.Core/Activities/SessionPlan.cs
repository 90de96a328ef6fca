using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>One activity before it is computed: its recordings, what each of them gives, and the session that they make together.</summary>
/// <param name="Contributions">The winner's first, the others richest first.</param>
public sealed record SessionPlan(RecordingSummary Winner, SessionFrame Frame, IReadOnlyList<Contribution> Contributions)
{
    /// <summary>The recordings without which the activity cannot be computed.</summary>
    public IEnumerable<string> Givers => Contributions.Where(one => one.Role is ContributionRole.Wins or ContributionRole.Gives).Select(one => one.Key);

    public bool IsAs(SessionFrame frame, IReadOnlyList<Contribution> contributions) => Frame == frame && AreAs(Contributions, contributions);

    /// <summary>Whether the same values come of it, whatever else became of recordings that give nothing.</summary>
    public bool GivesAs(SessionFrame frame, IReadOnlyList<Contribution> contributions) =>
        Frame == frame && AreAs(Bearing(Contributions), Bearing(contributions));

    private static List<Contribution> Bearing(IReadOnlyList<Contribution> contributions) =>
        [.. contributions.Where(one => one.Role is ContributionRole.Wins or ContributionRole.Gives or ContributionRole.Unreadable)];

    private static bool AreAs(IReadOnlyList<Contribution> some, IReadOnlyList<Contribution> others) =>
        some.Count == others.Count && some.Zip(others).All(pair => pair.First.IsAs(pair.Second));
}

/// <summary>What the recordings of one activity say of the session as a whole.</summary>
/// <param name="Start">Of the unbroken stretch in which the winner starts.</param>
/// <param name="ElapsedSeconds">As the winner states it; where others run beyond it, the length of all together.</param>
/// <param name="TimerSeconds">As the winner states it, and what others run beyond it; null where it is not stated or the winner was cut.</param>
/// <param name="DistanceMetres">As the session states it; null where no recording states that of this activity.</param>
public sealed record SessionFrame(Instant Start, double? ElapsedSeconds, double? TimerSeconds, Sport Sport, int Sets, double? DistanceMetres)
{
    /// <summary>That of a recording that is an activity by itself.</summary>
    public static SessionFrame Of(RecordingSummary alone) =>
        new(alone.Start, alone.ElapsedSeconds, alone.TimerSeconds, alone.Sport, alone.Sets, alone.DistanceMetres);
}
