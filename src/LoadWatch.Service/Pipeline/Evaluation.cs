using LoadWatch.Alerts;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Judges alerts at the evaluation date and decides notices, in one transaction (I-7, I-14).</summary>
public sealed class Evaluation(WorkingConfiguration configuration, Answers answers, Briefs briefs, Instant now, SweepReport report)
{
    public void Run(StoreSession session)
    {
        foreach (var person in configuration.People.Values.OrderBy(person => person.Id, StringComparer.Ordinal))
        {
            Judge(session, person);
        }

        // Again after the first time before days were computed: what is seen or shelved may stand since this very evaluation.
        report.Take(answers.TakeUp(session));
        report.NoticesDecided += briefs.Decide(session);
    }

    private void Judge(StoreSession session, Person person)
    {
        var date = DayUpdate.LastDateOver(person, now);
        var lateness = new Lazy<Lateness>(() => LatenessOf(session, person, date));
        var review = AlertReview.Review(
            person.Id,
            date,
            session.Alerts.Open(person.Id),
            id => session.Alerts.Changes.NextSequence(id) - 1,
            session.Findings.OfPerson(person.Id, date, date),
            session.Findings.Held,
            new Watching(configuration.GroupOf(person).Limits, session.Days.OfPerson(person.Id, date, date).Select(day => day.Plan).FirstOrDefault(DayPlan.None))
            {
                Lateness = () => lateness.Value,
            });
        foreach (var alert in review.Alerts)
        {
            session.Alerts.Put(alert);
        }

        foreach (var change in review.Changes)
        {
            session.Alerts.Changes.Append(change);
        }

        report.AlertChanges += review.Changes.Count;
        session.Evaluations.Add(person.Group, date, configuration.Hash);
    }

    private static Lateness LatenessOf(StoreSession session, Person person, LocalDate date) => Lateness.Of(
        [.. session.Sightings.FirstOfDates(person.Id, date.PlusDays(-Lateness.LookBackDays)).Select(one => (one.Recorded(person), PersonDay.LastOver(one.Seen, person)))], date);
}
