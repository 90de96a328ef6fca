// Sessions of the last 7 days of which a recorded channel had too little usable time. A choice.
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Recordings come, but heart rate or power of them cannot be used: strap, sensor or watch want a look. Ends with a recorded day that has fewer such sessions behind it.</summary>
public sealed class NotUsableRule : IRule
{
    private static readonly Channel[] Watched = [Channel.HeartRate, Channel.Power];

    public string Name => "not_usable";

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.NotUsable;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var limits = subject.Limits.NotUsable;
        var useless = Useless(subject, limits.UsableShare);
        var run = new FindingRun<Lately>(onDays: 1, subject.Memory.Before<RunState<Lately>>(Name));
        foreach (var day in subject.Judged)
        {
            if (day.State == DayState.Recorded)
            {
                var lately = useless.FindAll(one => one.Date > day.Date.PlusDays(-limits.Days) && one.Date <= day.Date);
                var many = lately.Count >= limits.Sessions;
                run.Read(day.Date, new Lately(lately), many, many);
            }

            subject.Memory.Keep(day.Date, Name, run.State);
            if (run is { Since: { } since, Reading: { } read })
            {
                yield return Find(subject, day, since, read.Sessions, limits);
            }
        }
    }

    private static List<Poor> Useless(RuleSubject subject, double wanted) =>
    [
        .. subject.Activities
            .SelectMany(activity => Poorest(subject, activity, wanted))
            .OrderBy(one => one.Date),
    ];

    /// <summary>One entry a session: the poorest of its channels. Heart rate that is not to be used for this person is not missed.</summary>
    private static IEnumerable<Poor> Poorest(RuleSubject subject, JoinedActivity activity, double wanted) => activity.UsableShare
        .Where(share => Watched.Contains(share.Key) && share.Value < wanted)
        .Where(share => share.Key != Channel.Power || !activity.Sport.IsOnFoot)
        .Where(share => share.Key != Channel.HeartRate || subject.Person.HeartRateIsValidOn(activity.Date))
        .OrderBy(share => share.Value)
        .ThenBy(share => share.Key)
        .Take(1)
        .Select(share => new Poor(activity.Date, share.Key, share.Value));

    private Finding Find(
        RuleSubject subject, Day day, LocalDate since, IReadOnlyList<Poor> lately, NotUsableLimits limits)
    {
        var channels = string.Join(" and ", lately.Select(one => ChannelWords.Of(one.Channel)).Distinct(StringComparer.Ordinal));
        return new Finding(
            subject.Person.Id,
            day.Date,
            Name,
            Region: null,
            Severity.Notice,
            since,
            lately.Count,
            limits.Sessions,
            "sessions",
            $"Too little usable {channels} in {lately.Count} sessions of the last {limits.Days} days, last on {Wording.Date(lately[^1].Date, day.Date)}: nothing was read from it.",
            new Evidence(
                "sessions of the last days with a recorded channel usable for less than the wanted share of its time",
                "a choice",
                [
                    .. lately.Select(one => new EvidenceItem($"usable_{Wording.IsoDate(one.Date)}", one.Share, "share", ChannelWords.Of(one.Channel))),
                    new("sessions_limit", limits.Sessions, "count"),
                    new("days", limits.Days, "days"),
                    new("usable_share_wanted", limits.UsableShare, "share"),
                ]));
    }

    /// <summary>A session of too little quality, by the poorest of its channels.</summary>
    private sealed record Poor(LocalDate Date, Channel Channel, double Share);

    private sealed record Lately(IReadOnlyList<Poor> Sessions);
}
