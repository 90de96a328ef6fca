using LoadWatch.Delivery.Pictures;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Page;

/// <summary>A picture as a template asks for it; it is drawn then.</summary>
internal sealed record PagePicture(PersonPicture Picture)
{
    public int Width { get; } = PersonDrawing.Width;

    public int Height { get; } = PersonDrawing.Height;

    public string Caption => OneLine.Of(Picture.Caption);

    public string Words => OneLine.Of(Picture.Words);

    /// <summary>Shapes to stand in an <c>svg</c> element of that size.</summary>
    public string Shapes => PersonDrawing.Svg(Picture);

    /// <summary>The bitmap, in base 64.</summary>
    public string Bitmap => Convert.ToBase64String(PersonDrawing.Png(Picture));
}
