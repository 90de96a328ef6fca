using System.Text;
using System.Text.Json;
using System.Text.RegularExpressions;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Csv;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Configuration;

/// <summary>What <c>config/README.md</c> says of tables is what the program does: examples, fields, words, columns.</summary>
public sealed class TableReadmeTests
{
    private static readonly string Chapter = Regex.Match(
        File.ReadAllText(Repository.Config("README.md")).ReplaceLineEndings("\n"), "^## CSV tables$.*?(?=^## )", RegexOptions.Singleline | RegexOptions.Multiline).Value;

    [Fact]
    public void EveryExampleOfALayoutReadsTheExampleOfItsFile()
    {
        var examples = Regex.Matches(Chapter, "```\n(?<file>.*?)```\n\n```json\n(?<layout>.*?)```", RegexOptions.Singleline | RegexOptions.ExplicitCapture);
        var read = examples.Select(example => Decode(example.Groups["layout"].Value, example.Groups["file"].Value)).ToList();

        Assert.All(read, file => Assert.Empty(file.Problems));
        Assert.Equal(
            ["club tracking: 2", "ratings form: 3", "gym sheet: 3", "clinic tests: 4", "door list: 2", "calendar: 2", "answers form: 2"],
            read.Select(file => $"{file.Table!.Layout}: {file.Table.Rows.Count}"));
        Assert.Equal(Enum.GetValues<RowKind>(), read.Select(file => file.Table!.Kind).Distinct());
    }

    [Fact]
    public void TheExamplesSayWhatTheirLayoutsSay()
    {
        var session = (SessionRow)Example("club tracking").Rows[1].Content;
        var set = (SetRow)Example("gym sheet").Rows[2].Content;
        var entry = (PlanRow)Example("calendar").Rows[0].Content;

        // 9.15 km; 30.6 km/h = 8.5 m/s; 1:32:30 = 92.5 min.
        Assert.Equal((92.5, DeclaredContent.Match), (session.Minutes, session.Content));
        Assert.Equal([("distance", 9150.0), ("distance_above_5_5_m_s", 655), ("speed_top", 8.5)], session.Quantities.Select(known => (known.Name, known.Value)));
        Assert.Equal(("row", 1, 12, 35.0), (set.Exercise, set.Set, set.Repetitions, set.Kilograms));
        Assert.Equal((PlanWord.TeamSession, true, "17:30:00"), (entry.Word, entry.RecordingExpected, entry.Start!.Value.ToString("HH:mm:ss", null)));
        Assert.Equal(["2026-03-31|n=1", "2026-03-31|n=1", "2026-04-01|n=1"], Example("ratings form").Rows.Select(row => row.Key));
    }

    [Fact]
    public void EveryFieldIsNamed()
    {
        foreach (var kind in Enum.GetValues<CsvKind>().Except([CsvKind.Samples]))
        {
            Assert.DoesNotContain(FieldsOf(kind), field => !IsNamed(field));
        }
    }

    [Fact]
    public void EveryWordIsNamed()
    {
        Type[] types = [typeof(DeclaredContent), typeof(SetLoad), typeof(TestOutcome), typeof(DayWord), typeof(PlanWord), typeof(AnswerWord), typeof(TableNaming), typeof(TableCover), typeof(RowKind)];

        Assert.DoesNotContain(types.SelectMany(ValueCheck.WordsOf), word => !IsNamed(word));
        Assert.DoesNotContain(FunctionTests(), word => !IsNamed(word));
    }

    [Fact]
    public void EveryColumnOfOurOwnTablesIsNamed()
    {
        foreach (var layout in BuiltInTables.All)
        {
            var row = Assert.Single(Chapter.Split('\n'), line => line.StartsWith($"| `{layout.Name}` | ", StringComparison.Ordinal) && line.Contains("**", StringComparison.Ordinal));
            var cell = Regex.Replace(row.Split(" | ")[2].TrimEnd(' ', '|'), @" \(.*?\)", "").Split(", ");

            Assert.Equal(layout.Header, cell.Where(name => name.StartsWith('*')).Select(name => name.Trim('*')));
            Assert.Equal(
                layout.Header.Concat(layout.Fields.Select(field => field.Column)).Append("person").Concat(layout.GroupColumn is null ? [] : ["group"]).Distinct().Order(StringComparer.Ordinal),
                cell.Select(name => name.Trim('*')).Order(StringComparer.Ordinal));
        }
    }

    private static DecodedTable Example(string name)
    {
        var example = Regex.Matches(Chapter, "```\n(?<file>[^`]*?)```\n\n```json\n(?<layout>[^`]*?)```", RegexOptions.ExplicitCapture)
            .Single(example => example.Groups["layout"].Value.Contains($"\"{name}\"", StringComparison.Ordinal));
        return Decode(example.Groups["layout"].Value, example.Groups["file"].Value).Table!;
    }

    private static LoadWatch.Recordings.DecodedFile Decode(string layout, string text)
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", $"{{ \"layouts\": [ {layout} ] }}");
        return new DecoderSet(folder.Read().Layouts).Decode(Encoding.UTF8.GetBytes(text));
    }

    /// <summary>As the complaint about an unknown one names them.</summary>
    private static string[] FieldsOf(CsvKind kind) => new CsvLayout { Name = "x", Kind = kind, Header = ["x"], DateColumn = "x", Fields = [new() { Column = "y", Field = "?" }] }
        .Validate().Single(reason => reason.Contains("use one of ", StringComparison.Ordinal)).Split("use one of ")[1].Split(", ");

    /// <summary>As the complaint about an unknown one names them, up to the anchors, which have a chapter of their own.</summary>
    private static IEnumerable<string> FunctionTests()
    {
        var words = new DecoderSet(BuiltInLayouts.All).Decode("date,test,value\n2026-03-31,?,1\n"u8.ToArray()).Problems[1].Reason["not one of ".Length..].Split(", ");
        Assert.Contains("grip_strength", words);
        return words.TakeWhile(word => word != "heart_rate_rest");
    }

    private static bool IsNamed(string word) => Chapter.Contains($"`{word}`", StringComparison.Ordinal);
}
