namespace LoadWatch.Service.Tests.Configuration;

/// <summary>One mistake in <c>loadwatch.json</c> at a time, and what is said about it: file, line, key and the nearest right word.</summary>
public sealed class ConfigurationMistakesTests
{
    [Theory]
    [InlineData("""{ "inbxoes": [] }""", """loadwatch.json:1: "inbxoes" is not a key here; did you mean "inboxes"?""")]
    [InlineData("""{ "zebra": 1 }""", """loadwatch.json:1: "zebra" is not a key here""")]
    [InlineData("{\n\"intake\": {\n\"settle_secnds\": 60 } }", """loadwatch.json:3: "settle_secnds" is not a key here; did you mean "settle_seconds"?""")]
    [InlineData("{ \"inboxes\": [\n{},\n{ \"pth\": \"inbox\" } ] }", """loadwatch.json:3: "pth" is not a key here; did you mean "path"?""")]
    [InlineData("{ \"groups\": [ {\n\"limits\": {\n\"silence\": {\n\"extra_day\": 1 } } } ] }",
        """loadwatch.json:4: "extra_day" is not a key here; did you mean "extra_days"?""")]
    [InlineData("{ \"layouts\": [ { \"time\": {\n\"colum\": \"t\" } } ] }", """loadwatch.json:2: "colum" is not a key here; did you mean "column"?""")]
    [InlineData("{ \"layouts\": [ { \"fields\": [\n{ \"colum\": \"t\" } ] } ] }", """loadwatch.json:2: "colum" is not a key here; did you mean "column"?""")]
    [InlineData("{ \"layouts\": [ { \"wide\": [ {\n\"fields\": [\n{ \"unti\": \"kg\" } ] } ] } ] }",
        """loadwatch.json:3: "unti" is not a key here; did you mean "unit"?""")]
    [InlineData("{\n\"data\": \"a\",\n\"data\": \"b\" }", """loadwatch.json:3: "data" stands twice here, first in line 2""")]
    public void AKeyThatIsNotOne(string json, string fault) => Assert.Equal([fault], ConfigurationFolder.FaultsWith("loadwatch.json", json));

    [Theory]
    [InlineData("""{ "intake": { "scan_seconds": "60" } }""", """loadwatch.json:1: intake.scan_seconds: "60" is not a whole number""")]
    [InlineData("""{ "intake": { "scan_seconds": 7.5 } }""", "loadwatch.json:1: intake.scan_seconds: 7.5 is not a whole number")]
    [InlineData("""{ "limits": { "monotony": { "enabled": "no" } } }""", """loadwatch.json:1: limits.monotony.enabled: "no" is not true or false""")]
    [InlineData("""{ "limits": { "load_ratio": { "quantities": "distance" } } }""",
        """loadwatch.json:1: limits.load_ratio.quantities: "distance" is not a list in brackets""")]
    [InlineData("""{ "intake": [] }""", "loadwatch.json:1: intake: a list is not an object in braces")]
    [InlineData("""{ "inboxes": {} }""", "loadwatch.json:1: inboxes: an object is not a list in brackets")]
    [InlineData("""{ "inboxes": null }""", "loadwatch.json:1: inboxes: null is not a list in brackets")]
    [InlineData("""{ "groups": [null] }""", "loadwatch.json:1: groups[0]: null is not an object in braces")]
    [InlineData("""{ "data": 7 }""", "loadwatch.json:1: data: 7 is not text in quotes")]
    [InlineData("""{ "computation": { "speed_bounds": [2, 1e999] } }""", "loadwatch.json:1: computation.speed_bounds[1]: 1e999 is not a number")]
    [InlineData("""{ "computation": { "exercises": { "squat": null } } }""",
        "loadwatch.json:1: computation.exercises.squat: null is not a list in brackets")]
    [InlineData("""{ "layouts": [ { "delimiter": ";;" } ] }""", """loadwatch.json:1: layouts[0].delimiter: ";;" is not one character in quotes""")]
    [InlineData("""{ "layouts": [ { "wide": [ { "set": "1" } ] } ] }""", """loadwatch.json:1: layouts[0].wide[0].set: "1" is not a whole number""")]
    [InlineData("""{ "layouts": [ { "constants": { "set": 1 } } ] }""", "loadwatch.json:1: layouts[0].constants.set: 1 is not text in quotes")]
    [InlineData("""{ "layouts": [ { "kind": "stes" } ] }""",
        """loadwatch.json:1: layouts[0].kind: "stes" is not one of samples, sessions, sets, tests, days, plan, answers; did you mean "sets"?""")]
    [InlineData("""{ "layouts": [ { "covers": "dtes" } ] }""",
        """loadwatch.json:1: layouts[0].covers: "dtes" is not one of dates, everything; did you mean "dates"?""")]
    [InlineData("""{ "computation": { "equations": { "heart_rate_max_by_age": "tanka" } } }""",
        """loadwatch.json:1: computation.equations.heart_rate_max_by_age: "tanka" is not one of tanaka, nes, gellish, gulati, sydo; did you mean "tanaka"?""")]
    [InlineData("""{ "inboxes": [ { "take": "mvoe" } ] }""",
        """loadwatch.json:1: inboxes[0].take: "mvoe" is not one of leave, move; did you mean "move"?""")]
    [InlineData("""{ "contacts": [ { "role": "physio" } ] }""",
        """loadwatch.json:1: contacts[0].role: "physio" is not one of coach, physiotherapist, clinician, front_desk, self""")]
    [InlineData("""{ "contacts": [ { "brief_days": ["none"] } ] }""",
        """
        loadwatch.json:1: contacts[0].brief_days[0]: "none" is not one of monday, tuesday, wednesday, thursday, friday, saturday, sunday
        """)]
    [InlineData("[]", "loadwatch.json:1: a list is not an object in braces")]
    public void AValueOfAWrongType(string json, string fault) => Assert.Equal([fault], ConfigurationFolder.FaultsWith("loadwatch.json", json));

    [Theory]
    [InlineData("{\n\"intake\": {\n\"scan_seconds\": 4 } }", "loadwatch.json:3: intake.scan_seconds: 4 is outside 5 to 3600")]
    [InlineData("{ \"limits\": {\n\"load_ratio\": {\n\"covered_of_7\": 8 } } }", "loadwatch.json:3: limits.load_ratio.covered_of_7: 8 is outside 5 to 7")]
    [InlineData("{ \"groups\": [ { \"limits\": {\n\"load_ratio\": {\n\"raise\": 0.9 } } } ] }",
        "loadwatch.json:3: groups[0].limits.load_ratio.raise: 0.9 is outside 1 to 10")]
    [InlineData("""{ "computation": { "usable_share_wanted": 50 } }""", "loadwatch.json:1: computation.usable_share_wanted: 50 is outside 0 to 1")]
    [InlineData("""{ "computation": { "power_bounds": [0.8, 0.8] } }""",
        "loadwatch.json:1: computation.power_bounds: the bounds must rise, the first from above 0")]
    [InlineData("""{ "computation": { "speed_bounds": [-1, 2] } }""",
        "loadwatch.json:1: computation.speed_bounds: the bounds must rise, the first from above 0")]
    [InlineData("""{ "computation": { "equations": { "heart_rate_above_equation": 61 } } }""",
        "loadwatch.json:1: computation.equations.heart_rate_above_equation: 61 is outside 10 to 60")]
    [InlineData("""{ "computation": { "equations": { "lucia_weights": [1, 2] } } }""",
        "loadwatch.json:1: computation.equations.lucia_weights: wants 3 numbers from 0 to 100")]
    [InlineData("""{ "computation": { "equations": { "stagno_bounds": [0.6, 0.7, 0.7, 0.8, 0.9] } } }""",
        "loadwatch.json:1: computation.equations.stagno_bounds: wants 5 numbers from 0 to 1, rising")]
    [InlineData("""{ "computation": { "equations": { "fast_load_factor": 0.5 } } }""",
        "loadwatch.json:1: computation.equations.fast_load_factor: 0.5 is outside 1 to 5")]
    [InlineData("""{ "computation": { "speed_max_shares": [0.9, 0.9] } }""",
        "loadwatch.json:1: computation.speed_max_shares: the shares must rise and lie in 0.5 to 1")]
    [InlineData("""{ "computation": { "speed_max_shares": [0.49, 0.9] } }""",
        "loadwatch.json:1: computation.speed_max_shares: the shares must rise and lie in 0.5 to 1")]
    [InlineData("""{ "computation": { "speed_max_shares": [0.9, 1.01] } }""",
        "loadwatch.json:1: computation.speed_max_shares: the shares must rise and lie in 0.5 to 1")]
    [InlineData("""{ "groups": [ { "load_fallbacks": ["minutes", "banister_trimp"] } ] }""",
        """loadwatch.json:1: groups[0].load_fallbacks: "banister_trimp" is the group's load itself""")]
    [InlineData("""{ "inboxes": [ { "name": "" } ] }""", "loadwatch.json:1: inboxes[0].name: may not be blank")]
    [InlineData("""{ "contacts": [ { "id": "a b" } ] }""",
        """loadwatch.json:1: contacts[0].id: "a b" may hold letters, digits, - and _ only, 40 at most""")]
    [InlineData("""{ "contacts": [ { "brief_at": "6:30" } ] }""",
        """loadwatch.json:1: contacts[0].brief_at: "6:30" is a time of day such as 06:30""")]
    [InlineData("""{ "contacts": [ { "brief_days": [] } ] }""", "loadwatch.json:1: contacts[0].brief_days: names no weekday")]
    public void AValueThatCannotBe(string json, string fault) => Assert.Equal([fault], ConfigurationFolder.FaultsWith("loadwatch.json", json));

    [Theory]
    [InlineData("""{ "time_zone": "Europe/Helsinky" }""",
        """loadwatch.json:1: time_zone: "Europe/Helsinky" is not an IANA time zone; did you mean "Europe/Helsinki"?""")]
    [InlineData("""{ "contacts": [ { "time_zone": "Mars" } ] }""", """loadwatch.json:1: contacts[0].time_zone: "Mars" is not an IANA time zone""")]
    [InlineData("""{ "contacts": [ { "groups": ["sqaud"] } ] }""",
        """loadwatch.json:1: contacts[0].groups: "sqaud" is not a group; did you mean "squad"?""")]
    [InlineData("""{ "contacts": [ { "groups": ["Squad"] } ] }""",
        """loadwatch.json:1: contacts[0].groups: "Squad" is not a group; did you mean "squad"?""")]
    [InlineData("""{ "contacts": [ { "people": ["anne"] } ] }""",
        """loadwatch.json:1: contacts[0].people: "anne" is not in the roster; did you mean "anna"?""")]
    [InlineData("""{ "computation": { "exercises": { "step_up": ["lges"] } } }""",
        """loadwatch.json:1: computation.exercises.step_up: "lges" is not a body region; did you mean "legs"?""")]
    [InlineData("""{ "computation": { "sports": { "cycling": ["Legs"] } } }""",
        """loadwatch.json:1: computation.sports.cycling: "Legs" is not a body region; did you mean "legs"?""")]
    [InlineData("""{ "groups": [ { "load_quantity": "banister_trmp" } ] }""",
        """loadwatch.json:1: groups[0].load_quantity: "banister_trmp" is not a quantity; did you mean "banister_trimp"?""")]
    [InlineData("""{ "groups": [ { "load_quantity": "distance_above_6_m_s" } ], "computation": { "speed_bounds": [2, 6.5] } }""",
        """loadwatch.json:1: groups[0].load_quantity: "distance_above_6_m_s" is not a quantity; did you mean "distance_above_6_5_m_s"?""")]
    [InlineData("""{ "groups": [ { "load_fallbacks": ["foster_laod"] } ] }""",
        """loadwatch.json:1: groups[0].load_fallbacks: "foster_laod" is not a quantity; did you mean "foster_load"?""")]
    public void AWordThatNamesNothing(string json, string fault) => Assert.Equal([fault], ConfigurationFolder.FaultsWith("loadwatch.json", json));

    [Theory]
    [InlineData("{ \"groups\": [ { \"id\": \"squad\" },\n{ \"id\": \"squad\" } ] }", """loadwatch.json:2: groups[1].id: the group "squad" stands above already""")]
    [InlineData("{ \"contacts\": [ { \"id\": \"staff\" },\n{ \"id\": \"STAFF\" } ] }",
        """loadwatch.json:2: contacts[1].id: the contact "STAFF" stands above already""")]
    [InlineData("{ \"inboxes\": [ {},\n{ \"name\": \"inbox\" } ] }", """loadwatch.json:2: inboxes[1].name: the inbox "inbox" stands above already""")]
    [InlineData("""{ "data": "inbox/data" }""",
        """loadwatch.json:1: inboxes[0].path: the folder "inbox/data" lies in this inbox: LoadWatch writes there""")]
    [InlineData("""{ "roster": "people.csv" }""", "people.csv: cannot be read")]
    [InlineData("{\n\"data\" \"a\" }", "loadwatch.json:2: ")]
    public void AThingThatIsThereTwiceOrNotAtAll(string json, string fault) =>
        Assert.StartsWith(fault, Assert.Single(ConfigurationFolder.FaultsWith("loadwatch.json", json)), StringComparison.Ordinal);

    [Theory]
    [InlineData("""{ "limits": { "load_ratio": { "raise": 1.5 } } }""", "loadwatch.json:1: limits.load_ratio.return: 1.8 is above raise, which is 1.5")]
    [InlineData("{ \"groups\": [ { \"limits\": {\n\"load_ratio\": { \"return\": 2.3 } } } ] }",
        "loadwatch.json:2: groups[0].limits.load_ratio.return: 2.3 is above raise, which is 2.2")]
    [InlineData("""{ "limits": { "stimulus_gap": { "notice_days": 15 } } }""",
        "loadwatch.json:1: limits.stimulus_gap.warning_days: 14 is below notice_days, which is 15")]
    [InlineData("""{ "limits": { "silence": { "gaps_wanted": 85 } } }""",
        "loadwatch.json:1: limits.silence.gaps_wanted: 85 gaps never fit in look_back_days, which is 84")]
    [InlineData("""{ "limits": { "weekly_jump": { "return": 0.5 } } }""", "loadwatch.json:1: limits.weekly_jump.return: 0.5 is above raise, which is 0.2")]
    [InlineData("""{ "limits": { "weekly_jump": { "look_back_weeks": 5 } } }""",
        "loadwatch.json:1: limits.weekly_jump.weeks: 6 is above look_back_weeks, which is 5")]
    [InlineData("""{ "limits": { "session_spike": { "run_notice": 0.7 } } }""",
        "loadwatch.json:1: limits.session_spike.run_warning: 0.6 is below run_notice, which is 0.7")]
    [InlineData("""{ "limits": { "session_spike": { "load_warning": 0.3 } } }""",
        "loadwatch.json:1: limits.session_spike.load_warning: 0.3 is below load_notice, which is 0.6")]
    [InlineData("""{ "limits": { "monotony": { "return": 2.1 } } }""", "loadwatch.json:1: limits.monotony.return: 2.1 is above raise, which is 2")]
    [InlineData("""{ "limits": { "monotony": { "strains_wanted": 90, "look_back_days": 80 } } }""",
        "loadwatch.json:1: limits.monotony.strains_wanted: 90 is above look_back_days, which is 80")]
    [InlineData("""{ "limits": { "hard_days": { "training_days_wanted": 40, "look_back_days": 28 } } }""",
        "loadwatch.json:1: limits.hard_days.training_days_wanted: 40 is above look_back_days, which is 28")]
    [InlineData("""{ "limits": { "hard_days": { "matches": 5, "match_days": 4 } } }""",
        "loadwatch.json:1: limits.hard_days.matches: 5 is above match_days, which is 4")]
    [InlineData("""{ "limits": { "falling_load": { "warning": 0.65 } } }""", "loadwatch.json:1: limits.falling_load.warning: 0.65 is above notice, which is 0.55")]
    [InlineData("""{ "limits": { "falling_load": { "return": 0.5 } } }""", "loadwatch.json:1: limits.falling_load.return: 0.5 is below notice, which is 0.55")]
    [InlineData("""{ "limits": { "falling_load": { "weeks": 5 } } }""", "loadwatch.json:1: limits.falling_load.weeks_wanted: 6 is above weeks, which is 5")]
    public void LimitsThatContradictEachOther(string json, string fault) => Assert.Equal([fault], ConfigurationFolder.FaultsWith("loadwatch.json", json));

    [Theory]
    [InlineData("""{ "limits": { "load_ratio": { "raise": 1.8 } } }""")]
    [InlineData("""{ "limits": { "stimulus_gap": { "notice_days": 14 } } }""")]
    [InlineData("""{ "limits": { "silence": { "gaps_wanted": 84 } } }""")]
    [InlineData("""{ "limits": { "falling_load": { "warning": 0.55, "return": 0.55 } } }""")]
    [InlineData("""{ "limits": { "session_spike": { "enabled": false, "run_warning": 0.3 } } }""")]
    public void LimitsThatMeetAreTaken(string json) => Assert.NotNull(ConfigurationFolder.With("loadwatch.json", json));

    [Theory]
    [InlineData("Distance", "is not the name of a quantity: a small letter, then small letters, digits and _, 60 at most")]
    [InlineData("7_m_s", "is not the name of a quantity: a small letter, then small letters, digits and _, 60 at most")]
    [InlineData("", "is not the name of a quantity: a small letter, then small letters, digits and _, 60 at most")]
    [InlineData("speed_top", "is no load: a day's sum of it would mean nothing")]
    [InlineData("rating", "is no load: a day's sum of it would mean nothing")]
    [InlineData("one_repetition_max_of_squat", "is no load: a day's sum of it would mean nothing")]
    public void ANameThatNoQuantityHas(string name, string fault) => Assert.Equal(
        [$"loadwatch.json:1: limits.weekly_jump.quantities[1]: \"{name}\" {fault}"],
        ConfigurationFolder.FaultsWith("loadwatch.json", $$"""{ "limits": { "weekly_jump": { "quantities": ["distance", "{{name}}"] } } }"""));

    [Fact]
    public void AFaultOfALayoutNamesTheLayoutAndItsLine()
    {
        var faults = ConfigurationFolder.FaultsWith("loadwatch.json", """
            { "layouts": [
              { "name": "pod", "header": ["t"], "time": { "column": "t" },
                "columns": [ { "column": "v", "channel": "speed", "unit": "mph" } ] } ] }
            """);

        Assert.Equal(["loadwatch.json:2: layouts[0]: layout \"pod\": columns: unit 'mph' of 'v' is not known for Speed"], faults);
    }

    [Fact]
    public void TwoMistakesAreToldTogether()
    {
        var faults = ConfigurationFolder.FaultsWith("loadwatch.json", """
            {
              "intake": { "scan_seconds": true },
              "pgaes": "p"
            }
            """);

        Assert.Equal(
            ["loadwatch.json:2: intake.scan_seconds: true is not a whole number", "loadwatch.json:3: \"pgaes\" is not a key here; did you mean \"pages\"?"],
            faults);
    }

    [Fact]
    public void MistakesOfTwoFilesAreToldTogether()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", """{ "contacts": [ { "groups": ["sqaud"] } ] }""");
        folder.Write("anchors.csv", "person,anchor,value,unit\nanne,body_mass,70,kg\n");

        Assert.Equal(["anchors.csv:2", "loadwatch.json:1"], folder.Faults().Select(fault => fault[..fault.IndexOf(": ", StringComparison.Ordinal)]));
    }
}
