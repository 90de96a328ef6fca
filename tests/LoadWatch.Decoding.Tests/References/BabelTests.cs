using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.References;

/// <summary>GPSBabel decodes the same files: every value of a record that both give is equal but for the kinds of <see cref="Difference"/>.</summary>
public class BabelTests
{
    private const int Generated = 100;

    [Fact]
    public void ItReadsEveryPlainGeneratedFileAlike()
    {
        Babel.SkipUnlessThere();
        var equal = Compare([.. Enumerable.Range(0, Generated).Select(number => GeneratedPart.Make(number, GeneratedStyle.Plain))]);
        Assert.True(equal > 100 * Generated, $"{equal} values were compared");
    }

    [Theory]
    [InlineData((int)GeneratedStyle.Usual)]
    [InlineData((int)GeneratedStyle.Unusual)]
    public void ItReadsOtherGeneratedFilesAlikeButForTheNamedKinds(int style)
    {
        Babel.SkipUnlessThere();
        var equal = Compare([.. Enumerable.Range(Generated, Generated).Select(number => GeneratedPart.Make(number, (GeneratedStyle)style, isEven: true))]);
        Assert.True(equal > 100 * Generated, $"{equal} values were compared");
    }

    [Fact]
    public void ItReadsTheHandMadeFilesAlike()
    {
        Babel.SkipUnlessThere();
        Compare([.. FitVectors.All.Where(IsWhole).SelectMany(PartFeatures.Split)]);
    }

    [Fact]
    public void ItReadsTheRealFilesAlike()
    {
        Babel.SkipUnlessThere();
        Assert.SkipWhen(RealFiles.Paths.Count == 0, "real FIT files are not on this machine");
        var equal = Compare([.. RealFiles.Paths.Select(File.ReadAllBytes).Where(IsWhole).Select(file => PartFeatures.Split(file).First())]);
        Assert.True(equal > 100_000, $"{equal} values were compared");
    }

    private static bool IsWhole(byte[] file) => FitDecoder.CheckCompleteness(file) == FitCompleteness.Complete;

    private static int Compare(IReadOnlyList<byte[]> parts)
    {
        var (equal, faults) = (0, new List<string>());
        foreach (var (part, number) in parts.Select((part, number) => (part, number)))
        {
            var comparison = new BabelComparison(OurParts.Read(part), Babel.Read(part), PartFeatures.Of(part));
            faults.AddRange(comparison.Run().Select(fault => $"{number}: {fault}"));
            equal += comparison.Equal;
        }

        Assert.True(faults.Count == 0, $"{faults.Count} values differ:\n{string.Join('\n', faults.Take(40))}");
        return equal;
    }
}
