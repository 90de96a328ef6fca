using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Decisions;

/// <summary>What somebody can decide.</summary>
public enum DecisionKind
{
    /// <summary>An alert was seen.</summary>
    Acknowledge,

    /// <summary>An arrival belongs to a person, whatever its names say.</summary>
    Assign,

    /// <summary>An alert is not told up to a date.</summary>
    Shelve,
    Ill,
    Injured,
    Away,

    /// <summary>The person trains again: ends what of the three above began before.</summary>
    Returning,

    /// <summary>No training.</summary>
    Rest,
    Match,

    /// <summary>An earlier decision holds no more.</summary>
    Withdraw,
}

/// <summary>Something that staff decided. Truth: nothing computes it again.</summary>
/// <param name="Subject">
/// Id of the alert, SHA-256 of the arrival, or id of the decision withdrawn; for what is about a person's dates, the person.
/// </param>
/// <param name="Person">Whose alert or dates it is about, or to whom the arrival belongs: an id of the roster of that moment.</param>
/// <param name="By">Who decided, in their own words; null where not said.</param>
/// <param name="Note">Null where none was left.</param>
public sealed record Decision(DecisionKind Kind, string Subject, string Person, Instant Made, string? By, string? Note)
{
    /// <summary>First date; null where it is about no dates. Of what came by a table, the date of its row.</summary>
    public LocalDate? From { get; init; }

    /// <summary>Last date, inclusive; null: an absence is open, rest and a match are of the one date.</summary>
    public LocalDate? Until { get; init; }

    /// <summary>The row that told it, as <see cref="ViaRow"/> writes it; null for a command.</summary>
    public string? Via { get; init; }

    /// <summary><c>kind|subject|instant</c>, and the row where one told it: one commit may take up several about the same subject.</summary>
    public string Id => $"{Words<DecisionKind>.Of(Kind)}|{Subject}|{ColumnTypes.Moment.Format(Made)}{(Via is { } row ? $"|{row}" : "")}";

    /// <summary>
    /// How a decision names its row: <c>answers|inbox/answers.csv|subject|key</c>. Keys are unique within a subject only.
    /// </summary>
    /// <param name="scope">The table.</param>
    /// <param name="subject">As the table writes it.</param>
    public static string ViaRow(string scope, string subject, string key) => $"{ViaAnswers}{scope}|{subject}|{key}";

    /// <summary>Whether a row of answers told it.</summary>
    public bool IsAnswer => Via?.StartsWith(ViaAnswers, StringComparison.Ordinal) == true;

    private const string ViaAnswers = "answers|";
}
