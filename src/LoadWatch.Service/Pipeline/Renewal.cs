using LoadWatch.Activities;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Takes changed reference values into stored activities at once, by their histograms: loads and times in zone. What needs the samples follows when the content
/// is decoded again, which all of them are asked for; so nothing is lost where this is cut off.
/// </summary>
public sealed class Renewal(WorkingConfiguration configuration, Store store, TableBasis basis)
{
    /// <param name="people">Ids with the first date to renew; null or empty: nobody.</param>
    public void Run(IReadOnlyDictionary<string, LocalDate>? people)
    {
        if (people is not { Count: > 0 })
        {
            return;
        }

        foreach (var (person, from) in people.OrderBy(pair => pair.Key, StringComparer.Ordinal))
        {
            store.Write(session =>
            {
                foreach (var activity in session.Activities.OfPerson(person, from))
                {
                    session.Activities.Renew(activity with { Values = Renewed(session, activity) });
                }
            });
        }
    }

    private ActivityValues Renewed(StoreSession session, StoredActivity activity)
    {
        var joined = activity.Session;
        var values = activity.Values with { Histograms = session.Activities.Histograms(activity.Key) };
        return HistogramRenewal.Of(values, joined.Sport, joined.Date, configuration.People[joined.Person], basis.AnchorsOf(configuration.People[joined.Person]), configuration.Computation);
    }
}
