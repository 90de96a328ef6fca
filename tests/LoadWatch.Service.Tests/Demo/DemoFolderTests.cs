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
        var person = DemoPerson.Draw(DemoCast.All.Single(part => part.Id == "elvi"), 7, Until);
        var activity = DemoSessions.Of(person, 7, Until).First();
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
