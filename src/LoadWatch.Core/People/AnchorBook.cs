using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.People;

/// <summary>Every anchor of every person, asked for by date: a value for a date uses only anchors dated that day or before (I-5).</summary>
public sealed class AnchorBook
{
    private readonly ILookup<(string Person, AnchorKind Kind, string? Exercise, string? Machine, string? Sport), Anchor> anchors;

    private readonly IReadOnlyList<Anchor> all;

    /// <summary>Words of exercises and machines are taken in their canonical form (<see cref="ExerciseWord"/>).</summary>
    public AnchorBook(IEnumerable<Anchor> anchors)
    {
        all = [.. anchors];
        this.anchors = all.ToLookup(anchor =>
            (anchor.Person, anchor.Kind, ExerciseWord.Canonical(anchor.Exercise), ExerciseWord.Canonical(anchor.Machine), anchor.Sport));
    }

    public static AnchorBook Empty { get; } = new([]);

    /// <summary>What stands in where no maximal heart rate is anchored.</summary>
    public HeartRateMaxEquation HeartRateMaxEquation { get; init; } = HeartRateMaxEquation.Tanaka;

    /// <summary>One person's anchors.</summary>
    public AnchorBook OfPerson(string person) => new(all.Where(anchor => anchor.Person == person)) { HeartRateMaxEquation = HeartRateMaxEquation };

    /// <summary>This book and more anchors.</summary>
    public AnchorBook With(IEnumerable<Anchor> more) => new([.. all, .. more]) { HeartRateMaxEquation = HeartRateMaxEquation };

    /// <summary>Every anchor of a person, in no order.</summary>
    public IEnumerable<Anchor> Of(string person) => all.Where(anchor => anchor.Person == person);

    /// <summary>
    /// The anchor that holds on <paramref name="date"/>, or null: measured before observed before estimated, then the latest, an undated
    /// one last. A machine's own anchors go before those without a machine; those of other machines never count.
    /// </summary>
    public Anchor? On(LocalDate date, string person, AnchorKind kind, string? exercise = null, string? machine = null) =>
        Best(HeldOn(date, person, kind, exercise, machine)) ?? Best(HeldOn(date, person, kind, exercise, machine: null));

    /// <summary>
    /// The anchor of a sport's capacity that holds on a date, or null: measured before observed before estimated, then that of the sport itself before one of no sport,
    /// then the latest. Those of other sports never count.
    /// </summary>
    public Anchor? On(LocalDate date, string person, AnchorKind kind, Sport sport) => Best(OfSport(person, kind, sport).Where(anchor => anchor.Date is null || anchor.Date <= date));

    /// <summary>Among those of no sport that hold by then and were shown from <paramref name="earliest"/> on; an undated one is of unknown age and does not count.</summary>
    public Anchor? Since(LocalDate earliest, LocalDate date, string person, AnchorKind kind) => Best(Recent(Of(person, kind, exercise: null, machine: null), earliest, date));

    /// <summary>The same of a sport's capacity.</summary>
    public Anchor? Since(LocalDate earliest, LocalDate date, string person, AnchorKind kind, Sport sport) => Best(Recent(OfSport(person, kind, sport), earliest, date));

    /// <summary>The measured anchor that holds on a date in place of another one, were that observed, or null.</summary>
    public Anchor? MeasuredOn(LocalDate date, Anchor other)
    {
        var best = other.Sport is { } sport ? On(date, other.Person, other.Kind, Sport.Parse(sport)) : On(date, other.Person, other.Kind, other.Exercise, other.Machine);
        return best is { Source: AnchorSource.Measured } && (other.Machine is null || best.Machine is not null) ? best : null;
    }

    private IEnumerable<Anchor> HeldOn(LocalDate date, string person, AnchorKind kind, string? exercise, string? machine) =>
        Of(person, kind, exercise, machine).Where(anchor => anchor.Date is null || anchor.Date <= date);

    private IEnumerable<Anchor> Of(string person, AnchorKind kind, string? exercise, string? machine) =>
        anchors[(person, kind, ExerciseWord.Canonical(exercise), ExerciseWord.Canonical(machine), null)];

    private IEnumerable<Anchor> OfSport(string person, AnchorKind kind, Sport sport) =>
        anchors[(person, kind, null, null, null)].Concat(anchors[(person, kind, null, null, sport.Family)]);

    private static IEnumerable<Anchor> Recent(IEnumerable<Anchor> anchors, LocalDate earliest, LocalDate date) =>
        anchors.Where(anchor => (anchor.ShownOn ?? anchor.Date) >= earliest && anchor.Date <= date);

    private static Anchor? Best(IEnumerable<Anchor> candidates) => candidates
        .OrderBy(anchor => anchor.Source)
        .ThenBy(anchor => anchor.Sport is null)
        .ThenByDescending(anchor => anchor.Date ?? LocalDate.MinIsoValue)
        .ThenByDescending(anchor => anchor.Value)
        .FirstOrDefault();
}
