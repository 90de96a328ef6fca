using LoadWatch.Days;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// No recording for longer than the person's own rhythm lets expect; where a plan says which sessions should bring one, several of them in a row without. The
/// only rule that unknown days raise (I-6); the next recording ends it. Absence mutes it.
/// </summary>
public sealed class SilenceRule : IRule
{
    public string Name => "silence";

    public bool IsEnabled(RuleLimits limits) => limits.Silence.Enabled;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var (person, days, limits) = subject;
        var recorded = new List<LocalDate>();
        RecordingRhythm? rhythm = null;
        var planned = new PlannedSessions(limits.Silence);
        var silent = 0;
        foreach (var day in days)
        {
            planned.Add(day);
            silent = day.State == DayState.Recorded ? 0 : day.Plan.Absence is null && day.Plan.RestStatedBy is null ? silent + 1 : silent;
            if (day.State == DayState.Recorded)
            {
                recorded.Add(day.Date);
                rhythm = RecordingRhythm.Of(recorded, limits.Silence);
            }
            else if (day.Plan.Absence is not null)
            {
                continue;
            }
            else if (planned.IsWatched)
            {
                if (planned.Missed.Count >= limits.Silence.PlannedMissed)
                {
                    yield return FindPlanned(person, day, planned.Missed, limits.Silence);
                }
            }
            else if (rhythm is not null && silent > rhythm.LimitDays)
            {
                yield return Find(person, day, silent, rhythm, limits.Silence);
            }
        }
    }

    private Finding Find(Person person, Day day, int silent, RecordingRhythm rhythm, SilenceLimits limits) => new(
        person.Id,
        day.Date,
        Name,
        Region: null,
        Severity.Notice,
        day.Date.PlusDays(rhythm.LimitDays + 1 - silent),
        silent,
        rhythm.LimitDays,
        "days",
        Sentence(silent, rhythm),
        Basis(silent, rhythm, limits));

    private Finding FindPlanned(Person person, Day day, IReadOnlyList<LocalDate> missed, SilenceLimits limits) => new(
        person.Id,
        day.Date,
        Name,
        Region: null,
        Severity.Notice,
        missed[limits.PlannedMissed - 1].PlusDays(limits.PlannedWaitDays),
        missed.Count,
        limits.PlannedMissed,
        "sessions",
        $"No recording of the last {missed.Count} planned sessions, the first on {Wording.Date(missed[0], day.Date)}.",
        new Evidence(
            "planned sessions in a row for which a recording was expected and none came, each given some days to come in",
            "a choice",
            [
                .. missed.Select((date, at) => new EvidenceItem($"missed_{at + 1}", 1, "count", Wording.IsoDate(date))),
                new("planned_missed", limits.PlannedMissed, "count"),
                new("planned_wait", limits.PlannedWaitDays, "days"),
            ]));

    private static string Sentence(int silent, RecordingRhythm rhythm)
    {
        var usual = rhythm.UsualGapDays == 1 ? "usually one every day" : $"usually one at least every {Wording.Days(rhythm.UsualGapDays)}";
        return $"No recording for {Wording.Days(silent)}; {usual}.";
    }

    private static Evidence Basis(int silent, RecordingRhythm rhythm, SilenceLimits limits) => new(
        "days since the last recorded day without those of absence and of stated rest, against a quantile of the gaps between recorded days before it (nearest rank upward) + extra days, "
            + "at most the ceiling",
        "a choice",
        [
            new("silent_days", silent, "days", $"last on {Wording.IsoDate(rhythm.LastRecorded)}"),
            new("usual_gap", rhythm.UsualGapDays, "days", "the quantile of the gaps"),
            new("gaps", rhythm.Gaps, "count"),
            new("limit", rhythm.LimitDays, "days"),
            new("gap_quantile", limits.GapQuantile, "share"),
            new("extra", limits.ExtraDays, "days"),
            new("ceiling", limits.CeilingDays, "days"),
            new("look_back", limits.LookBackDays, "days"),
            new("gaps_wanted", limits.GapsWanted, "count"),
        ]);
}
