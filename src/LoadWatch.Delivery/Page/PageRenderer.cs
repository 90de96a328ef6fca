using LoadWatch.Delivery.Pictures;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Page;

/// <summary>A brief as one self-contained HTML file: no script, nothing fetched, readable on phone, desk, in the dark, by ear and on paper.</summary>
public static class PageRenderer
{
    private static readonly LiquidTemplate Template = new("Page.brief");

    /// <summary>The same brief gives the same bytes, in every culture.</summary>
    /// <param name="pictures">Whether pictures can be drawn; null: as this machine can.</param>
    public static string Render(Brief brief, PictureProbe? pictures = null) => Template.Render(PageModel.Of(brief, pictures ?? PictureProbe.OfMachine));
}
