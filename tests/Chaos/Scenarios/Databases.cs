using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>The database held, damaged, gone, old or new, and originals that rot: section D of the catalogue.</summary>
public static class Databases
{
    private const int Damaged = 65;
    private const int InputOutput = 74;
    private const int TryLater = 75;
    private const int Configuration = 78;
    private const int PageBytes = 4096;

    /// <summary>What is done to the file, and what must be said of it with which exit code.</summary>
    private static readonly (string What, Action<string> Do, string Said, int Code)[] Damages =
    [
        ("its header is gone", path => Overwrite(path, 0, 100), "backup", Damaged),
        ("all behind its first page is gone", path => Overwrite(path, PageBytes, (int)new FileInfo(path).Length - PageBytes), "backup", Damaged),
        ("it is cut in half", path => Truncate(path, new FileInfo(path).Length / 2 / PageBytes * PageBytes), "backup", Damaged),
        ("it is empty", path => Truncate(path, 0), "missing", Damaged),
        ("it is deleted", File.Delete, "missing", Damaged),
        ("it is another program's", MakeForeign, "another program", Damaged),
        ("it is of a newer version", path => Execute(path, "PRAGMA user_version=9999"), "newer", Configuration),
    ];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("database-held", "D63 D64", "Another program holds the database while a sweep starts: 75 and a line; one that only reads for the whole sweep changes nothing.", Held),
        new("database-damaged", "D65 D67 D69", "Header, pages or all of the database gone, another program's or a newer version's in its place: 65, or 78 for the newer version, what to do is said, the file stays as it is, and the backup put back goes on.", DamagedFile),
        new("database-page", "D65", "A page of an index, then of a table is gone: verify names it.", DamagedPage),
        new("database-deleted", "D67", "The database is deleted under the running service: 74, no new one, 65 at the next start, and the backup put back goes on.", Deleted),
        new("log-deleted", "D66", "The write-ahead log of a killed run is deleted: what it held comes in again.", LogDeleted),
        new("database-of-yesterday", "D68", "The database of the day before beside the archive of today: what came since comes in again, once.", OfYesterday),
        new("rotted-original", "D72", "One bit of an original in the archive flips: verify names it, every value stays.", Rotted),
        new("two-instances", "D71", "A second instance ends at once with 75 and names the first; killed, the first leaves a number behind that stops nobody.", TwoInstances),
    ];

    private static void Held(Trial trial)
    {
        var nights = Nights.OneFile(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed);
        var undisturbed = Trial.Undisturbed(place, nights);
        place.Fill(nights.Tonight);
        using (var other = Open(place.DatabasePath))
        using (other.BeginTransaction(deferred: false))
        {
            var ended = place.Sweep();
            Trial.MustBe(TryLater, ended.Code, "as the exit code where the database is held");
            Trial.MustSay(ended.Errors, "holds the database");
        }

        using (var other = Open(place.DatabasePath))
        using (var reading = other.BeginTransaction(deferred: true))
        {
            using var command = other.CreateCommand();
            (command.Transaction, command.CommandText) = (reading, "SELECT COUNT(*) FROM arrival");
            command.ExecuteScalar();
            place.SweepWell();
        }

        Trial.MustConverge(place, undisturbed);
        trial.Survived();
        trial.Survived();
    }

    private static void DamagedFile(Trial trial)
    {
        using var done = Done(trial, out var undisturbed);
        Parallel.ForEach(Damages, Trial.TwoAtOnce, damage => Trial.Named(damage.What, () =>
        {
            using var place = done.Copy();
            damage.Do(place.DatabasePath);
            var before = Content(place.DatabasePath);
            var ended = place.Sweep();
            Trial.MustBe(damage.Code, ended.Code, $"as the exit code ({ended.Said})");
            Trial.MustSay(ended.Errors, damage.Said);
            Trial.MustBe(0, before.SequenceEqual(Content(place.DatabasePath)) ? 0 : 1, "changes of the file");
            PutBack(done, place);
            Trial.MustConverge(place, undisturbed);
            trial.Survived();
        }));
    }

    private static void DamagedPage(Trial trial)
    {
        using var done = Done(trial, out var undisturbed);
        foreach (var kind in new[] { "type = 'index' AND name = 'sighting_first_seen'", "type = 'table' AND name = 'activity'" })
        {
            using var place = done.Copy();
            var page = Execute(place.DatabasePath, $"SELECT rootpage FROM sqlite_master WHERE {kind}");
            Overwrite(place.DatabasePath, (Convert.ToInt32(page, System.Globalization.CultureInfo.InvariantCulture) - 1) * PageBytes, PageBytes);
            var ended = place.Command("verify");
            Trial.MustBe(Damaged, ended.Code, $"as the exit code of verify ({ended.Said})");
            PutBack(done, place);
            Trial.MustConverge(place, undisturbed);
            trial.Survived();
        }
    }

    private static void Deleted(Trial trial)
    {
        var nights = new Nights(Clock.Machine, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Machine);
        place.SweepWell();
        using var backup = place.Copy();
        using (var service = ServiceAtWork.Start(place, []))
        {
            service.MustSay("started");
            Array.ForEach(["", "-wal", "-shm"], side => File.Delete(place.DatabasePath + side));
            place.Put("anna/ride.fit", nights.Truth.Must(Truth.Stored, Files.Fit(nights.Session("anna", 0))));
            Trial.MustBe(InputOutput, service.Process.WaitForEnd().Code, "as the exit code where the database was deleted");
        }

        Trial.MustBe(0, File.Exists(place.DatabasePath) ? 1 : 0, "new databases");
        Trial.MustBe(Damaged, place.Sweep().Code, "as the exit code of the next start");
        PutBack(backup, place);
        place.SweepWell();
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static void LogDeleted(Trial trial)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed);
        var undisturbed = Trial.Undisturbed(place, nights);
        place.Fill(nights.Tonight);
        Trial.MustBe(Ended.Killed, place.Sweep(("LOADWATCH_KILL_AT", "evaluated:1")).Code, "as the exit code of a killed process");
        trial.Figure("bytes of the log", new FileInfo(place.DatabasePath + "-wal").Length);
        Array.ForEach(["-wal", "-shm"], side => File.Delete(place.DatabasePath + side));
        Trial.MustConverge(place, undisturbed);
        trial.Survived();
    }

    private static void OfYesterday(Trial trial)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var yesterday = trial.Prepared(nights, Clock.Fixed);
        using var place = yesterday.Copy();
        place.Fill(nights.Tonight);
        place.SweepWell();
        var wanted = Values.Of(place);
        PutBack(yesterday, place);
        place.SweepWell();
        Values.MustEqual(Values.Of(place), wanted);
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static void Rotted(Trial trial)
    {
        using var place = Done(trial, out _);
        var before = StoreDump.Lines(place.DatabasePath);
        var original = Directory.EnumerateFiles(Path.Combine(place.Data, "archive"), "*", SearchOption.AllDirectories).Order(StringComparer.Ordinal).First();
        Tool.Run("chmod", "600", original);
        var bytes = File.ReadAllBytes(original);
        bytes[bytes.Length / 2] ^= 8;
        File.WriteAllBytes(original, bytes);
        var ended = place.Command("verify");
        Trial.MustBe(Damaged, ended.Code, $"as the exit code of verify ({ended.Said})");
        Trial.MustSay(ended.Output, Path.GetFileName(original)[..12]);
        place.SweepWell();
        Trial.MustBe(0, before.SequenceEqual(StoreDump.Lines(place.DatabasePath), StringComparer.Ordinal) ? 0 : 1, "changes of the rows");
        trial.Survived();
    }

    private static void TwoInstances(Trial trial)
    {
        var nights = new Nights(Clock.Machine, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Machine);
        using (var first = ServiceAtWork.Start(place, []))
        {
            first.MustSay("started");
            var second = place.Sweep();
            Trial.MustBe(TryLater, second.Code, "as the exit code of a second instance");
            Trial.MustSay(second.Errors, FormattableString.Invariant($"process {first.Process.Id} holds"));
            first.Process.Kill();
        }

        // A number that belongs to somebody else by now.
        File.WriteAllText(Path.Combine(place.Data, "loadwatch.lock"), FormattableString.Invariant($"{Environment.ProcessId}"));
        place.Put("anna/ride.fit", nights.Truth.Must(Truth.Stored, Files.Fit(nights.Session("anna", 0))));
        place.SweepWell();
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static Place Done(Trial trial, out Digest undisturbed)
    {
        var nights = Nights.OneFile(Clock.Fixed, trial.Seed);
        var place = trial.Prepared(nights, Clock.Fixed);
        place.Fill(nights.Tonight);
        place.SweepWell();
        undisturbed = Digest.Of(place);
        return place;
    }

    private static void PutBack(Place from, Place to)
    {
        Array.ForEach(["", "-wal", "-shm"], side => File.Delete(to.DatabasePath + side));
        File.Copy(from.DatabasePath, to.DatabasePath);
    }

    private static byte[] Content(string path) => File.Exists(path) ? File.ReadAllBytes(path) : [];

    private static void Overwrite(string path, int from, int count)
    {
        using var file = new FileStream(path, FileMode.Open, FileAccess.Write);
        file.Position = from;
        file.Write(new byte[count]);
    }

    private static void Truncate(string path, long length)
    {
        using var file = new FileStream(path, FileMode.Open, FileAccess.Write);
        file.SetLength(length);
    }

    private static void MakeForeign(string path)
    {
        File.Delete(path);
        using var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Pooling = false }.ConnectionString);
        connection.Open();
        using var command = connection.CreateCommand();
        command.CommandText = "CREATE TABLE theirs (x)";
        command.ExecuteNonQuery();
    }

    private static object? Execute(string path, string sql)
    {
        using var connection = Open(path);
        using var command = connection.CreateCommand();
#pragma warning disable CA2100 // The texts stand above.
        command.CommandText = sql;
#pragma warning restore CA2100
        return command.ExecuteScalar();
    }

    private static SqliteConnection Open(string path)
    {
        var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = path, Mode = SqliteOpenMode.ReadWrite, Pooling = false, DefaultTimeout = 1 }.ConnectionString);
        connection.Open();
        return connection;
    }
}
