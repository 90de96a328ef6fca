using System.ComponentModel.DataAnnotations;
using System.Reflection;
using System.Text;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.RegularExpressions;
using LoadWatch.Activities;
using LoadWatch.Decoding;
using LoadWatch.Decoding.Csv;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Tests.Configuration;

/// <summary>What <c>config/README.md</c> says is what the program does: words, numbers and examples.</summary>
public sealed class ReadmeTests
{
    private static readonly string Readme = File.ReadAllText(Repository.Config("README.md")).ReplaceLineEndings("\n");
    private static readonly string[] Lines = Readme.Split('\n');
    private static readonly JsonSerializerOptions Compact = new(ConfigurationJson.Options) { WriteIndented = false };

    /// <summary>The records of numbers with the text in front of the table that explains them.</summary>
    public static TheoryData<string, Type> Limits
    {
        get
        {
            var data = new TheoryData<string, Type> { { "## Intake", typeof(IntakeEntry) }, { "**`quality`**", typeof(QualityLimits) }, { "**`equations`**", typeof(EquationChoices) } };
            foreach (var rule in typeof(RuleLimits).GetProperties().Where(property => property.Name != nameof(RuleLimits.Quantities)))
            {
                data.Add($"**`{KeyOf(rule)}`**", rule.PropertyType);
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Limits))]
    public void EveryLimitHasARowWithItsDefaultAndItsRange(string heading, Type limits)
    {
        var table = Table(heading);
        foreach (var property in limits.GetProperties())
        {
            var cells = Row(KeyOf(property), table);

            Assert.Equal((property.Name, Json(property.GetValue(Activator.CreateInstance(limits)))), (property.Name, cells[1]));
            if (property.GetCustomAttribute<RangeAttribute>() is { } range)
            {
                Assert.Contains(cells, cell => Regex.IsMatch(cell, $@"^{Invariant(range.Minimum)} to {Invariant(range.Maximum)}($|[,;])"));
            }
            else if (property.GetCustomAttribute<NumbersAttribute>() is { } numbers)
            {
                Assert.Equal($"{Invariant(numbers.Lowest)} to {Invariant(numbers.Highest)} each{(numbers.IsRising ? ", rising" : "")}", cells[2]);
            }
            else if (property.PropertyType.IsEnum)
            {
                Assert.Contains(cells, cell => ValueCheck.WordsOf(property.PropertyType).All(word => cell.Contains($"`{word}`", StringComparison.Ordinal)));
            }
            else
            {
                Assert.True(property.PropertyType != typeof(double) && property.PropertyType != typeof(int), $"{property.Name} has no range");
            }
        }
    }

    [Fact]
    public void EveryRuleHasItsLimitsAndItsTableInItsOrder()
    {
        var headings = RuleBook.All.Select(rule => $"**`{rule.Name}`**").ToList();
        Assert.Equal(headings, Limits.Select(row => row.Data.Item1).Where(headings.Contains));
        Assert.Equal(headings, headings.OrderBy(heading => Readme.IndexOf($"\n{heading}", StringComparison.Ordinal)));
    }

    [Fact]
    public void EveryAnchorHasItsUnitAndItsRange()
    {
        var table = Table("| anchor | unit |").ToList();
        foreach (var kind in AnchorKinds.All)
        {
            var cells = Row(kind.Name, table);
            var place = cells[0].Split(", ").ToList().IndexOf($"`{kind.Name}`");

            Assert.Contains(kind.Unit, cells[1].Split(", "));
            Assert.Equal((kind.Name, $"{Invariant(kind.Lowest)} to {Invariant(kind.Highest)}"), (kind.Name, cells[2].Split(", ")[place]));
        }
    }

    [Fact]
    public void EveryKeyOfTheConfigurationIsNamed()
    {
        Type[] types =
        [
            typeof(InboxEntry), typeof(GroupEntry), typeof(PersonEntry), typeof(ContactEntry), typeof(ComputationEntry), typeof(QualityLimits), typeof(EquationChoices), typeof(CsvLayout), typeof(CsvQuality), typeof(CsvField),
            typeof(CsvWideEntry),
        ];
        var missing = types
            .SelectMany(type => type.GetProperties())
            .Concat(typeof(LoadWatchFile).GetProperties().Where(property => property.Name != nameof(LoadWatchFile.Schema)))
            .Select(KeyOf)
            .Where(key => !IsNamed(key));

        Assert.Empty(missing.Except(["inboxes", "groups", "contacts", "computation", "intake"])); // The names of chapters.
    }

    [Fact]
    public void EveryFieldOfTheExportsIsNamed()
    {
        var fields = typeof(Exporter).Assembly.GetTypes()
            .Where(type => type.Namespace == typeof(Exporter).Namespace && type.Name.EndsWith("Line", StringComparison.Ordinal))
            .SelectMany(type => type.GetProperties(BindingFlags.Public | BindingFlags.Instance | BindingFlags.DeclaredOnly))
            .Where(property => property.GetCustomAttribute<JsonIgnoreAttribute>() is null)
            .Select(KeyOf)
            .ToHashSet();

        Assert.True(fields.Count > 60);
        Assert.DoesNotContain(fields, field => !IsNamed(field) && !Readme.Contains($"\"{field}\"", StringComparison.Ordinal));
    }

    [Fact]
    public void EveryWordThatMayBeWrittenIsNamed()
    {
        var words = QuantityNames.All
            .Concat(DefaultRegions.Exercises.Keys)
            .Concat(DefaultRegions.Sports.Keys)
            .Concat(Enum.GetValues<Channel>().Select(Words.Channel))
            .Concat(ValueCheck.WordsOf(typeof(ContactRole)))
            .Concat(ValueCheck.WordsOf(typeof(GroupKind)))
            .Concat(ValueCheck.WordsOf(typeof(NamesShown)))
            .Concat(ValueCheck.WordsOf(typeof(AnchorSource)))
            .Concat(ValueCheck.WordsOf(typeof(ArrivalState)))
            .Concat(ValueCheck.WordsOf(typeof(TakeMode)))
            .Concat(Enum.GetValues<CutReason>().Select(Words.Of));

        Assert.DoesNotContain(words, word => !IsNamed(word));
    }

    [Fact]
    public void TheShippedRegionsAreTheOnesTold()
    {
        var told = Paragraph("Shipped exercises.") + " " + Paragraph("Shipped sports.");
        foreach (var (word, regions) in DefaultRegions.Exercises.Concat(DefaultRegions.Sports))
        {
            var before = told[..told.IndexOf($"`{word}`", StringComparison.Ordinal)];
            var heading = Regex.Matches(before, @"(Legs and trunk|Arms and trunk|All three|Legs|Trunk|Arms):")[^1].Groups[1].Value;
            Assert.Equal((word, heading), (word, Heading(regions)));
        }
    }

    [Fact]
    public void TheExampleOfTheBuiltInFormatIsRead()
    {
        var file = new DecoderSet([BuiltInLayouts.Samples]).Decode(Encoding.UTF8.GetBytes(Block("time,sport")));

        Assert.Empty(file.Problems);
        var samples = Assert.Single(file.Recordings).Samples;
        Assert.Equal((2, 113.0, true), (samples.Count, samples[Channel.HeartRate][1], double.IsNaN(samples[Channel.Power][1])));
    }

    [Fact]
    public void TheExampleOfALayoutReadsTheExampleOfItsFile()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", $"{{ {Block("\"layouts\"")} }}");

        var file = new DecoderSet(folder.Read().Layouts).Decode(Encoding.UTF8.GetBytes(Block("Zeit;Puls;Tempo")));

        Assert.Empty(file.Problems);
        var recording = Assert.Single(file.Recordings);
        Assert.Equal(("running", "club track"), (recording.Sport.Name, file.SourceName));
        Assert.Equal(24.5 / 3.6, recording.Samples[Channel.Speed][0], 12);
        Assert.Equal("2026-03-31T15:30:00Z", recording.Start!.Value.ToString()); // 17:30 in Vienna, summer time since 29 March.
    }

    [Fact]
    public void TheExampleOfSeveralPeopleReadsTheExampleOfItsFile()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", $"{{ \"layouts\": [{Block("{\n  \"name\": \"pods\"")}] }}");

        var file = new DecoderSet(folder.Read().Layouts).Decode(Encoding.UTF8.GetBytes(Block("player,time")));

        Assert.Empty(file.Problems);
        Assert.Equal(["Pod 01", "Pod 02"], file.Recordings.Select(recording => recording.Subject));
        Assert.Equal([1.42, double.NaN], file.Recordings.Select(recording => recording.Samples[Channel.Speed] is [var speed, ..] ? speed : double.NaN));
    }

    private static string KeyOf(PropertyInfo property) =>
        property.GetCustomAttribute<JsonPropertyNameAttribute>()?.Name ?? JsonNamingPolicy.SnakeCaseLower.ConvertName(property.Name);

    private static string Invariant(object? value) => FormattableString.Invariant($"{value}");

    private static string Json(object? value) => JsonSerializer.Serialize(value, Compact);

    private static bool IsNamed(string word) => Regex.IsMatch(Readme, $@"`([a-z_]+\.)*\.?{Regex.Escape(word)}`");

    /// <summary>The cells of the one row whose first cell names the word.</summary>
    private static string[] Row(string word, IEnumerable<string>? table = null) => Assert.Single(
        (table ?? Lines).Where(line => line.StartsWith('|')).Select(line => line.Trim('|', ' ').Split(" | ")),
        cells => cells[0].Contains($"`{word}`", StringComparison.Ordinal));

    /// <summary>The first table after the line that begins so.</summary>
    private static IEnumerable<string> Table(string heading) => Lines
        .SkipWhile(line => !line.StartsWith(heading, StringComparison.Ordinal))
        .SkipWhile(line => !line.StartsWith('|'))
        .TakeWhile(line => line.StartsWith('|'));

    private static string Paragraph(string start) => string.Join(' ', Lines.SkipWhile(line => !line.StartsWith(start, StringComparison.Ordinal))
        .TakeWhile((line, i) => i == 0 || !line.StartsWith("Shipped", StringComparison.Ordinal)).TakeWhile(line => line.Length > 0));

    /// <summary>The fenced block that begins with a text.</summary>
    private static string Block(string start) => Regex.Matches(Readme, "```(json)?\n(?<text>.*?)```", RegexOptions.Singleline | RegexOptions.ExplicitCapture)
        .Select(match => match.Groups["text"].Value)
        .Single(block => block.StartsWith(start, StringComparison.Ordinal));

    private static string Heading(IReadOnlyList<BodyRegion> regions) => regions.Count switch
    {
        3 => "All three",
        2 => $"{regions[0]} and {BodyRegions.Word(regions[1])}",
        _ => regions[0].ToString(),
    };
}
