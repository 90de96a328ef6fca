using System.Text;
using LoadWatch.Findings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class ConfigurationReaderTests
{
    [Fact]
    public void AnEmptyObjectMeansEveryDefault()
    {
        var read = ConfigurationFolder.With("loadwatch.json", "{}");

        Assert.Equal(new RuleLimits(), read.Groups["squad"].Limits);
        Assert.Equal(("banister_trimp", 7), (read.Groups["squad"].LoadQuantity, Assert.Single(read.Contacts).BriefDays.Count));
        Assert.Equal((Duration.FromSeconds(60), 32L * 1024 * 1024, 512L * 1024 * 1024), (read.Settle, read.LargestFileBytes, read.LargestCsvBytes));
        Assert.Equal(["samples", "sessions", "sets", "tests", "days", "plan", "answers"], read.Layouts.Select(layout => layout.Name));
    }

    [Fact]
    public void CommentsAndTrailingCommasAndAByteOrderMarkAreTaken()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", [0xEF, 0xBB, 0xBF, .. "{ // a note\n\"intake\": { \"settle_seconds\": 5, }, /* another */ }"u8]);

        Assert.Equal(Duration.FromSeconds(5), folder.Read().Settle);
    }

    [Fact]
    public void AGroupReplacesOnlyTheLimitsThatItWritesAndTakesTheOthersFromTheCommonOnes()
    {
        var read = ConfigurationFolder.With("loadwatch.json", """
            { "limits": { "load_ratio": { "raise": 2.5, "return": 2.0 }, "silence": { "extra_days": 4 } },
              "groups": [ { "id": "squad", "limits": { "load_ratio": { "raise": 3.5 } } }, { "id": "class" } ] }
            """);

        var common = new RuleLimits { LoadRatio = new LoadRatioLimits { Raise = 2.5, Return = 2.0 }, Silence = new SilenceLimits { ExtraDays = 4 } };
        Assert.Equal(common with { LoadRatio = common.LoadRatio with { Raise = 3.5 } }, read.Groups["squad"].Limits);
        Assert.Equal(common, read.Groups["class"].Limits);
    }

    [Fact]
    public void CommonLimitsHoldForTheGroupThatIsThereWhenNoneIsWritten()
    {
        var read = ConfigurationFolder.With("loadwatch.json", """{ "limits": { "silence": { "extra_days": 9 } } }""");

        Assert.Equal(9, Assert.Single(read.Groups.Values).Limits.Silence.ExtraDays);
    }

    [Fact]
    public void AGroupTurnsRulesOffAndNamesQuantities()
    {
        var read = ConfigurationFolder.With("loadwatch.json", """
            { "limits": { "load_ratio": { "quantities": ["distance"] } },
              "groups": [ { "id": "squad", "limits": { "hard_days": { "enabled": false }, "falling_load": { "quantities": ["sprints_of_pods", "climb"] } } } ] }
            """);

        var limits = read.Groups["squad"].Limits;
        Assert.Equal((false, true), (limits.HardDays.Enabled, limits.Monotony.Enabled));
        Assert.Equal(["climb", "distance", "sprints_of_pods"], limits.Quantities);
    }

    [Fact]
    public void AnOwnRegionReplacesTheShippedOneAndTheOthersStay()
    {
        var read = ConfigurationFolder.With("loadwatch.json", """{ "computation": { "exercises": { "squat": ["legs", "trunk"], "step_up": ["legs"] } } }""");

        var words = new[] { "squat", "step_up", "plank" }.Select(word => $"{word}: {string.Join(" ", read.Computation.Exercises[word])}");
        Assert.Equal(["squat: Legs Trunk", "step_up: Legs", "plank: Trunk"], words);
    }

    [Fact]
    public void AnExerciseMayBeWrittenInAnyCaseAndWithBlanks()
    {
        var read = ConfigurationFolder.With("loadwatch.json", """{ "computation": { "exercises": { "Leg Press": ["legs", "trunk"] } } }""");

        Assert.Equal([BodyRegion.Legs, BodyRegion.Trunk], read.Computation.Exercises["leg_press"]);
        Assert.DoesNotContain("Leg Press", read.Computation.Exercises.Keys);
    }

    [Theory]
    [InlineData("""{ "Step-Up": ["legs"], "step up": ["arms"] }""", "\"step_up\" stands above already, written otherwise")]
    [InlineData("""{ " - ": ["legs"] }""", "\" - \" holds no letter")]
    public void AnExerciseThatStandsTwiceOrIsNoWordIsTold(string exercises, string fault) => Assert.EndsWith(
        fault,
        Assert.Single(ConfigurationFolder.FaultsWith("loadwatch.json", $$"""{ "computation": { "exercises": {{exercises}} } }""")),
        StringComparison.Ordinal);

    [Fact]
    public void ATableInAnotherEncodingGivesAnotherVersionForAnotherLetter()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("roster.csv", Encoding.Latin1.GetBytes("person,name,group\nanna,Pää,squad\n"));
        var first = folder.Read().Hash;
        folder.Write("roster.csv", Encoding.Latin1.GetBytes("person,name,group\nanna,Pöö,squad\n"));

        Assert.NotEqual(first, folder.Read().Hash);
    }

    [Fact]
    public void AMissingFileIsNamed()
    {
        using var folder = new ConfigurationFolder();
        File.Delete(folder.At("anchors.csv"));

        Assert.StartsWith("anchors.csv: cannot be read: ", Assert.Single(folder.Faults()), StringComparison.Ordinal);
    }
}
