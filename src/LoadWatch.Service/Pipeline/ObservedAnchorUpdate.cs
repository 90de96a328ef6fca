using LoadWatch.Anchors;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.People;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Brings the reference values that people's own sessions tell up to the month of the day after the last date that is over, and asks for what a changed one bears on:
/// sessions are computed again, days too (I-15). Only who is behind is looked at, and only the months after the first date that changed. What is observed rests on no
/// reference value, so that once is enough, whatever is computed again for it.
/// </summary>
public sealed class ObservedAnchorUpdate(WorkingConfiguration configuration, Store store, Instant now)
{
    private const int PeopleInOneCommit = 20;

    /// <summary>Dates through which people are computed, by person, where it is not the last date that is over for them.</summary>
    public IReadOnlyDictionary<string, LocalDate> Through { get; init; } = new Dictionary<string, LocalDate>();

    /// <returns>Whose sessions are to be computed again, with the first date of those.</returns>
    public IReadOnlyDictionary<string, LocalDate> Run(CancellationToken cancel)
    {
        var changed = new Dictionary<string, LocalDate>(StringComparer.Ordinal);
        var basis = TableBasis.Of(configuration, store);
        foreach (var people in Behind().Chunk(PeopleInOneCommit))
        {
            cancel.ThrowIfCancellationRequested();
            var found = people.AsParallel().AsOrdered().Select(item => Observe(item.Person, item.First, item.Last, basis)).OfType<ObservedChanges>().ToList();
            if (found.Count > 0)
            {
                store.Write(session => found.ForEach(one => { one.Write(session); }));
                found.FindAll(one => one.Spans.Count > 0).ForEach(one => changed[one.Person] = one.Spans.Min(span => span.From));
            }
        }

        return changed;
    }

    /// <summary>The first and the last month to compute.</summary>
    private List<(Person Person, LocalDate First, LocalDate Last)> Behind()
    {
        if (configuration.People.Count == 0)
        {
            return [];
        }

        var people = configuration.People.Values.ToDictionary(person => person.Id, StringComparer.Ordinal);
        return
        [
            .. store.Read(session => session.People.Behind(people.Values.Max(ThroughOf)))
                .Where(behind => people.ContainsKey(behind.Person))
                .Select(behind => (Person: people[behind.Person], First: First(behind), Last: ObservedAnchors.MonthOf(ThroughOf(people[behind.Person]).PlusDays(1))))
                .Where(item => item.First <= item.Last),
        ];
    }

    private LocalDate ThroughOf(Person person) => Through.TryGetValue(person.Id, out var date) ? date : DayUpdate.LastDateOver(person, now);

    /// <summary>Through the day after the last date computed, months are done.</summary>
    private static LocalDate First(PersonBehind behind)
    {
        LocalDate?[] dates = [behind.DirtyFrom, behind.ComputedTo?.PlusDays(1)];
        return ObservedAnchors.MonthBehind(dates.Min()!.Value);
    }

    private ObservedChanges? Observe(Person person, LocalDate first, LocalDate last, TableBasis basis)
    {
        var (standing, now) = store.Read(session => (session.ObservedAnchors.OfPerson(person.Id), Observed(session, person, first, last)));
        return ObservedChanges.Between(person.Id, first, standing, now, basis.StatedOf(person));
    }

    private IReadOnlyList<ObservedAnchor> Observed(StoreSession session, Person person, LocalDate first, LocalDate last)
    {
        LocalDate?[] begun = [session.Activities.FirstOfPerson(person.Id), session.TableRows.FirstOfPerson(person.Id)];
        if (begun.Min() is not { } beginning)
        {
            return [];
        }

        var from = LocalDate.Max(first, ObservedAnchors.MonthBehind(beginning));
        var since = from.PlusMonths(-ObservedAnchors.Months);
        IEnumerable<ShownMaximum> maxima =
        [
            .. ShownMaxima.Of(session.TableRows.OfPerson(person.Id, RowKind.Sets, since, last).Select(row => (row.Date, (SetRow)row.Content)), person, configuration.Computation.Equations.OneRepetitionMaxByRepetitions),
            .. session.Activities.QuantitiesLike(person.Id, since, last, QuantityNames.OneRepetitionMaxOf)
                .SelectMany(one => ShownMaxima.Of(one.Date, one.Quantities, configuration.Computation.Exercises.Keys)),
        ];
        return ObservedAnchors.Of(
            person, configuration.Computation.Equations, session.Activities.Bests(person.Id, since, last), [.. maxima], session.ObservedAnchors.OfPerson(person.Id), from, last);
    }
}
