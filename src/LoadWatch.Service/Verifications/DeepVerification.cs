using LoadWatch.Service.Commands;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;

namespace LoadWatch.Service.Verifications;

/// <summary>
/// Computes everything anew from the originals, in a copy of the database aside, and compares activity by activity: finds what no checksum can, rows that
/// were written wrong.
/// </summary>
public sealed class DeepVerification(Workplace workplace, Action<string, int, int> progress)
{
    /// <returns>What differs; null where the rows were computed on another configuration or by another version, or wait to be: a sweep mends that first.</returns>
    public IReadOnlyList<Rot>? Run(CancellationToken cancel)
    {
        var aside = Path.Combine(workplace.Folder.Root, FormattableString.Invariant($"verify-{Environment.ProcessId}"));
        try
        {
            var folder = DataFolder.Open(aside);
            workplace.Store.CopyTo(folder);
            using var copy = Store.Open(folder);
            var (before, behind) = copy.Read(session => (session.Derived.ConfigHash(), session.Outdated.Count()));
            if (behind > 0)
            {
                return null;
            }

            // Of the copy: beside a service the store itself goes on.
            var stored = Verification.Activities(copy, cancel).ToList();
            workplace.NewSweepOn(copy, MachineClock.Now()).Rebuild(cancel, (done, total) => progress("originals computed anew", done, total));
            return before == copy.Read(session => session.Derived.ConfigHash()) ? Differences(stored, copy, cancel) : null;
        }
        finally
        {
            if (Directory.Exists(aside))
            {
                Directory.Delete(aside, recursive: true);
            }
        }
    }

    private static List<Rot> Differences(IEnumerable<CheckedActivity> before, Store copy, CancellationToken cancel)
    {
        var found = new List<Rot>();
        using var stored = before.GetEnumerator();
        using var anew = Verification.Activities(copy, cancel).GetEnumerator();
        var (left, right) = (Next(stored), Next(anew));
        while (left is not null || right is not null)
        {
            var order = left is null ? 1 : right is null ? -1 : string.CompareOrdinal(left.Key, right.Key);
            if (order != 0 || left!.Checksum != right!.Checksum)
            {
                var one = order > 0 ? right! : left!;
                var how = order == 0 ? "differs from" : order < 0 ? "does not come out of" : "is missing, though it comes out of";
                found.Add(new Rot($"activity {one.Key}", $"{one.Person}'s session of {one.Date:uuuu-MM-dd} {how} what its originals give now", Advice.Rows));
            }

            left = order <= 0 ? Next(stored) : left;
            right = order >= 0 ? Next(anew) : right;
        }

        return found;
    }

    private static CheckedActivity? Next(IEnumerator<CheckedActivity> all) => all.MoveNext() ? all.Current : null;
}
