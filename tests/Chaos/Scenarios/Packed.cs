using System.Diagnostics;
using System.IO.Compression;
using System.Text;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Containers that are broken, lie or mean harm, and a file that ends whatever decodes it: section B of the catalogue. Each kind of damage byte by byte is proved in process.</summary>
public static class Packed
{
    private const int Bomb = 20 << 20;
    private const int TooManyEntries = 10_001;

    /// <summary>A third of what the import of a large history may take; the service must do with it here.</summary>
    private const string HeapHex = "8000000";

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("hostile-containers", "B38 B39 B40 B41", "Bombs, lies, nests, cuts, names that lead outside, endings that lie: refused with a reason in little memory, nothing unpacked to disk, the good members of others counted.", Containers),
        new("poison", "B43 D61", "Killed over a night in which one file ends every process that decodes it: three dead children refuse it, the others count.", Poison),
    ];

    private static void Containers(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        var sessions = new FreeSessions(nights);
        byte[] Ride(string person) => nights.Truth.Must(Truth.Stored, Files.Fit(sessions.Next(person)));
        using var place = trial.Prepared(nights, Clock.Fixed);
        nights.Add("bo/outside.zip", Files.Zip(("../../outside.fit", Ride("bo")), ("/tmp/loadwatch-outside.fit", Ride("bo")), ("a\\..\\b.fit", Ride("bo")), ("C:\\x.fit", Ride("bo"))), Truth.Aside);
        nights.Add("bo/gzip called zip.zip", Files.Gzip(Ride("bo")), Truth.Aside);
        nights.Add("bo/zip called fit.fit", Files.Zip(("in.fit", Ride("bo"))), Truth.Aside);
        nights.Add("bo/two members.gz", [.. Halves(Ride("bo")).SelectMany(Files.Gzip)], Truth.Aside);
        nights.Add("anna/program.csv", [0x4D, 0x5A, 0, 0, 3, .. new byte[200]], Truth.Refused);
        nights.Add("anna/page.fit", Files.Text("<!doctype html><title>404</title>"), Truth.Refused);
        var inner = Ride("cara");
        nights.Add("cara/wrong crc.zip", Patched(Files.Zip(("bad.fit", Files.Text("not counted")), ("good.fit", inner)), "PK\u0001\u0002", 16), Truth.Refused);
        foreach (var (name, state, bytes) in Harmful(Files.Fit(nights.Session("anna", 11, 400))).ToList())
        {
            nights.Add("anna/" + name, bytes, state);
        }

        // The session inside the harmful ones counts once, by itself.
        nights.Add("anna/harmless.fit", Files.Fit(nights.Truth.Sessions.Last(session => session.Person == "anna")), Truth.Stored);
        place.Fill(nights.Tonight);
        var before = Everything(place);
        Place.MustEndWell(place.Sweep(("DOTNET_GCHeapHardLimit", HeapHex)));
        Trial.MustBe(0, Everything(place).Except(before, StringComparer.Ordinal).Count() + (File.Exists("/tmp/loadwatch-outside.fit") ? 1 : 0), "files outside the data folder");
        Trial.Sound(place, nights.Truth);
        trial.Figure("containers", nights.Tonight.Count);
        trial.Survived();
    }

    /// <summary>A container whose member is a container too many is unpacked itself; the member is refused.</summary>
    private static IEnumerable<(string Name, string State, byte[] Bytes)> Harmful(byte[] ride)
    {
        yield return ("bomb.zip", Truth.Refused, Files.Zip(("zeros.fit", new byte[Bomb])));
        yield return ("bomb.gz", Truth.Refused, Squeezed(new byte[Bomb]));
        yield return ("nest.zip", Truth.Aside, Files.Zip(("inner.zip", Files.Zip(("in.fit", ride)))));
        yield return ("nest.gz", Truth.Aside, Files.Gzip(Files.Gzip(Files.Gzip(ride))));
        yield return ("entries.zip", Truth.Refused, Files.Zip(Enumerable.Range(0, TooManyEntries).Select(number => ($"{number}.fit", Array.Empty<byte>()))));
        yield return ("lies.zip", Truth.Refused, Patched(Files.Zip(("in.fit", ride)), "PK\u0001\u0002", 24));
        yield return ("secret.zip", Truth.Refused, Patched(Files.Zip(("in.fit", ride)), "PK\u0001\u0002", 8));
        yield return ("overlap.zip", Truth.Refused, Overlapping(ride));
        yield return ("cut.zip", Truth.Refused, Files.Zip(("in.fit", ride))[..^30]);
        yield return ("cut.gz", Truth.Refused, Files.Gzip(ride)[..^9]);
        yield return ("junk.gz", Truth.Refused, [.. Files.Gzip(ride), 1, 2, 3]);
        yield return ("empty.zip", Truth.Refused, Files.Zip());
    }

    /// <summary>Flips a bit of the first directory entry.</summary>
    private static byte[] Patched(byte[] zip, string mark, int offset)
    {
        zip[zip.AsSpan().IndexOf(Encoding.Latin1.GetBytes(mark)) + offset] ^= 1;
        return zip;
    }

    private static byte[] Squeezed(byte[] bytes)
    {
        using var packed = new MemoryStream();
        using (var gzip = new GZipStream(packed, CompressionLevel.SmallestSize))
        {
            gzip.Write(bytes);
        }

        return packed.ToArray();
    }

    /// <summary>Two entries of the directory that name the same bytes: the second gets sizes, check and place of the first.</summary>
    private static byte[] Overlapping(byte[] ride)
    {
        var zip = Files.Zip(("a.fit", ride), ("b.fit", []));
        var (first, second) = (zip.AsSpan().IndexOf("PK\u0001\u0002"u8), zip.AsSpan().LastIndexOf("PK\u0001\u0002"u8));
        zip.AsSpan(first + 10, 18).CopyTo(zip.AsSpan(second + 10));
        zip.AsSpan(first + 42, 4).CopyTo(zip.AsSpan(second + 42));
        return zip;
    }

    private static IEnumerable<byte[]> Halves(byte[] bytes) => [bytes[..(bytes.Length / 2)], bytes[(bytes.Length / 2)..]];

    private static List<string> Everything(Place place) =>
        [.. Directory.EnumerateFiles(place.Root, "*", SearchOption.AllDirectories).Where(path => !path.StartsWith(place.Data, StringComparison.Ordinal)
            && !path.StartsWith(place.At("pages"), StringComparison.Ordinal) && !path.StartsWith(place.At("notices"), StringComparison.Ordinal))];

    private static void Poison(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        var poison = Files.Fit(TrueSession.Make("anna", Clock.Fixed.Today.PlusDays(-20), new NodaTime.LocalTime(12, 0), Clock.Fixed.TimeZone, new Random(3)));
        nights.Add("anna/poison.fit", poison, Truth.Refused);
        nights.Add("anna/good.fit", Files.Fit(nights.Session("anna", 0)), Truth.Stored);
        nights.Add("bo/good.fit", Files.Fit(nights.Session("bo", 0)), Truth.Stored);
        using var place = trial.Prepared(nights, Clock.Fixed);
        place.Fill(nights.Tonight);
        Trial.MustBe(Ended.Killed, place.Sweep(("LOADWATCH_KILL_AT", "waiting:1")).Code, "as the exit code of a killed process");
        for (var sweep = 0; sweep < 3; sweep++)
        {
            trial.Figure("dead children", SweepWhileItKills(place, Truth.Sha(poison)));
            trial.Survived();
        }

        place.SweepWell();
        Trial.MustSay(place.Command("explain", Truth.Sha(poison)[..12]).Output, "poisonous");
        Trial.Sound(place, nights.Truth);
    }

    /// <summary>One sweep in which every child that is given the object dies.</summary>
    /// <returns>How many did.</returns>
    private static int SweepWhileItKills(Place place, string sha)
    {
        using var sweep = place.StartSweep();
        var dead = 0;
        while (!sweep.EndsWithin(TimeSpan.FromMilliseconds(2)))
        {
            foreach (var child in ChildrenOf(sweep.Id).Where(child => CommandLine(child).Contains(sha, StringComparison.Ordinal)))
            {
                dead += Kill(child) ? 1 : 0;
            }
        }

        Place.MustEndWell(sweep.WaitForEnd());
        return dead > 0 ? dead : throw new ChaosFailureException("no child was there to die");
    }

    private static bool Kill(int process)
    {
        try
        {
            using var child = Process.GetProcessById(process);
            child.Kill();
            return child.WaitForExit(TimeSpan.FromSeconds(5));
        }
        catch (Exception e) when (e is ArgumentException or InvalidOperationException)
        {
            return false;
        }
    }

    private static IEnumerable<int> ChildrenOf(int process) => Read($"/proc/{process}/task/{process}/children").Split(' ', StringSplitOptions.RemoveEmptyEntries)
        .Concat(Tasks(process).SelectMany(task => Read($"{task}/children").Split(' ', StringSplitOptions.RemoveEmptyEntries)))
        .Distinct(StringComparer.Ordinal)
        .Select(id => int.Parse(id, System.Globalization.CultureInfo.InvariantCulture));

    private static IEnumerable<string> Tasks(int process)
    {
        try
        {
            return Directory.GetDirectories($"/proc/{process}/task");
        }
        catch (IOException)
        {
            return [];
        }
    }

    private static string CommandLine(int process) => Read($"/proc/{process}/cmdline");

    /// <summary>Empty where the process has ended.</summary>
    private static string Read(string path)
    {
        try
        {
            return File.ReadAllText(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return "";
        }
    }
}
