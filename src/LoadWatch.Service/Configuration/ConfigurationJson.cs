using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;

namespace LoadWatch.Service.Configuration;

/// <summary>How <c>loadwatch.json</c> is read: snake_case keys, comments and trailing commas allowed, unknown keys never dropped silently.</summary>
public static class ConfigurationJson
{
    public static JsonSerializerOptions Options { get; } = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        DictionaryKeyPolicy = null,
        ReadCommentHandling = JsonCommentHandling.Skip,
        AllowTrailingCommas = true,
        UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow,
        RespectNullableAnnotations = true,
        TypeInfoResolver = new DefaultJsonTypeInfoResolver(),
        WriteIndented = true,
        Converters = { new JsonStringEnumConverter(JsonNamingPolicy.SnakeCaseLower, allowIntegerValues: false) },
    };

    public static JsonReaderOptions ReaderOptions { get; } = new() { CommentHandling = JsonCommentHandling.Skip, AllowTrailingCommas = true };

    public static JsonDocumentOptions DocumentOptions { get; } = new() { CommentHandling = JsonCommentHandling.Skip, AllowTrailingCommas = true };
}
