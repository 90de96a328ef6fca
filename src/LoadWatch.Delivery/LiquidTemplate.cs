using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Unicode;
using Fluid;
using LoadWatch.Delivery.Page;
using LoadWatch.Notices;

namespace LoadWatch.Delivery;

/// <summary>A template out of this assembly. Every value is encoded; letters of all scripts stay readable in the source.</summary>
/// <param name="name">Folder and file: <c>Page.brief</c>.</param>
internal sealed class LiquidTemplate(string name)
{
    private static readonly HtmlEncoder Encoder = HtmlEncoder.Create(UnicodeRanges.All);

    private static readonly TemplateOptions Options = MakeOptions();

    private readonly IFluidTemplate template = Parse($"LoadWatch.Delivery.{name}.liquid");

    /// <summary>The same values give the same bytes, in every culture.</summary>
    public string Render(object model) => template.Render(new TemplateContext(model, Options), Encoder);

    private static IFluidTemplate Parse(string resource)
    {
        using var stream = typeof(LiquidTemplate).Assembly.GetManifestResourceStream(resource)
            ?? throw new InvalidOperationException($"the resource {resource} is missing");
        using var reader = new StreamReader(stream);
        return new FluidParser().Parse(reader.ReadToEnd());
    }

    private static TemplateOptions MakeOptions()
    {
        var options = new TemplateOptions { CultureInfo = CultureInfo.InvariantCulture };
        options.MemberAccessStrategy.Register<PageModel>();
        options.MemberAccessStrategy.Register<PagePerson>();
        options.MemberAccessStrategy.Register<PagePicture>();
        options.MemberAccessStrategy.Register<PageSheet>();
        options.MemberAccessStrategy.Register<PageSheetRow>();
        options.MemberAccessStrategy.Register<PageCalls>();
        options.MemberAccessStrategy.Register<PageCall>();
        options.MemberAccessStrategy.Register<PageWeek>();
        options.MemberAccessStrategy.Register<WeekOfGroup>();
        options.MemberAccessStrategy.Register<PageGroup>();
        options.MemberAccessStrategy.Register<PageRow>();
        options.MemberAccessStrategy.Register<Strip>();
        options.MemberAccessStrategy.Register<BriefLine>();
        options.MemberAccessStrategy.Register<ReadingNote>();
        options.MemberAccessStrategy.Register<PastModel>();
        options.MemberAccessStrategy.Register<PastMonth>();
        options.MemberAccessStrategy.Register<PastBrief>();
        return options;
    }
}
