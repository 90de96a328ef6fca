namespace LoadWatch.Notices;

/// <summary>The sheets, the call list and the week as plain text.</summary>
internal static class FormText
{
    public static void WriteSheets(TextLines lines, IReadOnlyList<ClassSheet> sheets)
    {
        foreach (var sheet in sheets)
        {
            BriefText.Heading(lines, BriefText.Today);
            lines.Paragraph("", $"{sheet.Heading}: {(sheet.People.Count == 1 ? "1 person" : $"{sheet.People.Count} people")}");
            foreach (var person in sheet.People)
            {
                lines.Paragraph("- ", string.Join(": ", new[] { person.Name, Join(person.Note, person.Room) }.Where(part => part.Length > 0)));
            }
        }
    }

    public static void WriteCalls(TextLines lines, CallList? calls)
    {
        if (calls is null || calls.Calls.Count == 0)
        {
            return;
        }

        BriefText.Heading(lines, BriefText.ToCall);
        foreach (var call in calls.Calls)
        {
            lines.Paragraph("- ", $"{call.Name} (last recorded: {(call.LastSeen is { } seen ? BriefNumbers.Day(seen) : "never")}): {call.Why}");
        }

        WriteMore(lines, calls.Beyond);
    }

    public static void WriteWeek(TextLines lines, BriefWeek? week)
    {
        if (week is null)
        {
            return;
        }

        BriefText.Heading(lines, BriefText.TheWeek);
        lines.Line($"{BriefText.DateInWords(week.From)} to {BriefText.DateInWords(week.To)}");
        foreach (var group in week.Groups)
        {
            lines.Paragraph("- ", $"{group.Name}: {string.Join(' ', group.Sentences)}");
        }

        BriefText.WriteSection(lines, BriefText.StandingLong, week.Standing);
        WriteMore(lines, week.StandingBeyond);
        BriefText.WriteSection(lines, BriefText.LessLegWork, week.Lost);
        WriteMore(lines, week.LostBeyond);
    }

    private static void WriteMore(TextLines lines, int count)
    {
        if (count > 0)
        {
            lines.Paragraph("- ", BriefText.More(count));
        }
    }

    private static string Join(params string?[] parts) => string.Join(' ', parts.OfType<string>());
}
