using LoadWatch.Activities;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Containers;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Stimulus;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>The recordings of a session read from the archive once more, for what lies between them and the stimulus: that is stored nowhere.</summary>
internal static class ArchivedSession
{
    /// <summary>Null where an original is missing or damaged.</summary>
    public static SessionStimulus? Stimulus(
        WorkingConfiguration configuration, Archive archive, StoreSession session, TableBasis basis, Person person, StoredMerge merge)
    {
        var decoders = new DecoderSet(configuration.Layouts, ContainerLimits.For(configuration.LargestFileBytes));
        var decoder = new ArrivalDecoder(configuration, decoders, archive, Instant.MaxValue)
        {
            Salvages = sha => configuration.Salvages(session.Sightings.Of(sha).Select(sighting => sighting.Inbox)),
        };
        var shelf = new RecordingShelf(decoder);
        try
        {
            return Merged(decoder, shelf, new SessionPlan(merge.Winner, merge.Frame, merge.Contributions), session.Arrivals.Get) is { } recording
                ? decoder.StimulusOf(recording, person, basis)
                : null;
        }
        catch (IOException)
        {
            return null;
        }
        finally
        {
            shelf.Close();
        }
    }

    private static Recording? Merged(ArrivalDecoder decoder, RecordingShelf shelf, SessionPlan plan, Func<string, Arrival?> arrivalOf) =>
        plan.Givers.All(key => shelf.Has(key, arrivalOf))
            ? decoder.Merged(plan, plan.Givers.ToDictionary(key => key, key => shelf.Find(key, arrivalOf)!, StringComparer.Ordinal))
            : null;
}
