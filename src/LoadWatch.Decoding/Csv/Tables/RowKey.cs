using System.Text;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>
/// The canonical text that tells a row from the others of its subject and kind: the date, then what is known of its place, as
/// <c>2026-10-05|order=1|exercise=leg_press|set=2</c>.
/// </summary>
internal readonly record struct RowKey(string Text)
{
    /// <summary>Whether rows of equal keys are different rows, told apart by how often the key stands above them.</summary>
    public bool IsCounted { get; init; }

    public static RowKey Of(LocalDate date, params ReadOnlySpan<(string Name, string? Value)> parts)
    {
        var text = new StringBuilder(LocalDatePattern.Iso.Format(date));
        foreach (var (name, value) in parts)
        {
            if (value is not null)
            {
                text.Append('|').Append(name).Append('=').Append(Escaped(value));
            }
        }

        return new RowKey(text.ToString());
    }

    /// <param name="occurrence">From 1.</param>
    public string Counted(int occurrence) => FormattableString.Invariant($"{Text}|n={occurrence}");

    public static string? Written(LocalTime? time) => time is { } known ? LocalTimePattern.ExtendedIso.Format(known) : null;

    public static string? Written(int? number) => number is { } known ? FormattableString.Invariant($"{known}") : null;

    private static string Escaped(string value) =>
        value.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("|", "\\|", StringComparison.Ordinal);
}
