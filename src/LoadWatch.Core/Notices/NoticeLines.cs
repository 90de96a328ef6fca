using System.Globalization;
using NodaTime.Text;

namespace LoadWatch.Notices;

/// <summary>
/// A notice as lines of the notice file: one line for each thing said above the tables. Every line begins with date, contact and its place among the lines
/// (<c>2026-03-01 ada 1/3</c>); the first one goes on with the key, so that a notice which is already in the file is recognised, and a torn one too.
/// </summary>
public static class NoticeLines
{
    /// <summary>One line or more, without line ends, each free of control characters.</summary>
    public static IReadOnlyList<string> Of(Notice notice)
    {
        var said = Entries(notice.Text).ToList();
        var lines = new List<string> { Start(notice, 1, said.Count + 1) + KeyMark(notice) + OneLine.Of(notice.Subject) };
        lines.AddRange(said.Select((entry, place) => Start(notice, place + 2, said.Count + 1) + entry));
        return lines;
    }

    /// <summary>True when the lines hold the whole notice: its first line and every one that this line announces.</summary>
    public static bool Hold(IReadOnlyList<string> lines, Notice notice)
    {
        for (var at = 0; at < lines.Count; at++)
        {
            if (Announced(lines[at], notice) is { } count && Follow(lines, at, count, notice))
            {
                return true;
            }
        }

        return false;
    }

    private static bool Follow(IReadOnlyList<string> lines, int first, int count, Notice notice) =>
        count <= lines.Count - first
        && Enumerable.Range(2, count - 1).All(place => lines[first + place - 1].StartsWith(Start(notice, place, count), StringComparison.Ordinal));

    /// <summary>How many lines the notice has by its first line, or null for any other line.</summary>
    private static int? Announced(string line, Notice notice)
    {
        var head = Head(notice) + "1/";
        var end = line.IndexOf(" " + KeyMark(notice), StringComparison.Ordinal);
        return end > head.Length
            && line.StartsWith(head, StringComparison.Ordinal)
            && int.TryParse(line.AsSpan(head.Length, end - head.Length), NumberStyles.None, CultureInfo.InvariantCulture, out var count)
            && count > 0
                ? count
                : null;
    }

    private static string Start(Notice notice, int place, int count) =>
        string.Create(CultureInfo.InvariantCulture, $"{Head(notice)}{place}/{count} ");

    private static string KeyMark(Notice notice) => $"[{OneLine.Of(notice.Key)}] ";

    private static string Head(Notice notice) => $"{LocalDatePattern.Iso.Format(notice.Date)} {OneLine.Of(notice.ContactId)} ";

    /// <summary>The paragraphs of the text above its tables; a heading becomes the beginning of each entry under it.</summary>
    private static IEnumerable<string> Entries(string text)
    {
        var heading = "";
        foreach (var paragraph in Paragraphs(text).TakeWhile(IsSaid))
        {
            if (BriefText.Headings.Contains(paragraph, StringComparer.Ordinal))
            {
                heading = paragraph.ToLowerInvariant() + ": ";
            }
            else
            {
                var isItem = heading.Length > 0 && paragraph.StartsWith("- ", StringComparison.Ordinal);
                yield return heading + (isItem ? paragraph[2..] : paragraph);
            }
        }
    }

    private static bool IsSaid(string paragraph) =>
        !paragraph.StartsWith(BriefText.Everybody, StringComparison.Ordinal)
        && !paragraph.StartsWith(BriefText.HowToRead, StringComparison.Ordinal);

    /// <summary>A paragraph ends at an empty line, or where the next one begins with a dash or follows a heading.</summary>
    private static IEnumerable<string> Paragraphs(string text)
    {
        var open = "";
        foreach (var line in text.Split('\n').Append(""))
        {
            var begins = line.Trim().Length == 0 || line.StartsWith("- ", StringComparison.Ordinal);
            if (begins && open.Length > 0)
            {
                yield return open;
                open = "";
            }

            open = OneLine.Of($"{open} {line}");
        }
    }
}
