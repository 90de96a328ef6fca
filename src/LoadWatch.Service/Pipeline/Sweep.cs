using LoadWatch.Decoding;
using LoadWatch.Decoding.Containers;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Configurations;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>One pass over everything: take in, settle, compute days, judge alerts, decide and deliver notices. Running it again changes nothing.</summary>
public sealed class Sweep
{
    private readonly WorkingConfiguration configuration;
    private readonly Store store;
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
    private readonly KnownFiles known;
    private bool isNewConfiguration;

    /// <param name="known">Kept between sweeps, it spares reading the names of all files again.</param>
    public Sweep(WorkingConfiguration configuration, DataFolder folder, Store store, Instant now, IDecodeProbe probe, KnownFiles? known = null)
    {
        this.configuration = configuration;
        this.store = store;
        this.now = now;
        this.known = known ?? new KnownFiles();
        var archive = new Archive(folder);
        var decoders = new DecoderSet(configuration.Layouts, ContainerLimits.For(configuration.LargestFileBytes));
        decoder = new ArrivalDecoder(configuration, decoders, archive, now)
        {
            Salvages = sha => configuration.Inboxes.Any(inbox => inbox.Salvage) && configuration.Salvages(store.Read(session => session.Sightings.Of(sha)).Select(sighting => sighting.Inbox)),
        };
        var reader = new ArchiveReader(store, archive, decoders);
        settlement = new Settlement(configuration, store, decoder, Report);
        intake = new Intake(configuration, store, archive, decoders, settlement, this.known, now, Report);
        recovery = new Recovery(store, archive, reader, settlement, probe);
        moved = new MovedFiles(configuration, store, reader, settlement, this.known, now, Report);
        answers = new Answers(configuration, now);
        assigned = new AssignedFiles(configuration, store, reader, settlement, Report);
        tables = new Tables(configuration, store, decoder, Report);
        recomputations = new Recomputations(store, archive, reader, settlement, probe, Report);
        briefs = new Briefs(configuration, now, Report.Unreadable, Report.MissingInboxes);
    }

    public SweepReport Report { get; } = new();

    /// <summary>Whether the pages tell all that was known before this sweep; only then may it leave those alone that it has no news for.</summary>
    public bool PagesAreCurrent { get; init; }

    /// <summary>Kept from sweep to sweep, since a look into an inbox may hang longer than a sweep lasts.</summary>
    public InboxLooks Looks { get; init; } = new();

    public bool PagesAreWritten { get; private set; }

    /// <summary>
    /// How long a sweep goes on with contents whose basis changed; the next one goes on from there. So a changed formula over a large archive does not hold back
    /// the morning's brief.
    /// </summary>
    public TimeSpan RecomputesFor { get; init; } = TimeSpan.FromMinutes(1);

    public SweepReport Run(CancellationToken cancel = default)
    {
        Adopt();
        recovery.Run(cancel);
        intake.TakeIn(Inboxes.Changed(configuration, store, Looks, known, now, Report), cancel);
        moved.TakeUp();
        new Renewal(configuration, store, decoder.Basis).Run(settlement.AskedAgain);
        var patience = IsFromNothing ? Patience.Endless : new Patience(RecomputesFor);
        Recompute(patience, cancel);
        Report.Take(store.Write(answers.TakeUp));
        assigned.TakeUp(cancel);
        Observe(new ObservedAnchorUpdate(configuration, store, now), patience, cancel);
        Evaluate(cancel);
        Report.InAll = store.Read(session => session.Arrivals.CountByState());
        return Report;
    }

    /// <summary>
    /// Computes every derived row again from the archive (I-5); sends nothing. The rows stand until their successors come, and one that was stopped goes on
    /// where it was.
    /// </summary>
    /// <param name="progress">Gets the number of originals that are through, and of all.</param>
    public SweepReport Rebuild(CancellationToken cancel, Action<int, int>? progress = null)
    {
        Adopt();
        recovery.Run(cancel);
        var (through, all) = store.Write(session =>
        {
            if (session.Derived.Rebuild() == RebuildState.None)
            {
                new Adoption(configuration, session).AskForAll(RebuildState.OverRows);
            }

            return (Through(session), session.Outdated.Objects());
        });
        KillPoint.Pass("asked");
        var done = 0;
        recomputations.Progressed = () => progress?.Invoke(Math.Min(++done, all), all);
        Recompute(Patience.Endless, cancel);
        Observe(new ObservedAnchorUpdate(configuration, store, now) { Through = through }, Patience.Endless, cancel);
        new DayUpdate(configuration, store, now, Report) { Through = through }.Run(cancel);
        return Report;
    }

    private bool IsFromNothing => store.Read(session => session.Derived.Rebuild() == RebuildState.FromNothing);

    /// <returns>The dates through which people are computed: a rebuild ends with the same rows, whatever the clock says by now.</returns>
    private Dictionary<string, LocalDate> Through(StoreSession session) => configuration.People.Keys
        .Select(person => (person, Date: session.People.ComputedTo(person)))
        .Where(item => item.Date is not null)
        .ToDictionary(item => item.person, item => item.Date!.Value, StringComparer.Ordinal);

    /// <summary>What was computed on another basis is asked for again: anchors, owners, limits or formulas may differ.</summary>
    private void Adopt()
    {
        var renewed = store.Write(session => new Adoption(configuration, session).Run());
        isNewConfiguration = renewed is not null;
        decoder.Basis = TableBasis.Of(configuration, store);
        new Renewal(configuration, store, decoder.Basis).Run(renewed);
    }

    /// <summary>Contents first, since tables are among them; then rows, and the recordings that they bear on.</summary>
    private void Recompute(Patience patience, CancellationToken cancel)
    {
        recomputations.Run(patience, cancel);
        tables.TakeUp(cancel);
        decoder.Basis = TableBasis.Of(configuration, store);
        recomputations.Run(patience, cancel);
        var aside = recomputations.Aside;
        Report.PeopleBehind = store.Write(session =>
        {
            if (session.Outdated.Count() == aside)
            {
                session.Derived.SetRebuild(RebuildState.None);
            }

            return session.Outdated.People();
        });
    }

    /// <summary>
    /// A reference value from own sessions that changed bears on sessions, which are computed again. They show the same bests, so another turn finds a change only where
    /// contents came through that were outdated for another reason; those that patience leaves come through in a later sweep.
    /// </summary>
    private void Observe(ObservedAnchorUpdate update, Patience patience, CancellationToken cancel)
    {
        while (update.Run(cancel) is { Count: > 0 } changed)
        {
            decoder.Basis = TableBasis.Of(configuration, store);
            new Renewal(configuration, store, decoder.Basis).Run(changed);
            Recompute(patience, cancel);
        }
    }

    private void Evaluate(CancellationToken cancel)
    {
        // Nothing settled may be waiting (I-14): a night that is half in would raise what the other half returns. Neither may rows be missing.
        if (IsFromNothing || store.Read(session => session.Arrivals.Waiting()).Any(arrival => !Recovery.IsSuspect(arrival)))
        {
            return;
        }

        new DayUpdate(configuration, store, now, Report).Run(cancel, new Evaluation(configuration, answers, briefs, now, Report).Run);
        KillPoint.Pass("evaluated");
        new Deliveries(store, configuration, Report).Run(now);
        Report.Missed = store.Read(session => MissedNotices.All(session, configuration).Count());
        new Pages(configuration, store, briefs, Report).Rewrite(now, all: !PagesAreCurrent || isNewConfiguration || Report.HasNews);
        PagesAreWritten = true;
    }
}
