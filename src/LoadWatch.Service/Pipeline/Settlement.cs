using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Decides what becomes of contents and commits all effects of a group at once: states, recordings, activities, dirty dates (I-3, I-4).</summary>
public sealed class Settlement(WorkingConfiguration configuration, Store store, ArrivalDecoder decoder, Instant now, SweepReport report)
{
    /// <param name="force">Decode and judge again even where nothing about the arrival changed.</param>
    public void Settle(IReadOnlyList<SeenContent> seen, bool force)
    {
        var pending = Pending(seen, force);
        var decoded = pending.AsParallel().AsOrdered().Select(item => decoder.Decode(item.Content, item.Claims)).ToList();
        KillPoint.Pass("decoded");
        store.Write(session =>
        {
            RecordMembers(session, seen);
            var effects = new ArrivalEffects(session, decoder);
            foreach (var arrival in decoded)
            {
                effects.Apply(arrival);
            }

            effects.Finish();
        });
        foreach (var arrival in decoded)
        {
            report.Count(arrival.Verdict.State);
        }

        report.Advanced();
    }

    /// <summary>Contents that are new, or whose owner is told differently now, each once.</summary>
    private List<(ArrivalContent Content, IReadOnlyList<string> Claims)> Pending(IReadOnlyList<SeenContent> seen, bool force) =>
        store.Read(session => seen
            .GroupBy(item => item.Content.Sha, StringComparer.Ordinal)
            .Select(same =>
            {
                var paths = session.Sightings.Of(same.Key).Select(sighting => sighting.Path).Concat(same.Select(item => item.Content.Path));
                return (same.First().Content, Claims: Attribution.Claims(paths, configuration.People), Arrival: session.Arrivals.Get(same.Key));
            })
            .Where(item => force || IsPending(item.Arrival, item.Claims))
            .Select(item => (item.Content, item.Claims))
            .ToList());

    private static bool IsPending(Arrival? arrival, IReadOnlyList<string> claims) => arrival?.State switch
    {
        null or ArrivalState.Waiting => true,
        ArrivalState.Stored => claims.Count != 1 || claims[0] != arrival.Person,
        ArrivalState.Held => true,
        _ => false,
    };

    private void RecordMembers(StoreSession session, IReadOnlyList<SeenContent> seen)
    {
        foreach (var (content, origin) in seen.Where(item => item.Content.ParentSha is not null))
        {
            session.Arrivals.AddWaiting(content.Sha, content.ParentSha, content.ParentSha!, content.Bytes.Length);
            if (origin is not null)
            {
                session.Sightings.Upsert(origin.File.Inbox.Name, content.Path, content.Sha, now, origin.Stamp);
            }
        }
    }
}
