using System.Text;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The moments of the time column of a table, as local date and time of day.</summary>
internal sealed class MomentNotation(CsvLayout layout)
{
    private readonly TimeNotation notation = TimeNotation.Of(layout.Time.Format, layout.Decimal);
    private readonly DateTimeZone zone = layout.Time.Zone is { } name ? DateTimeZoneProviders.Tzdb[name] : DateTimeZone.Utc;

    /// <summary>Whether a layout takes the dates of its rows from moments, and these stand in a column.</summary>
    public static bool IsColumn(CsvLayout layout, string column) =>
        layout.DateColumn is null && column.Length > 0 && column == layout.Time.Column;

    /// <summary>As written; an instant without an offset of its own is placed in the layout's zone. Null for what is no moment.</summary>
    public LocalDateTime? Read(string text)
    {
        if (!notation.TryRead(Encoding.UTF8.GetBytes(text), out var written))
        {
            return null;
        }

        return written.Instant is { } instant ? instant.WithOffset(written.Offset ?? zone.GetUtcOffset(instant)).LocalDateTime : written.Local;
    }
}
