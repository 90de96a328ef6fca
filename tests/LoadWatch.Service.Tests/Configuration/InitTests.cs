using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class InitTests : IDisposable
{
    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-init-");

    public void Dispose() => root.Delete(recursive: true);

    [Fact]
    public void ANewFolderIsReadAsItIsAndTheNextStepsAreTold()
    {
        var (code, told) = Init();

        Assert.Equal(ExitCode.Ok, code);
        Assert.Empty(ConfigurationReader.Read(At("loadwatch.json")).People);
        Assert.Equal(["anchors.csv", "inbox", "loadwatch.json", "loadwatch.schema.json", "roster.csv"], Names());
        Assert.Contains("is ready. Next:", told, StringComparison.Ordinal);
        Assert.Contains($"wrote {At("roster.csv")}", told, StringComparison.Ordinal);
    }

    [Fact]
    public void TheSchemaLiesWhereTheConfigurationPoints()
    {
        Init();

        Assert.Contains("\"$schema\": \"./loadwatch.schema.json\"", File.ReadAllText(At("loadwatch.json")), StringComparison.Ordinal);
        Assert.Equal(ConfigurationSchema.Write(), File.ReadAllText(At("loadwatch.schema.json")));
    }

    [Fact]
    public void OnAFolderThatIsThereNoFileIsChangedAndThePeopleGetTheirFolders()
    {
        Init();
        File.AppendAllText(At("roster.csv"), "anna,Anna,squad,,,\nben,Ben,squad,,,\n");
        Directory.CreateDirectory(Path.Combine(At("inbox"), "BEN"));
        var before = Texts();

        var (code, told) = Init();

        Assert.Equal(ExitCode.Ok, code);
        Assert.Equal(before, Texts());
        Assert.Equal(["BEN", "anna"], Directory.EnumerateDirectories(At("inbox")).Select(Path.GetFileName).Order(StringComparer.Ordinal));
        Assert.Contains($"made {Path.Combine(At("inbox"), "anna")}", told, StringComparison.Ordinal);
        Assert.DoesNotContain("Next:", told, StringComparison.Ordinal);
    }

    [Fact]
    public void AFileThatStandsBesideNoConfigurationIsKept()
    {
        File.WriteAllText(At("roster.csv"), "person,name,group\nanna,Anna,squad\n");

        Init();

        Assert.Equal(["anna"], ConfigurationReader.Read(At("loadwatch.json")).People.Keys);
        Assert.True(Directory.Exists(Path.Combine(At("inbox"), "anna")));
    }

    [Fact]
    public void WhereNothingIsMissingItSaysSo()
    {
        Init();

        Assert.Contains("nothing is missing; no file was changed", Init().Told, StringComparison.Ordinal);
    }

    private (int Code, string Told) Init()
    {
        using var told = new StringWriter();
        return (InitCommand.Init(root.FullName, told), told.ToString());
    }

    private string At(string name) => Path.Combine(root.FullName, name);

    private IEnumerable<string?> Names() => Directory.EnumerateFileSystemEntries(root.FullName).Select(Path.GetFileName).Order(StringComparer.Ordinal);

    private List<(string, string)> Texts() =>
        [.. Directory.EnumerateFiles(root.FullName).Order(StringComparer.Ordinal).Select(path => (path, File.ReadAllText(path)))];
}
