namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Keeps one copy of each short text: a long table names the same people and machines over and over.</summary>
internal sealed class TextPool
{
    private const int TextsAtMost = 100_000;
    private const int CharactersAtMost = 100;

    private readonly HashSet<string> texts = new(StringComparer.Ordinal);

    public string Same(string text)
    {
        if (texts.TryGetValue(text, out var known))
        {
            return known;
        }

        if (text.Length <= CharactersAtMost && texts.Count < TextsAtMost)
        {
            texts.Add(text);
        }

        return text;
    }
}
