namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>
/// The value of a test. Its unit is checked with the test of the row, so here it is a number, or a length of time with colons that becomes
/// seconds.
/// </summary>
internal sealed record TestValueRole() : FieldRole(Word)
{
    public const string Word = "value";

    public override string? Complaint(CsvField field) => field.Unit is { } unit && !TestMeasures.Knows(unit)
        ? $"unit '{unit}' is a unit of no test"
        : base.Complaint(field with { Unit = null });

    public override CellReading Reading(CsvField field, CsvLayout layout)
    {
        var unit = Clock(field.Unit) ?? (MeasureUnit)new ScaledUnit("");
        return text => unit.Read(text, layout.Decimal) is { } number
            ? CellValue.Of(number)
            : CellValue.Wrong(unit.Complaint(layout.Decimal));
    }

    /// <summary>The unit of what <see cref="Reading"/> gives.</summary>
    public static string UnitRead(string unit) => Clock(unit) is null ? unit : Measure.Seconds.Unit;

    private static ClockUnit? Clock(string? unit) => unit is null ? null : Measure.Seconds.Find(unit) as ClockUnit;
}
