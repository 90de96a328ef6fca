using System.Globalization;
using LoadWatch.Anchors;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Service.Export;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>A reference value with its unit, its source, its date and how sure it is.</summary>
internal static class AnchorText
{
    /// <summary><c>critical_power (cycling) = 250 W, observed, holds from 2026-06-01: NOTE</c>.</summary>
    public static string Of(Anchor anchor)
    {
        var since = anchor.Date is { } date ? $"holds from {Words.Date(date)}" : "undated, holds from the beginning";
        var shown = anchor.ShownOn is { } on && on != anchor.Date ? $", last shown on {Words.Date(on)}" : "";
        var note = anchor.Note is { } words ? $": {OneLine.Of(words)}" : "";
        return $"{Name(anchor.Kind, anchor.Sport, anchor.Exercise, anchor.Machine)} = {Value(anchor.Value, anchor.Kind)}, {Words.Of(anchor.Source)}, {since}{shown}{note}";
    }

    /// <summary>The kind, and what it is of where it is of one sport, exercise or machine: <c>one_repetition_max leg_press</c>.</summary>
    public static string Name(AnchorKind kind, params IEnumerable<string?> of) =>
        string.Concat(of.OfType<string>().Select(word => $" {OneLine.Of(word)}").Prepend(AnchorKinds.Of(kind).Name));

    /// <summary>With its unit; a pure number has none.</summary>
    public static string Value(double value, AnchorKind kind) =>
        $"{value.ToString("0.###", CultureInfo.InvariantCulture)}{(AnchorKinds.Of(kind).Unit is var unit and not "1" ? $" {unit}" : "")}";

    /// <summary>The maximal heart rate that age lets expect; null where the birth year is unknown.</summary>
    public static string? ByAge(Person person, LocalDate date, HeartRateMaxEquation equation) =>
        person.AgeOn(date) is { } age && equation.BpmAt(age, person.Sex) is { } bpm
            ? string.Create(CultureInfo.InvariantCulture, $"heart_rate_max = {bpm:0.#} bpm, estimated from {age} years by the line of {Author(equation)}, on {Words.Date(date)}; single people differ from it by about 10 bpm (standard deviation, from memory)")
            : null;

    /// <summary>How far off the estimator takes a capacity to be; null for a kind that it does not read.</summary>
    public static string? Error(Anchor anchor) => anchor.Kind switch
    {
        AnchorKind.WPrime or AnchorKind.DPrime => $"{Percent(CapacityError.WPrime)} (an assumption, whoever measured it)",
        AnchorKind.CriticalPower or AnchorKind.PowerMax or AnchorKind.CriticalSpeed or AnchorKind.SpeedMax =>
            $"{Percent(CapacityError.Of(anchor.Source))} (an assumption for {Words.Of(anchor.Source)} values)",
        AnchorKind.OneRepetitionMax => $"{Percent(CapacityError.OfOneRepetitionMax(anchor.Source))} (an assumption for {Words.Of(anchor.Source)} values){Borrowed(anchor)}",
        _ => null,
    };

    /// <summary>What is to be known of one that rests on sessions further back than those of a month; empty of others.</summary>
    public static string Age(ObservedAnchor one, LocalDate on) => one.ShownOn < on.PlusMonths(-ObservedAnchors.Months)
        ? $"; what showed it is more than {ObservedAnchors.Months} months old: sessions since have shown no value beyond its error, or none at all, and it is read as surely as then"
        : "";

    /// <summary>A measured maximum of no machine is less sure on one.</summary>
    private static string Borrowed(Anchor anchor) => anchor is { Source: AnchorSource.Measured, Machine: null }
        ? $", {Percent(CapacityError.OfOneRepetitionMax(anchor.Source, isOfMachine: false))} of a set on a machine"
        : "";

    private static string Percent(double share) => (share * 100).ToString("0.#", CultureInfo.InvariantCulture) + " %";

    private static string Author(HeartRateMaxEquation equation) => equation switch
    {
        HeartRateMaxEquation.Nes => "Nes et al. 2013, Scand J Med Sci Sports 23:697-704",
        HeartRateMaxEquation.Gellish => "Gellish et al. 2007, Med Sci Sports Exerc 39:822-829 (equation from memory)",
        HeartRateMaxEquation.Gulati => "Gulati et al. 2010, Circulation 122:130-137, for women; of others Tanaka et al. 2001",
        HeartRateMaxEquation.Sydo => "Sydó et al. 2014, Mayo Clin Proc",
        _ => "Tanaka, Monahan and Seals 2001, J Am Coll Cardiol 37:153-156",
    };
}
