using ScottPlot;
using SkiaSharp;

namespace LoadWatch.Delivery.Pictures;

/// <summary>The one font of the pictures, out of this assembly: no font of the machine is asked for, so the same values give the same picture everywhere.</summary>
internal sealed class PictureFonts : IFontResolver
{
    public const string Name = "LoadWatch pictures";

    private const string Resource = "LoadWatch.Delivery.Pictures.pictures.ttf";

    private static readonly Lazy<PictureFonts> Shipped = new(Register);

    private readonly SKTypeface typeface;

    private PictureFonts(SKTypeface typeface) => this.typeface = typeface;

    /// <summary>The drawing library draws no text and says nothing where a font is missing, so this comes before any drawing.</summary>
    public static void Load() => _ = Shipped.Value;

    public SKTypeface? CreateTypeface(string fontName, FontWeight weight, FontSlant slant, FontSpacing spacing) => fontName == Name ? typeface : null;

    public SKTypeface? CreateTypeface(string fontName, bool bold, bool italic) => fontName == Name ? typeface : null;

    /// <summary>From a copy of its bytes, which the typeface keeps: glyphs are read long after the stream is closed, and by several threads.</summary>
    private static PictureFonts Register()
    {
        using var stream = typeof(PictureFonts).Assembly.GetManifestResourceStream(Resource)
            ?? throw new InvalidOperationException($"the resource {Resource} is missing");
        using var data = SKData.Create(stream);
        var fonts = new PictureFonts(SKTypeface.FromData(data) ?? throw new InvalidOperationException($"the resource {Resource} is no font"));
        Fonts.FontResolvers.Insert(0, fonts);
        return fonts;
    }
}
