using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A local time of day; in the column of moments that the dates are taken from, the time of the moment.</summary>
internal sealed record TimeRole(string Name) : FieldRole(Name)
{
    private static readonly LocalTimePattern[] Usual =
        [LocalTimePattern.CreateWithInvariantCulture("H:mm"), LocalTimePattern.CreateWithInvariantCulture("H:mm:ss")];

    public override string? Complaint(CsvField field) => field.Format is { } format && PatternComplaint(format) is { } reason
        ? $"format {reason}"
        : base.Complaint(field with { Format = null });

    public override CellReading Reading(CsvField field, CsvLayout layout) => field.Format switch
    {
        null when MomentNotation.IsColumn(layout, field.Column) => OfMoments(layout),
        null => OfPatterns(Usual, "not a time of day such as 17:30"),
        var format => OfPatterns([LocalTimePattern.CreateWithInvariantCulture(format)], "not a time of day as the layout writes it"),
    };

    private static CellReading OfMoments(CsvLayout layout)
    {
        var moments = new MomentNotation(layout);
        return text => moments.Read(text) is { } local ? CellValue.Of(local.TimeOfDay) : CellValue.Wrong("not a time as the layout writes it");
    }

    private static CellReading OfPatterns(LocalTimePattern[] patterns, string complaint) => text =>
    {
        foreach (var pattern in patterns)
        {
            if (pattern.Parse(text).TryGetValue(default, out var time))
            {
                return CellValue.Of(time);
            }
        }

        return CellValue.Wrong(complaint);
    };

    /// <summary>Writes a time of an afternoon and reads it again: a pattern without the half of the day does not give it back.</summary>
    private static string? PatternComplaint(string format)
    {
        try
        {
            var pattern = LocalTimePattern.CreateWithInvariantCulture(format);
            var probe = new LocalTime(15, 42);
            return pattern.Parse(pattern.Format(probe)).TryGetValue(default, out var back) && back == probe
                ? null
                : $"'{format}' does not hold a full time of day";
        }
        catch (InvalidPatternException wrong)
        {
            return $"'{format}' is not a pattern: {wrong.Message}";
        }
    }
}

/// <summary>A local date.</summary>
internal sealed record DateRole(string Name) : FieldRole(Name)
{
    public override string? Complaint(CsvField field) => field.Format is { } format && DateNotation.Complaint(format) is { } reason
        ? $"format {reason}"
        : base.Complaint(field with { Format = null });

    public override CellReading Reading(CsvField field, CsvLayout layout)
    {
        var notation = new DateNotation(field.Format ?? layout.DateFormat);
        return notation.Read;
    }
}
