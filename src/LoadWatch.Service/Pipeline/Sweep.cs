using LoadWatch.Activities;
using LoadWatch.Decoding;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>One pass over everything: take in, settle, compute days, judge alerts, decide and deliver notices. Running it again changes nothing.</summary>
public sealed class Sweep
{
    private readonly WorkingConfiguration configuration;
    private readonly Store store;
    private readonly Archive archive;
    private readonly Instant now;
    private readonly Settlement settlement;
    private readonly Intake intake;
    private readonly Recovery recovery;
    private readonly MovedFiles moved;
    private readonly Answers answers;
    private readonly AssignedFiles assigned;
    private readonly Tables tables;
    private readonly Recomputations recomputations;
    private readonly ArrivalDecoder decoder;
    private readonly Briefs briefs;
    private readonly ArchiveReader reader;

    public Sweep(WorkingConfiguration configuration, DataFolder folder, Store store, Instant now, IDecodeProbe probe)
    {
        this.configuration = configuration;
        this.store = store;
        this.now = now;
        archive = new Archive(folder);
        var decoders = new DecoderSet(configuration.Layouts);
        decoder = new ArrivalDecoder(configuration, decoders, archive, now);
        reader = new ArchiveReader(store, archive, decoders);
        settlement = new Settlement(configuration, store, decoder, Report);
        intake = new Intake(configuration, store, archive, decoders, settlement, now, Report);
        recovery = new Recovery(store, archive, reader, settlement, probe);
        moved = new MovedFiles(configuration, store, archive, reader, settlement, now, Report);
        answers = new Answers(configuration, now);
        assigned = new AssignedFiles(configuration, store, archive, reader, settlement, Report);
        tables = new Tables(configuration, store, decoder, Report);
        recomputations = new Recomputations(store, archive, reader, settlement);
        briefs = new Briefs(configuration, now, Report.Unreadable, Report.MissingInboxes);
    }

    public SweepReport Report { get; } = new();

    /// <summary>Whether the pages tell all that was known before this sweep; only then may it leave those alone that it has no news for.</summary>
    public bool PagesAreCurrent { get; init; }

    /// <summary>Kept from sweep to sweep, since a look into an inbox may hang longer than a sweep lasts.</summary>
    public InboxLooks Looks { get; init; } = new();

    public bool PagesAreWritten { get; private set; }

    public SweepReport Run(CancellationToken cancel = default)
    {
        AdoptConfiguration(cancel);
        decoder.Basis = store.Read(session => TableBasis.Of(configuration, session));
        recovery.Run(cancel);
        intake.TakeIn(Inboxes.Changed(configuration, store, Looks, now, Report), cancel);
        moved.TakeUp();
        TakeUpTables(cancel);
        Report.Take(store.Write(answers.TakeUp));
        assigned.TakeUp(cancel);
        Evaluate(cancel);
        Report.InAll = store.Read(session => session.Arrivals.CountByState());
        return Report;
    }

    /// <summary>Drops every derived row and computes it again from the archive (I-5); sends nothing.</summary>
    public SweepReport Rebuild(CancellationToken cancel, Action<int, int>? progress = null)
    {
        recovery.Run(cancel);
        var objects = store.Read(session => session.Arrivals.All())
            .Where(arrival => arrival.State != ArrivalState.Waiting && !Recovery.IsPoisonous(arrival))
            .Select(arrival => arrival.ObjectSha)
            .Distinct(StringComparer.Ordinal)
            .ToList();
        var through = store.Write(EmptyDerived);
        KillPoint.Pass("emptied");
        var done = 0;
        foreach (var piece in objects.SelectMany(sha => Kept(sha, () => progress?.Invoke(++done, objects.Count))).InPieces())
        {
            cancel.ThrowIfCancellationRequested();
            settlement.Settle(piece, force: true);
        }

        TakeUpTables(cancel);
        new DayUpdate(configuration, store, now, Report) { Through = through }.Run(cancel);
        store.Write(session => session.Derived.SetConfigHash(Basis));
        return Report;
    }

    /// <returns>The dates through which people were computed: a rebuild ends with the same rows, whatever the clock says by now.</returns>
    private Dictionary<string, LocalDate> EmptyDerived(StoreSession session)
    {
        var through = configuration.People.Keys
            .Select(person => (person, Date: session.People.ComputedTo(person)))
            .Where(item => item.Date is not null)
            .ToDictionary(item => item.person, item => item.Date!.Value, StringComparer.Ordinal);
        session.Derived.Empty();
        session.Derived.SetConfigHash("");
        return through;
    }

    /// <summary>Rows first, then the recordings that they bear on.</summary>
    private void TakeUpTables(CancellationToken cancel)
    {
        tables.TakeUp(cancel);
        decoder.Basis = store.Read(session => TableBasis.Of(configuration, session));
        recomputations.Run(cancel);
    }

    private IEnumerable<SeenContent> Kept(string objectSha, Action whenDone)
    {
        if (archive.Verify(objectSha))
        {
            foreach (var content in reader.Kept(objectSha))
            {
                yield return content;
            }
        }
        else
        {
            // The others go on; the row says what is missing, and a later rebuild finds it again once the original is back.
            settlement.Refuse(objectSha, "its original in the archive is missing or damaged");
        }

        whenDone();
    }

    /// <summary>The configuration and the formulas by which derived rows are computed.</summary>
    private string Basis => $"{configuration.Hash}/{ActivityComputation.Version}";

    /// <summary>What was computed on another basis is computed again: anchors, owners, limits or formulas may differ.</summary>
    private void AdoptConfiguration(CancellationToken cancel)
    {
        var derivedUnder = store.Write(session =>
        {
            session.Configurations.Remember(configuration.Hash, configuration.Text);
            return session.Derived.ConfigHash();
        });
        if (derivedUnder != Basis)
        {
            Rebuild(cancel);
        }
    }

    private void Evaluate(CancellationToken cancel)
    {
        // Nothing settled may be waiting (I-14): a night that is half in would raise what the other half returns.
        if (store.Read(session => session.Arrivals.Waiting()).Any(arrival => !Recovery.IsSuspect(arrival)))
        {
            return;
        }

        new DayUpdate(configuration, store, now, Report).Run(cancel);
        store.Write(new Evaluation(configuration, answers, briefs, now, Report).Run);
        KillPoint.Pass("evaluated");
        new Deliveries(store, Deliveries.Channels(configuration), Report).Run(now);
        new Pages(configuration, store, briefs, Report).Rewrite(now, all: !PagesAreCurrent || Report.HasNews);
        PagesAreWritten = true;
    }
}
