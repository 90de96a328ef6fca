using LoadWatch.People;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads a cell of <c>heart_rate_valid</c>: <c>yes</c>, or when it is not: <c>no</c>, <c>no since 2026-03-01</c>, <c>no 2026-02-01 to 2026-04-30</c>, several separated by <c>;</c>.</summary>
internal static class HeartRateCell
{
    private const string Wanted =
        "heart_rate_valid: holds yes, no, no since 2026-03-01, or no 2026-02-01 to 2026-04-30, several separated by ;, and never a reason";

    /// <summary>The fault does not repeat what stands there: a reason belongs nowhere, not even in a log.</summary>
    public static DatePeriods Read(TableRow row, List<ConfigurationFault> faults)
    {
        var text = (row["heart_rate_valid"] ?? "yes").ToLowerInvariant();
        if (text == "yes")
        {
            return DatePeriods.Never;
        }

        var periods = text.Split(';', StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries).Select(Period).ToList();
        if (periods.Count > 0 && !periods.Contains(null))
        {
            return DatePeriods.Of(periods.OfType<DatePeriod>());
        }

        faults.Add(row.Fault(Wanted));
        return DatePeriods.Never;
    }

    /// <summary>Null where it is none.</summary>
    private static DatePeriod? Period(string text) => text.Split(' ', StringSplitOptions.RemoveEmptyEntries) switch
    {
        ["no"] => new DatePeriod(LocalDate.MinIsoValue, null),
        ["no", "since", var from] when Date(from) is { } first => new DatePeriod(first, null),
        ["no", var from, "to", var until] when Date(from) is { } first && Date(until) is { } last && first <= last => new DatePeriod(first, last),
        _ => null,
    };

    private static LocalDate? Date(string text) => LocalDatePattern.Iso.Parse(text) is { Success: true, Value: var date } ? date : null;
}
