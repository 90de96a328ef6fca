using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

internal sealed class SessionsTable : TableKind
{
    public static SessionsTable Kind { get; } = new();

    public override RowKind Rows => RowKind.Sessions;

    public override string One => "session";

    public override IReadOnlyList<FieldRole> Roles { get; } =
    [
        new NumberRole("order", null, 1, 20) { IsWhole = true },
        new TimeRole("start"),
        new SportRole("sport"),
        new TextRole("drill"),
        new NumberRole("minutes", Measure.Minutes, 0, 1440) { IsAbove = true },
        new NumberRole("rating", null, 0, 10),
        new WordRole("content", Words<DeclaredContent>.All),
        new QuantityRole(),
    ];

    public override IReadOnlyList<string> Needed => [];

    public override bool CoversEverything => false;

    public override RowMade Make(LocalDate date, RowValues values) => RowMade.Of(new SessionRow(
        values.Whole("order"),
        values.Time("start"),
        values.Text("sport"),
        values.Text("drill"),
        values.Number("minutes"),
        values.Number("rating"),
        values.Quantities,
        values.Word<DeclaredContent>("content")));

    /// <summary>A session has an order or a start; where the table states neither, the sessions of a date are counted.</summary>
    public override RowKey Key(LocalDate date, RowContent content)
    {
        var row = (SessionRow)content;
        return RowKey.Of(
            date,
            ("order", RowKey.Written(row.Order)),
            ("start", row.Order is null ? RowKey.Written(row.Start) : null),
            ("drill", row.Drill)) with { IsCounted = row.Order is null && row.Start is null };
    }

    public override bool AreEqual(RowContent one, RowContent other) =>
        one is SessionRow first && other is SessionRow second
        && first.Quantities.SequenceEqual(second.Quantities)
        && first == second with { Quantities = first.Quantities };
}
