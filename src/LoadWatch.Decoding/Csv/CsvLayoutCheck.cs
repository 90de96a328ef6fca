using LoadWatch.Decoding.Csv.Tables;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Csv;

/// <summary>Finds what makes a layout unusable, before any file is read by it.</summary>
internal static class CsvLayoutCheck
{
    public static IReadOnlyList<string> Reasons(CsvLayout layout) =>
        [.. Basics(layout), .. Header(layout), .. layout.Kind == CsvKind.Samples ? Samples(layout) : TableLayoutCheck.Reasons(layout)];

    private static IEnumerable<string> Samples(CsvLayout layout) =>
    [
        .. Time(layout.Time), .. Channels(layout.Columns), .. SharedColumns(layout), .. Sport(layout), .. QualityCell.Complaints(layout.Quality),
        .. TableLayoutCheck.OfTablesOnly(layout),
    ];

    private static IEnumerable<string> Basics(CsvLayout layout)
    {
        if (string.IsNullOrWhiteSpace(layout.Name))
        {
            yield return "name is missing";
        }

        if (!IsDelimiter(layout.Delimiter))
        {
            yield return "delimiter must be one of , ; | a tab, or another ASCII mark that is not part of a number, a time or a quote";
        }

        if (layout.Decimal is not ('.' or ','))
        {
            yield return "decimal must be . or ,";
        }

        if (!CsvText.Knows(layout.Encoding))
        {
            yield return $"encoding '{layout.Encoding}' is not known: use {CsvText.Names}";
        }
    }

    private static bool IsDelimiter(char mark) =>
        mark == '\t' || (mark is > ' ' and < '\x7f' && !char.IsAsciiLetterOrDigit(mark) && !"\"'.+-:".Contains(mark));

    private static IEnumerable<string> Header(CsvLayout layout)
    {
        if (layout.Header.Count == 0)
        {
            yield return "header names no column, so nothing could pick the layout";
        }

        if (layout.Header.Any(string.IsNullOrWhiteSpace))
        {
            yield return "header holds an empty name";
        }

        foreach (var name in Repeated(layout.Header))
        {
            yield return $"header names '{name}' twice";
        }
    }

    internal static IEnumerable<string> Time(CsvTimeColumn time)
    {
        if (string.IsNullOrWhiteSpace(time.Column))
        {
            yield return "time.column is missing";
        }

        if (time.Zone is { } zone && DateTimeZoneProviders.Tzdb.GetZoneOrNull(zone) is null)
        {
            yield return $"time.zone '{zone}' is not an IANA zone";
        }

        foreach (var reason in time.DateColumn is null ? Moments(time) : DayClock.Complaints(time))
        {
            yield return reason;
        }
    }

    private static IEnumerable<string> Moments(CsvTimeColumn time)
    {
        if (time.Format == CsvTimeColumn.SecondsFromStart)
        {
            if (string.IsNullOrWhiteSpace(time.StartColumn))
            {
                yield return "time.start_column is missing: seconds_from_start needs it";
            }

            if (TimeNotation.Complaint(time.StartFormat) is { } startReason)
            {
                yield return $"time.start_format {startReason}";
            }
        }
        else if (TimeNotation.Complaint(time.Format) is { } reason)
        {
            yield return $"time.format {reason}";
        }
        else if (time.StartColumn is not null)
        {
            yield return "time.start_column is used by seconds_from_start only";
        }
    }

    private static IEnumerable<string> Channels(IReadOnlyList<CsvChannelColumn> columns)
    {
        if (columns.Count == 0)
        {
            yield return "columns names no channel";
        }

        foreach (var column in columns)
        {
            if (string.IsNullOrWhiteSpace(column.Column))
            {
                yield return $"columns: the column of {column.Channel} has no name";
            }

            if (ChannelUnit.Find(column.Channel, column.Unit) is null)
            {
                yield return $"columns: unit '{column.Unit}' of '{column.Column}' is not known for {column.Channel}";
            }
        }

        foreach (var channel in Repeated(columns.Select(column => column.Channel)))
        {
            yield return $"columns: two columns for {channel}";
        }
    }

    private static IEnumerable<string> SharedColumns(CsvLayout layout) =>
        Repeated(Named(layout)).Select(name => $"column '{name}' is used for two things");

    private static IEnumerable<string> Sport(CsvLayout layout)
    {
        if (layout.Sport is not null && layout.SportColumn is not null)
        {
            yield return "sport and sport_column exclude each other";
        }

        if (layout.Sport is { } sport && SportWord.Read(sport) is null)
        {
            yield return $"sport '{sport}' must be a word of small letters, digits and _, with / before a detail";
        }
    }

    private static IEnumerable<string> Named(CsvLayout layout) => layout.Columns.Select(column => column.Column)
        .Append(layout.Time.Column).Append(layout.Time.StartColumn).Append(layout.SportColumn)
        .Append(layout.Time.DateColumn).Append(layout.PersonColumn).Append(layout.Quality?.Column)
        .Where(name => !string.IsNullOrWhiteSpace(name)).Select(name => name!);

    private static IEnumerable<T> Repeated<T>(IEnumerable<T> items) =>
        items.GroupBy(item => item).Where(group => group.Count() > 1).Select(group => group.Key);
}
