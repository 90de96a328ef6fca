using System.Text;

namespace LoadWatch.Notices;

/// <summary>Plain text of a limited width, built line by line.</summary>
internal sealed class TextLines
{
    /// <summary>Columns that a mail program shows without breaking lines itself.</summary>
    public const int Width = 76;

    private readonly StringBuilder text = new();

    public void Blank() => text.Append('\n');

    public void Line(string line) => text.Append(line.TrimEnd()).Append('\n');

    /// <summary>Breaks at spaces; the first line begins with <paramref name="first"/>, the following ones are indented as far. A longer word stays whole.</summary>
    public void Paragraph(string first, string words)
    {
        var line = new StringBuilder(first);
        var empty = true;
        foreach (var word in OneLine.Of(words).Split(' '))
        {
            if (!empty && line.Length + 1 + word.Length > Width)
            {
                Line(line.ToString());
                line.Clear().Append(' ', first.Length);
                empty = true;
            }

            line.Append(empty ? "" : " ").Append(word);
            empty = false;
        }

        Line(line.ToString());
    }

    public override string ToString() => text.ToString();
}
