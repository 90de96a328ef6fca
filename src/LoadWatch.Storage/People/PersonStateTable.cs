using NodaTime;

namespace LoadWatch.Storage.People;

/// <summary>Table <c>person_state</c>: from which date on a person's days are to be computed again, and up to which they are.</summary>
public sealed class PersonStateTable
{
    private const string Mark = """
        INSERT INTO person_state (person, dirty_from, marks) VALUES (@person, @from, 1)
        ON CONFLICT (person) DO UPDATE SET
            dirty_from = CASE
                WHEN person_state.dirty_from IS NULL OR person_state.dirty_from > excluded.dirty_from THEN excluded.dirty_from
                ELSE person_state.dirty_from END,
            marks = person_state.marks + 1
        """;

    private const string Clear = """
        INSERT INTO person_state (person, computed_to) VALUES (@person, @through)
        ON CONFLICT (person) DO UPDATE SET
            dirty_from = CASE WHEN person_state.marks = @marks THEN NULL ELSE person_state.dirty_from END, computed_to = excluded.computed_to
        """;

    private const string SelectComputed = "SELECT computed_to FROM person_state WHERE person = @person AND computed_to IS NOT NULL";

    private const string SelectBehind = """
        SELECT person, dirty_from, computed_to, marks FROM person_state
        WHERE dirty_from IS NOT NULL OR computed_to < @date
        ORDER BY person
        """;

    private const string SelectPeople = "SELECT person FROM person_state ORDER BY person";

    private readonly StoreSession session;

    internal PersonStateTable(StoreSession session) => this.session = session;

    /// <summary>Asks for a person's days from a date on; an earlier date asked for before stays.</summary>
    public void MarkDirty(string person, LocalDate from) => session.Execute(Mark, new { person, from });

    /// <summary>Everybody whose days are or were to be computed, sorted.</summary>
    public IReadOnlyList<string> All() => session.Rows<string>(SelectPeople);

    /// <summary>Whose days are to be computed again, or are not computed up to a date; sorted by person.</summary>
    public IReadOnlyList<PersonBehind> Behind(LocalDate date) =>
        session.Rows<BehindRow>(SelectBehind, new { date }).ConvertAll(row => new PersonBehind(row.Person, row.DirtyFrom, row.ComputedTo, row.Marks));

    /// <summary>Notes that a person's days are computed through a date. They stay dirty where somebody asked for them since their inputs were read.</summary>
    /// <param name="marks">Of the person when the inputs were read; 0 where there were none.</param>
    public void Computed(string person, LocalDate through, long marks) => session.Execute(Clear, new { person, through, marks });

    /// <summary>The last date computed, or null before any.</summary>
    public LocalDate? ComputedTo(string person) => session.Row<Row>(SelectComputed, new { person })?.ComputedTo;

    private sealed class BehindRow
    {
        public string Person { get; init; } = "";

        public LocalDate? DirtyFrom { get; init; }

        public LocalDate? ComputedTo { get; init; }

        public long Marks { get; init; }
    }

    private sealed class Row
    {
        public LocalDate ComputedTo { get; init; }
    }
}

/// <param name="DirtyFrom">The first date to compute again, or null.</param>
/// <param name="ComputedTo">The last date computed, or null before any.</param>
/// <param name="Marks">How often the days were asked for.</param>
public sealed record PersonBehind(string Person, LocalDate? DirtyFrom, LocalDate? ComputedTo, long Marks);
