using LoadWatch.Alerts;

namespace LoadWatch.Notices;

/// <summary>Numbers by which alerts become briefs and that no limit holds, a sentence each. All a choice.</summary>
public static class FixedNumbers
{
    public static IReadOnlyList<string> All { get; } =
    [
        $"Silence is told once for a group where {CommonSilence.Fewest} people and half of the group are silent, their last recordings within {CommonSilence.WithinDays} days.",
        $"An alert that has stood for more than {StaleAlerts.Days} days is listed by the week's brief; where nobody has said that it was seen, it is asked about once a week.",
        FormattableString.Invariant($"Whose files come late is given time before an alert that rests on recordings that are missing (silence, little done, or much done by a week that was made whole from a part): the days within which {100 * Lateness.Quantile:0} % of the dates with a recording had one, of the last {Lateness.LookBackDays} days. With fewer than {Lateness.DatesWanted} such dates nothing is waited for; what the first night brought, and what came more than {Lateness.OldestDays} days after its date, is not counted."),
        $"A brief names {BriefBuilder.RowsAtMost} people to act on at most, the gravest reasons first, and counts the rest.",
    ];
}
