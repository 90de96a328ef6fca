using LoadWatch.Decoding;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Decides what becomes of contents and commits all effects of a group at once: states, recordings, activities, dirty dates (I-3, I-4). One group may be decoded
/// while the one before it commits; groups commit in the order in which they began.
/// </summary>
public sealed class Settlement(WorkingConfiguration configuration, Store store, ArrivalDecoder decoder, SweepReport report)
{
    private readonly ObservedAhead ahead = new(configuration, store);
    private Task committing = Task.CompletedTask;
    private HashSet<string> inCommit = new(StringComparer.Ordinal);

    /// <summary>Ids of people with the first date from which on other reference values hold now for what is stored of them.</summary>
    public IReadOnlyDictionary<string, LocalDate> AskedAgain => ahead.AskedAgain;

    /// <param name="force">Decode and judge again even where nothing about the arrival changed.</param>
    public void Settle(IReadOnlyList<SeenContent> seen, bool force) => Settle(seen, force, [], _ => { });

    /// <param name="gone">Sightings that name nobody any more.</param>
    /// <param name="alongside">Written in the same commit as the effects.</param>
    public void Settle(IReadOnlyList<SeenContent> seen, bool force, IReadOnlyList<Sighting> gone, Action<StoreSession> alongside)
    {
        Begin(seen, force, gone, alongside);
        Finish();
    }

    /// <summary>Decodes the contents and starts their commit; what they hold may be used until it is over.</summary>
    /// <inheritdoc cref="Settle(IReadOnlyList{SeenContent}, bool, IReadOnlyList{Sighting}, Action{StoreSession})"/>
    public void Begin(IReadOnlyList<SeenContent> seen, bool force, IReadOnlyList<Sighting> gone, Action<StoreSession> alongside)
    {
        if (seen.Any(item => inCommit.Contains(item.Content.Sha)))
        {
            // Who claims a content is known once its other names are committed.
            Finish();
        }

        var pending = store.Read(session => Pending(session, seen, force, gone));
        var judged = pending.AsParallel().AsOrdered().Select(item => decoder.Judge(item.Content, item.Claims, item.IsDecided, item.Salvages)).ToList();
        var observe = Observe(judged, force);
        var decoded = judged.AsParallel().AsOrdered().Select(decoder.Compute).ToList();
        var before = pending.ToDictionary(item => item.Content.Sha, item => item.Before, StringComparer.Ordinal);
        var shelf = new RecordingShelf(decoder);
        decoded.ForEach(shelf.Add);
        var values = new SessionValues(decoder, shelf);
        new Foresight(store, shelf, values).LookAhead(decoded);
        KillPoint.Pass("decoded");
        Finish();
        inCommit = seen.Select(item => item.Content.Sha).ToHashSet(StringComparer.Ordinal);
        committing = Task.Run(() => Commit(seen, decoded, before, observe + alongside, shelf, values));
    }

    /// <summary>What is computed again shows what it showed before, and what is too long to be held is computed already: by the reference values that stand.</summary>
    private Action<StoreSession> Observe(IReadOnlyList<JudgedArrival> judged, bool force)
    {
        if (force || judged.Any(one => one.Arrival.Through is not null))
        {
            ahead.Forget();
            return _ => { };
        }

        (decoder.Basis, var write) = ahead.Look(judged, decoder.Basis);
        return write;
    }

    /// <summary>Does something once everything that began is durable.</summary>
    public void Then(Action afterwards)
    {
        var last = committing;
        committing = Task.Run(() =>
        {
            last.GetAwaiter().GetResult();
            afterwards();
        });
    }

    /// <summary>Waits until everything that began is committed, and throws what went wrong with it.</summary>
    public void Finish()
    {
        var last = committing;
        (committing, inCommit) = (Task.CompletedTask, new HashSet<string>(StringComparer.Ordinal));
        last.GetAwaiter().GetResult();
    }

    private void Commit(
        IReadOnlyList<SeenContent> seen,
        List<DecodedArrival> decoded,
        Dictionary<string, ArrivalState?> before,
        Action<StoreSession> alongside,
        RecordingShelf shelf,
        SessionValues values)
    {
        store.Write(session =>
        {
            alongside(session);
            RecordMembers(session, seen);
            var effects = new ArrivalEffects(session, shelf, values);
            decoded.ForEach(effects.Apply);
            seen.Select(item => item.Content.Sha).Distinct(StringComparer.Ordinal).ToList().ForEach(effects.TouchNames);
            effects.Finish();
        });
        shelf.Close();
        foreach (var arrival in decoded.Where(arrival => before[arrival.Sha] != arrival.Verdict.State))
        {
            report.Count(arrival.Verdict.State);
        }

        report.Advanced();
    }

    /// <summary>Refuses an arrival that is not to be decoded; what it gave goes, and what its names held before counts as it did before it came.</summary>
    /// <param name="alongside">Written in the same commit.</param>
    public void Refuse(string sha, string reason, Action<StoreSession>? alongside = null) => store.Write(session =>
    {
        var shelf = new RecordingShelf(decoder);
        var effects = new ArrivalEffects(session, shelf, new SessionValues(decoder, shelf));
        effects.Apply(new DecodedArrival(sha, "unknown", new ArrivalVerdict(ArrivalState.Refused, reason, null), []));
        effects.TouchNames(sha);
        effects.Finish();
        alongside?.Invoke(session);
    });

    /// <summary>Contents that are new, or whose owner is told differently now, each once.</summary>
    private List<(ArrivalContent Content, IReadOnlyList<string> Claims, bool IsDecided, bool Salvages, ArrivalState? Before)> Pending(
        StoreSession session, IReadOnlyList<SeenContent> seen, bool force, IReadOnlyList<Sighting> gone)
    {
        var decided = session.Decisions.Assigned();
        return seen
            .GroupBy(item => item.Content.Sha, StringComparer.Ordinal)
            .Select(same =>
            {
                // A content read back from the archive was seen under the names on record; one seen now has its name besides.
                var known = session.Sightings.Of(same.Key).Except(gone).Select(sighting => new SeenName(sighting.Inbox, sighting.Path)).ToList();
                var names = known.Concat(same.Where(item => item.Origin is not null).Select(item => new SeenName(item.Origin!.Inbox, item.Content.Path))).ToList();
                var (salvaged, salvages) = (configuration.Salvages(known.Select(name => name.Inbox)), configuration.Salvages(names.Select(name => name.Inbox)));
                return (
                    same.First().Content,
                    Claims: Attribution.Claims(decided.GetValueOrDefault(same.Key)?.Person, names, configuration),
                    Salvages: salvages,
                    IsNewToSalvage: salvages && !salvaged,
                    Arrival: session.Arrivals.Get(same.Key));
            })
            .Where(item => force || IsPending(item.Arrival, item.Content, item.Claims) || (item.IsNewToSalvage && item.Arrival?.State == ArrivalState.Refused))
            .Select(item => (item.Content, item.Claims, decided.ContainsKey(item.Content.Sha), item.Salvages, item.Arrival?.State))
            .ToList();
    }

    private static bool IsPending(Arrival? arrival, ArrivalContent content, IReadOnlyList<string> claims) => arrival?.State switch
    {
        // An archive file refused inside another one, now seen by itself.
        ArrivalState.Refused => arrival.ParentSha is not null && content.ParentSha is null && content.Kind is ContentKind.Gzip or ContentKind.Zip,
        null or ArrivalState.Waiting => true,

        // Without a claim its device told whose it is, and still does: another roster or device list computes everything anew.
        ArrivalState.Stored => claims.Count > 1 || (claims.Count == 1 && claims[0] != arrival.Person),
        ArrivalState.Held => true,
        _ => false,
    };

    private static void RecordMembers(StoreSession session, IReadOnlyList<SeenContent> seen)
    {
        foreach (var (content, origin) in seen.Where(item => item.Content.ParentSha is not null))
        {
            session.Arrivals.AddWaiting(content.Sha, content.ParentSha, content.ParentSha!, content.Size);
            if (origin is not null)
            {
                session.Sightings.Upsert(origin.Inbox, content.Path, content.Sha, origin.FirstSeen, origin.Stamp);
            }
        }
    }
}
