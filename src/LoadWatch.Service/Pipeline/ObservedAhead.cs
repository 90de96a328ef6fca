using LoadWatch.Anchors;
using LoadWatch.Capacity;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Observes reference values from the bests of recordings that are about to be computed, so that a large import computes them once, and not again by what
/// <see cref="ObservedAnchorUpdate"/> finds in the end. That one has the last word: what is seen here may be wrong (recordings that are merged, sets, years out of
/// order), and is computed again then. For that, what is stored must have been computed by the values that are stored, or be asked for again: so these values are
/// committed with the recordings of their group, and ask again for what stands by then.
/// </summary>
public sealed class ObservedAhead(WorkingConfiguration configuration, Store store)
{
    /// <summary>Fewer are sooner computed twice than the year before them is read.</summary>
    private const int FewestSessions = 4;

    private Dictionary<string, Sight> before = new(StringComparer.Ordinal);

    /// <summary>Ids of people of whom stored recordings were asked for again, with the first date of those.</summary>
    public Dictionary<string, LocalDate> AskedAgain { get; } = new(StringComparer.Ordinal);

    /// <summary>Groups come in the order in which they commit, and only the one before may be uncommitted.</summary>
    /// <param name="basis">By which the group before was computed.</param>
    /// <returns>By which this group is to be computed, and what is to be written in its commit before its recordings are.</returns>
    public (TableBasis Basis, Action<StoreSession> Write) Look(IReadOnlyList<JudgedArrival> judged, TableBasis basis)
    {
        var (sights, found) = (new Dictionary<string, Sight>(StringComparer.Ordinal), new List<(LocalDate Since, ObservedChanges Changes)>());
        foreach (var own in judged.SelectMany(arrival => arrival.Kept).GroupBy(kept => kept.Owner.Id, StringComparer.Ordinal))
        {
            var person = own.First().Owner;
            var sight = With(before.GetValueOrDefault(person.Id), Alone([.. own]), out var fresh);
            if (IsWorthIt(sight, fresh))
            {
                sight = Read(sight, person);
                var (observed, last) = Observed(person, sight, fresh);
                if (ObservedChanges.Between(person.Id, sight.First, sight.Anchors!, observed, basis.StatedOf(person)) is { } changes)
                {
                    found.Add((sight.Since, changes));
                }

                sight = sight with { Since = last, Anchors = [.. sight.Anchors!.Where(one => one.From < sight.First), .. observed] };
            }

            sights[person.Id] = sight;
        }

        before = sights;
        return found.Count == 0
            ? (basis, _ => { })
            : (basis.With(found.ToDictionary(one => one.Changes.Person, one => sights[one.Changes.Person].Anchors!)), session => found.ForEach(one => Write(session, one.Since, one.Changes)));
    }

    /// <summary>Others have changed what is stored.</summary>
    public void Forget() => before.Clear();

    private static Sight With(Sight? known, IReadOnlyList<SessionBests> own, out IReadOnlyList<SessionBests> fresh)
    {
        fresh = own;
        var first = own.Min(session => session.Date);
        return known is null ? new Sight(first, own, null) : known with { Since = LocalDate.Min(known.Since, first), Sessions = [.. known.Sessions, .. own] };
    }

    /// <summary>Looking costs by months, computing again by sessions.</summary>
    private static bool IsWorthIt(Sight sight, IReadOnlyList<SessionBests> fresh)
    {
        var months = Period.Between(sight.First, ObservedAnchors.MonthOf(fresh.Max(session => session.Date)), PeriodUnits.Months).Months + 1;
        return fresh.Count >= FewestSessions && months > 0 && months <= fresh.Count;
    }

    /// <summary>With what is stored, where that was not read yet.</summary>
    private Sight Read(Sight sight, Person person)
    {
        if (sight.Anchors is not null)
        {
            return sight;
        }

        var (anchors, stored) = store.Read(session => (
            session.ObservedAnchors.OfPerson(person.Id),
            session.Activities.Bests(person.Id, sight.First.PlusMonths(-ObservedAnchors.Months), sight.Sessions.Max(one => one.Date))));
        return sight with { Anchors = anchors, Sessions = [.. sight.Sessions.Concat(stored).DistinctBy(one => one.Key)] };
    }

    /// <summary>All from the first month on: those through the month of the latest recording anew, but for what sets tell; later ones as they stand.</summary>
    private (IReadOnlyList<ObservedAnchor> Anchors, LocalDate Last) Observed(Person person, Sight sight, IReadOnlyList<SessionBests> fresh)
    {
        var last = ObservedAnchors.MonthOf(fresh.Max(session => session.Date));
        var observed = ObservedAnchors.Of(person, configuration.Computation.Equations, sight.Sessions, [], sight.Anchors!, sight.First, last);
        return ([.. observed, .. sight.Anchors!.Where(one => one.From > last || (one.From >= sight.First && one.Kind == AnchorKind.OneRepetitionMax))], last);
    }

    private void Write(StoreSession session, LocalDate since, ObservedChanges changes)
    {
        // The last word looks again from there on, whatever becomes of the recordings.
        session.People.MarkDirty(changes.Person, since);
        if (changes.Write(session) > 0)
        {
            var first = changes.Spans.Min(span => span.From);
            AskedAgain[changes.Person] = AskedAgain.TryGetValue(changes.Person, out var earlier) ? LocalDate.Min(earlier, first) : first;
        }
    }

    /// <summary>What recordings show, each session once: of those that overlap the one with most samples.</summary>
    private static IReadOnlyList<SessionBests> Alone(IReadOnlyList<KeptRecording> recordings)
    {
        var alone = new List<KeptRecording>();
        foreach (var one in recordings.OrderBy(one => one.Summary.Start))
        {
            if (alone.Count == 0 || one.Summary.Start >= alone[^1].Summary.End)
            {
                alone.Add(one);
            }
            else if (one.Summary.Samples > alone[^1].Summary.Samples)
            {
                alone[^1] = one;
            }
        }

        return alone.ConvertAll(one => one.Bests);
    }

    /// <summary>What is known of a person.</summary>
    /// <param name="Since">No month behind that date was looked at.</param>
    /// <param name="Sessions">Of the groups in a row that held some of theirs, and what was read.</param>
    /// <param name="Anchors">As they will be stored; null: nothing was read, and what is stored counts.</param>
    private sealed record Sight(LocalDate Since, IReadOnlyList<SessionBests> Sessions, IReadOnlyList<ObservedAnchor>? Anchors)
    {
        /// <summary>The first month to look at.</summary>
        public LocalDate First => ObservedAnchors.MonthBehind(Since);
    }
}
