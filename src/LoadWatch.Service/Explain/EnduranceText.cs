using System.Globalization;
using LoadWatch.People;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Explain;

/// <summary>What lies between power, speed or heart rate and the stimulus: the capacities as each reading of the band takes them, what was left, how long it was hard.</summary>
internal static class EnduranceText
{
    public static IEnumerable<string> Lines(EnduranceSteps steps)
    {
        var limits = steps.Limits;
        yield return string.Join("; ", new[] { OfCapacity(limits.Critical, CapacityError.Of(limits.Critical.Source)), OfWhole(), OfMaximum() }.OfType<string>());
        if (steps.LowestLeft is { } lowest && limits.Whole is { } whole)
        {
            yield return Text($"least left of {AnchorKinds.Of(whole.Kind).Name}: {AnchorText.Value(Math.Round(lowest), whole.Kind)}, {100 * lowest / whole.Value:0} % (middle reading){(lowest < 0 ? ": more was done than the reference values allow" : "")}");
        }

        var hard = steps.HardSeconds is { } seconds ? $"{Time(seconds)} at {HardLine.Drive:0.00} or more" : $"how long at {HardLine.Drive.ToString("0.00", CultureInfo.InvariantCulture)} or more is not known";
        yield return Text($"{Time(steps.CriticalSeconds)} at a drive of {steps.Variants.Mid.CriticalDrive:0.00} or more, ") + hard + " (middle reading)";

        string? OfWhole() => steps.LowestLeft is null || limits.Whole is null ? null : OfCapacity(limits.Whole, CapacityError.WPrime);

        string? OfMaximum() => limits.Maximum is null ? null : OfCapacity(limits.Maximum, CapacityError.Of(limits.Maximum.Source));

        string OfCapacity(Anchor anchor, double error) =>
            $"{AnchorKinds.Of(anchor.Kind).Name} {AnchorText.Value(anchor.Value, anchor.Kind)} (low reading {Number(steps.Variants.Low.Capacity(anchor.Value, error))}, high {Number(steps.Variants.High.Capacity(anchor.Value, error))})";
    }

    public static IEnumerable<string> Lines(HeartRateDrive drive)
    {
        var source = drive.IsAnchored ? "heart_rate_vt2" : "a choice, as no heart_rate_vt2 within the reserve holds";
        yield return Text($"second threshold at x2 = {drive.Threshold:0.###} of the reserve from {drive.Reserve.RestBpm:0.#} to {drive.Reserve.MaxBpm:0.#} bpm, {drive.Reserve.BpmAt(drive.Threshold):0.#} bpm ({source}), within {drive.RelativeError * 100:0.#} %");
    }

    private static string Time(double seconds) => seconds < 120 ? Text($"{seconds:0.#} s") : Text($"{seconds / 60:0.#} min");

    private static string Number(double value) => value.ToString("0.###", CultureInfo.InvariantCulture);

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
