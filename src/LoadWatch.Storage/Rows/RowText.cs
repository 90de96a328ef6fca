using LoadWatch.Rows;
using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage.Rows;

/// <summary>The content of a row as JSON text; equal contents give equal text, so that a version of a table can be compared with the one before.</summary>
public static class RowText
{
    public static string Write(RowContent content) => content switch
    {
        SessionRow row => JsonText.Write(row),
        SetRow row => JsonText.Write(row),
        TestRow row => JsonText.Write(row),
        LoadWatch.Rows.DayRow row => JsonText.Write(row),
        PlanRow row => JsonText.Write(row),
        AnswerRow row => JsonText.Write(row),
        _ => throw new ArgumentException($"no text for a {content.GetType().Name}", nameof(content)),
    };

    /// <exception cref="InvalidDataException">The text is not of this kind.</exception>
    internal static RowContent Read(RowKind kind, string text) => kind switch
    {
        RowKind.Sessions => JsonText.Read<SessionRow>(text),
        RowKind.Sets => JsonText.Read<SetRow>(text),
        RowKind.Tests => JsonText.Read<TestRow>(text),
        RowKind.Days => JsonText.Read<LoadWatch.Rows.DayRow>(text),
        RowKind.Plan => JsonText.Read<PlanRow>(text),
        _ => JsonText.Read<AnswerRow>(text),
    };
}
