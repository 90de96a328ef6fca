using LoadWatch.Findings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Alerts;

/// <summary>The life of an alert on its two axes, after IEC 62682 / ISA-18.2.</summary>
public enum AlertState
{
    /// <summary>Over, and seen.</summary>
    Normal,

    /// <summary>The finding holds and nobody has confirmed having seen it.</summary>
    Unacknowledged,

    /// <summary>The finding holds and somebody has seen it.</summary>
    Acknowledged,

    /// <summary>Returned to normal before anybody acknowledged it.</summary>
    Returned,
}

/// <summary>A finding's life over time.</summary>
/// <param name="Raised">The evaluation date on which it was raised the first time: part of its id.</param>
/// <param name="Judged">The last evaluation date on which its finding held.</param>
/// <param name="Text">Of the latest finding.</param>
public sealed record Alert(
    FindingKey Key,
    LocalDate Raised,
    LocalDate Judged,
    AlertState State,
    Severity Severity,
    string Text)
{
    /// <summary>The evaluation date on which it was raised last, the first time or again after it had returned.</summary>
    public LocalDate StandsSince { get; init; } = Raised;

    /// <summary>Last date, inclusive, up to which it is not told; null: it is. Shelving stands beside the state and changes none.</summary>
    public LocalDate? ShelvedUntil { get; init; }

    public AlertWatch Watch { get; init; }

    /// <summary>Names the limits of its rule by which its finding held last (<see cref="RuleBook.LimitsHash"/>); null: not known.</summary>
    public string? LimitsHash { get; init; }

    /// <summary>Whether it stands and is told: neither shelved nor suppressed.</summary>
    public bool IsTold => AlertLife.IsActive(State) && Watch == AlertWatch.Watched && ShelvedUntil is null;

    /// <summary><c>person|rule|about|raised</c>: the region or the quantity, empty where there is neither.</summary>
    public string Id => $"{Key.Person}|{Key.Rule}|{Key.Quantity ?? RegionWord(Key.Region)}|{Raised:uuuu-MM-dd}";

    public static string RegionWord(BodyRegion? region) => region is { } known ? BodyRegions.Word(known) : "";
}

/// <summary>Why an alert changed.</summary>
public enum AlertChangeReason
{
    Raised,
    SeverityRose,
    SeverityFell,
    Acknowledged,
    ReturnedToNormal,

    /// <summary>Later data undid it: as known now it did not even hold on the date on which it was raised last (I-14).</summary>
    Corrected,
    RaisedAgain,

    /// <summary>Somebody wants not to be told up to a date.</summary>
    Shelved,

    /// <summary>It is told again: the date has passed, it asks for more than before, or the shelving was withdrawn.</summary>
    Unshelved,

    /// <summary>Plan or answers turn its rule off: it is not told while they do, or over where nothing would hold.</summary>
    SuppressedByPlan,

    /// <summary>Its rule is no longer turned off by plan or answers, and it still holds.</summary>
    WatchedAgain,

    /// <summary>The limits switch its rule off.</summary>
    RuleSwitchedOff,

    /// <summary>It holds no more because the limits of its rule are others.</summary>
    LimitsChanged,
}

/// <summary>One appended row of an alert's history, with the evidence of its moment.</summary>
/// <param name="Sequence">Counts the changes of the alert from 1.</param>
/// <param name="Date">The evaluation date.</param>
public sealed record AlertChange(
    string AlertId,
    int Sequence,
    LocalDate Date,
    AlertState From,
    AlertState To,
    AlertChangeReason Reason,
    Severity Severity,
    string Text,
    Evidence? Evidence);
