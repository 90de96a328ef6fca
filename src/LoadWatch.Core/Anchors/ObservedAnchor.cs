using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>A reference value from a person's own sessions, as adopted for a calendar month and those after it.</summary>
/// <param name="From">The first of the month: it rests on sessions before that date alone (I-5).</param>
/// <param name="Value">In the unit of its kind, rounded to 9 significant digits.</param>
/// <param name="Error">Likewise, above 0.</param>
/// <param name="ShownOn">Date of the latest session behind it.</param>
/// <param name="Basis">How it came about, in plain words.</param>
public sealed record ObservedAnchor(string Person, AnchorKind Kind, LocalDate From, double Value, double Error, LocalDate ShownOn, string Basis)
{
    /// <summary>As <see cref="Anchor.Sport"/>.</summary>
    public string? Sport { get; init; }

    /// <summary>Of a one-repetition maximum, in canonical form; null for every other kind.</summary>
    public string? Exercise { get; init; }

    /// <summary>Of a one-repetition maximum, in canonical form; null without a machine.</summary>
    public string? Machine { get; init; }

    /// <summary>What it is a value of; at most one holds at a time.</summary>
    public AnchorOf Of => new(Kind, Sport, Exercise, Machine);

    public Anchor ToAnchor() => new(Person, From, Kind, Value, AnchorSource.Observed, Exercise, Basis, Machine) { Sport = Sport, ShownOn = ShownOn };
}

/// <summary>What an anchor of a person is a value of.</summary>
public readonly record struct AnchorOf(AnchorKind Kind, string? Sport, string? Exercise, string? Machine);
