using System.Globalization;
using System.Text;
using LoadWatch.People;

namespace LoadWatch.Notices;

/// <summary>
/// Puts initials where a text names somebody: whole words only, the longest match first. Names and ids are found in any case; in the names of files also
/// ids that are mere numbers or letters, single parts of names and names run together.
/// </summary>
internal sealed class NameCover
{
    /// <summary>Somebody whom the brief is not about.</summary>
    private const string Outsider = "somebody else";

    private const int PartLetters = 2;

    private readonly Dictionary<string, List<Covered>> byFirstWord;

    /// <param name="people">Everybody whose name may turn up.</param>
    /// <param name="labels">By id, what stands for the people of the brief.</param>
    public NameCover(IEnumerable<Person> people, IReadOnlyDictionary<string, string> labels) =>
        byFirstWord = people
            .SelectMany(person => Words(person, labels.GetValueOrDefault(person.Id)))
            .Where(word => word.Text.Length > 0)
            .GroupBy(word => word.Text, StringComparer.OrdinalIgnoreCase)
            .Select(Merge)
            .GroupBy(word => word.Text[..WordEnd(word.Text, 0)], StringComparer.OrdinalIgnoreCase)
            .ToDictionary(
                group => group.Key, group => group.OrderByDescending(word => word.Text.Length).ToList(), StringComparer.OrdinalIgnoreCase);

    private enum Kind
    {
        /// <summary>A name or an id.</summary>
        Whole,

        /// <summary>An id of digits or of one letter: in a sentence it cannot be told from what else is written so.</summary>
        Unclear,

        /// <summary>One word of a name: in a sentence it counts only as it is written.</summary>
        Part,
    }

    private enum Where
    {
        Sentence,
        Reason,
        File,
    }

    /// <summary>A sentence of our own, which may hold a whole name or an id.</summary>
    public string Sentence(string text) => Cover(text, Where.Sentence);

    /// <summary>A sentence that may quote what stood in a file: single parts of names count there, too.</summary>
    public string Reason(string text) => Cover(text, Where.Reason);

    /// <summary>The name of a file, or of somebody else who may be one of the people.</summary>
    public string File(string text) => Cover(text, Where.File);

    private static IEnumerable<Covered> Words(Person person, string? label)
    {
        var name = Composed(OneLine.Of(person.Name));
        var parts = Parts(name);
        yield return new(Trimmed(name), label ?? Outsider, Kind.Whole);
        yield return new(Trimmed(Composed(person.Id)), label ?? Outsider, IsUnclear(person.Id) ? Kind.Unclear : Kind.Whole);
        if (parts.Count > 1)
        {
            yield return new(string.Concat(parts), label ?? Outsider, Kind.Whole);
            yield return new(parts[^1] + parts[0], label ?? Outsider, Kind.Whole);
        }

        foreach (var part in parts.Where(part => part.Length >= PartLetters))
        {
            yield return new(part, Initials.Of(part), Kind.Part);
        }
    }

    private static bool IsUnclear(string id) => id.Length == 1 || id.All(char.IsDigit);

    /// <summary>Where one text stands for several people, the initials stand without the number.</summary>
    private static Covered Merge(IEnumerable<Covered> same)
    {
        var first = same.MinBy(word => word.Kind)!;
        var alike = same.Where(word => word.Kind == first.Kind).All(word => word.Cover == first.Cover);
        return alike ? first : first with { Cover = Initials.Of(first.Text) };
    }

    private string Cover(string text, Where where)
    {
        var from = Composed(OneLine.Of(text));
        var to = new StringBuilder(from.Length);
        var at = 0;
        while (at < from.Length)
        {
            if (BeginsWord(from, at) && Found(from, at, where) is { } found)
            {
                at += found.Text.Length;
                to.Append(at < from.Length ? Before(from[at], found.Cover) : found.Cover);
            }
            else
            {
                to.Append(from[at++]);
            }
        }

        return to.ToString();
    }

    /// <summary>No full stop is doubled, and no number grown.</summary>
    private static string Before(char next, string cover) => next switch
    {
        '.' => cover.TrimEnd('.'),
        _ when char.IsDigit(next) && char.IsDigit(cover[^1]) => cover + " ",
        _ => cover,
    };

    private Covered? Found(string text, int at, Where where) =>
        byFirstWord.GetValueOrDefault(text[at..WordEnd(text, at)])?.Find(word => Counts(word, text, at, where) && EndsWord(text, at + word.Text.Length));

    private static bool Counts(Covered word, string text, int at, Where where)
    {
        var counts = word.Kind switch
        {
            Kind.Whole => true,
            Kind.Unclear => where == Where.File,
            _ => where != Where.Sentence,
        };
        var comparison = word.Kind == Kind.Part && where != Where.File ? StringComparison.Ordinal : StringComparison.OrdinalIgnoreCase;
        return counts && string.Compare(text, at, word.Text, 0, word.Text.Length, comparison) == 0;
    }

    private static List<string> Parts(string name)
    {
        var parts = new List<string>();
        for (var at = 0; at < name.Length; at++)
        {
            if (BeginsWord(name, at))
            {
                parts.Add(name[at..WordEnd(name, at)]);
            }
        }

        return parts;
    }

    /// <summary>From its first to its last letter or digit.</summary>
    private static string Trimmed(string text)
    {
        var first = 0;
        while (first < text.Length && Class(text, first) == 0)
        {
            first++;
        }

        var end = text.Length;
        while (end > first && Class(text, end - 1) == 0)
        {
            end--;
        }

        return text[first..end];
    }

    private static bool BeginsWord(string text, int at) => Class(text, at) != 0 && (at == 0 || Class(text, at - 1) != Class(text, at));

    private static bool EndsWord(string text, int end) => end >= text.Length || Class(text, end) != Class(text, end - 1);

    private static int WordEnd(string text, int at)
    {
        var end = at + 1;
        while (!EndsWord(text, end))
        {
            end++;
        }

        return end;
    }

    /// <summary>1 for letters and their marks, 2 for digits, 0 for what parts words; both halves of a rare letter alike.</summary>
    private static int Class(string text, int at)
    {
        if (char.IsLowSurrogate(text[at]) && at > 0)
        {
            return Class(text, at - 1);
        }

        return char.GetUnicodeCategory(text, at) switch
        {
            UnicodeCategory.NonSpacingMark or UnicodeCategory.SpacingCombiningMark => 1,
            UnicodeCategory.DecimalDigitNumber => 2,
            _ => char.IsLetter(text, at) ? 1 : 0,
        };
    }

    /// <summary>File systems differ in how they write an accent.</summary>
    private static string Composed(string text) => text.Normalize(NormalizationForm.FormC);

    private sealed record Covered(string Text, string Cover, Kind Kind);
}
