using LoadWatch.Decoding.Csv.Tables;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// The tables of our own: comma, decimal point, ISO dates, <c>person</c> as an id of the roster (or no such column: the owner of the file). The
/// columns of the signature must be there, with cells that may be empty; all others may be left out.
/// </summary>
public static class BuiltInTables
{
    public static CsvLayout Sessions { get; } = Table(
        CsvKind.Sessions,
        ["date", "minutes"],
        [
            Field("session", "order"), Field("start"), Field("sport"), Field("drill"), Field("minutes"), Field("rating"), Field("content"),
            Quantity("distance_m", "distance", "m"),
            Quantity("distance_above_5_5_m", "distance_above_5_5_m_s", "m"),
            Quantity("distance_above_7_m", "distance_above_7_m_s", "m"),
            Quantity("speed_top_m_s", "speed_top", "m/s"),
            Quantity("climb_m", "climb", "m"),
            Quantity("work_kj", "work", "kJ"),
        ]);

    public static CsvLayout Sets { get; } = Table(
        CsvKind.Sets,
        ["date", "exercise", "repetitions"],
        [
            Field("session", "order"), Field("time"), Field("exercise"), Field("machine"), Field("set"), Field("repetitions"), Field("kilograms"),
            Field("pin"), Field("reserve", "repetitions_in_reserve"), Field("hardness"), Field("seconds"), Field("load"), Field("hold"), Field("fast"),
            Field("bar_speed_m_s", "bar_speed") with { Unit = "m/s" },
        ]);

    public static CsvLayout Tests { get; } = Table(
        CsvKind.Tests,
        ["date", "test", "value"],
        [
            Field("test"), Field("value"), Field("unit"), Field("exercise"), Field("machine"), Field("outcome"), Field("hand"), Field("device"),
            Field("chair_height_m", "chair_height") with { Unit = "m" },
        ]);

    public static CsvLayout Days { get; } = Table(CsvKind.Days, ["date", "day"], [Field("day")]);

    public static CsvLayout Plan { get; } = Table(
        CsvKind.Plan,
        ["from", "plan"],
        [Field("until"), Field("plan"), Field("start"), Field("end"), Field("recording", "recording_expected"), Field("sport")])
        with { DateColumn = "from", GroupColumn = "group" };

    public static CsvLayout Answers { get; } = Table(
        CsvKind.Answers,
        ["date", "answer"],
        [Field("answer"), Field("until"), Field("rule"), Field("file"), Field("by"), Field("note")])
        with { GroupColumn = "group" };

    public static IReadOnlyList<CsvLayout> All { get; } = [Sessions, Sets, Tests, Days, Plan, Answers];

    private static CsvLayout Table(CsvKind kind, IReadOnlyList<string> header, IReadOnlyList<CsvField> fields) => new()
    {
        Name = Words<CsvKind>.Of(kind),
        Kind = kind,
        Header = header,
        PersonColumn = "person",
        DateColumn = "date",
        Fields = fields,
    };

    private static CsvField Field(string column) => Field(column, column);

    private static CsvField Field(string column, string field) => new() { Column = column, Field = field };

    private static CsvField Quantity(string column, string quantity, string unit) =>
        new() { Column = column, Field = QuantityRole.Word, Quantity = quantity, Unit = unit };
}
