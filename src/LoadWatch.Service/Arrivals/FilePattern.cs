using System.Text.RegularExpressions;
using LoadWatch.People;

namespace LoadWatch.Service.Arrivals;

/// <summary>Whose a file is by its name: <c>{person}_*</c> finds <c>anna</c> in <c>anna_2026-03-02.fit</c>. <c>*</c> is any text, <c>?</c> any one character.</summary>
public sealed class FilePattern
{
    private const string Slot = "{person}";
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(1);

    private readonly Regex before;
    private readonly Regex after;

    private FilePattern(string text, string before, string after)
    {
        Text = text;
        this.before = Glob(before);
        this.after = Glob(after);
    }

    /// <summary>As it was written.</summary>
    public string Text { get; }

    /// <summary>Null where the text does not hold <c>{person}</c> exactly once, or holds a folder.</summary>
    public static FilePattern? Parse(string text) =>
        text.Split(Slot) is [var before, var after] && !text.Contains('/', StringComparison.Ordinal) && !text.Contains('\\', StringComparison.Ordinal)
            ? new FilePattern(text, before, after)
            : null;

    /// <summary>
    /// The person of the roster named where the pattern says, by id, name or alias; of several readings the longest word. The name counts with and without
    /// its endings. Null where it fits nowhere or nobody is meant.
    /// </summary>
    /// <param name="name">Without folders.</param>
    public Person? Find(string name, Subjects subjects) =>
        WithoutEndings(name).Select(shown => FindWhole(shown, subjects)).FirstOrDefault(person => person is not null);

    private Person? FindWhole(string name, Subjects subjects)
    {
        var starts = Enumerable.Range(0, name.Length).Where(start => before.IsMatch(name[..start])).ToList();
        var ends = Enumerable.Range(1, name.Length).Where(end => after.IsMatch(name[end..])).ToList();
        return starts.SelectMany(start => ends.Where(end => end > start).Select(end => name[start..end]))
            .OrderByDescending(word => word.Length)
            .Select(subjects.Find)
            .FirstOrDefault(person => person is not null);
    }

    private static IEnumerable<string> WithoutEndings(string name)
    {
        yield return name;
        for (var dot = name.LastIndexOf('.'); dot > 0; dot = name.LastIndexOf('.', dot - 1))
        {
            yield return name[..dot];
        }
    }

    private static Regex Glob(string text)
    {
        var body = Regex.Escape(text).Replace("\\*", ".*", StringComparison.Ordinal).Replace("\\?", ".", StringComparison.Ordinal);
        return new Regex($"^{body}\\z", RegexOptions.IgnoreCase | RegexOptions.CultureInvariant | RegexOptions.Singleline | RegexOptions.NonBacktracking, Patience);
    }
}
