using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A way of writing dates: <c>iso8601</c> or a pattern. Which of two numbers is the day is the pattern's to say, never guessed.</summary>
internal sealed class DateNotation(string format)
{
    private const int FirstYear = 2000;
    private const int LastYear = 2100;

    private readonly LocalDatePattern pattern = Pattern(format);

    /// <summary>What makes a format unusable, to be put behind the key's name, or null.</summary>
    public static string? Complaint(string format)
    {
        try
        {
            var candidate = Pattern(format);
            var probe = new LocalDate(2026, 10, 17);
            return candidate.Parse(candidate.Format(probe)).TryGetValue(default, out var back) && back == probe
                ? null
                : $"'{format}' does not hold a full date";
        }
        catch (InvalidPatternException wrong)
        {
            return $"'{format}' is not a pattern: {wrong.Message}";
        }
    }

    public static CellValue Plausible(LocalDate date) => date.Year is >= FirstYear and <= LastYear
        ? CellValue.Of(date)
        : CellValue.Wrong($"a date outside {FirstYear} to {LastYear}");

    public CellValue Read(string text) => pattern.Parse(text).TryGetValue(default, out var date)
        ? Plausible(date)
        : CellValue.Wrong(format == CsvTimeColumn.Iso8601 ? "not a date such as 2026-03-31" : "not a date as the layout writes it");

    private static LocalDatePattern Pattern(string format) =>
        format == CsvTimeColumn.Iso8601 ? LocalDatePattern.Iso : LocalDatePattern.CreateWithInvariantCulture(format);
}
