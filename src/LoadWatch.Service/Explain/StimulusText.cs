using System.Globalization;
using System.Text;
using LoadWatch.Activities;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Explain;

/// <summary>What a session asked of each region, and how that was read: by channel formula, source and what lies between.</summary>
/// <param name="activity">Its sets are those of tables; where it has none, those of the recordings count.</param>
/// <param name="archived">What its recordings say once more; null without any, or where they cannot be read.</param>
/// <param name="isUnreadable">Whether a recording cannot be read any more.</param>
internal sealed class StimulusText(JoinedActivity activity, SessionStimulus? archived, bool isUnreadable, EquationChoices equations, int? age)
{
    private readonly List<string> channels = [.. activity.Stimulus.Select(region => region.Channel).Distinct(StringComparer.Ordinal)];

    private readonly IReadOnlyList<ReadSet> all = activity.Sets.Count > 0 ? activity.Sets : archived?.Sets ?? [];

    /// <summary>The exercises of its sets, in canonical form; empty where they are not known.</summary>
    public IReadOnlyCollection<string> Exercises => [.. all.Select(set => set.Exercise).OfType<string>().Distinct(StringComparer.Ordinal)];

    /// <summary>Those that tell of a region which sets speak for.</summary>
    private List<ReadSet> Sets =>
        [.. all.Where(set => activity.Stimulus.Any(region => region.Channel == StimulusChannels.Sets && set.Regions.Contains(region.Region)))];

    private IEnumerable<SetRule> Rules => Sets.Select(set => set.Demand?.Rule).OfType<SetRule>().Distinct().Order();

    public void Append(StringBuilder text)
    {
        SessionText.AppendStimulus(text, activity, withNotSeen: false);
        foreach (var line in channels.SelectMany(OfChannel))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"        {line}");
        }

        if (isUnreadable && channels.Exists(channel => channel is not (StimulusChannels.None or StimulusChannels.Declared)))
        {
            text.AppendLine("        what lies between is not shown: an original in the archive is missing or damaged");
        }

        if (activity.Stimulus.Any(region => region.SeesHardWork))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"        {StimulusFormula.HeavyOrFast}");
        }
    }

    /// <summary>What no measurement stands behind.</summary>
    public IEnumerable<string> Assumptions() =>
        channels.SelectMany(channel => StimulusFormula.Assumptions(channel, age, archived?.Endurance, [.. Rules])).Distinct(StringComparer.Ordinal);

    private IEnumerable<string> OfChannel(string channel) => channel switch
    {
        StimulusChannels.Sets when Sets.Count > 0 => [.. Rules.SelectMany(rule => OfFormula(StimulusFormula.Of(rule, equations))), .. OfSets()],
        StimulusChannels.Power or StimulusChannels.Speed => [.. OfFormula(StimulusFormula.Of(channel)), .. OfEndurance(), .. OfFill()],
        StimulusChannels.HeartRate => [.. OfFormula(StimulusFormula.Of(channel)), .. OfHeartRate()],
        _ => OfFormula(StimulusFormula.Of(channel)),
    };

    private static IEnumerable<string> OfFormula(StimulusFormula? way) => way is null ? [] : [$"formula  {way.Formula}", $"source   {way.Source}"];

    private IEnumerable<string> OfSets() => SetText.Lines(Sets, Variants.Of(age)).SelectMany(lines => new[] { lines.Done, $"    {lines.Read}" });

    private IEnumerable<string> OfEndurance() => archived?.Endurance is { } steps ? EnduranceText.Lines(steps) : [];

    private IEnumerable<string> OfHeartRate() => archived?.HeartRate is { } drive ? EnduranceText.Lines(drive) : [];

    /// <summary>Where heart rate tells of moments that the better channel left.</summary>
    private IEnumerable<string> OfFill() => OfHeartRate().Select(line => $"heart rate where it tells alone: {line}");
}
