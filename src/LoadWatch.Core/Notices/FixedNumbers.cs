using LoadWatch.Alerts;

namespace LoadWatch.Notices;

/// <summary>Numbers by which alerts become briefs and that no limit holds, a sentence each. All a choice.</summary>
public static class FixedNumbers
{
    public static IReadOnlyList<string> All { get; } =
    [
        $"Silence is told once for a group where {CommonSilence.Fewest} people and half of the group are silent, their last recordings within {CommonSilence.WithinDays} days.",
        $"An alert that has stood for more than {StaleAlerts.Days} days is listed by the week's brief; where nobody has said that it was seen, it is asked about once a week.",
        $"A brief names {BriefBuilder.RowsAtMost} people to act on at most, the gravest reasons first, and counts the rest.",
    ];
}
