using System.Globalization;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using Microsoft.Data.Sqlite;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>After a change of the configuration just what depends on it is computed again, and the rows are those that everything computed anew gives (I-5).</summary>
public sealed class PartialRecomputationTests : IDisposable
{
    private const string Layout = """
        "layouts": [{
          "name": "tracking", "header": ["player", "moment"], "person_column": "player", "time": { "column": "moment" }, "sport": "soccer",
          "columns": [{ "column": "hr", "channel": "heart_rate", "unit": "bpm" }]
        }]
        """;

    private const string Roster = """
        person,name,group,birth_year,sex,time_zone,aliases,heart_rate_valid
        anna,Anna Ahola,squad,1996,f,UTC,,
        bo,Bo Björk,squad,1991,m,UTC,,
        cara,Cara Costa,squad,1958,f,UTC,,

        """;

    /// <summary>With one object in it or none.</summary>
    private const string Computation = "\"computation\": \\{([^{}]|\\{[^}]*\\})*\\}";

    /// <summary>Every kind of change, each with what it does to the files of the configuration.</summary>
    private static readonly (string Name, Action<WorkingFolder, int> Make)[] Changes =
    [
        ("undated anchor", (folder, number) => folder.Replace("anchors.csv", "anna,,heart_rate_max,.*", $"anna,,heart_rate_max,{150 + number},bpm,,")),
        ("dated anchor", (folder, number) => folder.Append("anchors.csv", $"bo,2026-06-{10 - (number % 3):00},critical_power,{200 + number},W,,\n")),
        ("anchor gone", (folder, _) => folder.Replace("anchors.csv", "cara,,heart_rate_rest,.*\n", "")),
        ("birth year", (folder, number) => folder.Replace("roster.csv", "(cara,Cara Costa,[a-z]+),[0-9]+", $"$1,{1950 + number}")),
        ("sex", (folder, number) => folder.Replace("roster.csv", "(anna,Anna Ahola,[a-z]+,[0-9]+),[fm]?", $"$1,{(number % 2 == 0 ? "m" : "")}")),
        ("zone", (folder, number) => folder.Replace("roster.csv", "(bo,Bo Björk,[a-z]+,[0-9]+,[fm]?),[^,]*", $"$1,{(number % 2 == 0 ? "Pacific/Auckland" : "America/New_York")}")),
        ("heart rate", (folder, number) => folder.Replace("roster.csv", "(anna,.*),[^,\n]*\n", $"$1,no since 2026-06-{(number % 5) + 4:00}\n")),
        ("heart rate for a time", (folder, number) => folder.Replace("roster.csv", "(anna,.*),[^,\n]*\n", $"$1,no 2026-06-{(number % 4) + 3:00} to 2026-06-{(number % 3) + 7:00}\n")),
        ("day begins", (folder, number) => folder.Replace("loadwatch.json", "\"name\": \"Squad\"(, \"day_begins_at\": \"[0-9:]*\")?", $"\"name\": \"Squad\", \"day_begins_at\": \"{(number % 3) * 4:00}:30\"")),
        ("alias", (folder, _) => folder.Replace("roster.csv", "(cara,Cara Costa,[a-z]+,[0-9]+,[fm]?,[^,]*),[^,]*", "$1,stranger")),
        ("newcomer", (folder, number) => folder.Append("roster.csv", $"dora{number},Dora Dahl {number},squad,1999,f,UTC,,\n")),
        ("leaver", (folder, _) => folder.Leave("bo")),
        ("other group", (folder, _) => folder.Replace("roster.csv", "(cara,Cara Costa),[a-z]+", "$1,class")),
        ("limits", (folder, number) => folder.Replace("loadwatch.json", "\"silence\": \\{[^}]*\\}", $"\"silence\": {{ \"enabled\": {(number % 2 == 0 ? "true" : "false")} }}")),
        ("load", (folder, _) => folder.Replace("loadwatch.json", "\"load_quantity\": \"[a-z_]+\"", "\"load_quantity\": \"edwards_load\"")),
        ("equations", (folder, number) => folder.Replace("loadwatch.json", Computation, $"\"computation\": {{ \"equations\": {{ \"banister_men\": [0.6{number % 3}, 1.9], \"banister_women\": [0.8, 1.7{number % 3}], \"heart_rate_max_by_age\": \"{(number % 2 == 0 ? "nes" : "gellish")}\" }} }}")),
        ("bounds", (folder, number) => folder.Replace("loadwatch.json", Computation, $"\"computation\": {{ \"speed_bounds\": [2, {(number % 3) + 3}] }}")),
        ("layout", (folder, _) => folder.Replace("loadwatch.json", "\"sport\": \"[a-z]+\"", "\"sport\": \"rugby\"")),
        ("device", (folder, number) => folder.Write("devices.csv", $"serial,person,from,to,session\n4711,{(number % 2 == 0 ? "anna" : "cara")},,,\n")),
        ("file names", (folder, number) => folder.Replace("loadwatch.json", "\"take\": \"leave\"(, \"file_pattern\": \"[^\"]*\")?", $"\"take\": \"leave\", \"file_pattern\": \"{(number % 2 == 0 ? "{person}*" : "*{person}")}\"")),
        ("contact", (folder, number) => folder.Replace("loadwatch.json", "\"name\": \"Staff[^\"]*\"", $"\"name\": \"Staff {number}\"")),
    ];

    private readonly WorkingFolder folder = Configured();

    public PartialRecomputationTests()
    {
        folder.Fill(Files());
        folder.Sweep();
    }

    public static TheoryData<string> Names => [.. Changes.Select(change => change.Name)];

    public void Dispose() => folder.Dispose();

    [Theory]
    [MemberData(nameof(Names))]
    public void AfterAChangeTheRowsAreThoseOfEverythingComputedAnew(string name)
    {
        Changes.Single(change => change.Name == name).Make(folder, 1);
        AssertAsComputedAnew(name);
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void AfterManyChangesTheRowsAreThoseOfEverythingComputedAnew(int seed)
    {
        var random = new Random(seed);
        var made = new List<string>();
        for (var number = 1; number <= 12; number++)
        {
            var (name, make) = Changes[random.Next(Changes.Length)];
            made.Add(name);
            make(folder, number);
            AssertAsComputedAnew(string.Join(", ", made));
        }
    }

    [Fact]
    public void WhatChangesNoRowDecodesNothing()
    {
        folder.Replace("loadwatch.json", "\"name\": \"Staff\"", "\"name\": \"Everybody in it\"");
        folder.Replace("loadwatch.json", "\"brief_at\": \"05:00\"", "\"brief_at\": \"05:30\"");
        var report = folder.Sweep();
        Assert.Equal((0, 0), (report.Recomputed, report.PeopleComputed));
    }

    /// <summary>Behind the end of the time nothing is decoded again.</summary>
    [Fact]
    public void ATimeWithoutHeartRateDecodesItsOwnRecordingsAlone()
    {
        folder.Replace("roster.csv", "(anna,.*),[^,\n]*\n", "$1,no 2026-06-04 to 2026-06-05\n");
        var report = folder.Sweep();
        var near = folder.Activities("anna").Count(activity => string.CompareOrdinal(activity.GetProperty("date").GetString(), "2026-06-02") >= 0 && string.CompareOrdinal(activity.GetProperty("date").GetString(), "2026-06-07") <= 0);
        Assert.InRange(report.Recomputed, 1, near + 3);
        Assert.True(report.Recomputed < folder.Activities("anna").Count, "everything of hers was decoded");
    }

    [Fact]
    public void OtherLimitsComputeDaysAndDecodeNothing()
    {
        folder.Replace("loadwatch.json", "\"silence\": \\{[^}]*\\}", "\"silence\": { \"enabled\": false }");
        var report = folder.Sweep();
        Assert.Equal((0, 3), (report.Recomputed, report.PeopleComputed));
        Assert.DoesNotContain("\"rule\":\"silence\"", folder.Export("findings"), StringComparison.Ordinal);
    }

    [Fact]
    public void AReferenceValueDecodesWhatItHoldsFor()
    {
        folder.Append("anchors.csv", "anna,2026-06-08,heart_rate_vt1,120,bpm,,\nanna,2026-06-08,heart_rate_vt2,150,bpm,,\n");
        var report = folder.Sweep();
        var concerned = folder.Activities("anna").Count(activity => string.CompareOrdinal(activity.GetProperty("date").GetString(), "2026-06-06") >= 0);
        Assert.InRange(report.Recomputed, 1, concerned + 3);
        Assert.True(report.Recomputed < folder.Arrivals().Count / 2, "nearly everything was decoded");
        Assert.Equal(2, report.PeopleComputed); // One file of the days behind holds somebody else's recording too.
    }

    [Fact]
    public void LoadsFollowAReferenceValueAtOnceAndTheRestPersonByPerson()
    {
        var before = folder.Computed();
        folder.Replace("anchors.csv", "anna,,heart_rate_max,.*", "anna,,heart_rate_max,170,bpm,,");
        folder.Replace("anchors.csv", "bo,,heart_rate_max,.*", "bo,,heart_rate_max,175,bpm,,");
        var first = folder.Sweep(recomputesFor: TimeSpan.Zero);
        var loads = Loads();
        Assert.NotEqual(before, folder.Computed());
        Assert.Equal(2, first.PeopleBehind);
        Assert.True(File.Exists(Path.Combine(folder.Root, "pages", "staff.html")));

        var behind = first.PeopleBehind;
        for (var sweeps = 0; behind > 0; sweeps++)
        {
            Assert.True(sweeps < 100, "it never ends");
            var next = folder.Sweep(recomputesFor: TimeSpan.Zero).PeopleBehind;
            Assert.InRange(next, 0, behind);
            behind = next;
        }

        Assert.Equal(loads, Loads());
        AssertAsComputedAnew("two reference values");
    }

    [Fact]
    public void ARebuildThatIsCutOffGoesOnWhereItWasAndTheRowsStandMeanwhile()
    {
        var before = Dump();
        var through = 0;
        Assert.Throws<OperationCanceledException>(() => folder.Rebuild(cancelAfter: 10, seen: (done, _) => through = done));
        Assert.Equal(before, Dump());
        var left = folder.Read((_, session) => session.Outdated.Count());
        Assert.InRange(left, 1, folder.Arrivals().Count - 5);
        Assert.True(through >= 10, "it was cut off before it began");

        var rest = folder.Rebuild();
        Assert.InRange(rest.Recomputed, 1, left + 3);
        Assert.Equal(before, Dump());
        Assert.Equal(0, folder.Read((_, session) => session.Outdated.Count()));
        Assert.Equal(0, folder.Sweep().Recomputed);
    }

    [Fact]
    public void AKilledRebuildIsFinishedByTheNextSweep()
    {
        var before = Dump();
        Assert.NotEqual(0, Loadwatch.RunAndKillAt("decoded", "rebuild", "--config", folder.ConfigPath).Code);
        Assert.True(folder.Read((_, session) => session.Outdated.Count()) > 0);
        Assert.True(folder.Sweep(probe: new DyingProbe("", deaths: 0)).Recomputed > 0);
        Assert.Equal(before, Dump());
        Assert.Equal(0, folder.Read((_, session) => session.Outdated.Count()));
    }

    private void AssertAsComputedAnew(string changes)
    {
        folder.Sweep();
        var partly = Dump();
        using (var workplace = Workplace.OpenToWork(folder.ConfigPath))
        {
            workplace.Store.Write(session => session.Derived.Empty());
        }

        folder.Sweep();
        Assert.True(partly == Dump(), $"after {changes}: {FirstDifference(partly, Dump())}");
    }

    private static string FirstDifference(string one, string other)
    {
        var (ones, others) = (one.Split('\n'), other.Split('\n'));
        return $"only partly:\n{string.Join('\n', ones.Except(others).Take(4))}\nonly anew:\n{string.Join('\n', others.Except(ones).Take(4))}";
    }

    private string Loads() => string.Join('\n', folder.Export("days").Split('\n').Select(line => line.Split("\"load\":") is [var head, var tail] ? $"{head}{tail.Split(',')[0]}" : line));

    /// <summary>Every derived row but those that keep account of what is left to do, and what became of each arrival.</summary>
    private string Dump()
    {
        string[] tables =
        [
            "recording", "activity", "histogram", "best_mean", "anchor_observed", "day", "todays_room", "finding", "question", "content_question", "table_row", "table_content",
            "arrival",
        ];
        using var connection = new SqliteConnection($"Data Source={Path.Combine(folder.Data, "loadwatch.db")};Pooling=False;Mode=ReadOnly");
        connection.Open();
        var lines = new List<string>();
        foreach (var table in tables)
        {
            using var command = connection.CreateCommand();
            command.CommandText = $"SELECT * FROM {table}";
            using var reader = command.ExecuteReader();
            while (reader.Read())
            {
                lines.Add($"{table}|{string.Join('|', Enumerable.Range(0, reader.FieldCount).Select(at => Text(reader.GetValue(at))))}");
            }
        }

        return string.Join('\n', lines.Order(StringComparer.Ordinal));
    }

    private static string Text(object value) => value is byte[] bytes ? Convert.ToHexString(bytes) : Convert.ToString(value, CultureInfo.InvariantCulture)!;

    private static WorkingFolder Configured()
    {
        var configured = new WorkingFolder(roster: Roster);
        configured.Configure(Layout);
        configured.Replace(
            "loadwatch.json",
            "\"groups\": \\[.*\\],\n  \"contacts\"|\"groups\": \\[\\{ \"id\": \"squad\", \"name\": \"Squad\" \\}\\]",
            """
            "groups": [{ "id": "squad", "name": "Squad", "load_quantity": "banister_trimp", "limits": { "silence": { "enabled": true } } }, { "id": "class", "name": "Class" }],
              "computation": { "speed_bounds": [2, 4] }
            """);
        return configured;
    }

    private static IReadOnlyList<(string Path, byte[] Bytes)> Files() =>
    [
        .. FortnightTables.Files(lightGroup: "class", "2026-06-11,stranger,leg_press,1,5,85,2"),
        ("anna late.fit", Some.Fit(Nights.Date(2), 70)),
        ("early cara.csv", Some.Csv(Nights.Date(3), 80)),
    ];
}

/// <summary>Changes of the files of a configuration.</summary>
internal static class ConfigurationEdits
{
    /// <summary>Replaces whatever fits; a change that was made before may leave nothing that does.</summary>
    public static void Replace(this WorkingFolder folder, string name, string pattern, string text) => folder.Write(name, System.Text.RegularExpressions.Regex.Replace(
        File.ReadAllText(Path.Combine(folder.Root, name)), pattern, text, System.Text.RegularExpressions.RegexOptions.None, TimeSpan.FromSeconds(5)));

    public static void Append(this WorkingFolder folder, string name, string text) => folder.Write(name, File.ReadAllText(Path.Combine(folder.Root, name)) + text);

    /// <summary>Takes somebody out of the roster and their reference values with them.</summary>
    public static void Leave(this WorkingFolder folder, string person)
    {
        folder.Replace("roster.csv", $"{person},.*\n", "");
        folder.Replace("anchors.csv", $"{person},.*\n", "");
        if (File.Exists(Path.Combine(folder.Root, "devices.csv")))
        {
            folder.Replace("devices.csv", $"[^\n]*,{person},.*\n", "");
        }
    }
}
