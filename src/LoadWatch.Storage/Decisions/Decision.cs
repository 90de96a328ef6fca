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
}

/// <summary>Something that staff decided. Truth: nothing computes it again.</summary>
/// <param name="Subject">Id of the alert, or SHA-256 of the arrival.</param>
/// <param name="Person">Whose alert it is, or to whom the arrival belongs: an id of the roster of that moment.</param>
/// <param name="By">Who decided, in their own words; null where not said.</param>
/// <param name="Note">Null where none was left.</param>
public sealed record Decision(DecisionKind Kind, string Subject, string Person, Instant Made, string? By, string? Note)
{
    /// <summary><c>kind|subject|instant</c>.</summary>
    public string Id => $"{Words<DecisionKind>.Of(Kind)}|{Subject}|{ColumnTypes.Moment.Format(Made)}";
}
