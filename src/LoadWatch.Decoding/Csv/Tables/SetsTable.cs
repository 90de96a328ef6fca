using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

internal sealed class SetsTable : TableKind
{
    public static SetsTable Kind { get; } = new();

    public override RowKind Rows => RowKind.Sets;

    public override string One => "set";

    public override IReadOnlyList<FieldRole> Roles { get; } =
    [
        new NumberRole("order", null, 1, 20) { IsWhole = true },
        new TimeRole("time"),
        new TextRole("exercise"),
        new TextRole("machine"),
        new NumberRole("set", null, 1, 200) { IsWhole = true },
        new NumberRole("repetitions", null, 0, 1000) { IsWhole = true },
        new NumberRole("kilograms", Measure.Kilograms, 0, 1000),
        new NumberRole("pin", null, 0, 1000),
        new NumberRole("repetitions_in_reserve", null, 0, 50),
        new NumberRole("hardness", null, 0, 10),
        new NumberRole("seconds", Measure.Seconds, 0, 86400),
        new WordRole("load", Words<SetLoad>.All),
        YesNo.Role("hold"),
        YesNo.Role("fast"),
        new NumberRole("bar_speed", Measure.MetresPerSecond, 0, 10) { IsAbove = true },
    ];

    public override IReadOnlyList<string> Needed => ["exercise"];

    public override bool CoversEverything => false;

    public override RowMade Make(LocalDate date, RowValues values)
    {
        var kilograms = values.Number("kilograms");
        var pin = values.Number("pin");
        return values.Text("exercise") is not { } exercise ? RowMade.Wrong("exercise", "no exercise") : RowMade.Of(new SetRow(
            values.Whole("order"),
            values.Time("time"),
            exercise,
            values.Text("machine"),
            values.Whole("set"),
            values.Whole("repetitions"),
            kilograms,
            pin,
            values.Number("repetitions_in_reserve"),
            values.Number("hardness"),
            values.Number("seconds"),
            values.Word<SetLoad>("load") ?? LoadOf(kilograms, pin),
            values.IsYes("hold"),
            values.IsYes("fast"))
        {
            BarSpeedMetresPerSecond = values.Number("bar_speed"),
        });
    }

    /// <summary>A set has a number of its own; where the table states none, equal rows are counted: three of them are three sets.</summary>
    public override RowKey Key(LocalDate date, RowContent content)
    {
        var row = (SetRow)content;
        return RowKey.Of(
            date,
            ("order", RowKey.Written(row.Order)),
            ("time", row.Order is null ? RowKey.Written(row.Time) : null),
            ("exercise", row.Exercise),
            ("machine", row.Machine),
            ("set", RowKey.Written(row.Set))) with { IsCounted = row.Set is null };
    }

    /// <summary>Where no word says it: a weight of 0 is body weight, a pin without kilograms is a pin, anything else a weight, known or not.</summary>
    private static SetLoad LoadOf(double? kilograms, double? pin) => (kilograms, pin) switch
    {
        (0, _) => SetLoad.BodyWeight,
        (null, not null) => SetLoad.Pin,
        _ => SetLoad.Weight,
    };
}
