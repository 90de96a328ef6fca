using LoadWatch.Notices;
using LoadWatch.Rows;
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
    public void TakeUp(CancellationToken cancel)
    {
        var (seen, applied) = store.Read(session => (
            session.TableVersions.Seen().ToLookup(version => version.Scope, StringComparer.Ordinal),
            session.TableVersions.Applied().ToLookup(version => version.Scope, StringComparer.Ordinal)));
        foreach (var scope in seen.Concat(applied).Select(table => table.Key).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal))
        {
            cancel.ThrowIfCancellationRequested();
            var (versions, done) = (seen[scope].ToList(), applied[scope].ToList());
            if (!versions.SequenceEqual(done))
            {
                Update(scope, versions, done);
                report.Advanced();
            }
        }
    }

    private void Update(string scope, List<TableVersion> versions, List<TableVersion> done)
    {
        KillPoint.Pass("rows");
        var before = store.Read(session => session.TableRows.OfScope(scope));
        var goesOn = versions.Take(done.Count).SequenceEqual(done);
        var after = (goesOn ? versions.Skip(done.Count) : versions).Aggregate(goesOn ? before : [], Apply);
        store.Write(session =>
        {
            Write(session, before, after);
            session.TableVersions.SetApplied(scope, versions);
        });
    }

    private IReadOnlyList<StoredRow> Apply(IReadOnlyList<StoredRow> rows, TableVersion version)
    {
        try
        {
            var table = decoder.ReadTable(store.Read(session => session.Arrivals.Get(version.Sha))!);
            return TableUpdate.Apply(rows, version, table, row => PersonOf(row, version));
        }
        catch (Exception e) when (e is InvalidDataException or IOException)
        {
            // The others go on (I-10).
            report.Unreadable.Add(new BriefLine(version.Path, $"a version of this table cannot be read back: {e.Message}"));
            return rows;
        }
    }

    private string? PersonOf(LoadWatch.Rows.TableRow row, TableVersion version) => row.Subject is { } written ? configuration.Subjects.Find(written, row.Date)?.Id : version.Owner;

    private void Write(StoreSession session, IReadOnlyList<StoredRow> before, IReadOnlyList<StoredRow> after)
    {
        var (old, now) = (before.ToHashSet(), after.ToHashSet());
        var gone = before.Where(row => !now.Contains(row)).ToList();
        var said = after.Where(row => !old.Contains(row)).ToList();
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
