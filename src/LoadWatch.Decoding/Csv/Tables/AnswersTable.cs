using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

internal sealed class AnswersTable : TableKind
{
    public static AnswersTable Kind { get; } = new();

    public override RowKind Rows => RowKind.Answers;

    public override string One => "question";

    public override IReadOnlyList<FieldRole> Roles { get; } =
    [
        new WordRole("answer", Words<AnswerWord>.All),
        new DateRole("until"),
        new TextRole("rule"),
        new TextRole("file", Longest: 1000),
        new TextRole("by"),
        new TextRole("note", Longest: 2000) { HasLines = true },
    ];

    public override IReadOnlyList<string> Needed => ["answer"];

    public override bool TakesGroups => true;

    public override RowMade Make(LocalDate date, RowValues values) => (values.Word<AnswerWord>("answer"), values.Date("until")) switch
    {
        (null, _) => RowMade.Wrong("answer", "no answer"),
        (_, { } until) when until < date => RowMade.Wrong("until", "before the date on which it begins"),
        (AnswerWord.BelongsTo, _) when values.Text("file") is null => RowMade.Wrong("file", "no file: belongs_to needs one"),
        ({ } word, var until) => RowMade.Of(new AnswerRow(
            word, until, values.Text("rule"), values.Text("file"), values.Text("by"), values.Text("note"))),
    };

    public override RowKey Key(LocalDate date, RowContent content)
    {
        var row = (AnswerRow)content;
        return RowKey.Of(date, ("answer", Words<AnswerWord>.Of(row.Word)), ("rule", row.Rule), ("file", row.File));
    }

    /// <summary>Two people may give the same answer, each with a note; the first counts.</summary>
    public override bool AreEqual(RowContent one, RowContent other) =>
        one is AnswerRow first && other is AnswerRow second && first == second with { By = first.By, Note = first.Note };
}
