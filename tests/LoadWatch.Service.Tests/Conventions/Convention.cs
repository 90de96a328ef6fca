using System.ComponentModel.DataAnnotations;
using System.Reflection;
using LoadWatch.Activities;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Tests.Conventions;

/// <summary>Checks that hold for the code as a whole. Each gives what breaks it, sorted; empty when nothing does.</summary>
internal static class Convention
{
    /// <summary>The ranges of event numbers: arrivals, recordings and activities, computation and days, findings and alerts, notices, the service.</summary>
    private static readonly int[] Thousands = [1, 2, 3, 4, 5, 9];

    private static readonly Type[] Numbers = [typeof(int), typeof(long), typeof(float), typeof(double), typeof(decimal)];

    /// <summary>References of an assembly whose names begin with none of the allowed beginnings.</summary>
    public static IReadOnlyList<string> ForeignReferences(Assembly assembly, params string[] allowed) =>
    [
        .. assembly.GetReferencedAssemblies().Select(reference => reference.Name!)
            .Where(name => !allowed.Any(start => name == start || name.StartsWith($"{start}.", StringComparison.Ordinal)))
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>References among the given assemblies, as <c>from -> to</c>.</summary>
    public static IReadOnlyList<string> MutualReferences(params Assembly[] assemblies)
    {
        var names = assemblies.Select(assembly => assembly.GetName().Name).ToHashSet();
        return
        [
            .. assemblies.SelectMany(from => from.GetReferencedAssemblies()
                    .Where(to => names.Contains(to.Name) && to.Name != from.GetName().Name)
                    .Select(to => $"{from.GetName().Name} -> {to.Name}"))
                .Order(StringComparer.Ordinal),
        ];
    }

    /// <summary>The log events of a catalogue, each with the method that carries it.</summary>
    public static IReadOnlyList<(string Method, LoggerMessageAttribute Event)> Events(Type catalogue) =>
    [
        .. catalogue.GetMethods(BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Static | BindingFlags.DeclaredOnly)
            .Select(method => (method.Name, method.GetCustomAttribute<LoggerMessageAttribute>()!))
            .Where(entry => entry.Item2 is not null),
    ];

    /// <summary>Event numbers that stand twice, lie outside the ranges, or whose event is not named as its method.</summary>
    public static IReadOnlyList<string> EventFaults(IReadOnlyList<(string Method, LoggerMessageAttribute Event)> events)
    {
        var twice = events.GroupBy(entry => entry.Event.EventId).Where(same => same.Count() > 1).Select(same => $"{same.Key} stands twice");
        var outside = events.Where(entry => !Thousands.Contains(entry.Event.EventId / 1000)).Select(entry => $"{entry.Event.EventId} is in no range");
        var misnamed = events.Where(entry => entry.Event.EventName != entry.Method).Select(entry => $"{entry.Event.EventId} is not named {entry.Method}");
        return [.. twice, .. outside, .. misnamed];
    }

    /// <summary>One line an event: number, level, name, text.</summary>
    public static string EventList(IReadOnlyList<(string Method, LoggerMessageAttribute Event)> events) => string.Concat(events
        .OrderBy(entry => entry.Event.EventId)
        .Select(entry => $"{entry.Event.EventId} {entry.Event.Level} {entry.Event.EventName}: {entry.Event.Message}\n"));

    /// <summary>Number properties of an options type and of the options inside it that have no range, as <c>Type.Property</c>.</summary>
    public static IReadOnlyList<string> NumbersWithoutRange(Type options) =>
    [
        .. Inside(options, []).SelectMany(type => type.GetProperties(BindingFlags.Public | BindingFlags.Instance))
            .Where(property => IsNumeric(property.PropertyType) && property.GetCustomAttribute<RangeAttribute>() is null && property.GetCustomAttribute<NumbersAttribute>() is null)
            .Select(property => $"{property.DeclaringType!.Name}.{property.Name}")
            .Order(StringComparer.Ordinal),
    ];

    private static bool IsNumeric(Type type) => Numbers.Contains(Bare(type)) || type.GetGenericArguments().Any(IsNumeric);

    private static HashSet<Type> Inside(Type type, HashSet<Type> known)
    {
        if (IsOurs(type) && known.Add(type))
        {
            foreach (var property in type.GetProperties(BindingFlags.Public | BindingFlags.Instance))
            {
                foreach (var inner in property.PropertyType.GetGenericArguments().Append(Bare(property.PropertyType)))
                {
                    Inside(inner, known);
                }
            }
        }

        return known;
    }

    private static Type Bare(Type type) => Nullable.GetUnderlyingType(type) ?? type;

    private static bool IsOurs(Type type) => type.IsClass && type.Namespace is { } space && space.StartsWith("LoadWatch", StringComparison.Ordinal);
}
