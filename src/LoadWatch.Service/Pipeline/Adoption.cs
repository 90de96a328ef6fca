using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Configurations;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Takes over a configuration: compares its parts with those that rows stand on, and in one transaction asks for just what depends on the changed ones: contents
/// to be decoded again, tables to be read again, days to be computed again. Nothing is dropped; what stands is replaced as its successor comes.
/// </summary>
public sealed class Adoption
{
    /// <summary>Before any recording or row.</summary>
    private static readonly LocalDate Beginning = new(1900, 1, 1);

    private static readonly Instant End = Instant.FromUtc(9999, 1, 1, 0, 0);

    /// <summary>A recording's local date and the date of its start in UTC are one apart at most, and a reference value is asked for on either side of midnight.</summary>
    private const int NearDays = 2;

    private readonly WorkingConfiguration configuration;
    private readonly StoreSession session;
    private readonly Lazy<bool> hasTimedPlan;
    private readonly Dictionary<string, LocalDate> renewed = new(StringComparer.Ordinal);
    private ILookup<(string Scope, string Part), string> before = null!;
    private ILookup<(string Scope, string Part), string> after = null!;

    public Adoption(WorkingConfiguration configuration, StoreSession session)
    {
        this.configuration = configuration;
        this.session = session;
        hasTimedPlan = new Lazy<bool>(() => session.TableRows.OfKind(RowKind.Plan).Any(TableBasis.Matters));
    }

    /// <returns>The people whose reference values changed, with the first date on which they do; null where rows stand on this configuration already.</returns>
    public IReadOnlyDictionary<string, LocalDate>? Run()
    {
        session.Configurations.Remember(configuration.Hash, configuration.Text);
        var basis = $"{configuration.Hash}/{Activities.ActivityComputation.Version}";
        var (stored, storedBasis) = (session.Derived.ConfigHash() is null ? [] : session.Basis.All(), session.Derived.ConfigHash());
        if (stored.Count > 0 && storedBasis == basis)
        {
            return null;
        }

        var parts = BasisParts.Of(configuration);
        (before, after) = (Lookup(stored), Lookup(parts));
        ForgetStrangers();
        Ask(isFromNothing: stored.Count == 0);
        session.Basis.Replace(parts);
        session.Derived.SetConfigHash(basis);
        return renewed;
    }

    /// <summary>Asks for everything, whatever it stands on.</summary>
    /// <param name="state">Over rows only where a user asks for it: a rebuild that was stopped goes on, but one that is asked for leaves nothing out.</param>
    public void AskForAll(RebuildState state)
    {
        session.Outdated.AddAll();
        session.TableVersions.ReplayAll();
        foreach (var person in session.People.All())
        {
            session.People.MarkDirty(person, Beginning);
        }

        // Once the rows were gone they are, until all are back.
        session.Derived.SetRebuild(session.Derived.Rebuild() == RebuildState.FromNothing ? RebuildState.FromNothing : state);
    }

    private static ILookup<(string Scope, string Part), string> Lookup(IEnumerable<BasisPart> parts) => parts.ToLookup(part => (part.Scope, part.Part), part => part.Value);

    /// <summary>Those who left the roster. Their recordings are judged again with everything that names decide.</summary>
    private void ForgetStrangers()
    {
        foreach (var person in session.People.All().Where(person => configuration.People.GetValueOrDefault(person)?.Id != person))
        {
            session.Derived.ForgetPerson(person);
        }
    }

    private void Ask(bool isFromNothing)
    {
        if (isFromNothing)
        {
            AskForAll(RebuildState.FromNothing);
            return;
        }

        if (Changed(BasisParts.Formulas) || Changed(BasisParts.Computation))
        {
            AskForAll(RebuildState.None);
        }

        if (Changed(BasisParts.Layouts))
        {
            session.Outdated.AddText();
            session.TableVersions.ReplayAll();
        }

        if (Changed(BasisParts.Names) || Changed(BasisParts.Devices))
        {
            // Whose a row is, is said while tables are read.
            session.TableVersions.ReplayAll();
        }

        if (Changed(BasisParts.Names) || Changed(BasisParts.Devices) || Changed(BasisParts.FileNames))
        {
            AskForOwners();
        }

        if (Changed(BasisParts.Salvage))
        {
            session.Outdated.AddInState(ArrivalState.Refused);
            session.Outdated.AddInState(ArrivalState.Stored);
        }

        foreach (var person in configuration.People.Keys)
        {
            AskFor(person);
        }
    }

    private bool Changed(string part, string scope = BasisParts.Everybody) => !before[(scope, part)].SequenceEqual(after[(scope, part)], StringComparer.Ordinal);

    private void AskFor(string person)
    {
        if (Changed(BasisParts.Group, person))
        {
            // A planned session may be cut out of the recordings, and whose it is goes by the group.
            session.People.MarkDirty(person, Beginning);
            AskForRecordings(person, hasTimedPlan.Value ? Beginning : null);
        }

        if (Changed(BasisParts.Rules, person))
        {
            session.People.MarkDirty(person, Beginning);
        }

        LocalDate?[] references = [Changed(BasisParts.Profile, person) ? Beginning : null, FirstChangedAnchor(person)];
        if (references.Min() is { } renewable)
        {
            renewed[person] = renewable;
        }

        AskForRecordings(person, references.Min());
        if (ChangedHeartRate(person) is var (first, last))
        {
            AskForRecordings(person, first, last);

            // From then on ratings are converted, by pairs of all the time before.
            session.People.MarkDirty(person, Beginning);
        }

        if (references[1] is not null)
        {
            // By another reference value they may be their owner's, or no longer be.
            session.Outdated.AddInState(ArrivalState.Held);
            session.Outdated.AddAsked();
        }
    }

    /// <param name="to">Last date; null: all later ones.</param>
    private void AskForRecordings(string person, LocalDate? from, LocalDate? to = null)
    {
        if (from is { } since)
        {
            // "Never" in the roster is the first date that there is.
            var date = LocalDate.Max(since, Beginning);
            session.Outdated.AddRecordings(person, date.PlusDays(-NearDays).AtMidnight().InUtc().ToInstant(), to?.PlusDays(NearDays).AtMidnight().InUtc().ToInstant() ?? End);
            session.People.MarkDirty(person, date);
        }
    }

    /// <summary>From when to when heart rate says something now and said nothing before, or the reverse.</summary>
    private (LocalDate First, LocalDate? Last)? ChangedHeartRate(string person) =>
        HeartRate(before, person).DifferenceTo(HeartRate(after, person));

    private static DatePeriods HeartRate(ILookup<(string Scope, string Part), string> parts, string person) =>
        DatePeriods.Parse(string.Join(' ', parts[(person, BasisParts.HeartRate)]));

    private LocalDate? FirstChangedAnchor(string person)
    {
        var (old, now) = (Anchors(before, person), Anchors(after, person));
        return old.Except(now, StringComparer.Ordinal).Concat(now.Except(old, StringComparer.Ordinal)).Select(line => (LocalDate?)(BasisParts.DateOf(line) ?? Beginning)).Min();
    }

    private static IReadOnlyList<string> Anchors(ILookup<(string Scope, string Part), string> parts, string person) =>
        [.. parts[(person, BasisParts.Anchors)].SelectMany(text => text.Split('\n', StringSplitOptions.RemoveEmptyEntries))];

    /// <summary>Who owns a content is judged by its names alone where they name anybody; only the others are decoded for it.</summary>
    private void AskForOwners()
    {
        session.Outdated.AddInState(ArrivalState.Held);
        foreach (var sha in new OwnerChanges(configuration, session).Find())
        {
            session.Outdated.Add(sha);
        }
    }
}
