using System.Globalization;
using LoadWatch.Recordings;
using LoadWatch.Service.Export;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Explain;

/// <summary>Sets with how each was read: what was done, the share of the maximum, the drives of its first and last repetition, the hard ones.</summary>
internal static class SetText
{
    /// <summary>Two lines for sets that are alike: what was done, and below it how it was read.</summary>
    public static IEnumerable<(string Done, string Read)> Lines(IEnumerable<ReadSet> sets, Variants variants) => sets
        .Select(set => (Done: Done(set), Read: Read(set, variants)))
        .GroupBy(line => line)
        .Select(alike => ($"{(alike.Count() == 1 ? "1 set" : Text($"{alike.Count()} sets"))} of {alike.Key.Done}", alike.Key.Read));

    /// <summary><c>squat (legs): 5 x 82.5 kg, 2 in reserve</c>.</summary>
    private static string Done(ReadSet read)
    {
        var set = read.Set;
        IEnumerable<string?> parts =
        [
            set.IsHold ? Stated("held for ", set.DurationSeconds, " s") : Stated("", set.Repetitions, set.Kilograms is null ? " repetitions" : ""),
            set.RepetitionsInReserve is { } reserve ? Text($"{reserve:0.##} in reserve") : null,
            set.Hardness is { } hardness ? Text($"hardness {hardness:0.##}") : null,
            set.ConcentricSeconds is { } seconds ? Text($"{seconds:0.##} s a repetition") : null,
            set.BarSpeedMetresPerSecond is { } speed ? Text($"bar at {speed:0.##} m/s") : null,
            set.IsFast ? "declared fast" : null,
        ];
        var machine = set.Machine is { } named ? $" on {OneLine.Of(named)}" : "";
        var load = set.Kilograms is { } kilograms ? Text($" {(set.IsHold ? "with" : "x")} {kilograms:0.##} kg") : "";
        var how = set.Load == SetLoad.Weight ? "" : $" ({Words.Of(set.Load).Replace('_', ' ')}{(set.Pin is { } pin ? Text($" {pin:0.##}") : "")})";
        var told = parts.OfType<string>().ToList();
        told[0] += load + how;
        return $"{OneLine.Of(read.Exercise ?? "an unnamed exercise")}{machine} ({string.Join(", ", read.Regions.Select(BodyRegions.Word))}): {string.Join(", ", told)}";
    }

    private static string Stated(string before, double? value, string after) => value is { } known ? Text($"{before}{known:0.##}{after}") : $"{before}unknown{after}";

    private static string Read(ReadSet read, Variants variants)
    {
        if (read.Demand is not { } demand)
        {
            return $"not read: no {read.Missing}";
        }

        var drives = demand.Drives(variants.Mid).ToList();
        var error = Text($"within {demand.RelativeError * 100:0.#} %");
        var how = demand.Rule switch
        {
            SetRule.LoadAndMaximum => Text($"by load and maximum, {OfMaximum(read.Set, demand)} {error}, {ToFailure(demand)}"),
            SetRule.Chart => Text($"by repetitions to failure, L = {demand.RelativeLoad:0.###} {error}, {ToFailure(demand)}"),
            SetRule.Fast => Text($"by load and maximum as a fast set, {OfMaximum(read.Set, demand)} {error}, counted {demand.FastFactor:0.##} times"),
            SetRule.DeclaredFast => "by the declaration that it was fast",
            _ => Text($"by the rating of a hold, hardness / 10 = {demand.RelativeLoad:0.##} {error}, its last {demand.SecondsEach:0.##} s"),
        };
        var drive = drives.Count == 1 || drives[0] == drives[^1]
            ? Text($"drive {drives[0]:0.###}")
            : Text($"drive {drives[0]:0.###} at the first and {drives[^1]:0.###} at the last repetition");
        return $"{how}; {drive}; {Hard(demand, variants)}, grade {demand.Grade}";
    }

    private static string OfMaximum(StrengthSet set, SetDemand demand) =>
        Text($"L = {set.Kilograms:0.##} kg / {set.Kilograms / demand.RelativeLoad:0.##} kg{(demand.IsMaximumBorrowed ? " (of the exercise, not of the machine)" : "")} = {demand.RelativeLoad:0.###}");

    private static string ToFailure(SetDemand demand) => demand.Reserve is { } reserve
        ? Text($"{demand.Repetitions + reserve:0.##} repetitions to failure")
        : "reserve unknown, so a lower bound";

    private static string Hard(SetDemand demand, Variants variants)
    {
        var band = Bands.Of(SetStimulus.Read([demand], variants.Low), SetStimulus.Read([demand], variants.Mid), SetStimulus.Read([demand], variants.High), Count);
        return Text($"hard {(demand.Rule == SetRule.Hold ? "bouts" : "repetitions")} {band.Mid:0} ({band.Low:0} to {band.High:0})");

        double Count(SetReading reading) => demand.Rule == SetRule.Hold ? reading.HardBouts : reading.HardRepetitions;
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
