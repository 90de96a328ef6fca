namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A number within limits.</summary>
/// <param name="Measure">What it is measured in; null for a pure number.</param>
/// <param name="Lowest">Smallest value taken, inclusive.</param>
/// <param name="Highest">Largest value taken, inclusive.</param>
internal sealed record NumberRole(string Name, Measure? Measure, double Lowest, double Highest) : FieldRole(Name)
{
    private static readonly MeasureUnit Pure = new ScaledUnit("");

    /// <summary>Whole numbers only.</summary>
    public bool IsWhole { get; init; }

    /// <summary>Whether <see cref="Lowest"/> itself is too low.</summary>
    public bool IsAbove { get; init; }

    /// <summary>Whether the unit must be stated: nothing in the field's name says it.</summary>
    public bool NeedsUnit { get; init; }

    public override string? Complaint(CsvField field) => field.Unit switch
    {
        null when NeedsUnit => $"unit is missing: {Name} is written in one of {Measure!.Known}",
        { } unit when Measure is not null && Measure.Find(unit) is null => $"unit '{unit}' is not known for {Name}: use one of {Measure.Known}",
        _ => base.Complaint(Measure is null ? field : field with { Unit = null }),
    };

    public override CellReading Reading(CsvField field, CsvLayout layout)
    {
        var unit = Measure?.Find(field.Unit ?? Measure.Unit) ?? Pure;
        return text => unit.Read(text, layout.Decimal) switch
        {
            null => CellValue.Wrong(unit.Complaint(layout.Decimal)),
            { } number => Complaint(number) is { } reason ? CellValue.Wrong(reason) : CellValue.Of(number),
        };
    }

    /// <summary>Why it cannot be this number, in its own unit, or null.</summary>
    public string? Complaint(double number) => this switch
    {
        _ when !(number >= Lowest && number <= Highest) || (IsAbove && number == Lowest) => OutOfRange(),
        { IsWhole: true } when !double.IsInteger(number) => "not a whole number",
        _ => null,
    };

    private string OutOfRange() => IsAbove
        ? FormattableString.Invariant($"not above {Lowest} and up to {Highest} {Measure?.Unit}").TrimEnd()
        : FormattableString.Invariant($"outside {Lowest} to {Highest} {Measure?.Unit}").TrimEnd();
}
