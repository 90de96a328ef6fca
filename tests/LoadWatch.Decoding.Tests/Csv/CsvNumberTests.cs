using System.Globalization;
using CsCheck;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Csv;

public class CsvNumberTests
{
    [Theory]
    [InlineData("1.234", '.', 1.234)]
    [InlineData("1,234", ',', 1.234)]
    [InlineData("-0.5", '.', -0.5)]
    [InlineData("+12", '.', 12)]
    [InlineData("007", '.', 7)]
    [InlineData("1.5e3", '.', 1500)]
    [InlineData("1,5E-1", ',', 0.15)]
    [InlineData("0", ',', 0)]
    public void ANumberIsRead(string cell, char mark, double expected) => Assert.Equal(expected, Read(cell, mark));

    [Theory]
    [InlineData("1.234", ',')]
    [InlineData("1,234", '.')]
    [InlineData("1.234,5", ',')]
    [InlineData("1,234.5", '.')]
    [InlineData("1'234", '.')]
    [InlineData("1 234", '.')]
    [InlineData("1\u00a0234", '.')]
    [InlineData("1.2.3", '.')]
    [InlineData("5.", '.')]
    [InlineData(".5", '.')]
    [InlineData("-", '.')]
    [InlineData("--1", '.')]
    [InlineData("1-", '.')]
    [InlineData("(1)", '.')]
    [InlineData("1e", '.')]
    [InlineData("1e+", '.')]
    [InlineData("1e1.5", '.')]
    [InlineData("1e999", '.')]
    [InlineData("NaN", '.')]
    [InlineData("Infinity", '.')]
    [InlineData("-∞", '.')]
    [InlineData("0x10", '.')]
    [InlineData("１２", '.')]
    [InlineData("140 bpm", '.')]
    [InlineData("=1+1", '.')]
    public void AnythingElseIsRefused(string cell, char mark) => Assert.Null(Read(cell, mark));

    [Fact]
    public void WhatIsWrittenInvariantlyIsReadBackExactly() =>
        Gen.Double[-1e9, 1e9].Sample(value =>
        {
            var text = value.ToString("R", CultureInfo.InvariantCulture);
            return Read(text, '.') == value && Read(text.Replace('.', ','), ',') == value;
        });

    /// <summary>Short numbers with few digits behind the mark, zeros in front and behind among them, are read as the runtime reads them.</summary>
    [Fact]
    public void ShortNumbersAreReadToTheLastBit() =>
        Gen.Select(Gen.Int[0, 99_999_999].Select(whole => whole >> (whole % 24)), Gen.Char['0', '9'].Array[0, 9].Select(digits => new string(digits))).Sample((whole, digits) =>
        {
            var text = digits.Length == 0 ? whole.ToString("000", CultureInfo.InvariantCulture) : $"{whole}.{digits}";
            return Read(text, '.') == double.Parse(text, CultureInfo.InvariantCulture);
        });

    private static double? Read(string cell, char mark)
    {
        var layout = BuiltInLayouts.Samples with { Decimal = mark, Delimiter = ';' };
        var file = CsvFiles.Decode($"time;power_w\n2026-10-05T06:00:00Z;{cell}\n", layout);
        return file.Recordings is [var recording] ? recording.Samples[Channel.Power][0] : null;
    }
}
