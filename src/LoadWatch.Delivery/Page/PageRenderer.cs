using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Unicode;
using Fluid;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Page;

/// <summary>A brief as one self-contained HTML file: no script, nothing fetched, readable on phone, desk, in the dark, by ear and on paper.</summary>
public static class PageRenderer
{
    private const string Resource = "LoadWatch.Delivery.Page.brief.liquid";

    /// <summary>Every value goes through it; letters of all scripts stay readable in the source.</summary>
    private static readonly HtmlEncoder Encoder = HtmlEncoder.Create(UnicodeRanges.All);

    private static readonly IFluidTemplate Template = Parse();

    private static readonly TemplateOptions Options = MakeOptions();

    /// <summary>The same brief gives the same bytes, in every culture.</summary>
    public static string Render(Brief brief) => Template.Render(new TemplateContext(PageModel.Of(brief), Options), Encoder);

    private static IFluidTemplate Parse()
    {
        using var stream = typeof(PageRenderer).Assembly.GetManifestResourceStream(Resource)
            ?? throw new InvalidOperationException($"the resource {Resource} is missing");
        using var reader = new StreamReader(stream);
        return new FluidParser().Parse(reader.ReadToEnd());
    }

    private static TemplateOptions MakeOptions()
    {
        var options = new TemplateOptions { CultureInfo = CultureInfo.InvariantCulture };
        options.MemberAccessStrategy.Register<PageModel>();
        options.MemberAccessStrategy.Register<PagePerson>();
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
        return options;
    }
}
