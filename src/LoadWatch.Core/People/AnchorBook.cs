using NodaTime;

namespace LoadWatch.People;

/// <summary>Every anchor of every person, asked for by date: a value for a date uses only anchors dated that day or before (I-5).</summary>
public sealed class AnchorBook
{
    private readonly ILookup<(string Person, AnchorKind Kind, string? Exercise), Anchor> anchors;

    private readonly IReadOnlyList<Anchor> all;

    public AnchorBook(IEnumerable<Anchor> anchors)
    {
        all = [.. anchors];
        this.anchors = all.ToLookup(anchor => (anchor.Person, anchor.Kind, anchor.Exercise));
    }

    public static AnchorBook Empty { get; } = new([]);

    /// <summary>This book and more anchors.</summary>
    public AnchorBook With(IEnumerable<Anchor> more) => new([.. all, .. more]);

    /// <summary>
    /// The anchor that holds on <paramref name="date"/>, or null: measured before observed before estimated, then the latest, an undated
    /// one last.
    /// </summary>
    public Anchor? On(LocalDate date, string person, AnchorKind kind, string? exercise = null) =>
        Best(anchors[(person, kind, exercise)].Where(anchor => anchor.Date is null || anchor.Date <= date));

    /// <summary>The same among the anchors dated from <paramref name="earliest"/> on; an undated one is of unknown age and does not
    /// count.</summary>
    public Anchor? Since(LocalDate earliest, LocalDate date, string person, AnchorKind kind, string? exercise = null) =>
        Best(anchors[(person, kind, exercise)].Where(anchor => anchor.Date >= earliest && anchor.Date <= date));

    private static Anchor? Best(IEnumerable<Anchor> candidates) => candidates
        .OrderBy(anchor => anchor.Source)
        .ThenByDescending(anchor => anchor.Date ?? LocalDate.MinIsoValue)
        .ThenByDescending(anchor => anchor.Value)
        .FirstOrDefault();
}
