using LoadWatch.Notices;
using LoadWatch.Rows;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Brings the rows of every table in line with its versions. Compares what was seen with what was applied, so it needs no mark of what is left to do: a kill
/// between the two is caught up by the next sweep. Recordings that the rows bear on are asked to be computed again in the same commit. A new version is put on top of the rows; anything else replays all versions in their order (I-5).
/// </summary>
public sealed class Tables(WorkingConfiguration configuration, Store store, ArrivalDecoder decoder, SweepReport report)
{
    private static readonly RowContent Compared = new LoadWatch.Rows.DayRow(DayWord.Rest);

    public void TakeUp(CancellationToken cancel)
    {
        foreach (var scope in store.Read(session => session.TableVersions.Changed()))
        {
            cancel.ThrowIfCancellationRequested();
            var (seen, applied) = store.Read(session => (session.TableVersions.Seen(scope), session.TableVersions.Applied(scope)));
            Update(scope, seen, applied);
            report.Advanced();
        }
    }

    private void Update(string scope, IReadOnlyList<TableVersion> versions, IReadOnlyList<TableVersion> done)
    {
        KillPoint.Pass("rows");
        var before = store.Read(session => session.TableRows.OfScope(scope));
        var goesOn = versions.Take(done.Count).SequenceEqual(done);
        var unread = new List<TableVersion>();
        var after = (goesOn ? versions.Skip(done.Count) : versions).Aggregate(goesOn ? before : [], (rows, version) => Apply(rows, version, unread));
        store.Write(session =>
        {
            Write(session, before, after);
            session.TableVersions.SetApplied(scope, [.. versions.Except(unread)]);
        });
    }

    /// <param name="unread">Gets the version where it cannot be read back: the next sweep tries again.</param>
    private IReadOnlyList<StoredRow> Apply(IReadOnlyList<StoredRow> rows, TableVersion version, List<TableVersion> unread)
    {
        try
        {
            var table = decoder.ReadTable(store.Read(session => session.Arrivals.Get(version.Sha))!);
            return NeedsOwner(table) && IsToldElsewhere(version) ? rows : TableUpdate.Apply(rows, version, table, row => PersonOf(row, version));
        }
        catch (Exception e) when (e is InvalidDataException or IOException)
        {
            // The others go on (I-10).
            unread.Add(version);
            report.Unreadable.Add(new BriefLine(version.Path, $"a version of this table cannot be read back: {e.Message}"));
            return rows;
        }
    }

    private static bool NeedsOwner(DecodedTable table) =>
        table.Kind is not (RowKind.Plan or RowKind.Answers) && table.Rows.Any(row => row.Subject is null);

    /// <summary>
    /// Whether a name that names nobody has its owner from another name of the content: it was moved there to be taken up, and what is retracted there later
    /// must not stand on here.
    /// </summary>
    private bool IsToldElsewhere(TableVersion version)
    {
        var (names, decided) = store.Read(session => (session.Sightings.Of(version.Sha), session.Decisions.Assigned().ContainsKey(version.Sha)));
        var byOwner = names.ToLookup(name => Attribution.Claims(null, [new SeenName(name.Inbox, name.Path)], configuration).Count > 0);
        return !decided && byOwner[true].Any() && byOwner[false].Any(name => name.Path == version.Path && version.Scope.StartsWith($"{name.Inbox}/", StringComparison.Ordinal));
    }

    private string? PersonOf(LoadWatch.Rows.TableRow row, TableVersion version) => row.Subject is { } written ? configuration.Subjects.Find(written, row.Date)?.Id : version.Owner;

    /// <summary>A row to be compared: contents hold lists, which are equal by their text only.</summary>
    private static (StoredRow Row, string Text) Told(StoredRow row) => (row with { Content = Compared }, RowText.Write(row.Content));

    private void Write(StoreSession session, IReadOnlyList<StoredRow> before, IReadOnlyList<StoredRow> after)
    {
        var gone = before.ExceptBy(after.Select(Told), Told).ToList();
        var said = after.ExceptBy(before.Select(Told), Told).ToList();
        session.TableRows.Remove(gone);
        session.TableRows.Put(said);
        foreach (var row in gone.Concat(said))
        {
            foreach (var person in TableBasis.Concerned(configuration, row))
            {
                session.People.MarkDirty(person, row.Date);
                if (TableBasis.Matters(row))
                {
                    session.Recomputations.Ask(person, row.Date, row.Content is PlanRow plan ? LocalDate.Max(row.Date, plan.Until ?? row.Date) : LocalDate.MaxIsoValue);
                }
            }
        }
    }
}
