using System.Text;
using System.Text.Json;

namespace LoadWatch.Service.Configuration;

/// <summary>The line of every key of a JSON text, by its path: <c>$.inboxes[0].path</c>.</summary>
public sealed class JsonPlaces
{
    private readonly Dictionary<string, long> lines = new(StringComparer.Ordinal);
    private readonly List<(string Path, string Key, long Line)> repeated = [];

    private JsonPlaces()
    {
    }

    /// <summary>Paths in the order of the text, each with its line from 1.</summary>
    public IEnumerable<KeyValuePair<string, long>> All => lines;

    /// <summary>Keys that stand a second time in the same object, each with the line where it comes again.</summary>
    public IReadOnlyList<(string Path, string Key, long Line)> Repeated => repeated;

    /// <exception cref="JsonException">The text is not JSON.</exception>
    public static JsonPlaces Of(byte[] utf8)
    {
        var places = new JsonPlaces();
        var reader = new Utf8JsonReader(utf8, ConfigurationJson.ReaderOptions);
        var lineStarts = LineStarts(utf8);
        reader.Read();
        places.Walk(ref reader, "$", lineStarts);
        return places;
    }

    /// <summary>The line of a path, or of its nearest outer path that has one.</summary>
    public long? LineOf(string path)
    {
        while (path.Length > 0)
        {
            if (lines.TryGetValue(path, out var line))
            {
                return line;
            }

            var cut = path.LastIndexOfAny(['.', '[']);
            path = cut < 0 ? "" : path[..cut];
        }

        return null;
    }

    private void Walk(ref Utf8JsonReader reader, string path, List<int> lineStarts)
    {
        lines.TryAdd(path, LineAt(lineStarts, reader.TokenStartIndex));
        switch (reader.TokenType)
        {
            case JsonTokenType.StartObject:
                while (reader.Read() && reader.TokenType == JsonTokenType.PropertyName)
                {
                    var key = reader.GetString()!;
                    var line = LineAt(lineStarts, reader.TokenStartIndex);
                    if (!lines.TryAdd($"{path}.{key}", line))
                    {
                        repeated.Add(($"{path}.{key}", key, line));
                    }

                    reader.Read();
                    Walk(ref reader, $"{path}.{key}", lineStarts);
                }

                break;
            case JsonTokenType.StartArray:
                for (var i = 0; reader.Read() && reader.TokenType != JsonTokenType.EndArray; i++)
                {
                    Walk(ref reader, $"{path}[{i}]", lineStarts);
                }

                break;
        }
    }

    private static List<int> LineStarts(byte[] utf8)
    {
        var starts = new List<int> { 0 };
        for (var i = 0; i < utf8.Length; i++)
        {
            if (utf8[i] == (byte)'\n')
            {
                starts.Add(i + 1);
            }
        }

        return starts;
    }

    private static long LineAt(List<int> starts, long offset)
    {
        var index = starts.BinarySearch((int)offset);
        return index >= 0 ? index + 1 : ~index;
    }
}
