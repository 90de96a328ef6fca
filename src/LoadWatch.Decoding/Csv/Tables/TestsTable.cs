using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

internal sealed class TestsTable : TableKind
{
    private const string OneRepetitionMax = "one_repetition_max";

    public static TestsTable Kind { get; } = new();

    public override RowKind Rows => RowKind.Tests;

    public override string One => "test";

    public override IReadOnlyList<FieldRole> Roles { get; } =
    [
        new WordRole("test", TestMeasures.Words),
        new TestValueRole(),
        new TextRole("unit", Longest: 16),
        new TextRole("exercise"),
        new TextRole("machine"),
        new WordRole("outcome", Words<TestOutcome>.All),
        new WordRole("hand", "left", "right"),
        new TextRole("device"),
        new NumberRole("chair_height", Measure.BodyMetres, 0.2, 1) { NeedsUnit = true },
    ];

    public override IReadOnlyList<string> Needed => ["test"];

    public override RowMade Make(LocalDate date, RowValues values) => values.Text("test") switch
    {
        null => RowMade.Wrong("test", "no test"),
        OneRepetitionMax when values.Text("exercise") is null => RowMade.Wrong("exercise", $"no exercise: {OneRepetitionMax} needs one"),
        var test => (values.Number(TestValueRole.Word), values.Word<TestOutcome>("outcome")) switch
        {
            (null, null) => RowMade.Wrong(TestValueRole.Word, "neither a value nor an outcome"),
            (null, _) => RowMade.Of(Row(test, null, null, values)),
            (not null, TestOutcome.Unable) => RowMade.Wrong("outcome", "unable, but there is a value"),
            ({ } number, _) => Measured(test, number, values),
        },
    };

    public override RowKey Key(LocalDate date, RowContent content)
    {
        var row = (TestRow)content;
        return RowKey.Of(date, ("test", row.Test), ("exercise", row.Exercise), ("machine", row.Machine), ("hand", row.Hand));
    }

    private static RowMade Measured(string test, double number, RowValues values)
    {
        var role = TestMeasures.Of(test);
        return values.Text("unit") switch
        {
            null => RowMade.Wrong("unit", $"no unit: {test} is measured in {role.Measure!.Known}"),
            var unit when role.Measure!.Find(unit) is not ScaledUnit =>
                RowMade.Wrong("unit", $"not a unit of {test}: use one of {role.Measure.Known}"),
            var unit => InUnit(role, ((ScaledUnit)role.Measure.Find(unit)!).Convert(number), values),
        };
    }

    private static RowMade InUnit(NumberRole role, double value, RowValues values) => role.Complaint(value) is { } reason
        ? RowMade.Wrong(TestValueRole.Word, reason)
        : RowMade.Of(Row(role.Name, value, role.Measure!.Unit, values));

    private static TestRow Row(string test, double? value, string? unit, RowValues values) => new(
        test,
        value,
        unit,
        values.Text("exercise"),
        values.Text("machine"),
        values.Word<TestOutcome>("outcome"),
        values.Text("hand"),
        values.Text("device"),
        values.Number("chair_height"));
}
