using System.Globalization;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Notices;

/// <summary>How a brief writes its numbers, in every culture alike. Unknown is a question mark, never a nought.</summary>
public static class BriefNumbers
{
    public const string Unknown = "?";

    private static readonly LocalDatePattern ShortDate = LocalDatePattern.Create("d MMM", CultureInfo.InvariantCulture);

    /// <summary>Whole units; one decimal below 10.</summary>
    public static string Load(double? value) => value switch
    {
        null => Unknown,
        > 0 and < 9.95 => value.Value.ToString("0.0", CultureInfo.InvariantCulture),
        _ => value.Value.ToString("0", CultureInfo.InvariantCulture),
    };

    /// <summary>The load of a row's week, with a plus where not all of its days are known.</summary>
    public static string SoFar(BriefRow row) => row is { WeekLoad: not null, KnownDays: < 7 } ? Load(row.WeekLoad) + "+" : Load(row.WeekLoad);

    /// <summary>Two decimals, so that a value just under a limit does not read as the limit.</summary>
    public static string Ratio(double? value) => value?.ToString("0.00", CultureInfo.InvariantCulture) ?? Unknown;

    public static string Count(int? value) => value?.ToString(CultureInfo.InvariantCulture) ?? Unknown;

    /// <summary><c>28 Feb</c>.</summary>
    public static string Day(LocalDate? date) => date is { } known ? ShortDate.Format(known) : Unknown;
}
