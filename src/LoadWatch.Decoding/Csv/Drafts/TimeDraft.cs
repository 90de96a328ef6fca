namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Finds the column that dates the rows, and its notation: only one that fits every row.</summary>
internal static class TimeDraft
{
    private const string TimeKey = "time";

    // One for each person of a squad, or each session of a day.
    private const int StartsAtMost = 30;
    private const double EarliestSecond = 946_684_800; // 2000
    private const double LatestSecond = 4_102_444_800; // 2100

    /// <summary>Null where no column holds moments, times of day beside dates, or seconds.</summary>
    public static CsvTimeColumn? Of(IReadOnlyList<ColumnStudy> columns, DraftNotes notes) =>
        Elapsed(columns, notes) ?? Moments(columns, notes) ?? Unix(columns, notes) ?? DayAndTime(columns, notes) ?? ElapsedWithoutStart(columns, notes);

    /// <summary>Whether the rows lie as close as those of a recording.</summary>
    public static bool IsOfRecording(CsvTimeColumn time, IReadOnlyList<ColumnStudy> columns)
    {
        var column = columns.First(column => column.Name == time.Column);
        var steps = (time.DateColumn is null ? column.Moments : column.Times).Steps;
        return time.Format is CsvTimeColumn.SecondsFromStart or CsvTimeColumn.UnixSeconds or CsvTimeColumn.UnixMilliseconds || steps.Long * 2 <= steps.All;
    }

    /// <summary>The notation for a layout: open where the day and the month could change places in every row.</summary>
    public static string Format(ColumnStudy column, NotationStudy study, string key, DraftNotes notes)
    {
        var dayFirst = study.Fitting.FirstOrDefault(notation => notation.Order == DateOrder.DayFirst);
        var monthFirst = study.Fitting.FirstOrDefault(notation => notation.Order == DateOrder.MonthFirst);
        if (dayFirst is not null && monthFirst is not null)
        {
            notes.Doubt(key, $"in every row of {DraftNotes.Quoted(column.Name)} the day or the month may stand first: \"{dayFirst.Format}\" or \"{monthFirst.Format}\"?");
            return LayoutDraft.Open;
        }

        notes.Found.Add($"{DraftNotes.Quoted(column.Name)}: \"{study.Fitting[0].Format}\" fits all {column.Filled} filled cells, such as {DraftNotes.Quoted(column.Shown.First())}");
        return study.Fitting[0].Format;
    }

    private static CsvTimeColumn? Moments(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var all = columns.Where(column => column.Moments.Fits).OrderByDescending(column => column.Words.Says(TradeWords.Time)).ThenByDescending(column => column.Texts).ToList();
        if (all is not [var taken, ..])
        {
            return null;
        }

        if (all.Count > 1)
        {
            notes.Doubt($"{TimeKey}.column", $"several columns hold moments: {DraftNotes.Quoted(all.Select(column => column.Name))}; taken: {DraftNotes.Quoted(taken.Name)}");
        }

        return new CsvTimeColumn { Column = taken.Name, Format = Format(taken, taken.Moments, $"{TimeKey}.format", notes), Zone = taken.Moments.IsLocal ? OpenZone(taken, notes) : null };
    }

    private static CsvTimeColumn? Unix(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        foreach (var column in columns.Where(column => column.IsNumber).OrderByDescending(column => column.Words.Says(TradeWords.Time)))
        {
            var (low, high) = (column.Numbers.Lowest, column.Numbers.Highest);
            var format = low >= EarliestSecond && high < LatestSecond ? CsvTimeColumn.UnixSeconds
                : low >= EarliestSecond * 1000 && high < LatestSecond * 1000 ? CsvTimeColumn.UnixMilliseconds : null;
            if (format is not null)
            {
                notes.Found.Add($"{DraftNotes.Quoted(column.Name)}: {format}, from {DraftNotes.Number(low)} to {DraftNotes.Number(high)}");
                return new CsvTimeColumn { Column = column.Name, Format = format };
            }
        }

        return null;
    }

    private static CsvTimeColumn? DayAndTime(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var times = columns.Where(column => column.Times.Fits && !column.IsNumber && !column.Words.Says(TradeWords.Elapsed)).OrderByDescending(column => column.Words.Says(TradeWords.Time)).FirstOrDefault();
        var dates = columns.FirstOrDefault(column => column.Dates.Fits && column != times);
        if (times is null || dates is null)
        {
            return null;
        }

        var written = Format(times, times.Times, $"{TimeKey}.format", notes);
        return new CsvTimeColumn
        {
            Column = times.Name,
            Format = written == "HH:mm:ss" ? CsvTimeColumn.Iso8601 : written,
            DateColumn = dates.Name,
            DateFormat = Format(dates, dates.Dates, $"{TimeKey}.date_format", notes),
            Zone = OpenZone(times, notes),
        };
    }

    /// <summary>A start that stays while seconds run.</summary>
    private static CsvTimeColumn? Elapsed(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var start = columns.FirstOrDefault(column => column.Moments.Fits && column.Texts <= StartsAtMost);
        if (start is null || Running(columns) is not { } seconds || seconds.Texts <= start.Texts)
        {
            return null;
        }

        notes.Found.Add($"{DraftNotes.Quoted(seconds.Name)}: runs from {DraftNotes.Number(seconds.Numbers.Lowest)} to {DraftNotes.Number(seconds.Numbers.Highest)} while {DraftNotes.Quoted(start.Name)} stays");
        notes.Doubt($"{TimeKey}.format", $"is {DraftNotes.Quoted(seconds.Name)} in seconds from the start? Nothing else is read");
        return new CsvTimeColumn
        {
            Column = seconds.Name,
            Format = CsvTimeColumn.SecondsFromStart,
            StartColumn = start.Name,
            StartFormat = Format(start, start.Moments, $"{TimeKey}.start_format", notes),
            Zone = start.Moments.IsLocal ? OpenZone(start, notes) : null,
        };
    }

    private static CsvTimeColumn? ElapsedWithoutStart(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        if (columns.Any(column => column.Dates.Fits) || Running(columns) is not { Numbers.Rises: true } seconds)
        {
            return null;
        }

        notes.Doubt($"{TimeKey}.start_column", $"{DraftNotes.Quoted(seconds.Name)} runs from {DraftNotes.Number(seconds.Numbers.Lowest)}, but no column says when it started: export with a column of the start, or of moments");
        return new CsvTimeColumn { Column = seconds.Name, Format = CsvTimeColumn.SecondsFromStart, StartColumn = LayoutDraft.Open };
    }

    private static ColumnStudy? Running(IReadOnlyList<ColumnStudy> columns) => columns.FirstOrDefault(column =>
        column.IsNumber && column.Numbers.Highest < EarliestSecond && (column.Words.Says(TradeWords.Elapsed) || column.Words.Says(TradeWords.Time)));

    private static string OpenZone(ColumnStudy column, DraftNotes notes)
    {
        notes.Doubt($"{TimeKey}.zone", $"{DraftNotes.Quoted(column.Name)} has no offset: of which zone are the times, for example \"Europe/Helsinki\"? Take the key out where they are UTC");
        return LayoutDraft.Open;
    }
}
