using System.Globalization;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>What a draft says beside the layout.</summary>
internal sealed class DraftNotes
{
    private const int ShownCharacters = 60;

    public List<string> Found { get; } = [];

    public List<string> Doubts { get; } = [];

    public void Doubt(string key, string question) => Doubts.Add($"{key}: {question}");

    /// <summary>A text of the file in a sentence: in quotes, on one line, cut to a readable length.</summary>
    public static string Quoted(string text)
    {
        var shown = OneLine.Of(text);
        return shown.Length <= ShownCharacters ? $"'{shown}'" : $"'{OneLine.Of(shown[..ShownCharacters])}...'";
    }

    public static string Quoted(IEnumerable<string> texts) => string.Join(", ", texts.Select(Quoted));

    public static string Number(double value) => value.ToString("0.###", CultureInfo.InvariantCulture);
}
