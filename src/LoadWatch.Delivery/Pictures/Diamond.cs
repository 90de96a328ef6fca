using ScottPlot;
using SkiaSharp;

namespace LoadWatch.Delivery.Pictures;

/// <summary>
/// A diamond as a marker. Not the drawing library's own: those leave their path to the collector while native code still draws it, which breaks the process off.
/// </summary>
internal sealed class Diamond(bool filled) : IMarker
{
    public void Render(SKCanvas canvas, Paint paint, Pixel center, float size, MarkerStyle markerStyle)
    {
        var half = size / 2;
        Pixel[] corners = [new(center.X + half, center.Y), new(center.X, center.Y + half), new(center.X - half, center.Y), new(center.X, center.Y - half)];
        if (filled)
        {
            Drawing.FillPath(canvas, paint, corners, markerStyle.FillStyle, new PixelRect(center, half));
        }
        else
        {
            Drawing.DrawPath(canvas, paint, corners, markerStyle.LineStyle, close: true);
        }
    }
}
