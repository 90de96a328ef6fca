using LoadWatch.Decoding.Fit;

namespace LoadWatch.Decoding.References;

/// <summary>fit-file-parser decodes the same files: every value that both give is equal but for the kinds of <see cref="Difference"/>.</summary>
public class FileParserTests
{
    private const int Generated = 400;

    [Fact]
    public void ItReadsEveryGeneratedFileAlike()
    {
        FileParser.SkipUnlessThere();
        var parts = Enumerable.Range(0, Generated).Select(number => GeneratedPart.Make(number, GeneratedStyle.Usual)).ToList();
        var (met, equal) = Compare(parts);
        Assert.Subset(new HashSet<Difference> { Difference.WordOfANumber }, met);
        Assert.True(equal > 100 * Generated, $"{equal} values were compared");
    }

    [Fact]
    public void ItReadsUnusualGeneratedFilesAlikeButForTheNamedKinds()
    {
        FileParser.SkipUnlessThere();
        var (met, equal) = Compare([.. Enumerable.Range(Generated, Generated).Select(number => GeneratedPart.Make(number, GeneratedStyle.Unusual))]);
        Assert.Superset(
            new HashSet<Difference>
            {
                Difference.PackedSpeedAndDistance, Difference.OtherBaseTypeThanTheProfile, Difference.SeveralValuesInOne, Difference.DeveloperFields,
            },
            met);
        Assert.True(equal > 100 * Generated, $"{equal} values were compared");
    }

    [Fact]
    public void ItReadsTheHandMadeFilesAlike()
    {
        FileParser.SkipUnlessThere();
        var (met, _) = Compare([.. FitVectors.All.Where(IsWhole).SelectMany(PartFeatures.Split)]);
        Assert.Subset(new HashSet<Difference> { Difference.PackedSpeedAndDistance, Difference.DeveloperFields }, met);
    }

    [Fact]
    public void ItReadsTheRealFilesAlike()
    {
        FileParser.SkipUnlessThere();
        Assert.SkipWhen(RealFiles.Paths.Count == 0, "real FIT files are not on this machine");
        var (_, equal) = Compare([.. RealFiles.Paths.Select(File.ReadAllBytes).Where(IsWhole).SelectMany(PartFeatures.Split)]);
        Assert.True(equal > 100_000, $"{equal} values were compared");
    }

    [Fact]
    public void TheComparisonFindsOneChangedValue()
    {
        FileParser.SkipUnlessThere();
        var part = GeneratedPart.Make(3, GeneratedStyle.Usual);
        var (ours, theirs) = (OurParts.Read(part), FileParser.Read([part])[0]);
        Assert.Empty(new Comparison(ours, theirs, PartFeatures.Of(part)).Run());
        var row = theirs.Records.Select((record, index) => (record, index)).First(row => row.record[6] is not null);
        row.record[6] += 0.2;
        Assert.StartsWith($"Altitude of record {row.index}", Assert.Single(new Comparison(ours, theirs, PartFeatures.Of(part)).Run()), StringComparison.Ordinal);
    }

    [Fact]
    public void TheComparisonFindsAPauseThatIsNotGivenAndALapInAnotherSession()
    {
        FileParser.SkipUnlessThere();
        var parts = Enumerable.Range(0, Generated).Select(number => GeneratedPart.Make(number, GeneratedStyle.Usual)).ToList();
        var (part, theirs) = parts.Zip(FileParser.Read(parts)).First(pair =>
            !PartFeatures.Of(pair.First).Kinds.Contains(Difference.CompressedTimes)
            && pair.Second.Sessions.Count == 2
            && OurParts.Read(pair.First) is { Sessions.Count: 2 } read
            && read.LapsBySession[0] != read.LapsBySession[1]
            && read.PausesBySession.Any(pauses => pauses.Any(pause => pause[1] is not null)));
        var ours = OurParts.Read(part);
        var moved = theirs with { Timer = [.. theirs.Timer.Select(entry => entry with { Time = entry.Time + 1000 })] };
        Assert.Empty(new Comparison(ours, theirs, PartFeatures.Of(part)).Run());
        Assert.Contains(new Comparison(ours, moved, PartFeatures.Of(part)).Run(), fault => fault.Contains("of a pause of session", StringComparison.Ordinal));
        Assert.Contains(new Comparison(ours, theirs with { Timer = [] }, PartFeatures.Of(part)).Run(), fault => fault.StartsWith("pauses of session", StringComparison.Ordinal));
        Assert.Contains(
            new Comparison(ours with { LapsBySession = [.. ours.LapsBySession.Reverse()] }, theirs, PartFeatures.Of(part)).Run(),
            fault => fault.StartsWith("laps of session", StringComparison.Ordinal));
    }

    [Fact]
    public void ItRefusesWhatIsDamaged()
    {
        FileParser.SkipUnlessThere();
        var whole = GeneratedPart.Make(1, GeneratedStyle.Usual);
        byte[][] damaged = [.. Enumerable.Range(0, 40).Select(i => Damaged(whole, i))];
        Assert.All(FileParser.Read(damaged), part => Assert.NotNull(part.Error));
        Assert.All(damaged, bytes => Assert.NotNull(OurParts.Read(bytes).Error));
    }

    private static byte[] Damaged(byte[] whole, int number)
    {
        if (number % 2 == 0)
            return whole[..(whole.Length - 1 - number)];

        var bytes = whole.ToArray();
        bytes[14 + (number * 7)] ^= 0x10;
        return bytes;
    }

    private static bool IsWhole(byte[] file) => FitDecoder.CheckCompleteness(file) == FitCompleteness.Complete;

    private static (HashSet<Difference> Met, int Equal) Compare(IReadOnlyList<byte[]> parts)
    {
        var (met, equal, faults) = (new HashSet<Difference>(), 0, new List<string>());
        foreach (var (theirs, part) in FileParser.Read(parts).Zip(parts))
        {
            var comparison = new Comparison(OurParts.Read(part), theirs, PartFeatures.Of(part));
            faults.AddRange(comparison.Run().Select(fault => $"{theirs.Name}: {fault}"));
            met.UnionWith(comparison.Met);
            equal += comparison.Equal;
        }

        Assert.True(faults.Count == 0, $"{faults.Count} values differ:\n{string.Join('\n', faults.Take(40))}");
        return (met, equal);
    }
}
