using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Storage.Activities;

namespace LoadWatch.Storage.Tests.Activities;

public sealed class HistogramCodecTests
{
    [Fact]
    public void EveryHistogramIsReadAsItWasWritten() =>
        Gen.Dictionary(Gen.Int, Gen.Long[1, long.MaxValue]).Sample(bins =>
        {
            var histogram = HistogramOf([.. bins.Select(pair => (pair.Key, pair.Value))]);

            Assert.Equal(histogram.Bins, HistogramCodec.Read(HistogramCodec.Write(histogram)).Bins);
        });

    [Fact]
    public void AHistogramOfHeartRateIsShort()
    {
        // By hand: 120 folds to 240 = 0x70 | 0x80, 1; 1000 = 7 * 128 + 104; the next bin lies 1 further, folded 2; 300 = 2 * 128 + 44.
        var bytes = HistogramCodec.Write(HistogramOf([(120, 1000), (121, 300)]));

        Assert.Equal([0xF0, 0x01, 0xE8, 0x07, 0x02, 0xAC, 0x02], bytes);
    }

    [Fact]
    public void AnEmptyHistogramIsNoBytes()
    {
        Assert.Empty(HistogramCodec.Write(new Histogram()));
        Assert.Empty(HistogramCodec.Read([]).Bins);
    }

    [Theory]
    [InlineData(new byte[] { 0xF0 })] // cut within a number
    [InlineData(new byte[] { 0x02 })] // a bin without its time
    [InlineData(new byte[] { 0x02, 0x00 })] // a bin without time is never written
    [InlineData(new byte[] { 0xFF, 0xFF, 0xFF, 0xFF, 0xFF, 0xFF, 0xFF, 0xFF, 0xFF, 0xFF, 0x01 })] // longer than any number
    [InlineData(new byte[] { 0xFE, 0xFF, 0xFF, 0xFF, 0xFF, 0x01, 0x01 })] // a bin beyond 32 bits
    public void DamagedBytesAreRefused(byte[] bytes) => Assert.Throws<InvalidDataException>(() => HistogramCodec.Read(bytes));

    [Fact]
    public void AnyBytesAreReadOrRefused() =>
        Gen.Byte.Array[0, 24].Sample(bytes => Assert.True(IsReadOrRefused(bytes)));

    private static bool IsReadOrRefused(byte[] bytes)
    {
        try
        {
            return HistogramCodec.Read(bytes).Bins.All(bin => bin.Value > 0);
        }
        catch (InvalidDataException)
        {
            return true;
        }
    }

    private static Histogram HistogramOf((int Bin, long Milliseconds)[] bins)
    {
        var histogram = new Histogram();
        foreach (var (bin, milliseconds) in bins)
        {
            histogram.Add(bin, milliseconds);
        }

        return histogram;
    }
}
