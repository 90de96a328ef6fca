using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Tells the date of each row, from a column of dates or of moments.</summary>
internal sealed class RowDate
{
    private readonly CsvTable table;
    private readonly DateNotation? dates;
    private readonly TimeNotation? moments;
    private readonly DateTimeZone zone;

    public RowDate(CsvTable table, CsvLayout layout)
    {
        this.table = table;
        Column = table.Find(TableColumns.Date(layout))!.Value;
        dates = layout.DateColumn is null ? null : new DateNotation(layout.DateFormat);
        moments = layout.DateColumn is null ? TimeNotation.Of(layout.Time.Format, layout.Decimal) : null;
        zone = layout.Time.Zone is { } name ? DateTimeZoneProviders.Tzdb[name] : DateTimeZone.Utc;
    }

    /// <summary>From 0.</summary>
    public int Column { get; }

    /// <param name="time">The time of day where the column holds moments. Midnight is none: so dates are written that have no time.</param>
    /// <returns>Null with the problem.</returns>
    public LocalDate? Read(CsvRows rows, out LocalTime? time, out Problem? problem)
    {
        time = null;
        var read = rows.Text(Column) switch
        {
            "" => CellValue.Wrong("no date"),
            var text => dates?.Read(text) ?? Moment(rows, out time),
        };
        problem = read.Reason is { } reason ? table.Wrong(rows, Column, reason) : null;
        return read.Value as LocalDate?;
    }

    private CellValue Moment(CsvRows rows, out LocalTime? time)
    {
        time = null;
        if (!moments!.TryRead(rows[Column], out var written))
        {
            return CellValue.Wrong("not a time as the layout writes it");
        }

        var local = written.Instant is { } instant
            ? instant.WithOffset(written.Offset ?? zone.GetUtcOffset(instant)).LocalDateTime
            : written.Local;
        time = local.TimeOfDay == LocalTime.Midnight ? null : local.TimeOfDay;
        return DateNotation.Plausible(local.Date);
    }
}
