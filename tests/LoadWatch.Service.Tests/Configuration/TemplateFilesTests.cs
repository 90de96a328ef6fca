using LoadWatch.Decoding;
using LoadWatch.Decoding.Csv;

namespace LoadWatch.Service.Tests.Configuration;

/// <summary>The files in <c>config/templates</c> are read as they stand and show every column.</summary>
public sealed class TemplateFilesTests
{
    public static TheoryData<string> Kinds => [.. BuiltInLayouts.All.Select(layout => layout.Name)];

    [Theory]
    [MemberData(nameof(Kinds))]
    public void ATemplateIsReadByTheLayoutOfItsName(string kind)
    {
        var file = new DecoderSet(BuiltInLayouts.All).Decode(File.ReadAllBytes(Template(kind)));

        Assert.Empty(file.Problems);
        Assert.Equal(kind, file.SourceName);
        Assert.Equal(kind == "samples" ? 2 : 3, file.Table?.Rows.Count ?? Assert.Single(file.Recordings).Samples.Count);
    }

    [Theory]
    [MemberData(nameof(Kinds))]
    public void ATemplateHoldsEveryColumn(string kind)
    {
        var layout = BuiltInLayouts.All.Single(layout => layout.Name == kind);
        var columns = layout.Header
            .Concat(layout.Columns.Select(column => column.Column))
            .Concat(layout.Fields.Select(field => field.Column))
            .Concat(new[] { layout.SportColumn, layout.PersonColumn, layout.GroupColumn }.OfType<string>())
            .Distinct();

        Assert.Equal(columns.Order(StringComparer.Ordinal), File.ReadLines(Template(kind)).First().Split(',').Order(StringComparer.Ordinal));
    }

    [Fact]
    public void ThereIsNoOtherTemplate() =>
        Assert.Equal(BuiltInLayouts.All.Select(layout => $"{layout.Name}.csv").Order(StringComparer.Ordinal),
            Directory.GetFiles(Repository.Config("templates")).Select(Path.GetFileName).Order(StringComparer.Ordinal));

    private static string Template(string kind) => Path.Combine(Repository.Config("templates"), $"{kind}.csv");
}
