using NodaTime;

namespace LoadWatch.Notices;

/// <summary>The groups as columns of text.</summary>
internal static class BriefTextTable
{
    private const int NameColumns = 26;

    public static void Write(TextLines lines, IReadOnlyList<BriefGroup> groups)
    {
        if (groups.Count == 0)
        {
            return;
        }

        lines.Blank();
        lines.Line(BriefText.Everybody);
        lines.Paragraph("", "* to look at. ? unknown. + so far, of the known days. Known: days of the last 7. Legs: days since the last heavy-or-fast leg day.");
        foreach (var group in groups)
        {
            lines.Blank();
            lines.Paragraph("", $"{OneLine.Of(group.Name)}, load in {OneLine.Of(group.LoadUnit)}");
            lines.Line(Columns(' ', "Name", "Week", "Usual", "Times", "Known", "Legs", "Last"));
            foreach (var row in group.Rows)
            {
                WriteRow(lines, row);
            }

            foreach (var line in group.NotWatched)
            {
                lines.Paragraph("  ", OneLine.Sentence(line));
            }
        }
    }

    private static void WriteRow(TextLines lines, BriefRow row)
    {
        lines.Line(Columns(
            row.Flagged ? '*' : ' ',
            Cut(OneLine.Of(row.Name)),
            BriefNumbers.SoFar(row),
            BriefNumbers.Load(row.UsualWeekLoad),
            BriefNumbers.Ratio(row.Ratio),
            BriefNumbers.Count(row.KnownDays),
            BriefNumbers.Count(row.DaysSinceHeavyLegs),
            BriefNumbers.Day(row.LastRecorded)));
        if (row.Remark is { } remark)
        {
            lines.Paragraph("    ", OneLine.Sentence(remark));
        }
    }

    private static string Columns(char mark, string name, string week, string usual, string times, string known, string legs, string last) =>
        $"{mark} {name.PadRight(NameColumns)}{week,8}{usual,8}{times,7}{known,7}{legs,6}{last,9}";

    /// <summary>A longer name ends in an ellipsis; the people to look at are named in full above.</summary>
    private static string Cut(string name) => name.Length <= NameColumns ? name : name[..Whole(name, NameColumns - 1)] + "\u2026";

    private static int Whole(string text, int length) => char.IsHighSurrogate(text[length - 1]) ? length - 1 : length;
}
