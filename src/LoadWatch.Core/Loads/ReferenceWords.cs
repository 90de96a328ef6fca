using LoadWatch.People;

namespace LoadWatch.Loads;

/// <summary>Reference values in the words of a sentence.</summary>
public static class ReferenceWords
{
    /// <summary>Several, separated by commas. None where the values are the same and yet no pair any more: of different dates.</summary>
    public static string Of(IReadOnlyList<ReferenceChange> changes) =>
        changes.Count == 0 ? "own weight and exponent of different dates" : string.Join(", ", changes.Select(Of));

    /// <summary><c>maximal heart rate 190 to 180 bpm</c>.</summary>
    public static string Of(ReferenceChange change)
    {
        var unit = change.Unit == "1" ? "" : $" {change.Unit}";
        return (change.Before, change.Now) switch
        {
            ({ } before, { } now) => FormattableString.Invariant($"{Of(change.Kind)} {before:0.##} to {now:0.##}{unit}"),
            (null, { } now) => FormattableString.Invariant($"{Of(change.Kind)} none to {now:0.##}{unit}"),
            ({ } before, null) => FormattableString.Invariant($"{Of(change.Kind)} {before:0.##}{unit} to none"),
            _ => Of(change.Kind),
        };
    }

    public static string Of(AnchorKind kind) => kind switch
    {
        AnchorKind.HeartRateRest => "resting heart rate",
        AnchorKind.HeartRateMax => "maximal heart rate",
        AnchorKind.HeartRateVt1 => "heart rate at the first threshold",
        AnchorKind.HeartRateVt2 => "heart rate at the second threshold",
        AnchorKind.TrimpWeight => "own weight of the training impulse",
        AnchorKind.TrimpExponent => "own exponent of the training impulse",
        AnchorKind.SpeedMax => "best speed",
        _ => AnchorKinds.Of(kind).Name.Replace('_', ' '),
    };
}
