using LoadWatch.Decoding.Csv.Tables;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Drafts the layout of a table: its kind is the one of whose fields most have a column.</summary>
internal static class TableDraft
{
    private const string FieldsKey = "fields";

    public static CsvLayout Of(CsvLayout begun, CsvTimeColumn? time, IReadOnlyList<ColumnStudy> columns, DraftNotes ofTime, DraftNotes notes)
    {
        var (kind, fields) = TradeWords.Fields.Select(kind => (Kind: kind.Key, Fields: Fields(kind.Value, columns))).MaxBy(kind => Weight(kind.Kind, kind.Fields));
        notes.Doubt("kind", fields.Count == 0
            ? "neither a time series nor a table whose columns are known by name: taken for sessions; add \"fields\", README.md names them"
            : $"taken for {Words<CsvKind>.Of(kind)} for the sake of {DraftNotes.Quoted(fields.Select(field => field.Column.Name))}: is a row one of these?");
        return Dated(begun, time, columns, ofTime, notes) with
        {
            Kind = kind,
            Fields = [.. fields.Select(field => Field(field.Name, field.Column, notes)), .. kind == CsvKind.Sessions ? Quantities(columns, notes) : []],
        };
    }

    /// <summary>How many fields speak for the kind. What another kind has too tells nothing, nor do the fields of a plan or of answers without the one that makes them so.</summary>
    private static int Weight(CsvKind kind, List<(string Name, ColumnStudy Column)> fields) => kind switch
    {
        CsvKind.Plan or CsvKind.Answers when !fields.Exists(field => TableKind.Of(kind).Needed.Contains(field.Name)) => 0,
        _ => fields.Count(field => field.Name is not "hardness"),
    };

    private static List<(string Name, ColumnStudy Column)> Fields(IReadOnlyList<(string Field, string[] Words)> known, IReadOnlyList<ColumnStudy> columns)
    {
        var found = new List<(string Name, ColumnStudy Column)>();
        foreach (var (field, words) in known)
        {
            if (columns.FirstOrDefault(column => column.Words.Says(words) && !column.Moments.Fits && !column.Dates.Fits && !found.Exists(other => other.Column == column)) is { } column)
            {
                found.Add((field, column));
            }
        }

        return found;
    }

    private static CsvField Field(string name, ColumnStudy column, DraftNotes notes)
    {
        var unit = (name, column) switch
        {
            ("minutes", { IsNumber: false, Times.Fits: true }) => column.Times.Fitting[0].Format.Count(c => c == ':') == 2 ? "h:mm:ss" : Asked(column, "h:mm", "m:ss", notes),
            ("minutes", { Unit: "s" or "h" }) => column.Unit,
            ("kilograms", { Unit: "lb" }) => "lb",
            ("seconds", { IsNumber: false, Times.Fits: true }) => column.Times.Fitting[0].Format.Count(c => c == ':') == 2 ? "h:mm:ss" : Asked(column, "m:ss", "h:mm", notes),
            ("seconds", { Unit: "min" or "h" }) => column.Unit,
            ("bar_speed", { Unit: "m/s" or "km/h" }) => column.Unit,
            ("bar_speed", _) => Open(column, "the speed of the bar in m/s or km/h", notes),
            _ => null,
        };
        if (name is "day" or "test" or "outcome" or "plan" or "answer")
        {
            notes.Doubt(FieldsKey, $"add \"words\" that say what the cells of {DraftNotes.Quoted(column.Name)} stand for: {DraftNotes.Quoted(column.Shown.Take(10))}");
        }

        notes.Found.Add($"{name}: {DraftNotes.Quoted(column.Name)}{(unit is null ? "" : $" in {unit}")}");
        return new CsvField { Column = column.Name, Field = name, Unit = unit };
    }

    private static string Asked(ColumnStudy column, string taken, string other, DraftNotes notes)
    {
        notes.Doubt(FieldsKey, $"{DraftNotes.Quoted(column.Name)} is taken as {taken}, or is it {other}?");
        return taken;
    }

    private static string Open(ColumnStudy column, string question, DraftNotes notes)
    {
        notes.Doubt(FieldsKey, $"{DraftNotes.Quoted(column.Name)}, {DraftNotes.Number(column.Numbers.Lowest)} to {DraftNotes.Number(column.Numbers.Highest)}, is {question}?");
        return LayoutDraft.Open;
    }

    /// <summary>Distance and the highest speed of a session.</summary>
    private static IEnumerable<CsvField> Quantities(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        (string Quantity, Channel Channel, string[] Units)[] known = [("distance", Channel.Distance, ["m", "km"]), ("speed_top", Channel.Speed, ["m/s", "km/h"])];
        foreach (var (quantity, channel, units) in known)
        {
            if (columns.FirstOrDefault(column => column.IsNumber && (column.Words.Says(TradeWords.Channels[channel]) || (channel == Channel.Speed && column.Words.Says(["vmax"])))) is not { } column)
            {
                continue;
            }

            var unit = column.Unit is { } stated && units.Contains(stated) ? stated : Open(column, $"{quantity} in {string.Join(" or ", units)}", notes);
            yield return new CsvField { Column = column.Name, Field = QuantityRole.Word, Quantity = quantity, Unit = unit };
        }
    }

    private static CsvLayout Dated(CsvLayout begun, CsvTimeColumn? time, IReadOnlyList<ColumnStudy> columns, DraftNotes ofTime, DraftNotes notes)
    {
        if (time is { DateColumn: null, Format: not CsvTimeColumn.SecondsFromStart })
        {
            notes.Found.AddRange(ofTime.Found);
            notes.Doubts.AddRange(ofTime.Doubts);
            return begun with { Time = time };
        }

        if (columns.FirstOrDefault(column => column.Dates.Fits) is { } dates)
        {
            return begun with { DateColumn = dates.Name, DateFormat = TimeDraft.Format(dates, dates.Dates, "date_format", notes) };
        }

        notes.Doubt("date_column", "no column holds dates in one writing");
        return begun with { DateColumn = LayoutDraft.Open };
    }
}
