using System.Reflection;
using LoadWatch.Decoding.Fit;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.References;

/// <summary>One file for each kind of <see cref="Difference"/>: what LoadWatch gives, and what the reference gives instead.</summary>
public class DifferenceTests
{
    private const int HeartRate = 1;
    private const int Power = 2;
    private const int Speed = 3;
    private const int Cadence = 4;
    private const int Distance = 5;
    private static readonly FitDefinition OnlyHeartRate = new(20, new FitFieldLayout(3, Unsigned8));

    [Fact]
    public void ThereAreNoMoreThanTwelve() => Assert.InRange(Enum.GetValues<Difference>().Length, 1, 12);

    [Fact]
    public void EachNamesASectionAndHasATest()
    {
        var tests = typeof(DifferenceTests).GetMethods().Where(method => method.IsDefined(typeof(FactAttribute))).Select(method => method.Name).ToList();
        Assert.All(Enum.GetNames<Difference>(), kind =>
        {
            var section = typeof(Difference).GetField(kind)!.GetCustomAttribute<SectionAttribute>();
            Assert.InRange(section?.Number ?? 0, 1, 20);
            Assert.NotEmpty(section!.Subject);
            Assert.Contains(tests, test => test.StartsWith(kind, StringComparison.Ordinal));
        });
    }

    [Fact]
    public void ReservedBitsOfAHeader()
    {
        var part = Parts.Activity();
        var at = part.AsSpan().IndexOf([(byte)0, .. BitConverter.GetBytes(Parts.Base)]);
        part[at] |= 0x10;
        BitConverter.GetBytes(FitCrc.Of(part.AsSpan(..^2))).CopyTo(part, part.Length - 2);
        Assert.Equal([120, 121], Column(OurParts.Read(part), HeartRate));
        Assert.Contains("record header", ByFileParser(part).Error, StringComparison.Ordinal);
    }

    [Fact]
    public void CompressedTimesWithoutATimeBeforeThem()
    {
        var part = Parts.Begin().Define(1, OnlyHeartRate).Compressed(1, 3, 101).ToBytes();
        Assert.Equal([null], Column(OurParts.Read(part), 0));
        Assert.Contains("previous timestamp", ByFileParser(part).Error, StringComparison.Ordinal);
    }

    [Fact]
    public void CompressedTimesBehindOneThatRolledOver()
    {
        Babel.SkipUnlessThere();
        double?[] seconds = [30, 31, 32, 37, 37, 68];
        Assert.Equal(seconds, SecondsFromBase(OurParts.Read(FitVectors.Get("v03")).Records));
        Assert.NotEqual(seconds, SecondsFromBase(Babel.Read(FitVectors.Get("v03"))!));
    }

    [Fact]
    public void ByteOrderOfEachDefinition()
    {
        Babel.SkipUnlessThere();
        var part = Parts.Begin().Define(0, new(20, new(253, Unsigned32), new(7, Unsigned16)))
            .Define(1, new(0xFF00, new FitFieldLayout(1, Unsigned16)) { BigEndian = true })
            .Message(0, Parts.Base, 0x0102).ToBytes();
        Assert.Equal([0x0102], Column(OurParts.Read(part), Power));
        Assert.Equal(0x0201, Babel.Read(part)![0][Power]);
    }

    [Fact]
    public void OtherBaseTypeThanTheProfile()
    {
        var part = Parts.Begin().Define(0, new(20, new(253, Unsigned32), new(7, Unsigned32))).Message(0, Parts.Base, 300).ToBytes();
        Assert.Equal([300], Column(OurParts.Read(part), Power));
        Assert.Equal([null], Column(ByFileParser(part), Power));
    }

    [Fact]
    public void SeveralValuesInOne()
    {
        var part = Parts.Begin().Define(0, new(20, new(253, Unsigned32), new(4, Unsigned8, 3))).Message(0, Parts.Base, FitValue.Many(null, 80, 90)).ToBytes();
        Assert.Equal([80], Column(OurParts.Read(part), Cadence));
        Assert.Equal([null], Column(ByFileParser(part), Cadence));
    }

    [Fact]
    public void NoughtIsAValue()
    {
        Babel.SkipUnlessThere();
        var part = Parts.Begin().DefineRecord().Message(0, Parts.Base, 0).ToBytes();
        Assert.Equal([0], Column(OurParts.Read(part), HeartRate));
        Assert.Null(Babel.Read(part)![0][HeartRate]);
    }

    [Fact]
    public void NotADate()
    {
        var part = Parts.Begin().DefineRecord().Message(0, 5000, 90).ToBytes();
        Assert.Equal([null], Column(OurParts.Read(part), 0));
        Assert.Equal([(5000 + 631_065_600) * 1000.0], Column(ByFileParser(part), 0));
    }

    [Fact]
    public void PackedSpeedAndDistance()
    {
        var part = FitVectors.Get("v07");
        Assert.Equal([250, 255, 260, null], Column(OurParts.Read(part), Distance));
        Assert.Equal([null, null, null, null], Column(ByFileParser(part), Distance));
    }

    [Fact]
    public void DeveloperFieldsThatStandForOneOfTheProfile()
    {
        var part = WithDeveloperField("Thrust", nativeField: 7);
        Assert.Equal([250], Column(OurParts.Read(part), Power));
        Assert.Equal([null], Column(ByFileParser(part), Power));
    }

    [Fact]
    public void DeveloperFieldsThatAreCalledLikeOneOfTheProfile()
    {
        var part = WithDeveloperField("heart_rate", FitValue.None);
        Assert.Equal([90], Column(OurParts.Read(part), HeartRate));
        Assert.Equal([250], Column(ByFileParser(part), HeartRate));
    }

    [Fact]
    public void FirstPartOnly()
    {
        byte[] file = [.. Parts.Activity(), .. Parts.Activity(heartRate: 140)];
        Assert.Equal([120, 121, 140, 141], Column(OurParts.Read(file), HeartRate));
        Assert.Equal([120, 121], Column(ByFileParser(file), HeartRate));
    }

    [Fact]
    public void WideFields()
    {
        Babel.SkipUnlessThere();
        var part = Parts.Begin()
            .Define(0, new(20, new(253, Unsigned32), new(73, Unsigned32), new(6, Unsigned16))).Message(0, Parts.Base, 60_000, 5_000)
            .Define(0, new(20, new(253, Unsigned32), new(73, Unsigned32))).Message(0, Parts.Base, 70_000).ToBytes();
        Assert.Equal([60, 70], Column(OurParts.Read(part), Speed));
        Assert.Equal([5, 4.46], Babel.Read(part)!.Select(record => record[Speed]));
    }

    [Fact]
    public void WordOfANumber()
    {
        var part = Parts.Begin().DefineRecord().Message(0, Parts.Base, 90).DefineSession().Message(1, Parts.Base, 2, 153, 1, 1).ToBytes();
        Assert.Equal("sub_sport_153", OurParts.Read(part).Sessions[0].SubSport);
        Assert.Equal("mountain_enduro", ByFileParser(part).Sessions[0].SubSport);
    }

    private static byte[] WithDeveloperField(string name, FitValue nativeField) =>
        Parts.Begin()
            .Define(2, new(206, new(0, Unsigned8), new(1, Unsigned8), new(2, Unsigned8), new(3, Text, 12), new(14, Unsigned16), new(15, Unsigned8)))
            .Message(2, 0, 5, 0x84, name, 20, nativeField)
            .Define(0, new(20, new(253, Unsigned32), new(3, Unsigned8)) { Developer = [new(5, Unsigned16, 0)] })
            .Message(0, Parts.Base, 90, 250)
            .ToBytes();

    private static ReferencePart ByFileParser(byte[] file)
    {
        FileParser.SkipUnlessThere();
        return FileParser.Read([file])[0];
    }

    private static IEnumerable<double?> Column(ReferencePart part, int column) => part.Records.Select(record => record[column]);

    private static IEnumerable<double?> SecondsFromBase(IReadOnlyList<double?[]> records) =>
        records.Select(record => (record[0] - Parts.BaseUnixMilliseconds) / 1000);
}
