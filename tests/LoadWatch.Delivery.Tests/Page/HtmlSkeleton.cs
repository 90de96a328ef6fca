using System.Text.RegularExpressions;

namespace LoadWatch.Delivery.Tests.Page;

/// <summary>A strict reader of our own pages: tags with every attribute, in order. What a browser would have to guess at is refused.</summary>
internal static partial class HtmlSkeleton
{
    /// <exception cref="FormatException">Something is neither text, a character reference, nor a whole tag.</exception>
    public static IReadOnlyList<string> Of(string page)
    {
        var tags = new List<string>();
        for (var at = 0; at < page.Length;)
        {
            at = page[at] switch
            {
                '<' => ReadTag(page, at, tags),
                '&' when Reference().Match(page, at) is { Success: true } reference => at + reference.Length,
                '&' or '>' => throw new FormatException($"bare {page[at]} at {at}: {page.Substring(at, Math.Min(40, page.Length - at))}"),
                _ => at + 1,
            };
        }

        return tags;
    }

    private static int ReadTag(string page, int at, List<string> tags)
    {
        var tag = Tag().Match(page, at);
        if (!tag.Success)
        {
            throw new FormatException($"no tag at {at}: {page.Substring(at, Math.Min(40, page.Length - at))}");
        }

        tags.Add(Words().Replace(tag.Value, "$1"));

        // The style is ours and holds no value; it is read as it stands.
        return tag.Value == "<style>" ? page.IndexOf("</style>", at, StringComparison.Ordinal) : at + tag.Length;
    }

    [GeneratedRegex("\\G(<!DOCTYPE html>|</?[a-z][a-z0-9]*(\\s[a-zA-Z-]+=\"[^\"<>]*\")*\\s?/?>)")]
    private static partial Regex Tag();

    [GeneratedRegex("\\G&(#[0-9]{1,7}|#x[0-9A-F]{1,6}|[a-z]{2,6});")]
    private static partial Regex Reference();

    /// <summary>The words for who hears the page; they name the unit.</summary>
    [GeneratedRegex("(aria-label|alt)=\"[^\"]*\"")]
    private static partial Regex Words();
}
