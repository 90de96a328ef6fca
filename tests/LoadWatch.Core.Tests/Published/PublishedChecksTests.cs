namespace LoadWatch.Tests.Published;

public class PublishedChecksTests
{
    private const string Heading = "| what | source | how | published | ours | tolerance | list |";

    private static readonly string Readme = Path.Combine(Root(AppContext.BaseDirectory), "tests", "README.md");

    public static TheoryData<string> Names => [.. PublishedChecks.All.Select(row => row.Check.What)];

    [Theory]
    [MemberData(nameof(Names))]
    public void WhatWasPublishedComesOut(string what)
    {
        var (list, check) = PublishedChecks.All.Single(row => row.Check.What == what);

        Assert.True(check.Holds, check.Line(list));
    }

    [Fact]
    public void AtLeastTwentyFiveRestOnNumbersThatWereRead() =>
        Assert.InRange(PublishedChecks.All.Count(row => row.Check.Source.Reading is Reading.Read or Reading.Quoted), 25, int.MaxValue);

    /// <summary>
    /// The table in <c>tests/README.md</c> is the one that the checks make. <c>LOADWATCH_WRITE_TABLES=1</c> writes it there.
    /// </summary>
    [Fact]
    public void TheTableIsTheOneOfTheChecks()
    {
        var text = File.ReadAllText(Readme).ReplaceLineEndings("\n");
        var (before, after) = Around(text);
        var wanted = before + Table() + after;
        if (Environment.GetEnvironmentVariable("LOADWATCH_WRITE_TABLES") is { Length: > 0 })
        {
            File.WriteAllText(Readme, wanted);
            text = wanted;
        }

        Assert.Equal(wanted, text);
    }

    [Fact]
    public void AnotherNumberIsNotTakenForThePublishedOne()
    {
        var source = new Source("nobody", Reading.FromMemory);

        Assert.False(new PublishedCheck("far", source, [1, 2], 0.1, "", () => [1, 2.2]).Holds);
        Assert.False(new PublishedCheck("none", source, [1, 2], 0.1, "", () => [1, double.NaN]).Holds);
        Assert.False(new PublishedCheck("short", source, [1, 2], 0.1, "", () => [1]).Holds);
        Assert.False(new PublishedCheck("word", source, ["light"], () => ["Light"]).Holds);
        Assert.True(new PublishedCheck("near", source, [1, 2], 0.1, "", () => [1.05, 1.95]).Holds);
        Assert.True(new PublishedCheck("share", source, [10, 200], Tolerance.Share(0.1), "", () => [11, 181]).Holds);
        Assert.False(new PublishedCheck("each", source, [10, 200], Tolerance.Each(2, 1), "", () => [11, 202]).Holds);
    }

    private static string Table() =>
        $"{Heading}\n| --- | --- | --- | --- | --- | --- | --- |\n{string.Concat(PublishedChecks.All.Select(row => row.Check.Line(row.List) + "\n"))}";

    private static (string Before, string After) Around(string text)
    {
        var from = text.IndexOf(Heading, StringComparison.Ordinal);
        Assert.True(from >= 0, "tests/README.md has no table of published numbers");
        var to = text.IndexOf("\n\n", from, StringComparison.Ordinal) + 1;
        return (text[..from], text[to..]);
    }

    private static string Root(string folder) =>
        File.Exists(Path.Combine(folder, "LoadWatch.sln")) ? folder : Root(Path.GetDirectoryName(folder.TrimEnd(Path.DirectorySeparatorChar))!);
}
