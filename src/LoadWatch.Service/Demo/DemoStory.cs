using LoadWatch.Findings;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Demo;

/// <summary>An alert that the story leads to, whatever the seed.</summary>
/// <param name="Region">For stimulus rules.</param>
public sealed record DemoAlert(string Person, string Rule, BodyRegion? Region, Severity Severity);

/// <summary>The storyline: known before the first number is drawn.</summary>
public static class DemoStory
{
    /// <summary>Every alert that stands on the last date under the shipped limits, by person; nobody else has one.</summary>
    public static IReadOnlyList<DemoAlert> Alerts { get; } =
        [.. DemoCast.All.Select(Alert).OfType<DemoAlert>().OrderBy(alert => alert.Person, StringComparer.Ordinal)];

    /// <summary>The same in words, with what leaves no alert, for a terminal.</summary>
    public static IReadOnlyList<string> Lines { get; } = [.. DemoCast.All.Select(Line).OfType<string>()];

    private static DemoAlert? Alert(DemoPart part) => part.Plot switch
    {
        DemoPlot.RampUp => new(part.Id, "load_ratio", null, Severity.Warning),
        DemoPlot.EasyOnly or DemoPlot.ArmsForWeeks => new(part.Id, "stimulus_gap", BodyRegion.Legs, Severity.Warning),
        DemoPlot.ArmsForDays => new(part.Id, "stimulus_gap", BodyRegion.Legs, Severity.Notice),
        DemoPlot.SilentNineDays or DemoPlot.SilentTwoWeeks => new(part.Id, "silence", null, Severity.Notice),
        _ => null,
    };

    private static string? Line(DemoPart part) => part.Plot switch
    {
        DemoPlot.RampUp => $"{part.Name} rows twice a day in the last week: more than twice the usual week.",
        DemoPlot.EasyOnly => $"{part.Name} has only rowed easily for more than two weeks: no heavy or fast work of the legs.",
        DemoPlot.ArmsForWeeks => $"{part.Name} has trained arms only for more than three weeks: no heavy leg work.",
        DemoPlot.ArmsForDays => $"{part.Name} has trained arms only for nearly two weeks.",
        DemoPlot.StrapFailed => $"{part.Name}'s strap gives no heart rate for three weeks: no load rather than a wrong one, and no alert.",
        DemoPlot.SilentNineDays => $"{part.Name} sends nothing for nine days, against nearly every day before.",
        DemoPlot.SilentTwoWeeks => $"{part.Name} sends nothing for two weeks, against three times a week before.",
        _ => null,
    };
}
