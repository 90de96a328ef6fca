using LoadWatch.Delivery.Page;
using LoadWatch.People;
using LoadWatch.Tests;

namespace LoadWatch.Delivery.Tests.Page;

/// <summary>The page as a browser draws it.</summary>
public sealed class PageDrawingTests
{
    /// <summary>Today's class of 24 with a note for most of them, and ten to call: one sheet of A4 each.</summary>
    [Theory]
    [InlineData(1, BriefForm.ClassSheet)]
    [InlineData(1, BriefForm.CallList)]
    [InlineData(2, BriefForm.ClassSheet, BriefForm.CallList)]
    public async Task ClassAndCallListTakeOneSheetOfPaperEach(int sheets, params BriefForm[] forms)
    {
        Assert.SkipUnless(Chromium.Exists, "no chromium here");
        var token = TestContext.Current.CancellationToken;
        var folder = Directory.CreateTempSubdirectory("loadwatch-page-");
        try
        {
            var page = Path.Combine(folder.FullName, "desk.html");
            await File.WriteAllTextAsync(page, PageRenderer.Render(MorningExamples.BusyDesk(forms)), token);
            Assert.Equal(sheets, await Chromium.Sheets(page, token));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    [Theory]
    [InlineData(360)]
    [InlineData(1200)]
    public async Task TheSquadsPageIsDrawnInLightAndDark(int width)
    {
        Assert.SkipUnless(Chromium.Exists, "no chromium here");
        var token = TestContext.Current.CancellationToken;
        var folder = Directory.CreateTempSubdirectory("loadwatch-page-");
        try
        {
            var page = Path.Combine(folder.FullName, "squad.html");
            await File.WriteAllTextAsync(page, PageRenderer.Render(MorningExamples.SquadBrief()), token);
            var light = await Chromium.Picture(page, width, 2400, dark: false, token);
            var dark = await Chromium.Picture(page, width, 2400, dark: true, token);

            // An empty sheet of this size compresses to far less; equal pictures would mean that one of the two looks is missing.
            Assert.True(light.Length > 20_000, $"only {light.Length} bytes were drawn");
            Assert.True(dark.Length > 20_000, $"only {dark.Length} bytes were drawn");
            Assert.NotEqual(light, dark);
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }
}
