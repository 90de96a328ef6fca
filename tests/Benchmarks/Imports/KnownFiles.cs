using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;

namespace LoadWatch.Benchmarks.Imports;

/// <summary>Empty files in the inbox of a squad, each noted in the store as taken in long ago with the stamp that it has.</summary>
internal static class KnownFiles
{
    private const int InOneFolder = 1000;
    private const int InOneCommit = 10_000;
    private const string Mark = "known.txt";

    public static void Make(Squad squad, int files)
    {
        squad.Make();
        var mark = Path.Combine(squad.Root, Mark);
        var wanted = files.ToString(CultureInfo.InvariantCulture);
        if (File.Exists(mark) && File.ReadAllText(mark) == wanted)
        {
            return;
        }

        squad.ForgetImport();
        using var workplace = Workplace.OpenToWork(squad.ConfigPath);
        workplace.NewSweep(squad.Morning).Run();
        foreach (var numbers in Enumerable.Range(0, files).Chunk(InOneCommit))
        {
            var paths = numbers.Select(number => (Path: PathOf(squad, number), Person: Squad.Id(number / InOneFolder % squad.People))).ToList();
            paths.ForEach(item => Create(Path.Combine(squad.Inbox, item.Path)));
            workplace.Store.Write(session => paths.ForEach(item => Note(session, squad, item.Path, item.Person)));
        }

        File.WriteAllText(mark, wanted);
    }

    private static string PathOf(Squad squad, int number) => string.Create(
        CultureInfo.InvariantCulture, $"{Squad.Id(number / InOneFolder % squad.People)}/{number / InOneFolder:0000}/recording {number:0000000}.fit");

    private static void Create(string path)
    {
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        File.Create(path).Dispose();
    }

    private static void Note(StoreSession session, Squad squad, string path, string person)
    {
        var sha = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(path)));
        session.Arrivals.AddWaiting(sha, null, sha, 0);
        session.Arrivals.Settle(sha, ArrivalState.Aside, "fit", "no activity file", person);
        session.Sightings.Upsert("inbox", path, sha, squad.Morning, SafeFile.StampOf(Path.Combine(squad.Inbox, path))!);
    }
}
