using System.Globalization;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Numbers and dates as the sentences of findings show them, rounded for reading.</summary>
internal static class Wording
{
    /// <summary><c>2 March</c>, with the year where it is not the year of <paramref name="told"/>.</summary>
    public static string Date(LocalDate date, LocalDate told) =>
        date.ToString(date.Year == told.Year ? "d MMMM" : "d MMMM uuuu", CultureInfo.InvariantCulture);

    /// <summary><c>2026-03-02</c>, for evidence.</summary>
    public static string IsoDate(LocalDate date) => date.ToString("uuuu-MM-dd", CultureInfo.InvariantCulture);

    /// <summary><c>1 day</c>, <c>3.5 days</c>.</summary>
    public static string Days(double days) => days == 1 ? "1 day" : $"{Number(days)} days";

    /// <summary><c>leg work</c>.</summary>
    public static string Work(BodyRegion region) => region switch
    {
        BodyRegion.Legs => "leg work",
        BodyRegion.Trunk => "trunk work",
        _ => "arm work",
    };

    /// <summary>Whole from 10 up, one decimal below.</summary>
    public static string Number(double value) => value.ToString(Math.Abs(value) >= 10 ? "0" : "0.#", CultureInfo.InvariantCulture);

    /// <summary>One decimal, or two where one would hide the difference from the limit.</summary>
    public static string Ratio(double value, double limit)
    {
        var hidden = value != limit && Limit(Math.Round(value, 1)) == Limit(limit);
        return value >= 10 ? Number(value) : value.ToString(hidden ? "0.00" : "0.0", CultureInfo.InvariantCulture);
    }

    public static string Limit(double limit) => limit.ToString("0.0#", CultureInfo.InvariantCulture);

    /// <summary><c>44 %</c> of 0.44, with a decimal where a whole number would hide the difference from the limit.</summary>
    public static string Percent(double fraction, double limit)
    {
        var hidden = fraction != limit && Math.Round(100 * fraction) == Math.Round(100 * limit);
        return (100 * fraction).ToString(hidden ? "0.0" : "0", CultureInfo.InvariantCulture) + " %";
    }

    /// <summary><c>40 %</c>, <c>12.5 %</c>.</summary>
    public static string Percent(double limit) => (100 * limit).ToString("0.##", CultureInfo.InvariantCulture) + " %";

    public static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];

    /// <summary>The verb of a reading of another date.</summary>
    public static string Is(LocalDate read, LocalDate told) => read == told ? "is" : "was";

    /// <summary><c> on 2 March, not known since</c> for a reading of another date, else nothing.</summary>
    public static string NotKnownSince(LocalDate read, LocalDate told) => read == told ? "" : $" on {Date(read, told)}, not known since";
}
