using System.Text;
using CsCheck;

namespace LoadWatch.Decoding.Fit;

/// <summary>Check values of CRC-16/ARC; "123456789" gives 0xBB3D in every catalogue of checksums, the others were worked out bit by bit.</summary>
public class FitCrcTests
{
    [Theory]
    [InlineData("", 0x0000)]
    [InlineData("A", 0x30C0)]
    [InlineData(".FIT", 0x92DE)]
    [InlineData("123456789", 0xBB3D)]
    public void TextHasItsKnownChecksum(string text, int expected) => Assert.Equal(expected, FitCrc.Of(Encoding.ASCII.GetBytes(text)));

    [Fact]
    public void BytesHaveTheirKnownChecksum()
    {
        Assert.Equal(0, FitCrc.Of([0]));
        Assert.Equal(0xBAD3, FitCrc.Of([.. Enumerable.Range(0, 256).Select(value => (byte)value)]));
        Assert.Equal(0x7040, FitCrc.Of([.. Enumerable.Repeat((byte)0xFF, 16)]));
        Assert.Equal(0x3391, FitCrc.Of(Convert.FromHexString("0E10D907000000002E464954")));
    }

    [Fact]
    public void AChecksumIsTheSameBitByBit() =>
        Gen.Byte.Array[0, 100].Sample(bytes => FitCrc.Of(bytes) == BitByBit(bytes));

    [Fact]
    public void AChecksumOverBytesAndTheirChecksumIsZero() =>
        Gen.Byte.Array[0, 100].Sample(bytes => FitCrc.Of([.. bytes, .. BitConverter.GetBytes(FitCrc.Of(bytes))]) == 0);

    [Fact]
    public void AChecksumCanBeTakenInPieces() =>
        Gen.Select(Gen.Byte.Array[0, 60], Gen.Byte.Array[0, 60])
            .Sample((a, b) => FitCrc.Of([.. a, .. b]) == FitCrc.Of(b, FitCrc.Of(a)));

    private static int BitByBit(byte[] bytes)
    {
        var crc = 0;
        foreach (var value in bytes)
        {
            crc ^= value;
            for (var bit = 0; bit < 8; bit++)
                crc = (crc & 1) != 0 ? (crc >> 1) ^ 0xA001 : crc >> 1;
        }

        return crc;
    }
}
