// Sessions of the last 7 days of which a recorded channel had too little usable time. A choice.
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Recordings come, but heart rate or power of them cannot be used: strap, sensor or watch want a look. Ends with a recorded day that has few enough such sessions behind it.</summary>
public sealed class NotUsableRule : IRule
{
    public string Name => "not_usable";

    public RuleRecord Record { get; } = new NotUsableRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.NotUsable;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var limits = subject.Limits.NotUsable;
        var useless = Useless(subject, limits.UsableShare);
        var run = new FindingRun<Lately>(limits.OnDays, limits.OffDays, subject.Memory.Before<RunState<Lately>>(Name));
        foreach (var day in subject.Judged)
        {
            run.Watch(PlanMutes.Of(Name, day.Plan), day.Date);
            if (day.State == DayState.Recorded)
            {
                var lately = useless.FindAll(one => one.Date > day.Date.PlusDays(-limits.Days) && one.Date <= day.Date);
                run.Read(day.Date, new Lately(lately), lately.Count >= limits.Sessions, lately.Count > Math.Min(limits.ReturnSessions, limits.Sessions - 1));
            }

            subject.Memory.Keep(day.Date, Name, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(subject, day, since, read.Sessions, limits).Unless(run.Muted);
            }
        }
    }

    private static List<Poor> Useless(RuleSubject subject, double wanted) =>
    [
        .. subject.Activities
            .SelectMany(activity => Poorest(subject, activity, wanted))
            .OrderBy(one => one.Date),
    ];

    /// <summary>One entry a session: the poorest of its channels.</summary>
    private static IEnumerable<Poor> Poorest(RuleSubject subject, JoinedActivity activity, double wanted) => SensorFaults.Poor(subject.Person, activity, wanted)
        .Take(1)
        .Select(share => new Poor(activity.Date, share.Key, share.Value));

    private Finding Find(
        RuleSubject subject, Day day, LocalDate since, IReadOnlyList<Poor> lately, NotUsableLimits limits)
    {
        return new Finding(
            subject.Person.Id,
            day.Date,
            Name,
            Region: null,
            limits.Severity.Severity(),
            since,
            lately.Count,
            limits.Sessions,
            "sessions",
            Sentence(day.Date, lately, limits),
            new Evidence(
                "sessions of the last days with a recorded channel usable for less than the wanted share of its time",
                "a choice",
                [
                    .. lately.Select(one => new EvidenceItem($"usable_{Wording.IsoDate(one.Date)}", one.Share, "share", ChannelWords.Of(one.Channel))),
                    new("sessions_limit", limits.Sessions, "count"),
                    new("return_sessions", limits.ReturnSessions, "count"),
                    new("on_days", limits.OnDays, "days"),
                    new("off_days", limits.OffDays, "days"),
                    new("days", limits.Days, "days"),
                    new("usable_share_wanted", limits.UsableShare, "share"),
                ]));
    }

    private static string Sentence(LocalDate date, IReadOnlyList<Poor> lately, NotUsableLimits limits)
    {
        if (lately.Count == 0)
        {
            return $"Sessions of the last {limits.Days} days can be used again; it is over once that stays so.";
        }

        var channels = string.Join(" and ", lately.Select(one => ChannelWords.Of(one.Channel)).Distinct(StringComparer.Ordinal));
        var until = lately.Count < limits.Sessions ? $"; over with {limits.ReturnSessions} or fewer" : "";
        return $"Too little usable {channels} in {lately.Count} {(lately.Count == 1 ? "session" : "sessions")} of the last {limits.Days} days, "
            + $"last on {Wording.Date(lately[^1].Date, date)}: nothing was read from it{until}.";
    }

    /// <summary>A session of too little quality, by the poorest of its channels.</summary>
    private sealed record Poor(LocalDate Date, Channel Channel, double Share);

    private sealed record Lately(IReadOnlyList<Poor> Sessions);
}
