using System.Data.Common;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using LoadWatch.Storage.Archives;

namespace LoadWatch.Service.Verifications;

/// <summary>
/// Reads everything that is kept and names what rotted: objects of the archive against their names, the database by its engine, activities against the
/// checksum written with them. It changes nothing and runs beside the service.
/// </summary>
/// <param name="progress">Is told what is read, how much of it, and of how much.</param>
public sealed class Verification(DataFolder folder, Store store, Action<string, int, int> progress)
{
    private const int PageRows = 500;
    private const string Rotten = "its bytes are not those that it is named by";

    private readonly List<Rot> found = [];

    public VerificationReport Run(CancellationToken cancel)
    {
        var objects = CheckObjects(cancel);
        var activities = 0;
        var unmarked = 0;
        try
        {
            found.AddRange(store.Check().Select(line => new Rot("database", $"The database: {line}", Advice.Database)));
            NameSessions();
            foreach (var activity in Activities(store, cancel))
            {
                activities++;
                unmarked += activity.IsSound is null ? 1 : 0;
                if (activity.IsSound == false)
                {
                    found.Add(new Rot($"activity {activity.Key}", $"The values of {activity.Person}'s session of {activity.Date:uuuu-MM-dd} are not those that were written", Advice.Rows));
                }
            }
        }
        catch (DbException error) when (StoreTroubles.Of(error) == StoreTrouble.Damaged)
        {
            found.Add(new Rot("database", $"The database cannot be read to its end: {error.Message}", Advice.Database));
        }

        return new VerificationReport(objects, activities, unmarked, found);
    }

    /// <summary>All activities of a store in the order of their keys, a page at a time.</summary>
    public static IEnumerable<CheckedActivity> Activities(Store store, CancellationToken cancel)
    {
        var after = "";
        for (var page = Page(); page.Count > 0; page = Page())
        {
            foreach (var activity in page)
            {
                yield return activity;
            }

            after = page[^1].Key;
        }

        IReadOnlyList<CheckedActivity> Page()
        {
            cancel.ThrowIfCancellationRequested();
            return store.Read(session => session.Activities.Check(after, PageRows));
        }
    }

    private int CheckObjects(CancellationToken cancel)
    {
        var archive = new Archive(folder);
        var objects = folder.Objects().ToList();
        var done = 0;
        foreach (var path in objects)
        {
            cancel.ThrowIfCancellationRequested();
            var name = Path.GetFileName(path);
            if (!IsSha(name) || !archive.Verify(name))
            {
                found.Add(new Rot(name, $"Original {Short(name)}: {Rotten}", Advice.Object));
            }

            progress("originals", ++done, objects.Count);
        }

        return objects.Count;
    }

    /// <summary>Which files and sessions a rotten object stands for, and which are missing altogether.</summary>
    private void NameSessions()
    {
        var rotten = found.Where(rot => rot.Advice == Advice.Object).ToDictionary(rot => rot.What, StringComparer.Ordinal);
        found.RemoveAll(rot => rot.Advice == Advice.Object);
        var named = store.Read(session =>
        {
            // In this order: an original is there before anything is known of it.
            var arrivals = session.Arrivals.All();
            var present = folder.Objects().Select(path => Path.GetFileName(path)).ToHashSet(StringComparer.Ordinal);
            return arrivals
                .GroupBy(arrival => arrival.ObjectSha, StringComparer.Ordinal)
                .Where(kept => rotten.ContainsKey(kept.Key) || !present.Contains(kept.Key))
                .Select(kept => OriginalRot.Of(session, kept.Key, [.. kept], rotten.ContainsKey(kept.Key) ? Rotten : "it is missing"))
                .ToList();
        });
        found.AddRange(named);
        found.AddRange(rotten.Values.Where(rot => !named.Exists(known => known.What == rot.What))
            .Select(rot => rot with { Sentence = $"Original {Short(rot.What)}, which nothing refers to: {Rotten}" }));
    }

    private static string Short(string name) => name[..Math.Min(12, name.Length)];

    private static bool IsSha(string name) => name.Length == 64 && name.All(char.IsAsciiHexDigitLower);
}
