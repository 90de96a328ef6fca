using LoadWatch.Activities;
using LoadWatch.Decoding;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>From bytes to a judged arrival with all its values. Pure but for reading the archive; safe to use from several threads.</summary>
public sealed class ArrivalDecoder(WorkingConfiguration configuration, DecoderSet decoders, Archive archive, Instant now)
{
    /// <summary>Never fails for what the content holds: one that breaks the computation is refused, and the others go on (I-10).</summary>
    /// <param name="claims">Ids of the people whom all sightings of the content name, or the one whom a decision names; where none, the devices tell.</param>
    public DecodedArrival Decode(ArrivalContent content, IReadOnlyCollection<string> claims)
    {
        try
        {
            return DecodeSound(content, claims);
        }
        catch (Exception e) when (e is ArithmeticException or ArgumentException or InvalidOperationException or IndexOutOfRangeException)
        {
            var reason = $"a defect of LoadWatch, please report it: {e.GetType().Name} while it was computed";
            return new DecodedArrival(content.Sha, Words.Of(content.Kind), new ArrivalVerdict(ArrivalState.Refused, reason, null), []);
        }
    }

    private DecodedArrival DecodeSound(ArrivalContent content, IReadOnlyCollection<string> claims)
    {
        var kind = Words.Of(content.Kind);
        if (content.Kind is ContentKind.Gzip or ContentKind.Zip)
        {
            return new DecodedArrival(content.Sha, kind, ContainerVerdict(content), []);
        }

        var file = decoders.Decode(content.Bytes);
        var owners = claims.Count > 0 ? claims : Attribution.ByDevice(file.Recordings, now, configuration.Devices, configuration.People);
        var verdict = OfTheRoster(ArrivalVerdict.Of(file, owners, now));
        return new DecodedArrival(content.Sha, file.Kind, verdict, verdict.Person is { } person ? Compute(content.Sha, file, person) : [])
        {
            Table = verdict.State == ArrivalState.Stored ? file.Table : null,
        };
    }

    /// <summary>Folders only name people of the roster; one whom a decision names may have left it since.</summary>
    private ArrivalVerdict OfTheRoster(ArrivalVerdict verdict) =>
        verdict.Person is { } person && !configuration.People.ContainsKey(person)
            ? new ArrivalVerdict(ArrivalState.Held, AssignedFiles.NotInTheRoster(person), null)
            : verdict;

    /// <summary>The content of a known arrival, read back from the archive: the object itself, or the member of it that has this hash.</summary>
    /// <exception cref="InvalidDataException">The archive does not hold it any more.</exception>
    public ArrivalContent Read(Arrival arrival, string path) =>
        ArrivalContent.Expand(decoders, arrival.ObjectSha, path, archive.Read(arrival.ObjectSha)).FirstOrDefault(content => content.Sha == arrival.Sha)
        ?? throw new InvalidDataException($"the archive object {arrival.ObjectSha[..12]} no longer holds {arrival.Sha[..12]}");

    /// <summary>What a stored table holds.</summary>
    /// <exception cref="InvalidDataException">The archive does not hold it any more, or it is no table as layouts are now.</exception>
    public DecodedTable ReadTable(Arrival arrival) =>
        decoders.Decode(Read(arrival, "").Bytes).Table ?? throw new InvalidDataException($"{arrival.Sha[..12]} is no table");

    /// <summary>Computes the values of one recording of a stored arrival again.</summary>
    public ActivityValues Recompute(Arrival arrival, int part)
    {
        var file = decoders.Decode(Read(arrival, "").Bytes);
        var recording = file.Recordings.First(candidate => candidate.Part == part);
        return ActivityComputation.Compute(
            recording, configuration.People[arrival.Person!], configuration.Anchors, configuration.Computation);
    }

    private List<ComputedRecording> Compute(string sha, DecodedFile file, string personId)
    {
        var person = configuration.People[personId];
        return file.Recordings
            .Where(recording => ArrivalVerdict.IsUsable(recording, now))
            .Select(recording => new ComputedRecording(
                RecordingSummaries.Of(sha, recording, person, file.SourceName),
                ActivityComputation.Compute(recording, person, configuration.Anchors, configuration.Computation)))
            .ToList();
    }

    private static ArrivalVerdict ContainerVerdict(ArrivalContent content) => (content.Members, content.Problems.Count) switch
    {
        (0, 0) => new ArrivalVerdict(ArrivalState.Refused, "an archive without files", null),
        (0, _) => new ArrivalVerdict(ArrivalState.Refused, content.Problems[0].ToString(), null),
        (_, 0) => new ArrivalVerdict(ArrivalState.Aside, $"an archive; files in it: {content.Members}, each an arrival of its own", null),
        var (whole, broken) => new ArrivalVerdict(
            ArrivalState.Refused, $"{broken} of the {whole + broken} files in it; the others are taken. The first: {content.Problems[0]}", null),
    };
}
