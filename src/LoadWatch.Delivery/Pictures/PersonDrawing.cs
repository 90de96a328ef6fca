using LoadWatch.Notices;
using ScottPlot;

namespace LoadWatch.Delivery.Pictures;

/// <summary>
/// A person's 56 days drawn: a bar for a day's load, the last seven darker; a grey band of the usual weeks spread over their days; a level line for the mean of
/// each seven days; a hollow square where nothing is known, a hollow bar with a cross-stroke where a load could not be computed, a dash for rest. Below, a filled
/// diamond for heavy or fast leg work, a small hollow one where that is unknown. One colour in several strengths: it reads the same in grey and to every eye.
/// </summary>
public static class PersonDrawing
{
    public const int Width = 340;

    public const int Height = 150;

    /// <summary>Dots of the bitmap for one of the drawing, for the screens of phones.</summary>
    private const int Dots = 2;

    private const int WeekDays = 7;
    private const float FontSize = 11;
    private const float DigitWidth = 7;
    private const double HalfBar = 0.36;

    private static readonly Color Ink = Colors.Black;
    private static readonly PixelPadding Frame = new(left: 0, right: 20, bottom: 20, top: 8);

    /// <summary>A scalable drawing to stand in a page: its ink is the page's own. The same values give the same text.</summary>
    public static string Svg(PersonPicture picture)
    {
        using var plot = Draw(picture);
        return InlineSvg.Of(plot.GetSvgXml(Width, Height));
    }

    /// <summary>Black on white, twice as many dots as <see cref="Width"/> and <see cref="Height"/> say. The same values give the same bytes.</summary>
    public static byte[] Png(PersonPicture picture)
    {
        using var plot = Draw(picture);
        plot.FigureBackground.Color = Colors.White;
        plot.ScaleFactor = Dots;
        return plot.GetImageBytes(Width * Dots, Height * Dots, ImageFormat.Png);
    }

    private static Plot Draw(PersonPicture picture)
    {
        PictureFonts.Load();
        var plot = new Plot();
        var top = Top(picture);
        plot.Font.Set(PictureFonts.Name);
        plot.FigureBackground.Color = Colors.Transparent;
        plot.DataBackground.Color = Colors.Transparent;
        plot.HideGrid();
        plot.Axes.SetLimits(-0.7, picture.Days.Count - 0.3, -0.2 * top, 1.06 * top);
        DrawAxes(plot, picture, top);
        DrawUsual(plot, picture);
        DrawDays(plot, picture, top);
        DrawWeeks(plot, picture);
        DrawLegs(plot, picture, -0.11 * top);
        return plot;
    }

    /// <summary>The highest value to be drawn; 1 without any.</summary>
    private static double Top(PersonPicture picture)
    {
        var highest = picture.Days.Select(day => day.Load ?? 0).Concat(picture.WeekLoads.Append(picture.Usual?.High).Select(week => (week ?? 0) / WeekDays)).Max();
        return highest > 0 ? highest : 1;
    }

    private static void DrawAxes(Plot plot, PersonPicture picture, double top)
    {
        var loads = LoadTicks.UpTo(top);
        var dates = Enumerable.Range(0, picture.Days.Count).Where(place => place % (2 * WeekDays) == 0 || place == picture.Days.Count - 1).ToList();
        plot.Layout.Fixed(Frame with { Left = 12 + (DigitWidth * loads.Max(tick => tick.Label.Length)) });
        plot.Axes.Left.SetTicks([.. loads.Select(tick => tick.Load)], [.. loads.Select(tick => tick.Label)]);
        plot.Axes.Bottom.SetTicks([.. dates.Select(place => (double)place)], [.. dates.Select(place => BriefNumbers.Day(picture.Days[place].Date))]);
        foreach (var axis in plot.Axes.GetAxes())
        {
            axis.FrameLineStyle.Width = 0;
            axis.TickLabelStyle.FontSize = FontSize;
        }

        plot.Axes.Left.MajorTickStyle.Length = 0;
        foreach (var tick in loads)
        {
            Line(plot, -0.7, picture.Days.Count - 0.3, tick.Load, tick.Load == 0 ? 1 : 0.6f, tick.Load == 0 ? 1 : 0.25);
        }
    }

    private static void DrawUsual(Plot plot, PersonPicture picture)
    {
        if (picture.Usual is { } usual)
        {
            Fill(plot, -0.7, picture.Days.Count - 0.3, usual.Low / WeekDays, usual.High / WeekDays, 0.18);
            Line(plot, -0.7, picture.Days.Count - 0.3, usual.Low / WeekDays, 0.8f, 0.4);
            Line(plot, -0.7, picture.Days.Count - 0.3, usual.High / WeekDays, 0.8f, 0.4);
        }
    }

    private static void DrawDays(Plot plot, PersonPicture picture, double top)
    {
        for (var place = 0; place < picture.Days.Count; place++)
        {
            var day = picture.Days[place];
            if (day is { Known: true, Load: null })
            {
                DrawUncomputed(plot, place, top);
            }
            else if (day.Known)
            {
                Fill(plot, place - HalfBar, place + HalfBar, 0, Math.Max(day.Load!.Value, 0.012 * top), place < picture.Days.Count - WeekDays ? 0.5 : 0.8);
            }
        }

        Mark(plot, picture, day => !day.Known, 0.025 * top, MarkerShape.OpenSquare, 4);
    }

    private static void DrawUncomputed(Plot plot, int place, double top)
    {
        var bar = plot.Add.Rectangle(place - HalfBar, place + HalfBar, 0, 0.3 * top);
        bar.FillColor = Colors.Transparent;
        bar.LineColor = Ink;
        bar.LineWidth = 0.8f;
        var stroke = plot.Add.Line(place - HalfBar, 0.08 * top, place + HalfBar, 0.22 * top);
        (stroke.Color, stroke.LineWidth, stroke.MarkerSize) = (Ink, 0.8f, 0);
    }

    private static void DrawWeeks(Plot plot, PersonPicture picture)
    {
        for (var week = 0; week < picture.WeekLoads.Count; week++)
        {
            if (picture.WeekLoads[week] is { } load)
            {
                Line(plot, (week * WeekDays) - 0.4, (week * WeekDays) + WeekDays - 0.6, load / WeekDays, 2, 1);
            }
        }
    }

    private static void DrawLegs(Plot plot, PersonPicture picture, double height)
    {
        Mark(plot, picture, day => day.HeavyLegs == true, height, MarkerShape.FilledDiamond, 7, new Diamond(filled: true));
        Mark(plot, picture, day => day.HeavyLegs is null, height, MarkerShape.OpenDiamond, 4, new Diamond(filled: false));
    }

    private static void Mark(Plot plot, PersonPicture picture, Func<BriefDay, bool> belongs, double height, MarkerShape shape, float size, IMarker? drawnBy = null)
    {
        var places = Enumerable.Range(0, picture.Days.Count).Where(place => belongs(picture.Days[place])).Select(place => (double)place).ToArray();
        if (places.Length > 0)
        {
            plot.Add.Markers(places, [.. places.Select(_ => height)], shape, size, Ink).MarkerStyle.CustomRenderer = drawnBy;
        }
    }

    private static void Fill(Plot plot, double left, double right, double bottom, double top, double strength)
    {
        var area = plot.Add.Rectangle(left, right, bottom, top);
        area.FillColor = Ink.WithAlpha(strength);
        area.LineWidth = 0;
    }

    private static void Line(Plot plot, double left, double right, double height, float width, double strength)
    {
        var line = plot.Add.Line(left, height, right, height);
        (line.Color, line.LineWidth, line.MarkerSize) = (Ink.WithAlpha(strength), width, 0);
    }
}
