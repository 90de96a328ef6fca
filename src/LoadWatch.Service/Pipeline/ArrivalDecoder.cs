using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Csv;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>From bytes to a judged arrival with all its values. Pure but for reading the archive; safe to use from several threads.</summary>
public sealed class ArrivalDecoder(WorkingConfiguration configuration, DecoderSet decoders, Archive archive, Instant now)
{
    private readonly MemberPlaces places = new(decoders);
    private readonly LastOriginal originals = new(archive);

    /// <summary>What tables say that recordings are computed with; the sweep keeps it up to date.</summary>
    public TableBasis Basis { get; set; } = TableBasis.Of(configuration);

    /// <summary>Whether a stored content was seen where files that were cut off are used.</summary>
    public Func<string, bool> Salvages { get; init; } = _ => false;

    /// <summary>Never fails for what the content holds: one that breaks the program is refused, and the others go on (I-10).</summary>
    /// <param name="claims">Ids of the people whom all sightings of the content name, or the one whom a decision names; where none, the devices or the content itself tell.</param>
    /// <param name="decided">A decision names the owner: then nobody asks whether the recordings can be theirs.</param>
    /// <param name="salvages">Whether it was seen where files that were cut off are used.</param>
    public JudgedArrival Judge(ArrivalContent content, IReadOnlyCollection<string> claims, bool decided, bool salvages)
    {
        try
        {
            return JudgeSound(content, claims, decided, salvages);
        }
        catch (Exception e) when (IsDefect(e))
        {
            return new JudgedArrival(Broken(content.Sha, Words.Of(content.Kind), e), []);
        }
    }

    /// <summary>With all values of its recordings. Never fails either.</summary>
    public DecodedArrival Compute(JudgedArrival judged)
    {
        try
        {
            var computed = judged.Kept.Select(kept => new ComputedRecording(kept.Summary, kept.Usable.Recording, Values(kept.Usable, kept.Owner, Basis)));
            return judged.Arrival with { Recordings = [.. judged.Arrival.Recordings, .. computed] };
        }
        catch (Exception e) when (IsDefect(e))
        {
            return Broken(judged.Arrival.Sha, judged.Arrival.Kind, e);
        }
    }

    private static DecodedArrival Broken(string sha, string kind, Exception defect) => new(
        sha, kind, new ArrivalVerdict(ArrivalState.Refused, $"a defect of LoadWatch, please report it: {defect.GetType().Name} while it was computed", null), []);

    /// <summary>What only a fault of the program throws while it computes.</summary>
    public static bool IsDefect(Exception e) => e is ArithmeticException or ArgumentException or InvalidOperationException or IndexOutOfRangeException;

    private JudgedArrival JudgeSound(ArrivalContent content, IReadOnlyCollection<string> claims, bool decided, bool salvages)
    {
        var kind = Words.Of(content.Kind);
        if (content.Kind is ContentKind.Gzip or ContentKind.Zip)
        {
            return new JudgedArrival(new DecodedArrival(content.Sha, kind, ContainerVerdict(content), []), []);
        }

        var read = ReadContent(content, salvages);
        var file = read.File;
        if (Subjects(file) is { Count: > 0 } subjects && (subjects.Count > 1 || claims.Count == 0))
        {
            return OfSeveral(content, read, subjects);
        }

        var owners = claims.Count > 0 ? claims : Attribution.ByDevice(file.Recordings.Concat(file.Worn), now, configuration.Devices, configuration.People);
        var verdict = OfTheRoster(ArrivalVerdict.Of(file, owners, now));
        var taken = new Taken();
        if (verdict.Person is { } owner && OfOwner(content, read, configuration.People[owner], decided, taken) is { } reason)
        {
            taken = new Taken();
            verdict = new ArrivalVerdict(ArrivalState.Held, reason, null);
        }

        var arrival = new DecodedArrival(content.Sha, file.Kind, verdict, taken.Computed)
        {
            Through = read.Through,
            Problems = Problems(file),
            Table = verdict.State == ArrivalState.Stored ? file.Table : null,
            Questions = verdict.State == ArrivalState.Stored && file is { Table: not null, Worn.Count: 0 } ? RowsNotUsed(file.Problems) : [],
        };
        return new JudgedArrival(arrival, taken.Kept);
    }

    /// <summary>Judges the recordings of one owner, one after the other.</summary>
    /// <returns>Why the file cannot be the owner's, by the first of its recordings that says so; else null.</returns>
    private string? OfOwner(ArrivalContent content, ReadContents read, Person owner, bool decided, Taken taken)
    {
        foreach (var recording in Usable(read))
        {
            var usable = Cut(recording);
            if (!decided && Implausible(usable, owner) is { } reason)
            {
                return reason;
            }

            Take(content.Sha, usable, owner, read, taken);
        }

        return null;
    }

    /// <summary>One question a table, however many of its rows cannot be used.</summary>
    private static IReadOnlyList<string> RowsNotUsed(IReadOnlyList<Problem> problems) => problems.Count switch
    {
        0 => [],
        1 => [$"1 row is not used: {problems[0]}"],
        _ => [$"{problems.Count} rows are not used, the first two: {problems[0]}; {problems[1]}"],
    };

    private static IReadOnlyList<string> Problems(DecodedFile file)
    {
        var more = file.Problems.Count - DecodedArrival.MostProblems;
        var told = file.Problems.Take(DecodedArrival.MostProblems).Select(problem => problem.ToString());
        return more > 0 ? [.. told, $"{more} more"] : [.. told];
    }

    private static List<string> Subjects(DecodedFile file) =>
        [.. file.Recordings.Select(recording => recording.Subject).OfType<string>().Distinct(StringComparer.Ordinal)];

    /// <summary>A file of several people: each recording is its person's; those of nobody are asked about and leave the others alone.</summary>
    private JudgedArrival OfSeveral(ArrivalContent content, ReadContents read, IReadOnlyList<string> subjects)
    {
        var file = read.File;
        var taken = new Taken();
        var questions = new List<string>();
        var dated = 0;
        foreach (var recording in Usable(read))
        {
            dated++;
            var person = OwnerOf(recording);
            if (person is null)
            {
                questions.Add($"\"{recording.Subject}\" is not in the roster: a line there, an alias or a line in devices.csv takes the recording up");
            }
            else if (Cut(recording) is var usable && Implausible(usable, person) is { } implausible)
            {
                questions.Add($"the recording of \"{recording.Subject}\" is left out: {implausible}");
            }
            else
            {
                Take(content.Sha, usable, person, read, taken);
            }
        }

        var asked = questions.Distinct(StringComparer.Ordinal).ToList();
        var verdict = taken.Count > 0
            ? new ArrivalVerdict(ArrivalState.Stored, asked.Concat(file.Problems.Select(problem => problem.ToString())).FirstOrDefault(), null)
            : new ArrivalVerdict(ArrivalState.Held, dated == 0 ? "no recording with a date" : $"owner unknown: none of the {subjects.Count} people in it is in the roster", null);
        var arrival = new DecodedArrival(content.Sha, file.Kind, verdict, taken.Computed)
        {
            Through = read.Through,
            Problems = Problems(file),
            Questions = taken.Count > 0 ? asked : [],
        };
        return new JudgedArrival(arrival, taken.Kept);
    }

    private Person? OwnerOf(Recording recording) =>
        recording.Subject is { } subject
            ? configuration.Subjects.Find(subject) ?? ByDevice(recording, subject.Trim())
            : null;

    private Person? ByDevice(Recording recording, string serial) =>
        Attribution.Owners(recording, serial, configuration.Devices, configuration.People) is [var only] ? only : null;

    private IEnumerable<Recording> Usable(ReadContents read) => read.Recordings().Where(recording => ArrivalVerdict.IsUsable(recording, now));

    private string? Implausible(UsableRecording recording, Person person)
    {
        var date = LocalStart.DateOf(recording.Recording, person);
        return Plausibility.Of(recording, person, Basis.AnchorsOf(person, date), date);
    }

    /// <summary>Folders only name people of the roster; one whom a decision names may have left it since.</summary>
    private ArrivalVerdict OfTheRoster(ArrivalVerdict verdict) =>
        verdict.Person is { } person && !configuration.People.ContainsKey(person)
            ? new ArrivalVerdict(ArrivalState.Held, AssignedFiles.NotInTheRoster(person), null)
            : verdict;

    /// <summary>The content of a known arrival, read back from the archive: the object itself, or the member of it that has this hash.</summary>
    /// <exception cref="InvalidDataException">The archive does not hold it any more.</exception>
    public ArrivalContent Read(Arrival arrival, string path) =>
        LargeText.In(archive, arrival.ObjectSha, path) ?? Content(arrival, path, archive.Read(arrival.ObjectSha));

    private ReadContents ReadContent(ArrivalContent content, bool salvages = false) => content switch
    {
        { Open: { } open } => new ReadContents(decoders.OpenText(open)),
        { Kind: ContentKind.Text } => new ReadContents(decoders.OpenText(content.Bytes)),
        _ => new ReadContents(decoders.Decode(content.Bytes, salvages)),
    };

    private ArrivalContent Content(Arrival arrival, string path, byte[] original) =>
        places.Find(arrival.ObjectSha, path, original, arrival.Sha)
        ?? throw new InvalidDataException($"the archive object {arrival.ObjectSha[..12]} no longer holds {arrival.Sha[..12]}");

    /// <summary>What a stored table holds.</summary>
    /// <exception cref="InvalidDataException">The archive does not hold it any more, or it is no table as layouts are now.</exception>
    public DecodedTable ReadTable(Arrival arrival) =>
        ReadContent(Read(arrival, ""), Salvages(arrival.Sha)).File.Table ?? throw new InvalidDataException($"{arrival.Sha[..12]} is no table");

    /// <summary>The recordings of a stored arrival, read back from the archive; none where its original is missing or damaged.</summary>
    public RecordingsAtHand ReadRecordings(Arrival arrival)
    {
        try
        {
            if (LargeText.In(archive, arrival.ObjectSha, "") is { } large)
            {
                return archive.Verify(arrival.ObjectSha) ? ReadContent(large).AtHand() : RecordingsAtHand.None;
            }

            return originals.ReadWhole(arrival.ObjectSha) is { } bytes ? ReadContent(Content(arrival, "", bytes), Salvages(arrival.Sha)).AtHand() : RecordingsAtHand.None;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or InvalidDataException)
        {
            return RecordingsAtHand.None;
        }
    }

    /// <summary>Everything computed from a recording of a person of the roster: of the part within the planned session, where the plan has its time.</summary>
    public ActivityValues Values(Recording recording, string person, TableBasis basis) => Values(Cut(recording), configuration.People[person], basis);

    /// <summary>The stimulus as <see cref="Values(Recording, string, TableBasis)"/> has it, with what lies between.</summary>
    public SessionStimulus StimulusOf(Recording recording, Person person, TableBasis basis) =>
        ActivityComputation.StimulusOf(Counted(Cut(recording), person, basis).Usable, person, AnchorsOf(recording, person, basis), configuration.Computation);

    /// <summary>Makes one recording of those of an activity, each by the quality cuts of the configuration; null where none gives anything.</summary>
    public Recording? Merged(SessionPlan plan, IReadOnlyDictionary<string, Recording> recordings) =>
        MergedSession.Of(plan, recordings, configuration.Computation.Quality);

    private UsableRecording Cut(Recording recording) => new(recording, configuration.Computation.UsableShareWanted, configuration.Computation.Quality);

    /// <summary>What is too long to be held is computed at once, and its samples let go.</summary>
    private void Take(string sha, UsableRecording usable, Person owner, ReadContents read, Taken taken)
    {
        if (read.Through is null)
        {
            taken.Kept.Add(Keep(sha, usable, owner, read.File.SourceName));
        }
        else
        {
            taken.Computed.Add(new ComputedRecording(RecordingSummaries.Of(sha, usable, owner, read.File.SourceName), null, Values(usable, owner, Basis)));
        }
    }

    private static KeptRecording Keep(string sha, UsableRecording usable, Person person, string? sourceName)
    {
        var summary = RecordingSummaries.Of(sha, usable, person, sourceName);
        var means = person.HeartRateIsValidOn(summary.Date) ? usable.BestMeans : usable.BestMeans.Where(one => one.Key != Channel.HeartRate).ToDictionary();
        return new KeptRecording(summary, usable, person, new SessionBests(summary.Key, summary.Date, summary.Sport, means));
    }

    private ActivityValues Values(UsableRecording usable, Person person, TableBasis basis)
    {
        var (counted, cut) = Counted(usable, person, basis);
        var values = ActivityComputation.Compute(counted, person, AnchorsOf(usable.Recording, person, basis), configuration.Computation);
        IReadOnlyList<string> missing = usable.Recording.CutOff is { } reason ? [$"only its beginning is used: {reason}"] : [];
        return cut.LeftOut.Count + missing.Count == 0
            ? values
            : values with { Remarks = [.. missing, .. cut.LeftOut, .. values.Remarks], Cuts = [.. cut.Cuts, .. values.Cuts] };
    }

    private static AnchorBook AnchorsOf(Recording recording, Person person, TableBasis basis) => basis.AnchorsOf(person, LocalStart.DateOf(recording, person));

    /// <summary>The part within the planned session.</summary>
    private (UsableRecording Usable, CutRecording Cut) Counted(UsableRecording usable, Person person, TableBasis basis)
    {
        var recording = usable.Recording;
        var planned = basis.Planned(person, LocalStart.DateOf(recording, person));
        var cut = SessionWindow.Of(recording, planned) is { } window ? RecordingCut.To(recording, window.Start, window.End) : CutRecording.Nothing(recording);
        return (cut.LeftOut.Count == 0 ? usable : Cut(cut.Recording), cut);
    }

    private static ArrivalVerdict ContainerVerdict(ArrivalContent content) => (content.Members, content.Problems.Count) switch
    {
        (0, 0) => new ArrivalVerdict(ArrivalState.Refused, "an archive without files", null),
        (0, _) => new ArrivalVerdict(ArrivalState.Refused, content.Problems[0].ToString(), null),
        (_, 0) => new ArrivalVerdict(ArrivalState.Aside, $"an archive; files in it: {content.Members}, each an arrival of its own", null),
        var (whole, broken) => new ArrivalVerdict(
            ArrivalState.Refused, $"{broken} of the {whole + broken} files in it; the others are taken. The first: {content.Problems[0]}", null),
    };

    /// <summary>Recordings of a content that have an owner: those to be computed, and those that are.</summary>
    private sealed class Taken
    {
        public List<KeptRecording> Kept { get; } = [];

        public List<ComputedRecording> Computed { get; } = [];

        public int Count => Kept.Count + Computed.Count;
    }

    /// <summary>A content as read.</summary>
    /// <param name="File">What it holds, without the samples where it is long.</param>
    /// <param name="Through">Reads the recordings where they are too many to be held; else null.</param>
    private sealed record ReadContents(DecodedFile File, TextContent? Through)
    {
        public ReadContents(DecodedFile file)
            : this(file, null)
        {
        }

        public ReadContents(TextContent text)
            : this(text.File, text.IsLong ? text : null)
        {
        }

        public IEnumerable<Recording> Recordings() => Through?.Recordings() ?? File.Recordings;

        public RecordingsAtHand AtHand() => Through is { } text ? new RecordingsAtHand(text) : new RecordingsAtHand(File.Recordings);
    }
}
