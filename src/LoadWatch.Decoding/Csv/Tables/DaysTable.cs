using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

internal sealed class DaysTable : TableKind
{
    public static DaysTable Kind { get; } = new();

    public override RowKind Rows => RowKind.Days;

    public override string One => "date";

    public override IReadOnlyList<FieldRole> Roles { get; } = [new WordRole("day", Words<DayWord>.All)];

    public override IReadOnlyList<string> Needed => ["day"];

    public override bool CoversEverything => false;

    public override RowMade Make(LocalDate date, RowValues values) => values.Word<DayWord>("day") is { } word
        ? RowMade.Of(new DayRow(word))
        : RowMade.Wrong("day", "no word for the day");

    public override RowKey Key(LocalDate date, RowContent content) => RowKey.Of(date);
}
