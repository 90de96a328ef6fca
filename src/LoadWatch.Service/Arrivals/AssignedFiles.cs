using LoadWatch.Activities;
using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Takes up decisions on owners that are not in effect yet: the content is judged again, and the days of whoever had it and of whoever gets it are computed
/// anew. One that is held for another reason, its date, is looked at again by every sweep. So are decisions that were withdrawn and still show.
/// </summary>
public sealed class AssignedFiles(
    WorkingConfiguration configuration, Store store, ArchiveReader reader, Settlement settlement, SweepReport report)
{
    /// <summary>Why a content is held whose owner by decision has left.</summary>
    public static string NotInTheRoster(string person) => $"assigned to {person}, who is not in the roster";

    public void TakeUp(CancellationToken cancel)
    {
        foreach (var kept in store.Read(Waiting).GroupBy(arrival => arrival.ObjectSha, StringComparer.Ordinal))
        {
            cancel.ThrowIfCancellationRequested();
            if (reader.Kept(kept.Key) is { } contents)
            {
                Settle(contents, kept.Select(arrival => arrival.Sha).ToHashSet(StringComparer.Ordinal));
            }
            else
            {
                report.Unreadable.AddRange(kept.Select(Missing));
            }
        }
    }

    private List<Arrival> Waiting(StoreSession session) => session.Decisions.Assigned().Values
        .OrderBy(decision => decision.Subject, StringComparer.Ordinal)
        .Select(decision => (Arrival: session.Arrivals.Get(decision.Subject), Owner: configuration.People.GetValueOrDefault(decision.Person)))
        .Where(item => item is { Owner: { } owner, Arrival: { State: ArrivalState.Stored or ArrivalState.Held } arrival } && arrival.Person != owner.Id && !IsOfSeveral(session, arrival))
        .Select(item => item.Arrival!)
        .Concat(Withdrawn(session))
        .ToList();

    /// <summary>Its recordings are those whom the file names, whatever was decided before that was known.</summary>
    private static bool IsOfSeveral(StoreSession session, Arrival arrival) =>
        arrival is { State: ArrivalState.Stored, Person: null } && session.Recordings.OfArrival(arrival.Sha).Count > 0;

    private IEnumerable<Arrival> Withdrawn(StoreSession session) => session.Decisions.AssignedNoMore()
        .OrderBy(pair => pair.Key, StringComparer.Ordinal)
        .Select(pair => (Arrival: session.Arrivals.Get(pair.Key), pair.Value.Person))
        .Where(item => item.Arrival is { } arrival && StillShows(session, arrival, item.Person))
        .Select(item => item.Arrival!);

    private bool StillShows(StoreSession session, Arrival arrival, string person) => arrival.State switch
    {
        ArrivalState.Held => arrival.Reason == NotInTheRoster(person),
        ArrivalState.Stored => arrival.Person == person && !IsOwnerAnyway(session, arrival),
        _ => false,
    };

    private bool IsOwnerAnyway(StoreSession session, Arrival arrival)
    {
        var claims = Attribution.Claims(null, [.. session.Sightings.Of(arrival.Sha).Select(sighting => new SeenName(sighting.Inbox, sighting.Path))], configuration);
        return claims.Count > 0
            ? claims is [var only] && only == arrival.Person
            : session.Recordings.OfArrival(arrival.Sha) is { Count: > 0 } recordings && recordings.All(recording => OwnsDevice(recording, arrival.Person!));
    }

    /// <summary>A recording's source ends with its device's serial number, where there is one.</summary>
    private bool OwnsDevice(RecordingSummary recording, string person) =>
        configuration.Devices.On(recording.Source[(recording.Source.LastIndexOfAny([' ', '/']) + 1)..], recording.Date, session: null) == person;

    private void Settle(IEnumerable<SeenContent> contents, HashSet<string> shas)
    {
        foreach (var piece in contents.Where(seen => shas.Contains(seen.Content.Sha)).InPieces())
        {
            settlement.Settle(piece, force: true);
        }
    }

    private BriefLine Missing(Arrival arrival) => new(
        store.Read(session => session.Sightings.Of(arrival.Sha))[0].Path, "its original in the archive is missing or damaged; its owner was not changed");
}
