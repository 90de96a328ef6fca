using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Takes up held contents that somebody has put right by moving the file: a name that is gone from an inbox that keeps its files says nothing any more,
/// as long as another name of the same content is still there.
/// </summary>
public sealed class MovedFiles(
    WorkingConfiguration configuration, Store store, ArchiveReader reader, Settlement settlement, KnownFiles known, Instant now, SweepReport report)
{
    public void TakeUp()
    {
        foreach (var arrival in store.Read(session => session.Arrivals.InState(ArrivalState.Held)))
        {
            var names = store.Read(session => session.Sightings.Of(arrival.Sha)).ToLookup(IsThere);
            if (names[true].Any() && names[false].Any() && reader.Kept(arrival.ObjectSha) is { } kept)
            {
                var gone = names[false].ToList();
                var content = kept.Where(seen => seen.Content.Sha == arrival.Sha).ToList();
                settlement.Settle(content, force: true, gone, session => Forget(session, arrival, gone));
                gone.ForEach(sighting => known.Forget(sighting.Inbox, sighting.Path));
            }
        }
    }

    private void Forget(StoreSession session, Arrival arrival, List<Sighting> gone)
    {
        foreach (var sighting in gone)
        {
            session.Sightings.Forget(sighting);
            session.Audits.Add("sighting_forgotten", $"{arrival.Sha[..12]} is no longer in {sighting.Inbox}", now);
        }
    }

    /// <summary>Also true where it cannot be told: the inbox empties itself, is away, or is no longer configured, or its folder may not be looked into.</summary>
    private bool IsThere(Sighting sighting) =>
        configuration.Inboxes.FirstOrDefault(inbox => inbox.Name == sighting.Inbox) is not { Take: TakeMode.Leave } inbox
        || report.MissingInboxes.Contains(inbox.Name)
        || !Directory.Exists(inbox.Path)
        || report.Looks.Any(look => look.Inbox.Name == inbox.Name && look.Closed.Any(folder => sighting.Path.StartsWith(folder + "/", StringComparison.Ordinal)))
        || File.Exists(Path.Combine(inbox.Path, sighting.Path.Split(Attribution.Inside)[0]));
}
