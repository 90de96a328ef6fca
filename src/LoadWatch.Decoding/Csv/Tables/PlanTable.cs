using LoadWatch.Plans;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

internal sealed class PlanTable : TableKind
{
    public static PlanTable Kind { get; } = new();

    public override RowKind Rows => RowKind.Plan;

    public override string One => "entry of the plan";

    public override IReadOnlyList<FieldRole> Roles { get; } =
    [
        new WordRole("plan", Words<PlanWord>.All),
        new DateRole("until"),
        new TimeRole("start"),
        new TimeRole("end"),
        YesNo.Role("recording_expected"),
        new SportRole("sport"),
    ];

    public override IReadOnlyList<string> Needed => ["plan"];

    public override bool TakesGroups => true;

    public override bool TakesEverybody => true;

    public override RowMade Make(LocalDate date, RowValues values) => (values.Word<PlanWord>("plan"), values.Date("until")) switch
    {
        (null, _) => RowMade.Wrong("plan", "no word for what is planned"),
        (_, { } until) when until < date => RowMade.Wrong("until", "before the date on which it begins"),
        ({ } word, var until) => RowMade.Of(new PlanRow(
            word, until, values.Time("start"), values.Time("end"), values.IsYes("recording_expected"), values.Text("sport"))),
    };

    public override RowKey Key(LocalDate date, RowContent content)
    {
        var row = (PlanRow)content;
        return RowKey.Of(date, ("plan", Words<PlanWord>.Of(row.Word)), ("start", RowKey.Written(row.Start)));
    }
}
