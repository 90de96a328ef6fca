using System.Globalization;
using LoadWatch.Recordings;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>
/// I-1 and I-5: order, repetition, packing, nights and names change nothing. Of each kind six variations, or as many as LOADWATCH_VARIATIONS asks for in all;
/// kind and number of a variation say all about it.
/// </summary>
public sealed class MetamorphicTests
{
    private static readonly int Each = int.Parse(Environment.GetEnvironmentVariable("LOADWATCH_VARIATIONS") ?? "30", CultureInfo.InvariantCulture)
        / Enum.GetValues<Variation>().Length;

    public static TheoryData<Variation, int> All()
    {
        var data = new TheoryData<Variation, int>();
        foreach (var variation in Enum.GetValues<Variation>())
        {
            for (var number = 0; number < Each; number++)
            {
                data.Add(variation, number);
            }
        }

        return data;
    }

    [Fact]
    public void TheFilesHoldWhatIsToBeProven()
    {
        var (text, tables) = (SquadBase.Shared.Text, SquadBase.Shared.DerivedTables);
        Assert.InRange(SquadFiles.Bare.Count, 200, 250);
        Assert.All(["recording", "activity", "histogram", "day", "finding", "table_row", "content_question"], table => Assert.Contains(table, tables));
        Assert.All(Enum.GetValues<ArrivalState>().Except([ArrivalState.Waiting, ArrivalState.Aside]), state => Assert.Contains($" {state} ", text, StringComparison.Ordinal));
        Assert.Contains("claimed by anna and bo", text, StringComparison.Ordinal);
        Assert.NotEmpty(SquadBase.Shared.Standing);
    }

    [Theory]
    [InlineData("watch 31.fit")]
    [InlineData("squad 31.csv")]
    [InlineData("days.csv")]
    public void OneContentLessIsNoticed(string name)
    {
        using var folder = SquadBase.Make();
        SquadBase.TakeIn(folder, [.. SquadFiles.Packed.Where(file => !file.Name.EndsWith(name, StringComparison.Ordinal)).Select(file => new Placed(file.Path, file.Bytes))]);

        var text = Digest.Of(folder, SquadBase.Shared.DerivedTables);

        Assert.True(After(SquadBase.Shared.Text, "# day") != After(text, "# day"), "the days are the same without it");
    }

    [Theory]
    [MemberData(nameof(All))]
    public void TheSameContentsComeToTheSame(Variation variation, int number)
    {
        using var folder = SquadBase.Make();
        var files = Variations.Of(variation, number);

        SquadBase.TakeIn(folder, files);

        AssertSame(SquadBase.Shared.Text, Digest.Of(folder, SquadBase.Shared.DerivedTables));
        Assert.Equal(Placed.SmallestNames(files), Digest.ShownNames(folder));
    }

    private static string After(string text, string heading) => text[text.IndexOf($"{heading}\n", StringComparison.Ordinal)..];

    /// <summary>Names the first lines that differ, not a place in megabytes.</summary>
    internal static void AssertSame(string expected, string actual)
    {
        var (wanted, found) = (expected.Split('\n'), actual.Split('\n'));
        var differences = wanted.Except(found, StringComparer.Ordinal).Take(5).Select(line => $"- {line}")
            .Concat(found.Except(wanted, StringComparer.Ordinal).Take(5).Select(line => $"+ {line}"));
        Assert.True(expected == actual, string.Join('\n', differences));
    }
}
