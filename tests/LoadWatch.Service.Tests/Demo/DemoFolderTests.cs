using System.Security.Cryptography;
using System.Text;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Service.Demo;
using NodaTime;

namespace LoadWatch.Service.Tests.Demo;

public sealed class DemoFolderTests : IDisposable
{
    private static readonly LocalDate Until = new(2026, 11, 3);
    private static readonly DemoPart[] Few = [.. DemoCast.All.Where(part => part.Id is "joel" or "lauri" or "otso" or "elvi" or "henri")];

    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-demo-");

    public void Dispose() => root.Delete(recursive: true);

    [Fact]
    public void TheSameSeedAndDateGiveTheSameBytes()
    {
        var (first, second) = (Written("a", 7, Until), Written("b", 7, Until));
        Assert.Equal(first.Keys, second.Keys);
        Assert.Equal(first, second);
    }

    [Fact]
    public void AnotherSeedGivesOtherNumbersInTheSameFiles()
    {
        var (first, second) = (Written("a", 7, Until), Written("b", 8, Until));
        var (inBoth, differing) = (first.Keys.Intersect(second.Keys).ToList(), first.Count(file => second.GetValueOrDefault(file.Key) != file.Value));
        Assert.True(inBoth.Count > first.Count * 0.85, "sessions are missed in other places, and nothing else");
        Assert.True(differing > first.Count * 0.95, "every session is drawn anew");
        Assert.Equal(first["loadwatch.json"], second["loadwatch.json"]);
    }

    [Fact]
    public void AllButTheHalvesDecodeWithoutAProblem()
    {
        Written("a", 7, Until);
        foreach (var path in Directory.EnumerateFiles(root.FullName, "*.fit", SearchOption.AllDirectories))
        {
            var decoded = FitDecoder.Decode(File.ReadAllBytes(path));
            var isHalf = Path.GetFileName(path).StartsWith("half of ", StringComparison.Ordinal);
            Assert.Equal((path, isHalf), (path, decoded.Problems.Any(problem => problem.Severity == ProblemSeverity.Error)));
            Assert.Equal((path, 0), (path, isHalf ? 0 : decoded.Problems.Count));
            Assert.Equal((path, isHalf || decoded.FileType == "settings" ? 0 : 1), (path, decoded.Recordings.Count));
        }
    }

    [Fact]
    public void AFileHoldsWhatTheRulesWereJudgedOn()
    {
        var person = DemoPerson.Draw(DemoCast.All.Single(part => part.Id == "kaisa"), 7, Until);
        var activity = DemoSessions.Of(person, 7, Until).First(session => session.Sets.Count > 0);
        var (told, read) = (DemoRecording.Of(activity), Assert.Single(FitDecoder.Decode(FitEncoder.Encode(activity)).Recordings));
        Assert.Equal((told.Sport, told.Start, told.LocalOffset, told.Device), (read.Sport, read.Start, read.LocalOffset, read.Device));
        Assert.Equal(told.Sets, read.Sets);
        Assert.Equal(told.Samples.UnixMilliseconds, read.Samples.UnixMilliseconds);
        Assert.Equal(told.Samples[Channel.HeartRate], read.Samples[Channel.HeartRate]);
    }

    [Fact]
    public void EveryWayToTheInboxIsThere()
    {
        var files = Written("a", 7, Until, DemoCast.All.Where(part => part.Group == DemoCast.Boat).ToArray()).Keys;
        Assert.Single(files, file => file == "inbox/lauri/week.zip");
        Assert.Contains(files, file => file.StartsWith("inbox/milla/", StringComparison.Ordinal) && file.EndsWith(".fit.gz", StringComparison.Ordinal));
        Assert.Contains(files, file => file.StartsWith("inbox/otso/", StringComparison.Ordinal) && file.EndsWith(".csv", StringComparison.Ordinal));
        Assert.Contains(files, file => file.StartsWith("inbox/petra/", StringComparison.Ordinal) && file.EndsWith(".csv", StringComparison.Ordinal)
            && files.Contains(Path.ChangeExtension(file, ".fit")));
        Assert.Single(files, file => file.StartsWith("inbox/kaisa/copy of ", StringComparison.Ordinal));
        Assert.Single(files, file => file.StartsWith("inbox/joel/half of ", StringComparison.Ordinal));
        Assert.Single(files, file => file.StartsWith("inbox/_unknown-upload/", StringComparison.Ordinal));
        Assert.Single(files, file => file.StartsWith("inbox/_club-laptop/", StringComparison.Ordinal));
        Assert.Equal(2, files.Where(file => file.StartsWith("inbox/pods/", StringComparison.Ordinal)).Select(file => file.Split('-')[^1]).Distinct().Count());
        Assert.DoesNotContain(files, file => file.StartsWith("inbox/inka/", StringComparison.Ordinal) || file.StartsWith("inbox/sanni/", StringComparison.Ordinal));
        Assert.Contains("inbox/henri/settings.fit", files);
    }

    [Fact]
    public void EveryFileIsOlderThanTheMorningOfTheBrief()
    {
        Written("a", 7, Until);
        var morning = (Until + new LocalTime(6, 0)).InZoneLeniently(DemoPerson.Zone).ToInstant().ToDateTimeUtc();
        Assert.All(Directory.EnumerateFiles(root.FullName, "*", SearchOption.AllDirectories), path => Assert.True(File.GetLastWriteTimeUtc(path) < morning, path));
    }

    [Fact]
    public void TheSetLogGrowsNightByNightAndIsCorrected()
    {
        var demo = new DemoFolder(Path.Combine(root.FullName, "a"), 7, Until, [.. DemoCast.All.Where(part => part.Group == DemoCast.Class)]);
        List<string[]> versions = [];
        foreach (var morning in demo.Mornings)
        {
            demo.Arrive(morning);
            versions.Add(morning == demo.Mornings[0] ? [] : File.ReadAllLines(Path.Combine(root.FullName, "a", "inbox", "class", "sets.csv")));
        }

        Assert.Equal([1, 2, 0], versions.Skip(1).Zip(versions.Skip(2), (before, after) => before.Except(after).Count()));
        Assert.All(versions[^1].Skip(1), line => Assert.Matches("^[^,]+,[0-9-]{10},[0-9:]{5},[a-z_]+,", line));
        Assert.True(versions[^1].Length > versions[1].Length);
    }

    [Fact]
    public void AFolderThatHoldsSomethingIsLeftAlone()
    {
        File.WriteAllText(Path.Combine(root.FullName, "mine.txt"), "");
        Assert.Throws<IOException>(() => DemoFolder.Write(root.FullName, 7, Until, Few));
        Assert.Single(Directory.EnumerateFileSystemEntries(root.FullName));
    }

    /// <summary>Hash of content and time by path.</summary>
    private SortedDictionary<string, string> Written(string name, int seed, LocalDate until, DemoPart[]? cast = null)
    {
        var folder = Path.Combine(root.FullName, name);
        var summary = DemoFolder.Write(folder, seed, until, cast ?? Few);
        var files = new SortedDictionary<string, string>(StringComparer.Ordinal);
        foreach (var path in Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories))
        {
            byte[] content = [.. File.ReadAllBytes(path), .. Encoding.ASCII.GetBytes(File.GetLastWriteTimeUtc(path).Ticks.ToString())];
            files[Path.GetRelativePath(folder, path).Replace('\\', '/')] = Convert.ToHexString(SHA256.HashData(content));
        }

        Assert.Equal(files.Count, summary.Files);
        return files;
    }
}
