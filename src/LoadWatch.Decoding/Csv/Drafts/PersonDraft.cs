namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Finds the columns of the person and of the sport, and names those that tell how well a position was received.</summary>
internal static class PersonDraft
{
    private const int PeopleAtMost = 500;

    public static string? Of(IReadOnlyList<ColumnStudy> columns, IReadOnlyCollection<string?> used, DraftNotes notes)
    {
        var free = columns.Where(column => column.Filled > 0 && !used.Contains(column.Name) && !column.Moments.Fits && !column.Dates.Fits).ToList();
        var named = free.Where(column => column.Words.Says(TradeWords.Person) && column.Texts <= PeopleAtMost).ToList();
        if (named is [var taken, ..])
        {
            notes.Found.Add($"people: {DraftNotes.Quoted(taken.Name)} names {taken.Texts}, such as {DraftNotes.Quoted(taken.Shown.Take(3))}");
            if (named.Count > 1)
            {
                notes.Doubt("person_column", $"several may name people: {DraftNotes.Quoted(named.Select(column => column.Name))}; taken: {DraftNotes.Quoted(taken.Name)}");
            }

            return taken.Name;
        }

        // Text that comes again and again may be anything: it is only asked about.
        if (free.FirstOrDefault(column => !column.IsNumber && column.Texts is >= 2 and <= PeopleAtMost && column.Texts * 2 < column.Filled) is { } perhaps)
        {
            notes.Doubt("person_column", $"no column is called so; does {DraftNotes.Quoted(perhaps.Name)} name people, such as {DraftNotes.Quoted(perhaps.Shown.Take(3))}? Without the key a file is about its owner");
        }
        else
        {
            notes.Found.Add("people: no column names any; a file is about its owner");
        }

        return null;
    }

    public static string? Sport(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var column = columns.FirstOrDefault(column => column.Words.Says(TradeWords.Sport) && column.Filled > 0);
        if (column is null)
        {
            notes.Doubt("sport", "no column names it: add \"sport\", for example \"running\"; without it the sport is generic");
            return null;
        }

        if (column.Shown.FirstOrDefault(text => SportWord.Read(text) is null) is { } unread)
        {
            notes.Doubt("sport_column", $"{DraftNotes.Quoted(column.Name)} holds {DraftNotes.Quoted(unread)}, which is no word of the FIT profile: left out; add \"sport\" where all files are of one");
            return null;
        }

        return column.Name;
    }

    public static void AskOfReception(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        if (columns.FirstOrDefault(column => column.IsNumber && column.Words.Says(TradeWords.Reception)) is { } column)
        {
            notes.Doubt(
                "quality",
                $"{DraftNotes.Quoted(column.Name)}, {DraftNotes.Number(column.Numbers.Lowest)} to {DraftNotes.Number(column.Numbers.Highest)}, may tell how well a position was received: "
                + "add \"quality\" with \"column\" and \"at_least\" or \"at_most\", so that bad rows give no speed");
        }
    }
}
