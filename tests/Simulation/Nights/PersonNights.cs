using LoadWatch.Activities;
using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Service.Pipeline;
using LoadWatch.Simulation.Worlds;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Simulation.Nights;

/// <summary>
/// One person's nights by the service's own days, rules and alerts, in memory: every night takes in what has come by then, computes again from the first date that it
/// changes, and judges alerts at the date that is over.
/// </summary>
public sealed class PersonNights(TruePerson truth, Group group, Sport sport, Course course)
{
    private readonly List<(LocalDate ArrivesOn, JoinedActivity Activity)> recordings = [.. truth.Sessions.Where(session => session.Recorded is not null).Select(session => Recording(session, group, sport))];
    private readonly List<Day> days = [];
    private readonly Dictionary<LocalDate, List<Finding>> findings = [];
    private readonly Dictionary<string, Alert> alerts = new(StringComparer.Ordinal);
    private readonly Dictionary<string, int> sequences = new(StringComparer.Ordinal);
    private readonly List<AlertChange> changes = [];
    private PersonPlan plan = PersonPlan.None;
    private LocalDate? firstNight;
    private LocalDate? lastNight;

    public TruePerson Truth => truth;

    public IReadOnlyList<Day> Days => days;

    public IEnumerable<Alert> Alerts => alerts.Values;

    /// <summary>Every change of every alert, in order.</summary>
    public IReadOnlyList<AlertChange> Changes => changes;

    public Alert AlertOf(string id) => alerts[id];

    /// <summary>The night after a date.</summary>
    public void Pass(LocalDate date)
    {
        var told = truth.Told.Where(one => one.On <= date).ToList();
        var isNew = (LocalDate on) => on <= date && !(on <= lastNight);
        var dirty = recordings.Where(one => isNew(one.ArrivesOn)).Select(one => one.Activity.Date)
            .Concat(told.Where(one => isNew(one.On)).Select(one => one.From))
            .Append(lastNight?.PlusDays(1) ?? date)
            .Min();
        if (told.Exists(one => isNew(one.On)))
        {
            plan = PlanOf(told);
        }

        Compute(course.FromNothing ? LocalDate.MinIsoValue : dirty.PlusDays(-LoadCalendar.SettledDaysBack), date);
        lastNight = date;
        firstNight ??= date;
        Take(AlertReview.Review(
            truth.Person.Id,
            date,
            [.. alerts.Values.Where(alert => alert.State != AlertState.Normal)],
            id => sequences.GetValueOrDefault(id),
            findings.GetValueOrDefault(date, []),
            (key, on) => findings.GetValueOrDefault(on, []).Exists(finding => finding.Key == key && finding.Severity > Severity.Note),
            new Watching(group.Limits, days.Count == 0 ? DayPlan.None : days[^1].Plan) { Lateness = () => LatenessOn(date) }));
    }

    /// <summary>Staff say that they have seen an alert.</summary>
    public void Acknowledge(string id, LocalDate date) => Take(AlertReview.Acknowledge(alerts[id], date, known => sequences.GetValueOrDefault(known)));

    private Lateness LatenessOn(LocalDate date) => !course.WaitsForLateFiles ? Lateness.Unknown : Lateness.Of(
        [.. recordings.Where(one => one.ArrivesOn <= date).Select(one => (one.Activity.Date, LocalDate.Max(one.ArrivesOn, firstNight!.Value)))], date);

    private void Compute(LocalDate from, LocalDate to)
    {
        days.RemoveAll(day => day.Date >= from);
        var computed = PersonSeries.Continue(
            truth.Person,
            group,
            days.Count > LoadCalendar.LookBackDays ? days[^LoadCalendar.LookBackDays..] : [.. days],
            [.. recordings.Where(one => one.ArrivesOn <= to && (days.Count == 0 || one.Activity.Date >= from)).Select(one => one.Activity)],
            [],
            plan,
            to);
        days.AddRange(computed.Days);
        foreach (var day in computed.Days)
        {
            findings[day.Date] = [];
        }

        foreach (var finding in computed.Findings)
        {
            findings[finding.Date].Add(finding);
        }
    }

    private void Take(AlertReviewResult review)
    {
        foreach (var alert in review.Alerts)
        {
            alerts[alert.Id] = alert;
        }

        foreach (var change in review.Changes)
        {
            sequences[change.AlertId] = change.Sequence;
            changes.Add(change);
        }
    }

    private static PersonPlan PlanOf(IEnumerable<Told> told) => new()
    {
        Entries = [.. told.Select(one => one.Entry).OfType<PlanEntry>().OrderBy(entry => entry.From)],
        Absences = [.. told.Select(one => one.Absence).OfType<Absence>().OrderBy(absence => absence.From)],
    };

    private static (LocalDate ArrivesOn, JoinedActivity Activity) Recording(TrueSession session, Group group, Sport sport) => (session.Recorded!.ArrivesOn, new JoinedActivity
    {
        Key = $"{session.Date:uuuu-MM-dd}",
        Date = session.Date,
        Sport = sport,
        Sources = [session.Recorded.Source],
        Quantities = [.. Quantities(session, group)],
        Stimulus = [Stimulus(session, group)],
        UsableShare = new Dictionary<Channel, double> { [Channel.HeartRate] = session.Recorded.Load is null ? 0.2 : 1 },
    });

    private static IEnumerable<Quantity> Quantities(TrueSession session, Group group)
    {
        if (session.Recorded!.Load is { } load)
        {
            yield return new Quantity(group.LoadQuantity, Math.Round(load, 3), "", Estimated: false);
        }

        if (session.Metres is { } metres)
        {
            yield return new Quantity(QuantityNames.Distance, Math.Round(metres), "m", Estimated: false);
        }
    }

    private static RegionStimulus Stimulus(TrueSession session, Group group)
    {
        var efforts = new Band(session.HardEfforts, session.HardEfforts, session.HardEfforts);
        var sets = group.LoadQuantity == QuantityNames.Kilograms;
        return new(
            BodyRegion.Legs,
            Grade.B,
            sets ? StimulusChannels.Sets : StimulusChannels.Power,
            sets ? null : efforts,
            sets ? efforts : null,
            sets ? 2 : null,
            null,
            null,
            null,
            []);
    }
}
