using System.Globalization;
using LoadWatch.Findings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Notices;

/// <summary>A brief as plain text that stands alone, and its subject.</summary>
public static class BriefText
{
    internal const string ToLookAt = "TO LOOK AT";
    internal const string NoLongerToLookAt = "NO LONGER TO LOOK AT";
    internal const string ReferenceValueChanged = "REFERENCE VALUE CHANGED";
    internal const string NeedsAnAnswer = "NEEDS AN ANSWER";
    internal const string Everybody = "EVERYBODY";
    internal const string TheWeek = "THE WEEK";
    internal const string ToCall = "TO CALL";
    internal const string Today = "TODAY";
    internal const string StandingLong = "STANDING FOR MORE THAN 14 DAYS";
    internal const string LessLegWork = "LESS HEAVY OR FAST LEG WORK";
    internal const string HowToRead = "HOW TO READ THIS";

    /// <summary>Headings above what is said before the tables.</summary>
    internal static readonly IReadOnlyList<string> Headings =
        [ToLookAt, Today, ToCall, TheWeek, StandingLong, LessLegWork, NoLongerToLookAt, ReferenceValueChanged, NeedsAnAnswer];

    private static readonly LocalDatePattern LongDate = LocalDatePattern.Create("dddd d MMMM uuuu", CultureInfo.InvariantCulture);

    /// <summary><c>Sunday 1 March 2026</c>, in every culture.</summary>
    public static string DateInWords(LocalDate date) => LongDate.Format(date);

    /// <summary>The subject of a mail: neither names nor values, since relays log it.</summary>
    public static string Subject(Brief brief)
    {
        var news = brief switch
        {
            { Flagged.Count: > 0 } => "something to look at",
            { Calls.Calls.Count: > 0 } => "somebody to call",
            { Questions.Count: > 0 } => "something needs an answer",
            { Sheets.Count: > 0 } => "who is planned today",
            { NothingIsKnown: true } => "nothing is known yet",
            { SomeAreUnknown: true } => "nothing to act on, some unknown",
            _ => "all quiet",
        };
        return $"Morning brief, {DateInWords(brief.Date)}: {news}";
    }

    /// <summary>The subject of the mail that tells of a changed list.</summary>
    public static string UpdateSubject(Brief brief) => $"Morning brief, {DateInWords(brief.Date)}: the list changed";

    /// <summary>Lines of at most 76 columns ended by line feeds, for a reader who sees nothing else.</summary>
    public static string Write(Brief brief)
    {
        var lines = new TextLines();
        lines.Paragraph("", $"Morning brief for {brief.ContactName}, {DateInWords(brief.Date)}");
        lines.Line(brief.DataUpTo is { } upTo ? $"Data up to {DateInWords(upTo)}" : "No data yet");
        lines.Blank();
        lines.Paragraph("", brief.FirstLine);
        WriteFlagged(lines, brief);
        FormText.WriteSheets(lines, brief.Sheets);
        FormText.WriteCalls(lines, brief.Calls);
        FormText.WriteWeek(lines, brief.Week);
        WriteSection(lines, NoLongerToLookAt, brief.Returned);
        WriteSection(lines, ReferenceValueChanged, brief.Changed);
        WriteSection(lines, NeedsAnAnswer, brief.Questions);
        BriefTextTable.Write(lines, brief.Groups);
        WriteFoot(lines);
        return lines.ToString();
    }

    private static void WriteFlagged(TextLines lines, Brief brief)
    {
        if (brief.Flagged.Count == 0)
        {
            return;
        }

        Heading(lines, ToLookAt);
        foreach (var person in brief.Flagged)
        {
            lines.Paragraph("- ", $"{person.Name} ({HeadOf(person)}): {person.Sentence}");
            if (person.Picture is { } picture)
            {
                lines.Paragraph("  ", picture.Words);
            }
        }

        if (brief.FlaggedBeyond > 0)
        {
            lines.Paragraph("- ", Beyond(brief.FlaggedBeyond));
        }
    }

    /// <summary><c>warning, new</c> or <c>notice, since 27 Feb</c>.</summary>
    public static string HeadOf(FlaggedPerson person) =>
        person.Since.Length == 0 ? SeverityWord(person.Severity) : $"{SeverityWord(person.Severity)}, {person.Since}";

    /// <summary>How the people beyond the named ones are told.</summary>
    public static string Beyond(int count) =>
        count == 1 ? "And 1 more to look at, marked in the table below." : $"And {count} more to look at, marked in the tables below.";

    /// <summary>How those are told whom a list has no room for.</summary>
    public static string More(int count) => $"And {count} more.";

    public static string SeverityWord(Severity severity) => severity switch
    {
        Severity.Warning => "warning",
        Severity.Notice => "notice",
        _ => "note",
    };

    internal static void WriteSection(TextLines lines, string heading, IReadOnlyList<BriefLine> items)
    {
        if (items.Count == 0)
        {
            return;
        }

        Heading(lines, heading);
        foreach (var item in items)
        {
            lines.Paragraph("- ", $"{item.Subject}: {item.Sentence}");
        }
    }

    private static void WriteFoot(TextLines lines)
    {
        Heading(lines, HowToRead);
        foreach (var note in ReadingNotes.Terms)
        {
            lines.Paragraph("- ", $"{note.Term}: {note.Meaning}");
        }

        Heading(lines, "PLEASE MIND");
        foreach (var caution in ReadingNotes.Cautions)
        {
            lines.Paragraph("- ", caution);
        }
    }

    internal static void Heading(TextLines lines, string heading)
    {
        lines.Blank();
        lines.Line(heading);
    }
}
