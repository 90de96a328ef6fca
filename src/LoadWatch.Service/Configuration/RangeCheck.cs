using System.Collections;
using System.ComponentModel.DataAnnotations;
using System.Reflection;
using System.Text.Json;
using System.Text.Json.Serialization;
using LoadWatch.Activities;

namespace LoadWatch.Service.Configuration;

/// <summary>Checks the ranges written on the properties of the configuration, with the path of each fault.</summary>
public static class RangeCheck
{
    /// <summary>Pairs of path (<c>$.limits.load_ratio.raise</c>) and reason.</summary>
    public static IEnumerable<(string Path, string Reason)> Faults(object value, string path = "$")
    {
        foreach (var property in value.GetType().GetProperties(BindingFlags.Public | BindingFlags.Instance))
        {
            if (property.GetIndexParameters().Length > 0 || property.GetValue(value) is not { } inner)
            {
                continue;
            }

            var name = $"{path}.{KeyOf(property)}";
            foreach (var rule in property.GetCustomAttributes<ValidationAttribute>().Where(rule => !rule.IsValid(inner)))
            {
                yield return (name, Reason(rule, inner));
            }

            foreach (var fault in Inner(inner, name))
            {
                yield return fault;
            }
        }
    }

    private static string KeyOf(PropertyInfo property) =>
        property.GetCustomAttribute<JsonPropertyNameAttribute>()?.Name ?? JsonNamingPolicy.SnakeCaseLower.ConvertName(property.Name);

    private static IEnumerable<(string Path, string Reason)> Inner(object inner, string path) => inner switch
    {
        string => [],
        IDictionary entries => entries.Keys.Cast<object>().SelectMany(key => entries[key] is { } entry && IsOurs(entry) ? Faults(entry, $"{path}.{key}") : []),
        IEnumerable list => list.Cast<object>().SelectMany((item, i) => IsOurs(item) ? Faults(item, $"{path}[{i}]") : []),
        _ => IsOurs(inner) ? Faults(inner, path) : [],
    };

    private static bool IsOurs(object value) =>
        value.GetType() is { IsClass: true, Namespace: { } space } && space.StartsWith("LoadWatch", StringComparison.Ordinal);

    private static string Reason(ValidationAttribute rule, object value) => rule switch
    {
        RangeAttribute range => FormattableString.Invariant($"{value} is outside {range.Minimum} to {range.Maximum}"),
        NumbersAttribute numbers => numbers.Wanted,
        RequiredAttribute => "may not be blank",
        _ => FormattableString.Invariant($"\"{value}\" {rule.ErrorMessage}"),
    };
}
