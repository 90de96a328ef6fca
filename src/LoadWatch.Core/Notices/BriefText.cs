using System.Globalization;
using LoadWatch.Findings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Notices;

/// <summary>A brief as plain text that stands alone, and its subject.</summary>
public static class BriefText
{
    internal const string ToLookAt = "TO LOOK AT";
    internal const string BackToUsual = "BACK TO USUAL";
    internal const string ReferenceValueChanged = "REFERENCE VALUE CHANGED";
    internal const string NeedsAnAnswer = "NEEDS AN ANSWER";
    internal const string Everybody = "EVERYBODY";
    internal const string HowToRead = "HOW TO READ THIS";

    private static readonly LocalDatePattern LongDate = LocalDatePattern.Create("dddd d MMMM uuuu", CultureInfo.InvariantCulture);

    /// <summary><c>Sunday 1 March 2026</c>, in every culture.</summary>
    public static string DateInWords(LocalDate date) => LongDate.Format(date);

    /// <summary>The subject of a mail: neither names nor values, since relays log it.</summary>
    public static string Subject(Brief brief)
    {
        var news = (brief.Flagged.Count > 0, brief.Questions.Count > 0) switch
        {
            (true, _) => "something to look at",
            (_, true) => "something needs an answer",
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
        WriteSection(lines, BackToUsual, brief.Returned);
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
            lines.Paragraph("- ", $"{person.Name} ({SeverityWord(person.Severity)})");
            foreach (var reason in person.Reasons)
            {
                lines.Paragraph("  ", reason.Sentence + Mark(reason));
                lines.Paragraph("  ", $"Consider: {reason.Consider}");
            }

            lines.Paragraph("  ", $"Decides: {WhoDecides(person)}.");
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

    /// <summary>Everybody named as deciding over one of the person's reasons, once.</summary>
    public static string WhoDecides(FlaggedPerson person) =>
        string.Join("; ", person.Reasons.Select(reason => reason.Decides).Distinct(StringComparer.Ordinal));

    /// <summary>How the people beyond the named ones are told.</summary>
    public static string Beyond(int count) =>
        count == 1 ? "And 1 more to look at, marked in the table below." : $"And {count} more to look at, marked in the tables below.";

    public static string SeverityWord(Severity severity) => severity switch
    {
        Severity.Warning => "warning",
        Severity.Notice => "notice",
        _ => "note",
    };

    private static string Mark(FlaggedReason reason) => (reason.IsNew, reason.IsSeen) switch
    {
        (true, _) => " (new)",
        (_, true) => " (seen)",
        _ => "",
    };

    private static void WriteSection(TextLines lines, string heading, IReadOnlyList<BriefLine> items)
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

    private static void Heading(TextLines lines, string heading)
    {
        lines.Blank();
        lines.Line(heading);
    }
}
