using LoadWatch.Delivery.Page;
using LoadWatch.Tests;

namespace LoadWatch.Delivery.Tests.Page;

/// <summary>The page as a browser draws it.</summary>
public sealed class PageDrawingTests
{
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
