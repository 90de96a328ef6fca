using LoadWatch.Findings;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class LimitsOfPeopleTests
{
    [Fact]
    public void APersonReplacesOnlyWhatIsWrittenAndTakesTheOthersFromTheGroup()
    {
        var read = ConfigurationFolder.With("loadwatch.json", """
            { "limits": { "silence": { "extra_days": 4 } },
              "groups": [ { "id": "squad", "limits": { "load_ratio": { "raise": 2.5, "return": 2 } } } ],
              "people": { "ANNA": { "limits": { "load_ratio": { "return": 1.9 }, "hard_days": { "enabled": false } } }, "ben": {} } }
            """);

        var anna = read.GroupOf(read.People["anna"]).Limits;
        Assert.Equal((2.5, 1.9, 4, false), (anna.LoadRatio.Raise, anna.LoadRatio.Return, anna.Silence.ExtraDays, anna.HardDays.Enabled));
        Assert.Same(read.Groups["squad"], read.GroupOf(read.People["ben"]));
        Assert.Equal(("squad", 2.0, true), (read.GroupOf(read.People["anna"]).Id, read.Groups["squad"].Limits.LoadRatio.Return, read.Groups["squad"].Limits.HardDays.Enabled));
    }

    [Theory]
    [InlineData("""{ "groups": [ { "id": "squad", "kind": "clinic" } ] }""", "load_ratio, weekly_jump, monotony, hard_days")]
    [InlineData("""{ "limits": { "monotony": { "enabled": true } }, "groups": [ { "id": "squad", "kind": "clinic" } ] }""", "load_ratio, weekly_jump, monotony, hard_days")]
    [InlineData("""{ "groups": [ { "id": "squad", "kind": "clinic", "limits": { "hard_days": { "enabled": true } } } ] }""", "load_ratio, weekly_jump, monotony")]
    [InlineData("""{ "groups": [ { "id": "squad", "kind": "squad" } ] }""", "")]
    public void InAClinicRulesOfWeeksAndOfDaysInARowAreOffUnlessItTurnsThemOn(string json, string off)
    {
        var limits = ConfigurationFolder.With("loadwatch.json", json).Groups["squad"].Limits;

        Assert.Equal(off, string.Join(", ", RuleBook.All.Where(rule => !rule.LimitsOf(limits).Enabled).Select(rule => rule.Name)));
    }

    [Theory]
    [InlineData("""{ "people": { "anne": {} } }""", """loadwatch.json:1: people.anne: "anne" is not in the roster; did you mean "anna"?""")]
    [InlineData("""{ "people": { "anna": { "limits": { "load_ratio": { "raise": 20 } } } } }""", "loadwatch.json:1: people.anna.limits.load_ratio.raise: 20 is outside 1 to 10")]
    [InlineData("""{ "people": { "anna": { "limits": { "load_ratio": { "return": 2.5 } } } } }""", "loadwatch.json:1: people.anna.limits.load_ratio.return: 2.5 is above raise, which is 2.2")]
    [InlineData("""{ "people": { "anna": { "limit": {} } } }""", """loadwatch.json:1: "limit" is not a key here; did you mean "limits"?""")]
    [InlineData("""{ "people": { "anna": {}, "Anna": {} } }""", """loadwatch.json:1: people.Anna: the person "anna" stands above already""")]
    [InlineData("""{ "groups": [ { "kind": "clinik" } ] }""", """loadwatch.json:1: groups[0].kind: "clinik" is not one of squad, clinic; did you mean "clinic"?""")]
    [InlineData("""{ "limits": { "not_usable": { "return_sessions": 3 } } }""", "loadwatch.json:1: limits.not_usable.return_sessions: 3 is not below sessions, which is 3")]
    [InlineData("""{ "limits": { "hard_days": { "matches_return": 3 } } }""", "loadwatch.json:1: limits.hard_days.matches_return: 3 is not below matches, which is 3")]
    [InlineData("""{ "limits": { "hard_days": { "return_factor": 1.4 } } }""", "loadwatch.json:1: limits.hard_days.return_factor: 1.4 is above median_factor, which is 1.3")]
    [InlineData("""{ "limits": { "stimulus_gap": { "regions": ["leg"] } } }""",
        """loadwatch.json:1: limits.stimulus_gap.regions[0]: "leg" is not one of legs, trunk, arms; did you mean "legs"?""")]
    [InlineData("""{ "limits": { "test_overdue": { "tests": ["grip"] } } }""", """loadwatch.json:1: limits.test_overdue.tests[0]: "grip" is not a function test""")]
    [InlineData("""{ "limits": { "silence": { "severity": "note" } } }""", """loadwatch.json:1: limits.silence.severity: "note" is not one of notice, warning; did you mean "notice"?""")]
    public void MistakesAreNamedWithTheirPlace(string json, string fault) => Assert.Equal([fault], ConfigurationFolder.FaultsWith("loadwatch.json", json));
}
