using System.Buffers.Binary;
using System.Globalization;
using System.Text.RegularExpressions;
using LoadWatch.Delivery.Pictures;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Tests;
using SkiaSharp;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests.Pictures;

public sealed partial class PersonDrawingTests
{
    [Fact]
    public void TheSameDaysGiveTheSameBytesInEveryCulture()
    {
        var before = CultureInfo.CurrentCulture;
        var (svg, png) = (PersonDrawing.Svg(Example()), PersonDrawing.Png(Example()));
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("fi-FI");
            Assert.Equal(svg, PersonDrawing.Svg(Example()));
            Assert.Equal(png, PersonDrawing.Png(Example()));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    /// <summary>Nothing that native code still draws with is left to the collector, nor shared between threads: else the process itself breaks off.</summary>
    [Fact]
    public async Task ManyThreadsDrawTheSamePicturesWhileMemoryIsCollected()
    {
        var (png, svg) = (PersonDrawing.Png(Example()), PersonDrawing.Svg(Example()));
        using var drawn = new CancellationTokenSource();
        var collector = Task.Run(() => Collect(drawn.Token), TestContext.Current.CancellationToken);

        var pictures = ParallelEnumerable.Range(0, 20).WithDegreeOfParallelism(3).Select(_ => (Png: PersonDrawing.Png(Example()), Svg: PersonDrawing.Svg(Example()))).ToList();
        await drawn.CancelAsync();

        Assert.All(pictures, picture => Assert.True(png.AsSpan().SequenceEqual(picture.Png) && svg == picture.Svg));
        Assert.True(await collector > 0);
    }

    private static int Collect(CancellationToken until)
    {
        var collections = 0;
        for (; !until.IsCancellationRequested; collections++)
        {
            GC.Collect(0, GCCollectionMode.Forced, blocking: true);
            GC.WaitForPendingFinalizers();
        }

        return collections;
    }

    // Of 56 days, from the newest: 2 unknown, 1 rest, 4 of load in the last seven; 6 of 7 are load before them, the seventh rest. By hand.
    [Fact]
    public void EveryDayIsABarADashOrAHollowSquare()
    {
        var svg = PersonDrawing.Svg(Of(back => back < 2 ? null : back % 7 == 3 ? 0 : 50, _ => false));

        Assert.Equal(5, Bars(svg, "0.8").Count);
        Assert.Equal(49, Bars(svg, "0.5").Count);
        Assert.Equal(1 + 7, Bars(svg, "0.8").Concat(Bars(svg, "0.5")).Count(height => height < 2));
        Assert.Equal(2, HollowSquares().Count(svg));
    }

    [Fact]
    public void ABarIsAsTallAsItsShareOfTheHighest()
    {
        var heights = Bars(PersonDrawing.Svg(Of(back => back == 0 ? 100 : 25, _ => false)), "0.8");

        Assert.Equal(heights[^1] / 4, heights[0], 0.11);
    }

    // Weeks of 100 to 800 before the last: the middle half is 275 to 625, or 39 to 89 a day; the highest bar is 800. By hand.
    [Fact]
    public void TheBandIsTheUsualWeekSpreadOverItsDays()
    {
        var svg = PersonDrawing.Svg(Of(back => back % 7 == 0 ? 100 * (back / 7) : 0, _ => false, days: 90));
        var band = Assert.Single(Bars(svg, "0.18"));
        var highest = Bars(svg, "0.5").Max();

        Assert.Equal((625 - 275) / 7.0 / 700 * highest, band, 0.11);
    }

    [Fact]
    public void WithoutUsualWeeksThereIsNoBand() => Assert.Empty(Bars(PersonDrawing.Svg(Of(back => back < 20 ? 50 : null, _ => false)), "0.18"));

    [Fact]
    public void HeavyOrFastDaysAreFilledDiamondsAndUnknownOnesHollow()
    {
        var svg = PersonDrawing.Svg(Of(_ => 50, back => back < 3 ? true : back < 5 ? null : false));

        Assert.Equal(3, FilledPaths().Count(svg));
        Assert.Equal(2, HollowDiamonds().Count(svg));
    }

    [Fact]
    public void AWeekOfWhichTooLittleIsKnownHasNoLine()
    {
        Assert.Equal(8, WeekLines().Count(PersonDrawing.Svg(Of(_ => 50, _ => false, days: 70))));
        Assert.Equal(7, WeekLines().Count(PersonDrawing.Svg(Of(back => back < 3 ? null : 50, _ => false, days: 70))));
    }

    [Fact]
    public void TheDrawingTakesItsInkFromThePageAndBringsNoNames()
    {
        var svg = PersonDrawing.Svg(Example());

        Assert.DoesNotMatch("id=|url\\(|#[0-9a-fA-F]{3}|black|white|font|style|xmlns|clip", svg);
        Assert.All(Paints().Matches(svg).Select(match => match.Groups[1].Value), paint => Assert.True(paint is "currentColor" or "none", paint));
    }

    [Theory]
    [InlineData(125, "0", "50", "100")]
    [InlineData(199, "0", "50", "100", "150")]
    [InlineData(200, "0", "100", "200")]
    [InlineData(7, "0", "2.0", "4.0", "6.0")]
    [InlineData(23000, "0", "10000", "20000")]
    public void RoundLoadsStandBesideIt(double highest, params string[] expected)
    {
        var svg = PersonDrawing.Svg(Of(back => back == 0 ? highest : 0, _ => false));

        Assert.Equal(["4 Jan", "18 Jan", "1 Feb", "15 Feb", "28 Feb", .. expected], Texts().Matches(svg).Select(match => match.Groups[1].Value));
    }

    [Fact]
    public void SomebodyWithoutAnyLoadHasAPictureToo()
    {
        Assert.NotEmpty(PersonDrawing.Png(Of(_ => null, _ => null)));
        Assert.NotEmpty(PersonDrawing.Png(Of(_ => 0, _ => false)));
    }

    // The size stands in the header chunk, bytes 16 to 23 (PNG, ISO/IEC 15948).
    [Fact]
    public void TheBitmapHasTwoDotsForOne()
    {
        var png = PersonDrawing.Png(Example());

        Assert.Equal((680, 300), (BinaryPrimitives.ReadInt32BigEndian(png.AsSpan(16)), BinaryPrimitives.ReadInt32BigEndian(png.AsSpan(20))));
        Assert.InRange(png.Length, 3_000, 30_000);
    }

    [Fact]
    public void TheShippedFontHasEveryLetterThatIsDrawn()
    {
        using var stream = typeof(PersonDrawing).Assembly.GetManifestResourceStream("LoadWatch.Delivery.Pictures.pictures.ttf")!;
        using var font = SKTypeface.FromStream(stream);

        Assert.All("0123456789. JanFebMarAprMayJunJulAugSepOctNovDec?", letter => Assert.NotEqual(0, font.GetGlyph(letter)));
        Assert.Equal(0, font.GetGlyph('山'));
    }

    /// <summary>Without the font nothing would stand left of the bars: the first column of dots that is not white lies there.</summary>
    [Fact]
    public void TheBitmapHoldsItsTexts()
    {
        using var bitmap = SKBitmap.Decode(PersonDrawing.Png(Example()));
        var inked = Enumerable.Range(0, 40).Sum(x => Enumerable.Range(0, 200).Count(y => bitmap.GetPixel(x, y).Red < 128));

        Assert.InRange(inked, 50, 2000);
    }

    [Fact]
    public void TheBitmapIsGreyOnWhite()
    {
        using var bitmap = SKBitmap.Decode(PersonDrawing.Png(Example()));

        Assert.All(bitmap.Pixels, dot => Assert.True(dot.Red == dot.Green && dot.Green == dot.Blue && dot.Alpha == 255));
    }

    private static PersonPicture Example() => SquadBrief().Flagged[0].Picture!;

    private static PersonPicture Of(Func<int, double?> load, Func<int, bool?> heavy, int days = 60)
    {
        var subject = Subject("a", "Ann", LoadRatio("a")) with { Days = Trends("a", days, load, heavy) };
        return BriefBuilder.Build(Contact(ContactRole.Coach), Today, [subject], []).Flagged[0].Picture!;
    }

    /// <summary>Heights of the rectangles of a strength, from left to right.</summary>
    private static List<double> Bars(string svg, string strength) =>
        [.. Rectangles().Matches(svg).Select(match => match.Value).Where(tag => tag.Contains($"fill-opacity=\"{strength}\"", StringComparison.Ordinal))
            .Select(tag => double.Parse(Height().Match(tag).Groups[1].Value, CultureInfo.InvariantCulture))];

    [GeneratedRegex("<rect[^>]*>")]
    private static partial Regex Rectangles();

    [GeneratedRegex(" height=\"([0-9.]+)\"")]
    private static partial Regex Height();

    [GeneratedRegex("<rect[^>]* width=\"4\" height=\"4\"[^>]* fill=\"none\" stroke=\"currentColor\"")]
    private static partial Regex HollowSquares();

    [GeneratedRegex("<path d=\"M[^L\"]*(?:L[^L\"]*){3,4}\" fill=\"currentColor\"")]
    private static partial Regex FilledPaths();

    [GeneratedRegex("<path[^>]* d=\"M[^L\"]*(?:L[^L\"]*){4}\"[^>]* fill=\"none\"")]
    private static partial Regex HollowDiamonds();

    [GeneratedRegex("<path stroke-width=\"2\"")]
    private static partial Regex WeekLines();

    [GeneratedRegex("(?:fill|stroke)=\"([^\"]*)\"")]
    private static partial Regex Paints();

    [GeneratedRegex("<text[^>]*>([^<]*)</text>")]
    private static partial Regex Texts();
}
