using System.Text.Json.Serialization;
using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>What later dates need of a session: kept with its day, so that look-backs join and compute nothing again.</summary>
/// <param name="Key">Key of the activity.</param>
/// <param name="Sport">As <see cref="Recordings.Sport"/> writes itself.</param>
/// <param name="Load">The load that it counts with, of the group's kind; null where unknown.</param>
/// <param name="Quantities">Those that rules and conversions look back at, by name.</param>
/// <param name="UsableShare">Of heart rate and power, where not all was usable.</param>
/// <param name="AddsLoad">See <see cref="JoinedActivity.AddsLoad"/>.</param>
public sealed record DaySession(
    string Key, string Sport, double? Load, IReadOnlyDictionary<string, double> Quantities, IReadOnlyDictionary<Channel, double> UsableShare, bool AddsLoad)
{
    /// <summary>Name of the quantity that its load was converted from; null where it has the group's load itself.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public string? ConvertedFrom { get; init; }

    /// <summary>Standard error of a converted load, in the unit of the group's load; null where it was not converted by a line.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? LoadError { get; init; }

    /// <param name="names">Quantities that the person's group looks at: its load, what stands in for it, what its limits name.</param>
    public static DaySession Of(JoinedActivity activity, double? load, IReadOnlySet<string> names) => new(
        activity.Key,
        activity.Sport.ToString(),
        load,
        new SortedDictionary<string, double>(
            activity.Quantities.Where(quantity => names.Contains(quantity.Name) || IsOfRules(quantity.Name)).ToDictionary(quantity => quantity.Name, quantity => quantity.Value),
            StringComparer.Ordinal),
        new SortedDictionary<Channel, double>(
            activity.UsableShare.Where(share => share.Key is Channel.HeartRate or Channel.Power && share.Value < 1).ToDictionary()),
        activity.AddsLoad);

    /// <summary>The session again, as far as it is kept: sources, stimulus and remarks are not.</summary>
    public JoinedActivity On(LocalDate date) => new()
    {
        Key = Key,
        Date = date,
        Sport = Recordings.Sport.Parse(Sport),
        Sources = [],
        Quantities = [.. Quantities.Select(quantity => new Quantity(quantity.Key, quantity.Value, Unit(quantity.Key), Estimated: false))],
        UsableShare = UsableShare,
        AddsLoad = AddsLoad,
    };

    private static bool IsOfRules(string quantity) =>
        quantity is QuantityNames.Distance or QuantityNames.SpeedTop or QuantityNames.PowerTop
        || quantity.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal);

    private static string Unit(string quantity) => quantity switch
    {
        QuantityNames.SpeedTop => "m/s",
        QuantityNames.PowerTop => "W",
        _ when quantity.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal) => "kg",
        _ => LoadUnits.Of(quantity),
    };
}
