using System.Globalization;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A way to write a measure.</summary>
internal abstract record MeasureUnit(string Name)
{
    /// <summary>In the measure's own unit, to 9 significant digits; null for what is not written so.</summary>
    public abstract double? Read(string text, char decimalMark);

    /// <summary>Why a cell could not be read.</summary>
    public abstract string Complaint(char decimalMark);
}

/// <summary>A number; its value times <paramref name="Times"/>, over <paramref name="Over"/>.</summary>
internal sealed record ScaledUnit(string Name, double Times = 1, double Over = 1) : MeasureUnit(Name)
{
    public override double? Read(string text, char decimalMark) =>
        CellNumber.Read(text, decimalMark) is { } number && double.IsFinite(number * Times) ? Convert(number) : null;

    public override string Complaint(char decimalMark) => $"not a number with the decimal mark {decimalMark}";

    public double Convert(double number) => Significant.Round(number * Times / Over);
}

/// <summary>A length of time with colons, named as it is written; its seconds over <paramref name="Over"/>.</summary>
internal sealed record ClockUnit(string Name, double Over = 1) : MeasureUnit(Name)
{
    private const int FirstDigits = 4;

    private readonly int parts = Name.Split(':').Length;
    private readonly int secondsOfLast = Name.EndsWith("ss", StringComparison.Ordinal) ? 1 : 60;

    public override double? Read(string text, char decimalMark)
    {
        var found = text.Split(':');
        if (found.Length != parts || found[0].Length is 0 or > FirstDigits || !found.All(IsDigits) || !found.Skip(1).All(IsSixtieth))
        {
            return null;
        }

        var total = found.Aggregate(0, (sum, part) => (sum * 60) + int.Parse(part, CultureInfo.InvariantCulture));
        return Significant.Round(total * secondsOfLast / Over);
    }

    public override string Complaint(char decimalMark) => $"not a length of time as {Name}";

    private static bool IsDigits(string part) => part.All(char.IsAsciiDigit);

    private static bool IsSixtieth(string part) => part.Length == 2 && part[0] < '6';
}
