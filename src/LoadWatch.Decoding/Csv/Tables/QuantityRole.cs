using LoadWatch.Loads;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A named number of a session, as stated by the table.</summary>
internal sealed record QuantityRole() : FieldRole(Word)
{
    public const string Word = "quantity";

    private const int LongestName = 60;
    private const int LongestUnit = 16;
    private const double Largest = 1e9;

    // More than any session of a person has; a choice.
    private const double LargestMetres = 1_000_000;
    private const double LargestClimb = 50_000;
    private const double LargestWork = 100_000;
    private const double LargestSpeed = 45;

    public override string? Complaint(CsvField field) => field switch
    {
        { Quantity: null } => "quantity is missing: it names the number",
        { Quantity: QuantityNames.Minutes or "rating" } => $"quantity '{field.Quantity}' is a field of its own: \"field\": \"{field.Quantity}\"",
        { Quantity: { } name } when !IsName(name) => $"quantity '{name}' must be small letters, digits and _, {LongestName} at most",
        { Unit: null or "" } => $"unit is missing: {field.Quantity} is measured in {Number(field.Quantity!, "").Measure!.Known}".TrimEnd(),
        { Unit.Length: > LongestUnit } => $"unit '{field.Unit}' is longer than {LongestUnit} characters",
        _ => Number(field.Quantity!, field.Unit).Complaint(field with { Quantity = null }),
    };

    public override CellReading Reading(CsvField field, CsvLayout layout)
    {
        var name = field.Quantity!;
        var number = Number(name, field.Unit!);
        var reading = number.Reading(field with { Quantity = null }, layout);
        return text => reading(text) switch
        {
            { Value: double value } => CellValue.Of(new Quantity(name, value, number.Measure!.Unit, Estimated: false)),
            var wrong => wrong,
        };
    }

    /// <summary>A quantity that we know has its own unit and others that become it; any other one is kept in the unit that the layout states.</summary>
    private static NumberRole Number(string name, string unit) => name switch
    {
        QuantityNames.Distance => new(name, Measure.Metres, 0, LargestMetres),
        _ when name.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal) => new(name, Measure.Metres, 0, LargestMetres),
        QuantityNames.Climb => new(name, Measure.Metres, 0, LargestClimb),
        QuantityNames.MinutesModerate or QuantityNames.MinutesVigorous => new(name, Measure.Minutes, 0, 1440),
        QuantityNames.SpeedTop => new(name, Measure.MetresPerSecond, 0, LargestSpeed),
        QuantityNames.Work => new(name, Measure.Kilojoules, 0, LargestWork),
        QuantityNames.Kilograms => new(name, Measure.Kilograms, 0, Largest),
        QuantityNames.Sets or QuantityNames.Repetitions => new(name, Measure.Only("count"), 0, Largest) { IsWhole = true },
        _ when QuantityNames.All.Contains(name) => new(name, Measure.Only("AU"), 0, Largest),
        _ => new(name, Measure.Only(unit), 0, Largest),
    };

    private static bool IsName(string name) =>
        name.Length is > 0 and <= LongestName && char.IsAsciiLetterLower(name[0])
        && name.All(c => char.IsAsciiLetterLower(c) || char.IsAsciiDigit(c) || c == '_');
}
