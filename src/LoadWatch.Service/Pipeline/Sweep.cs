using LoadWatch.Decoding;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>One pass over everything: take in, settle, compute days, judge alerts, decide and deliver notices. Running it again changes nothing.</summary>
public sealed class Sweep
{
    private const int ObjectsInOneCommit = 64;

    private readonly WorkingConfiguration configuration;
    private readonly Store store;
    private readonly Instant now;
    private readonly Settlement settlement;
    private readonly Intake intake;
    private readonly Recovery recovery;
    private readonly Briefs briefs;
    private readonly ArchiveReader reader;

    public Sweep(WorkingConfiguration configuration, DataFolder folder, Store store, Instant now, IDecodeProbe probe)
    {
        this.configuration = configuration;
        this.store = store;
        this.now = now;
        var archive = new Archive(folder);
        var decoders = new DecoderSet(configuration.Layouts);
        var decoder = new ArrivalDecoder(configuration, decoders, archive, now);
        reader = new ArchiveReader(store, archive, decoders);
        settlement = new Settlement(configuration, store, decoder, now, Report);
        intake = new Intake(configuration, store, archive, decoders, settlement, now, Report);
        recovery = new Recovery(store, archive, reader, settlement, probe);
        briefs = new Briefs(configuration, now);
    }

    public SweepReport Report { get; } = new();

    public SweepReport Run(CancellationToken cancel = default)
    {
        AdoptConfiguration(cancel);
        recovery.Run(cancel);
        Inboxes.MakePersonFolders(configuration);
        intake.TakeIn(Inboxes.Changed(configuration, store, Report), cancel);
        Evaluate(cancel);
        return Report;
    }

    /// <summary>Drops every derived row and computes it again from the archive (I-5); sends nothing.</summary>
    public SweepReport Rebuild(CancellationToken cancel, Action<int, int>? progress = null)
    {
        recovery.Run(cancel);
        var objects = store.Read(session => session.Arrivals.All()).Select(arrival => arrival.ObjectSha).Distinct(StringComparer.Ordinal).ToList();
        store.Write(session =>
        {
            session.Derived.Empty();
            session.Derived.SetConfigHash("");
        });
        var done = 0;
        foreach (var group in objects.Chunk(ObjectsInOneCommit))
        {
            cancel.ThrowIfCancellationRequested();
            settlement.Settle(group.SelectMany(reader.Contents).ToList(), force: true);
            done += group.Length;
            progress?.Invoke(done, objects.Count);
        }

        new DayUpdate(configuration, store, now, Report).Run(cancel);
        store.Write(session => session.Derived.SetConfigHash(configuration.Hash));
        return Report;
    }

    /// <summary>What was computed under another configuration is computed again: anchors, owners and limits may differ.</summary>
    private void AdoptConfiguration(CancellationToken cancel)
    {
        var derivedUnder = store.Write(session =>
        {
            session.Configurations.Remember(configuration.Hash, configuration.Text);
            return session.Derived.ConfigHash();
        });
        if (derivedUnder != configuration.Hash)
        {
            Rebuild(cancel);
            Report.Settled.Clear();
        }
    }

    private void Evaluate(CancellationToken cancel)
    {
        // Nothing settled may be waiting (I-14): a night that is half in would raise what the other half returns.
        if (store.Read(session => session.Arrivals.Waiting()).Count > 0)
        {
            return;
        }

        new DayUpdate(configuration, store, now, Report).Run(cancel);
        store.Write(new Evaluation(configuration, briefs, now, Report).Run);
        KillPoint.Pass("evaluated");
        new Deliveries(store, Deliveries.Channels(configuration), Report).Run(now);
        new Pages(configuration, store, briefs, Report).Rewrite();
    }
}
