using LoadWatch.Findings;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Demo;

/// <summary>An alert that the story leads to, whatever the seed.</summary>
/// <param name="Region">For stimulus rules.</param>
public sealed record DemoAlert(string Person, string Rule, BodyRegion? Region, Severity Severity);

/// <summary>The storyline: known before the first number is drawn.</summary>
public static class DemoStory
{
    /// <summary>Every alert that stands on the last date under the shipped limits, by person and rule; beside them only <see cref="Possible"/> ones do.</summary>
    public static IReadOnlyList<DemoAlert> Alerts { get; } =
    [
        .. DemoCast.All.SelectMany(Alert).OrderBy(alert => alert.Person, StringComparer.Ordinal).ThenBy(alert => alert.Rule, StringComparer.Ordinal),
    ];

    /// <summary>
    /// Alerts that may stand beside them, as the numbers drawn fall: the week of the row across the lake may be far above the last one, and above the usual.
    /// </summary>
    public static IReadOnlyList<DemoAlert> Possible { get; } =
        [.. DemoCast.All.Where(part => part.Plot == DemoPlot.LongRow).Select(part => new DemoAlert(part.Id, "weekly_jump", null, Severity.Notice))];

    /// <summary>The same in words, with what leaves no alert, for a terminal.</summary>
    public static IReadOnlyList<string> Lines { get; } = [.. DemoCast.All.Select(Line).OfType<string>()];

    private static IEnumerable<DemoAlert> Alert(DemoPart part) => part.Plot switch
    {
        DemoPlot.RampUp =>
        [
            new(part.Id, "load_ratio", null, Severity.Warning),
            new(part.Id, "weekly_jump", null, Severity.Notice),
            new(part.Id, "hard_days", null, Severity.Notice),
            new(part.Id, "monotony", null, Severity.Notice),
        ],
        DemoPlot.EasyOnly or DemoPlot.ArmsForWeeks => [new(part.Id, "stimulus_gap", BodyRegion.Legs, Severity.Warning)],
        DemoPlot.ArmsForDays => [new(part.Id, "stimulus_gap", BodyRegion.Legs, Severity.Notice)],
        DemoPlot.StrapFailed => [new(part.Id, "not_usable", null, Severity.Notice)],
        DemoPlot.LongRow => [new(part.Id, "session_spike", null, Severity.Warning)],
        DemoPlot.SilentThirteenDays or DemoPlot.SilentTwoWeeks => [new(part.Id, "silence", null, Severity.Notice)],
        DemoPlot.WeakGrip => [new(part.Id, "function_test", null, Severity.Notice)],
        _ => [],
    };

    private static string? Line(DemoPart part) => part.Plot switch
    {
        DemoPlot.RampUp => $"{part.Name} rows twice a day in the last week: more than twice the usual week, and every day as hard as the next.",
        DemoPlot.EasyOnly => $"{part.Name} has rowed easily and left out the gym for more than two weeks: no heavy or fast work of the legs. The coach has seen it.",
        DemoPlot.ArmsForWeeks => $"{part.Name} has trained arms only for more than three weeks: no heavy leg work.",
        DemoPlot.ArmsForDays => $"{part.Name} has trained arms only for about two weeks: no heavy leg work, told as a notice.",
        DemoPlot.StrapFailed => $"{part.Name}'s strap gives no heart rate for three weeks: no load rather than a wrong one, and a word about the strap.",
        DemoPlot.LongRow => $"{part.Name} has rowed across the lake, more than twice as long as any row of the last weeks, with planned days off before and after: a word about that session.",
        DemoPlot.SilentThirteenDays => $"{part.Name} sends nothing for thirteen days: three of the squad's planned rows without a recording.",
        DemoPlot.SilentTwoWeeks => $"{part.Name} is on holiday, and nobody was told: four classes of the plan missed.",
        DemoPlot.AwayAsTold => $"{part.Name} is away too, as staff were told: no alert.",
        DemoPlot.Ill => $"{part.Name} was ill for a week and is back with shorter sessions; the coach's page counts the days since the return and says nothing of the illness.",
        DemoPlot.WeakGrip => $"{part.Name}'s grip strength fell below the published cut-off: told to the clinician alone.",
        _ => null,
    };
}
