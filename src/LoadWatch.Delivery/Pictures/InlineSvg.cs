using System.Globalization;
using System.Text.RegularExpressions;
using System.Xml.Linq;

namespace LoadWatch.Delivery.Pictures;

/// <summary>
/// The drawing library's SVG made fit to stand in a page, several times over: every shape in the page's own ink, so that it shows in light, dark and print; no
/// ids, which would clash; no font of its own; numbers to a tenth of a dot.
/// </summary>
internal static partial class InlineSvg
{
    /// <summary>Shapes and texts, without the element around them.</summary>
    public static string Of(string svg)
    {
        var shapes = XDocument.Parse(svg).Root!.Descendants().Where(shape => shape.Name.LocalName is "rect" or "path" or "text" && shape.Parent!.Name.LocalName != "clipPath");
        return string.Concat(shapes.Select(Shape).Select(shape => shape.ToString(SaveOptions.DisableFormatting)));
    }

    private static XElement Shape(XElement shape) => shape.Name.LocalName == "text" ? Text(shape) : new XElement(
        shape.Name.LocalName,
        shape.Attributes().Where(attribute => attribute.Name.LocalName is not ("fill" or "stroke" or "stroke-miterlimit")).Select(Rounded),
        Paint(shape, "fill", "currentColor"),
        Paint(shape, "stroke", null));

    /// <summary>Nothing but ink and "none" is drawn with.</summary>
    private static XAttribute? Paint(XElement shape, string name, string? otherwise)
    {
        var paint = shape.Attribute(name) is { } own ? own.Value == "none" ? "none" : "currentColor" : otherwise;
        return paint is null ? null : new XAttribute(name, paint);
    }

    /// <summary>Begins where the library placed the first letter; the page's font sets the others.</summary>
    private static XElement Text(XElement text)
    {
        var shift = Numbers().Matches(text.Attribute("transform")!.Value);
        return new XElement(
            "text",
            new XAttribute("x", Sum(shift[0].Value, Numbers().Match(text.Attribute("x")!.Value).Value)),
            new XAttribute("y", Sum(shift[1].Value, Numbers().Match(text.Attribute("y")!.Value).Value)),
            new XAttribute("fill", "currentColor"),
            text.Value.Trim());
    }

    private static XAttribute Rounded(XAttribute attribute) => new(
        attribute.Name.LocalName,
        Numbers().Replace(attribute.Value, number => attribute.Name.LocalName.EndsWith("opacity", StringComparison.Ordinal) ? Short(Read(number.Value), "0.##") : Short(Read(number.Value))));

    private static string Sum(string first, string second) => Short(Read(first) + Read(second));

    private static double Read(string number) => double.Parse(number, CultureInfo.InvariantCulture);

    private static string Short(double number, string format = "0.#") => number.ToString(format, CultureInfo.InvariantCulture);

    [GeneratedRegex(@"-?[0-9]+(\.[0-9]+)?(e-?[0-9]+)?", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.NonBacktracking)]
    private static partial Regex Numbers();
}
