using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Looks at a CSV and drafts a layout for it. Nothing is guessed silently: what the file leaves open stays open and is asked.</summary>
public static class LayoutDrafting
{
    /// <param name="open">Opens the file at its start; the stream can seek. It is read several times and never held whole.</param>
    /// <param name="name">What the layout is to be called.</param>
    /// <exception cref="IOException">The file could not be read.</exception>
    public static LayoutDraft Of(Func<Stream> open, string name)
    {
        ArgumentNullException.ThrowIfNull(open);
        var notes = new DraftNotes();
        var table = DialectStudy.Find(new CsvSource(open), notes);
        return table.Fault is { } fault ? LayoutDraft.Refused(fault) : Of(table, name, notes);
    }

    private static LayoutDraft Of(CsvTable table, string name, DraftNotes notes)
    {
        var columns = table.Names.Select((column, index) => new ColumnStudy(column, index)).Where(column => column.Name.Length > 0).ToList();
        var (fault, linesBelow) = RowStudy.Read(table, columns, notes);
        if (fault is not null)
        {
            return LayoutDraft.Refused(fault);
        }

        var begun = new CsvLayout
        {
            Name = name,
            Delimiter = table.Separator,
            Decimal = DecimalDraft.Of(columns, notes),
            Encoding = table.Text is { MarkLength: 0, Encoding: not null } ? CsvText.Windows1252 : CsvText.Auto,
            LinesAbove = table.LinesAbove,
            LinesBelow = linesBelow,
        };
        AskOfRepeatedNames(columns, notes);
        var layout = Signed(Filled(begun, columns, notes));
        NameUnused(layout, columns, notes);
        return new LayoutDraft(layout, notes.Found, notes.Doubts, Problem: null);
    }

    private static CsvLayout Filled(CsvLayout begun, IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var ofTime = new DraftNotes();
        var ofChannels = new DraftNotes();
        var time = TimeDraft.Of(columns, ofTime);
        var channels = ChannelDraft.Of([.. columns.Where(column => column.Name != time?.Column)], ofChannels);
        if (time is null || channels.Count == 0 || !TimeDraft.IsOfRecording(time, columns))
        {
            return TableDraft.Of(begun with { PersonColumn = PersonDraft.Of(columns, [], notes) }, time, columns, ofTime, notes);
        }

        notes.Found.Add("kind: a time series");
        notes.Found.AddRange([.. ofTime.Found, .. ofChannels.Found]);
        notes.Doubts.AddRange([.. ofTime.Doubts, .. ofChannels.Doubts]);
        PersonDraft.AskOfReception(columns, notes);
        var sport = PersonDraft.Sport(columns, notes);
        return begun with
        {
            Time = time,
            Columns = channels,
            SportColumn = sport,
            PersonColumn = PersonDraft.Of(columns, [.. channels.Select(channel => channel.Column), time.Column, time.StartColumn, time.DateColumn, sport], notes),
        };
    }

    /// <summary>With the columns that make the file what it is as its signature.</summary>
    private static CsvLayout Signed(CsvLayout layout)
    {
        string?[] all =
        [
            layout.PersonColumn, layout.DateColumn, layout.Time.DateColumn, layout.Time.Column, layout.Time.StartColumn,
            .. layout.Columns.Select(column => column.Column), .. layout.Fields.Select(field => field.Column),
        ];
        return layout with { Header = [.. all.OfType<string>().Where(name => name.Length > 0 && name != LayoutDraft.Open).Distinct(StringComparer.Ordinal)] };
    }

    /// <summary>What the layout passes over is named, so that nobody takes it for read.</summary>
    private static void NameUnused(CsvLayout layout, IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var unused = columns.Select(column => column.Name).Distinct(StringComparer.Ordinal).Where(name => name != layout.SportColumn && !layout.Header.Contains(name)).ToList();
        if (unused.Count > 0)
        {
            notes.Found.Add($"not used: {DraftNotes.Quoted(unused)}");
        }
    }

    private static void AskOfRepeatedNames(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var repeated = columns.GroupBy(column => column.Name, StringComparer.Ordinal).Where(same => same.Count() > 1).Select(same => same.Key).ToList();
        if (repeated.Count > 0)
        {
            notes.Doubt("header", $"two columns are called {DraftNotes.Quoted(repeated)}: a file is refused where the layout uses one of them");
        }
    }
}
