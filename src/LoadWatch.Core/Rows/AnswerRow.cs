using NodaTime;

namespace LoadWatch.Rows;

/// <summary>What a row of kind <c>answers</c> says: something that staff decided, on the row's date.</summary>
/// <param name="Until">Last date, inclusive; null: open, or the one date.</param>
/// <param name="Rule">For seen and shelve: the rule meant; null: all of the person's.</param>
/// <param name="File">For belongs_to: the file's path below its inbox or the first digits of its SHA-256.</param>
public sealed record AnswerRow(AnswerWord Word, LocalDate? Until, string? Rule, string? File, string? By, string? Note) : RowContent;

/// <summary>What staff can answer.</summary>
public enum AnswerWord
{
    /// <summary>The alerts of the date, or that stood on it, were seen.</summary>
    Seen,

    /// <summary>Not told until a date.</summary>
    Shelve,
    Ill,
    Injured,
    Away,

    /// <summary>Trains again from the date on.</summary>
    Returning,

    /// <summary>No training on the date.</summary>
    Rest,

    /// <summary>A match on the date.</summary>
    Match,

    /// <summary>A file belongs to the person.</summary>
    BelongsTo,
}
