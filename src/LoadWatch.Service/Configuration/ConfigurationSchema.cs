using System.ComponentModel.DataAnnotations;
using System.Reflection;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Text.Json.Schema;
using LoadWatch.Findings;

namespace LoadWatch.Service.Configuration;

/// <summary>Writes the JSON schema of <c>loadwatch.json</c>, from which editors complete keys and show what they mean.</summary>
public static class ConfigurationSchema
{
    private static readonly JsonSchemaExporterOptions Exporter = new() { TreatNullObliviousAsNonNullable = true, TransformSchemaNode = Complete };

    private static readonly JsonSerializerOptions Writing = new()
    {
        WriteIndented = true,
        NewLine = "\n",
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>The schema with types, words, ranges, defaults and, where the documentation lies beside the program, descriptions. Ends with a line break.</summary>
    public static string Write()
    {
        var schema = ConfigurationJson.Options.GetJsonSchemaAsNode(typeof(LoadWatchFile), Exporter).AsObject();
        WriteOutLimits(schema["properties"]!["limits"]!.AsObject());
        schema.Insert(0, "$schema", "https://json-schema.org/draft/2020-12/schema");
        schema.Insert(1, "title", "loadwatch.json");
        return schema.ToJsonString(Writing) + "\n";
    }

    /// <summary>The exporter points from the common limits to those of a group, which have no defaults.</summary>
    private static void WriteOutLimits(JsonObject limits)
    {
        var whole = ConfigurationJson.Options.GetJsonSchemaAsNode(typeof(RuleLimits), Exporter);
        limits["properties"] = whole["properties"]!.DeepClone();
    }

    private static JsonNode Complete(JsonSchemaExporterContext context, JsonNode node)
    {
        if (node is not JsonObject schema)
        {
            return node;
        }

        if (context.TypeInfo.Type.IsEnum)
        {
            schema["enum"] = new JsonArray([.. ValueCheck.WordsOf(context.TypeInfo.Type).Select(word => (JsonNode)word)]);
        }

        if (context.PropertyInfo is { AttributeProvider: PropertyInfo property })
        {
            AddRules(schema, property);
            if (!IsOfGroup(context.Path))
            {
                AddDefault(schema, property);
            }

            if (Documentation.Summary(property) is { } summary)
            {
                schema.Insert(0, "description", summary);
            }
        }

        return schema;
    }

    /// <summary>What the limits of a group or a person leave out is taken from wider ones, not from a default.</summary>
    private static bool IsOfGroup(ReadOnlySpan<string> path) => (path.Contains("groups") || path.Contains("people")) && path.Contains("limits");

    private static void AddRules(JsonObject schema, PropertyInfo property)
    {
        if (property.GetCustomAttribute<RangeAttribute>() is { } range)
        {
            schema["minimum"] = JsonSerializer.SerializeToNode(range.Minimum);
            schema["maximum"] = JsonSerializer.SerializeToNode(range.Maximum);
        }

        if (property.IsDefined(typeof(RequiredAttribute)))
        {
            schema["minLength"] = 1;
        }

        if (property.GetCustomAttribute<RegularExpressionAttribute>() is { } rule)
        {
            schema["pattern"] = rule.Pattern;
        }
    }

    /// <summary>Objects and lists of objects say their defaults key by key.</summary>
    private static void AddDefault(JsonObject schema, PropertyInfo property)
    {
        var value = JsonSerializer.SerializeToNode(
            property.GetValue(Activator.CreateInstance(property.DeclaringType!)), property.PropertyType, ConfigurationJson.Options);
        if (value is JsonValue || (value is JsonArray list && list.All(item => item is JsonValue)))
        {
            schema["default"] = value;
        }
    }
}
