using System.Collections.Concurrent;
using System.Reflection;
using System.Xml;
using System.Xml.Linq;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads the summaries of properties from the documentation files that lie beside the program.</summary>
public static class Documentation
{
    private static readonly ConcurrentDictionary<string, IReadOnlyDictionary<string, string>> Known = new(StringComparer.Ordinal);

    /// <summary>The summary in one line of plain text; null where there is none or the file is missing.</summary>
    public static string? Summary(PropertyInfo property) =>
        Known.GetOrAdd(property.DeclaringType!.Assembly.GetName().Name!, Read).GetValueOrDefault($"P:{property.DeclaringType.FullName}.{property.Name}");

    private static Dictionary<string, string> Read(string assembly)
    {
        var path = Path.Combine(AppContext.BaseDirectory, $"{assembly}.xml");
        try
        {
            return XDocument.Load(path).Descendants("member")
                .Where(member => member.Element("summary") is not null)
                .ToDictionary(member => member.Attribute("name")!.Value, member => Plain(member.Element("summary")!), StringComparer.Ordinal);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or XmlException)
        {
            return [];
        }
    }

    private static string Plain(XElement summary)
    {
        var words = string.Concat(summary.DescendantNodes().Select(Text)).Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries);
        return string.Join(' ', words);
    }

    private static string Text(XNode node) => node switch
    {
        XText text => text.Value,
        XElement { Name.LocalName: "see" } see when see.Attribute("cref") is { } target => Key(target.Value),
        _ => "",
    };

    /// <summary>A property named in a summary is a key of the file.</summary>
    private static string Key(string target) =>
        System.Text.Json.JsonNamingPolicy.SnakeCaseLower.ConvertName(target[(target.LastIndexOf('.') + 1)..]);
}
