// One session against the largest of the 30 days before: excess = (session - largest) / largest.
// Running distance: the bands from 10 % and from 30 % are those of Schuster Brandt Frandsen et al. 2025, Br J Sports Med, a cohort of 5,205 runners (from memory, not
// checked against the paper); of healthy runners simulated the lower one told far too often, so the notice begins at the higher one and the warning at twice that
// (tests/README.md). Every other session by its load: limits and counts are a choice, the notice and the sessions wanted fitted by the same simulation.
using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// One session is far beyond the largest of the days before. It holds on the session's date and on the known dates after it up to the hold: on an unknown date it
/// stands as it was (I-6). Sessions on the date of a match are not judged, but later ones are compared with them. Too few sessions before: nothing is raised.
/// </summary>
public sealed class SessionSpikeRule : IRule
{
    public string Name => "session_spike";

    private string KeyOfRuns => $"{Name}/{QuantityNames.Distance}";

    public RuleRecord Record { get; } = new SessionSpikeRecord();

    public IRuleLimits LimitsOf(RuleLimits limits) => limits.SessionSpike;

    public IEnumerable<Finding> Evaluate(RuleSubject subject)
    {
        var limits = subject.Limits.SessionSpike;
        var sizes = new SessionSizes(subject);
        var runs = new SpikeHold(limits.HoldDays, subject.Memory.Before<SpikesStanding>(KeyOfRuns));
        var loads = new SpikeHold(limits.HoldDays, subject.Memory.Before<SpikesStanding>(Name));
        foreach (var day in subject.Judged)
        {
            var spikes = day.Plan.IsMatch ? [] : sizes.Spikes(day.Date).ToList();
            runs.Pass(day, spikes.Where(spike => spike.OfRun));
            loads.Pass(day, spikes.Where(spike => !spike.OfRun));
            subject.Memory.Keep(day.Date, KeyOfRuns, runs.State);
            subject.Memory.Keep(day.Date, Name, loads.State);
            foreach (var hold in new[] { loads, runs })
            {
                if (hold is { Since: { } since, Shown: { } spike })
                {
                    yield return Find(subject, day.Date, since, spike, limits);
                }
            }
        }
    }

    private Finding Find(RuleSubject subject, LocalDate date, LocalDate since, SessionSpike spike, SessionSpikeLimits limits)
    {
        var limit = Limit(spike, limits);
        return new(
            subject.Person.Id,
            date,
            Name,
            Region: null,
            spike.Severity,
            since,
            spike.Excess,
            limit,
            "fraction",
            Sentence(date, spike, limit, limits, subject.LoadUnit),
            Basis(spike, limits, subject.LoadUnit))
        {
            Quantity = spike.OfRun ? QuantityNames.Distance : null,
        };
    }

    private static double Limit(SessionSpike spike, SessionSpikeLimits limits) => (spike.OfRun, spike.Severity) switch
    {
        (true, Severity.Warning) => limits.RunWarning,
        (true, _) => limits.RunNotice,
        (false, Severity.Warning) => limits.LoadWarning,
        _ => limits.LoadNotice,
    };

    private static string Sentence(LocalDate date, SessionSpike spike, double limit, SessionSpikeLimits limits, string loadUnit)
    {
        var (what, compared) = spike.OfRun
            ? ($"Run of {Kilometres(spike.Value)} km", $"longest of the {limits.LookBackDays} days before ({Kilometres(spike.Largest)} km")
            : ($"Session of {Wording.Number(spike.Value)} {loadUnit}", $"largest of the {limits.LookBackDays} days before ({Wording.Number(spike.Largest)} {loadUnit}");
        return $"{what} on {Wording.Date(spike.Date, date)}, {Wording.Percent(spike.Excess, limit)} beyond the {compared} on "
            + $"{Wording.Date(spike.LargestOn, date)}); the limit is {Wording.Percent(limit)}.";
    }

    private static string Kilometres(double metres) => FormattableString.Invariant($"{metres / 1000:0.0}");

    private static Evidence Basis(SessionSpike spike, SessionSpikeLimits limits, string loadUnit)
    {
        var unit = spike.OfRun ? "m" : loadUnit;
        return new(
            spike.OfRun
                ? "excess = (distance of the run - longest run of the days before) / the latter"
                : "excess = (load of the session - largest load of a session of the days before) / the latter",
            spike.OfRun ? "bands of Schuster Brandt Frandsen et al. 2025, Br J Sports Med (from memory); as limits a choice" : "a choice",
            [
                new("excess", spike.Excess, "fraction", $"session of {Wording.IsoDate(spike.Date)}"),
                new("session", spike.Value, unit),
                new("largest_before", spike.Largest, unit, $"on {Wording.IsoDate(spike.LargestOn)}"),
                new("sessions_before", spike.Sessions, "count"),
                new("notice", spike.OfRun ? limits.RunNotice : limits.LoadNotice, "fraction"),
                new("warning", spike.OfRun ? limits.RunWarning : limits.LoadWarning, "fraction"),
                new("sessions_wanted", spike.OfRun ? limits.RunsWanted : limits.SessionsWanted, "count"),
                new("look_back", limits.LookBackDays, "days"),
                new("hold", limits.HoldDays, "days"),
            ]);
    }
}
