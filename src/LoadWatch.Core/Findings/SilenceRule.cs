using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// No recording for longer than the person's own rhythm lets expect; where a plan says which sessions should bring one, several of them in a row without. The
/// only rule that unknown days raise (I-6); the next recording ends it. Absence mutes it, and it counts anew from the end of one.
/// </summary>
public sealed class SilenceRule : IRule
{
    /// <summary>The unit of what rests on planned sessions.</summary>
    internal const string OfPlan = "sessions";

    public string Name => "silence";

    public RuleRecord Record { get; } = new SilenceRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.Silence;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var (person, days, limits) = subject;
        var before = subject.Memory.Before<Silence>(Name) ?? new Silence(0, Since: null, Rhythm: null, Missed: null, LastThere: null);
        var recorded = days.Take(subject.First).Where(day => day.State == DayState.Recorded).Select(day => day.Date).ToList();
        var (silent, since, rhythm, there) = (before.Days, before.Since, before.Rhythm, before.LastThere ?? LastThereBefore(subject));
        var planned = new PlannedSessions(limits.Silence, before.Missed);
        foreach (var day in days.Take(subject.First))
        {
            planned.Learn(day);
        }

        foreach (var day in subject.Judged)
        {
            planned.Add(day);
            there = subject.Plan.Attendance.GetValueOrDefault(day.Date) ? day.Date : there;
            silent = day.State == DayState.Recorded || day.Plan.Absence is not null ? 0 : day.Plan.RestStatedBy is null ? silent + 1 : silent;
            if (day.State == DayState.Recorded)
            {
                recorded.Add(day.Date);
                rhythm = RecordingRhythm.Of(recorded, limits.Silence);
            }

            since = silent > rhythm?.LimitDays ? since ?? day.Date : null;
            subject.Memory.Keep(day.Date, Name, new Silence(silent, since, rhythm, planned.State, there));
            if (day.State == DayState.Recorded || day.Plan.Absence is not null)
            {
                continue;
            }

            if (planned.IsWatched)
            {
                if (planned.Missed >= limits.Silence.PlannedMissed)
                {
                    yield return FindPlanned(person, day, planned, Attended(there, day.Date), limits.Silence);
                }
            }
            else if (rhythm is not null && since is { } first)
            {
                yield return Find(person, day, first, silent, Attended(there, day.Date), rhythm, limits.Silence);
            }
        }
    }

    private Finding Find(Person person, Day day, LocalDate since, int silent, string attended, RecordingRhythm rhythm, SilenceLimits limits) => new(
        person.Id,
        day.Date,
        Name,
        Region: null,
        limits.Severity.Severity(),
        since,
        silent,
        rhythm.LimitDays,
        "days",
        Sentence(silent, rhythm, attended),
        Basis(silent, rhythm, limits));

    private Finding FindPlanned(Person person, Day day, PlannedSessions planned, string attended, SilenceLimits limits) => new(
        person.Id,
        day.Date,
        Name,
        Region: null,
        limits.Severity.Severity(),
        planned.First[limits.PlannedMissed - 1].PlusDays(limits.PlannedWaitDays),
        planned.Missed,
        limits.PlannedMissed,
        OfPlan,
        $"No recording of the last {planned.Missed} planned sessions, the first on {Wording.Date(planned.First[0], day.Date)}.{attended}",
        new Evidence(
            "planned sessions in a row for which a recording was expected and none came, each given some days to come in",
            "a choice",
            [
                .. planned.First.Select((date, at) => new EvidenceItem($"missed_{at + 1}", 1, "count", Wording.IsoDate(date))),
                new("planned_missed", limits.PlannedMissed, "count"),
                new("planned_wait", limits.PlannedWaitDays, "days"),
            ]));

    private static LocalDate? LastThereBefore(RuleSubject subject) => subject.Judged.FirstOrDefault() is { } first
        ? subject.Plan.Attendance.Where(day => day.Value && day.Key < first.Date).Max(day => (LocalDate?)day.Key)
        : null;

    /// <summary>Who came and logged nothing is another matter than who stays away.</summary>
    private static string Attended(LocalDate? there, LocalDate date) =>
        there is { } last ? $" Last there on {Wording.Date(last, date)}, by the list of attendance." : "";

    private static string Sentence(int silent, RecordingRhythm rhythm, string attended)
    {
        var usual = rhythm.UsualGapDays == 1 ? "usually one every day" : $"usually one at least every {Wording.Days(rhythm.UsualGapDays)}";
        return $"No recording for {Wording.Days(silent)}; {usual}.{attended}";
    }

    private static Evidence Basis(int silent, RecordingRhythm rhythm, SilenceLimits limits) => new(
        "days since the last recorded day or absence without those of stated rest, against a quantile of the gaps between recorded days before it (nearest rank upward) + extra days, "
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

    /// <summary>What the next date needs: days without a recording, since when they are too many, the rhythm as it was on the last one, who was there last without one.</summary>
    private sealed record Silence(int Days, LocalDate? Since, RecordingRhythm? Rhythm, MissedSessions? Missed, LocalDate? LastThere);
}
