using System.Text;
using LoadWatch.Decoding.Csv;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Tests.Csv.Tables;

/// <summary>One table in many writings: each is read rightly, or refused with its place.</summary>
public class TableDialectTests
{
    private const string Names = "Datum;Name;Übung;Satz;Wdh;Gewicht\r\n";
    private const string Text = Names + "05.10.2026;aada;leg_press;1;8;82,5\r\n06.10.2026;aada;leg_press;2;8;\r\n";

    private static readonly CsvLayout German = TableFiles.German;

    public static TheoryData<string, CsvLayout, byte[]> Writings()
    {
        var western = CodePagesEncodingProvider.Instance.GetEncoding(1252)!;
        byte[] Marked(Encoding encoding) => [.. encoding.GetPreamble(), .. encoding.GetBytes(Text)];
        byte[] Plain(string text) => new UTF8Encoding(false).GetBytes(text);
        CsvLayout Dated(string format) => German with { DateFormat = format };
        string Dates(string first, string second) => Text.Replace("05.10.2026", first).Replace("06.10.2026", second);
        return new()
        {
            { "UTF-8", German, Plain(Text) },
            { "UTF-8 with a byte order mark", German, Marked(new UTF8Encoding(true)) },
            { "UTF-16 little endian with a mark", German, Marked(new UnicodeEncoding(false, true)) },
            { "UTF-16 big endian with a mark", German, Marked(new UnicodeEncoding(true, true)) },
            { "Windows-1252", German, western.GetBytes(Text) },
            { "Windows-1252 by the layout", German with { Encoding = "windows-1252" }, western.GetBytes(Text) },
            { "LF", German, Plain(Text.Replace("\r\n", "\n")) },
            { "CR", German, Plain(Text.Replace("\r\n", "\r")) },
            { "no line end at the end", German, Plain(Text.TrimEnd()) },
            { "blank lines at the end", German, Plain(Text + "\r\n\r\n  \r\n") },
            { "lines of separators only", German, Plain(Text + ";;;;;\r\n;;;;;\r\n") },
            { "blank lines between", German, Plain(Text.Replace("\r\n", "\r\n\r\n")) },
            { "blank lines above", German, Plain("\r\n\r\n" + Text) },
            { "quoted cells", German, Plain(Text.Replace("leg_press", "\"leg_press\"").Replace("82,5", "\"82,5\"")) },
            { "quoted names", German, Plain(Text.Replace("Übung", "\"Übung\"")) },
            { "blanks around", German, Plain(Text.Replace(";", " ; ")) },
            { "tabs around", German, Plain(Text.Replace(";", "\t;\t")) },
            { "non-breaking blanks around", German, Plain(Text.Replace("82,5", "\u00a082,5\u00a0")) },
            { "sep line", German, Plain("sep=;\r\n" + Text) },
            { "sep line with a bar", German, Plain("sep=|\r\n" + Text.Replace(';', '|')) },
            { "sep line with a tab", German, Plain("sep=\t\r\n" + Text.Replace(';', '\t')) },
            { "tabs", German with { Delimiter = '\t' }, Plain(Text.Replace(';', '\t')) },
            { "bars", German with { Delimiter = '|' }, Plain(Text.Replace(';', '|')) },
            { "commas and decimal points", German with { Delimiter = ',', Decimal = '.' }, Plain(Text.Replace(',', '.').Replace(';', ',')) },
            { "commas and quoted decimal commas", German with { Delimiter = ',' }, Plain(Text.Replace("82,5", "\"82;5\"").Replace(';', ',')) },
            { "empty cells behind the last column", German, Plain(Text.Replace("\r\n", ";;\r\n")) },
            { "empty cells behind the last column of rows only", German, Plain(Text.Replace("82,5", "82,5;;;")) },
            { "columns that nothing names", German, Plain(Text.Replace("\r\n", ";x\r\n")) },
            { "columns in another order", German, Plain("Gewicht;Name;Wdh;Übung;Satz;Datum\n82,5;aada;8;leg_press;1;05.10.2026\n;aada;8;leg_press;2;06.10.2026\n") },
            { "notes with line ends and quotes", German, Plain(Text.Replace("Gewicht", "Gewicht;Notiz").Replace("82,5", "82,5;\"a\r\n\"\"b\"\";c\"").Replace("8;\r\n", "8;;5\" x\r\n")) },
            { "plus sign", German, Plain(Text.Replace("82,5", "+82,5")) },
            { "exponent", German, Plain(Text.Replace("82,5", "8,25e1")) },
            { "leading zeros", German, Plain(Text.Replace("82,5", "0082,50")) },
            { "whole numbers with a decimal", German, Plain(Text.Replace(";8;", ";8,0;")) },
            { "day and month of one digit", Dated("d.M.yyyy"), Plain(Dates("5.10.2026", "6.10.2026")) },
            { "month before day", Dated("MM/dd/yyyy"), Plain(Dates("10/05/2026", "10/06/2026")) },
            { "day before month with strokes", Dated("dd/MM/yyyy"), Plain(Dates("05/10/2026", "06/10/2026")) },
            { "ISO dates", Dated("iso8601"), Plain(Dates("2026-10-05", "2026-10-06")) },
            { "dates without marks", Dated("yyyyMMdd"), Plain(Dates("20261005", "20261006")) },
            { "year of two digits", Dated("dd.MM.yy"), Plain(Dates("05.10.26", "06.10.26")) },
            { "month names", Dated("d MMM yyyy"), Plain(Dates("5 Oct 2026", "6 Oct 2026")) },
            { "moments at midnight", German with { DateColumn = null, Time = new() { Column = "Datum", Format = "dd.MM.yyyy HH:mm:ss" } }, Plain(Dates("05.10.2026 00:00:00", "06.10.2026 00:00:00")) },
        };
    }

    [Theory]
    [MemberData(nameof(Writings))]
    public void TheSameTableIsReadHoweverItIsWritten(string writing, CsvLayout layout, byte[] bytes)
    {
        var file = TableFiles.Decode(bytes, layout);

        Assert.NotEmpty(writing);
        Assert.Empty(file.Problems);
        Assert.Equal(("table", "kraft"), (file.Kind, file.SourceName));
        var set = new SetRow(null, null, "leg_press", null, 1, 8, 82.5, null, null, null, null, SetLoad.Weight, IsHold: false, IsFast: false);
        Assert.Equal(
            [("aada", new LocalDate(2026, 10, 5), set), ("aada", new LocalDate(2026, 10, 6), set with { Set = 2, Kilograms = null })],
            file.Table!.Rows.Select(row => (row.Subject, row.Date, row.Content)));
    }

    [Fact]
    public void UTF16WithoutAMarkIsReadWhereTheLayoutSaysSo()
    {
        // Without a mark the bytes look like no text, so this way goes past the decoder set.
        var file = CsvDecoder.Decode(new UnicodeEncoding(false, false).GetBytes(Text), [German with { Encoding = "utf-16" }]);

        Assert.Equal(2, file.Table!.Rows.Count);
    }

    [Theory]
    [InlineData("05.10.2026;aada;squat;1;8;1.234", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1.234,5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1 234,5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1\u00a0234,5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1\u202f234", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1'234,5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1’234", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1,234,567", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;82.5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;82,5 kg", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;82,", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;,5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;50%", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;５０", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;½", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;NaN", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;∞", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;=40+2", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;(5)", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;--5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;−5", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;0x10", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;82\u200b", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;n/a", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;-", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1e999", "column 6 (Gewicht): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;1;8;1e9", "column 6 (Gewicht): outside 0 to 1000 kg")]
    [InlineData("05.10.2026;aada;squat;1;8;-5", "column 6 (Gewicht): outside 0 to 1000 kg")]
    [InlineData("05.10.2026;aada;squat;1;8;1000,1", "column 6 (Gewicht): outside 0 to 1000 kg")]
    [InlineData("05.10.2026;aada;squat;1;8,5;80", "column 5 (Wdh): not a whole number")]
    [InlineData("05.10.2026;aada;squat;1;1001;80", "column 5 (Wdh): outside 0 to 1000")]
    [InlineData("05.10.2026;aada;squat;1;8-10;80", "column 5 (Wdh): not a number with the decimal mark ,")]
    [InlineData("05.10.2026;aada;squat;0;8;80", "column 4 (Satz): outside 1 to 200")]
    [InlineData("05.10.2026;aada;;1;8;80", "column 3 (Übung): no exercise")]
    [InlineData("05.10.2026;;squat;1;8;80", "column 2 (Name): no person")]
    [InlineData(";aada;squat;1;8;80", "column 1 (Datum): no date")]
    [InlineData("2026-10-05;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("10/05/2026;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("5.10.2026;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("05.10.26;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("31.02.2026;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("10.17.2026;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("46300;aada;squat;1;8;80", "column 1 (Datum): not a date as the layout writes it")]
    [InlineData("05.10.1926;aada;squat;1;8;80", "column 1 (Datum): a date outside 2000 to 2100")]
    [InlineData("05.10.2026;\"aada\nb\";squat;1;8;80", "column 2 (Name): holds a line end or another control character")]
    public void ABadCellIsNamedAndItsRowIsNotUsed(string row, string expected)
    {
        var file = TableFiles.Decode(Names + Good(40) + row + "\r\n" + Good(40, from: 41), German);

        var problem = Assert.Single(file.Problems);
        Assert.Equal((ProblemSeverity.Error, "line 42, " + expected), (problem.Severity, problem.ToString()));
        Assert.Equal(80, file.Table!.Rows.Count);
        Assert.DoesNotContain(file.Table.Rows, known => ((SetRow)known.Content).Exercise == "squat");
    }

    [Theory]
    [InlineData("05.10.2026;aada;squat;1;8", "line 42: 5 cells for 6 columns")]
    [InlineData("05.10.2026", "line 42: 1 cells for 6 columns")]
    [InlineData("05.10.2026;aada;squat;1;8;82;5", "line 42: 7 cells for 6 columns")]
    [InlineData("05.10.2026;aada;\"squat\"x;1;8;80", "line 42: text behind a closing quote")]
    public void ARowOfAnotherShapeIsNamed(string row, string expected)
    {
        var file = TableFiles.Decode(Names + Good(40) + row + "\r\n" + Good(40, from: 41), German);

        Assert.Equal(expected, Assert.Single(file.Problems).ToString());
        Assert.Equal(80, file.Table!.Rows.Count);
    }

    [Theory]
    [InlineData("", "byte 0: the file is empty")]
    [InlineData("\n\n", "line 1: the file is empty")]
    [InlineData("sep=;\n", "line 2: no line of column names")]
    [InlineData("Datum;Übung;Satz;Satz\n05.10.2026;squat;1;1\n", "line 1 (Satz): two columns have this name")]
    [InlineData("Datum;Uebung;Satz\n05.10.2026;squat;1\n", "line 1: no layout fits the column names found (Datum, Uebung, Satz); layouts known: kraft")]
    [InlineData("Datum,Übung,Satz\n05.10.2026,squat,1\n", "line 1: no layout fits the column names found (Datum,Übung,Satz); layouts known: kraft")]
    [InlineData("Datum;Übung\n05.10.2026;squat\n06.10.2026;\"squat\n07.10.2026;squat\n", "line 3: a quote opens here and is never closed")]
    [InlineData("Datum;Übung\nx;squat\ny;squat\n", "none of 2 rows can be used")]
    [InlineData("Datum;Übung\n05.10.2026;squat\nDatum;Gewicht\n", "line 3: other column names begin here: two files in one")]
    public void AFileThatCannotBeUsedIsRefusedWithThePlace(string text, string expected) =>
        Assert.Equal(expected, TableFiles.Refusal(TableFiles.Decode(text, German)));

    [Fact]
    public void ANulByteRefusesTheFile()
    {
        // Deep in the file: near its beginning the content is no text at all.
        var text = Names + Good(190) + "05.10.2026;aada;sq\0uat;1;8;80\r\n";

        Assert.Equal("line 192: a NUL byte: the file is damaged or no text", TableFiles.Refusal(TableFiles.Decode(text, German)));
    }

    [Fact]
    public void ALineOfMoreThanAMegabyteRefusesTheFile()
    {
        var text = Names + Good(1) + "05.10.2026;aada;" + new string('x', (1 << 20) + 1) + ";1;8;80\r\n";

        Assert.Equal("line 3: a line is longer than 1 MB", TableFiles.Refusal(TableFiles.Decode(text, German)));
    }

    [Theory]
    [InlineData("1,234", '.')]
    [InlineData("1.234", ',')]
    [InlineData("1.234.567", '.')]
    [InlineData("1,234,567", ',')]
    public void AThousandsMarkIsNeverRead(string cell, char decimalMark)
    {
        var file = TableFiles.Decode(Text.Replace("82,5", $"\"{cell}\""), German with { Decimal = decimalMark });

        Assert.Single(file.Table!.Rows);
        Assert.Equal($"line 2, column 6 (Gewicht): not a number with the decimal mark {decimalMark}", Assert.Single(file.Problems).ToString());
    }

    [Theory]
    [InlineData("1.234", '.')]
    [InlineData("1,234", ',')]
    public void ADecimalMarkIsAlwaysRead(string cell, char decimalMark)
    {
        var row = TableFiles.Contents<SetRow>(Text.Replace("82,5", cell), German with { Decimal = decimalMark })[0];

        Assert.Equal(1.234, row.Kilograms);
    }

    [Fact]
    public void ATableWithoutRowsIsATable()
    {
        var file = TableFiles.Decode(Names, German);

        Assert.Empty(file.Problems);
        Assert.Empty(file.Table!.Rows);
    }

    [Fact]
    public void TheSameColumnNamesInTheMiddleAreExplained()
    {
        var file = TableFiles.Decode(Names + Good(1) + Names + Good(1, from: 2), German);

        Assert.Equal(2, file.Table!.Rows.Count);
        Assert.Equal("line 3: the column names come again: rows above and below are taken as one table", Assert.Single(file.Problems).ToString());
        Assert.Equal(ProblemSeverity.Warning, file.Problems[0].Severity);
    }

    [Fact]
    public void WhatASpreadsheetTakesForAFormulaIsPlainText()
    {
        var row = TableFiles.Contents<SetRow>(Text.Replace("leg_press;1", "=SUM(A1:A9);1"), German)[0];

        Assert.Equal("=SUM(A1:A9)", row.Exercise);
    }

    [Theory]
    [InlineData(30, 3, true)]
    [InlineData(5, 3, true)]
    [InlineData(36, 4, true)]
    [InlineData(35, 4, false)]
    [InlineData(90, 10, true)]
    [InlineData(89, 10, false)]
    public void MoreThanOneRowInTenAndMoreThanThreeBadRefuseTheFile(int good, int bad, bool taken)
    {
        var file = TableFiles.Decode(Names + Good(good) + string.Concat(Enumerable.Repeat("gestern;aada;squat;1;8;80\n", bad)), German);

        Assert.Equal(taken ? good : null, file.Table?.Rows.Count);
        Assert.Equal(taken ? bad : bad + 1, file.Problems.Count);
        Assert.Equal(!taken, file.Problems[0].Reason == $"{bad} of {good + bad} rows cannot be used, more than 10 %");
    }

    [Fact]
    public void AQuotedCellThatSwallowsRowsCountsWithAllOfThem()
    {
        var lines = (Names + Good(60)).Split("\r\n");
        lines[10] = lines[10].Replace("leg_press", "\"leg_press");
        lines[20] = lines[20].Replace("leg_press", "leg_press\"");

        Assert.Equal("11 of 60 rows cannot be used, more than 10 %", TableFiles.Refusal(TableFiles.Decode(string.Join("\r\n", lines), German)));
    }

    private static string Good(int count, int from = 1) =>
        string.Concat(Enumerable.Range(from, count).Select(set => $"05.10.2026;aada;leg_press;{set};8;82,5\r\n"));
}
