using System.Text.Json;
using LoadWatch.Service.Export;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>The names in exports are what others build on: changing one here is changing the contract.</summary>
public sealed class ExportContractTests : IDisposable
{
    private const string Regions = "{arms,legs,trunk}";

    private readonly WorkingFolder folder = new();

    public ExportContractTests()
    {
        folder.Fill(Some.Fortnight());

        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData("arrivals", "sha256,file,kind,state,reason,person")]
    [InlineData("findings", "person,rule,region,quantity,date,severity,value,limit,unit")]
    [InlineData("alerts", "id,person,rule,region,quantity,raised,state,severity,shelved_until,watch,text")]
    [InlineData(
        "days",
        "person,date,state,state_source,load,load_error,acute,chronic,ratio_coupled,ratio_uncoupled,ratio_ewma,weekly_change,weekly_change_ordinary,usual_week,"
        + "largest_session_30,longest_run_30_m,monotony,strain,coverage_7,coverage_28,heavy_or_fast_7,heavy_or_fast_28,heavy_or_fast_14,heavy_or_fast_usual_14,"
        + "heavy_or_fast_known_7,heavy_or_fast_known_14,heavy_or_fast_known_28,days_since_heavy_or_fast")]
    [InlineData("today", "person,date,load_quantity,inside_limits,reason,held_by,passed_at_rest,largest_day_30,largest_day_30_on,heavy_or_fast_week")]
    [InlineData(
        "activities",
        "person,date,start,sport,elapsed_s,timer_s,quantities,load_quantity,time_in_zone_s,heart_rate_mean_bpm,heart_rate_max_bpm,power_mean_w,power_max_w,"
        + "usable_share,cuts,stimulus,recordings,tables,adds_load,remarks")]
    public void EveryRowOfATableHasTheseKeys(string table, string keys)
    {
        var rows = Rows(table);
        Assert.NotEmpty(rows);
        Assert.All(rows, row => Assert.Equal(keys, Keys(row)));
    }

    [Theory]
    [InlineData("quantities", "name,value,unit,estimated")]
    [InlineData("stimulus", "region,hard_bouts,hard_repetitions,slow_s,medium_s,large_s,grade,channel,not_seen")]
    [InlineData("recordings", "sha256,file,part,role,gives")]
    public void EveryPartOfAnActivityHasTheseKeys(string list, string keys)
    {
        var parts = Rows("activities").SelectMany(row => row.GetProperty(list).EnumerateArray()).ToList();
        Assert.NotEmpty(parts);
        Assert.All(parts, part => Assert.Equal(keys, Keys(part)));
    }

    [Fact]
    public void TimeInZoneNamesItsChannelsAndTheBoundsOfItsZones()
    {
        var times = Rows("activities").Select(row => row.GetProperty("time_in_zone_s")).ToList();
        Assert.All(times, time => Assert.Equal("heart_rate,power,speed,zones", Keys(time)));
        var zones = times.SelectMany(time => time.GetProperty("zones").EnumerateObject()).ToList();
        Assert.Equal(["heart_rate", "power"], zones.Select(zone => zone.Name).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal));
        Assert.All(zones, zone => Assert.Equal("basis,bounds,unit,estimated", Keys(zone.Value)));
    }

    [Fact]
    public void DaysCountHeavyOrFastByRegion()
    {
        var day = Rows("days")[0];
        Assert.All(
            ["heavy_or_fast_7", "heavy_or_fast_28", "days_since_heavy_or_fast"],
            name => Assert.Equal(Regions, $"{{{string.Join(',', Keys(day.GetProperty(name)).Split(',').Order(StringComparer.Ordinal))}}}"));
    }

    [Fact]
    public void ArrivalsNameTheStatesInLowerCase()
    {
        var states = Rows("arrivals").Select(row => row.GetProperty("state").GetString()!).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal);
        Assert.Equal(["aside", "held", "refused", "stored"], states);
    }

    [Fact]
    public void TheCommandWritesWhatTheExporterWritesAndCutsByPersonAndDate()
    {
        Assert.Equal(folder.Export("days"), Loadwatch.Run("export", "days", "--config", folder.ConfigPath).Output);
        var cut = Loadwatch.Run("export", "days", "--config", folder.ConfigPath, "--person", "BO", "--from", "2026-06-05", "--to", "2026-06-07").Output;
        var wanted = folder.Export("days").Split('\n').Where(line => line.Contains("\"bo\"", StringComparison.Ordinal) && new[] { "06-05", "06-06", "06-07" }.Any(line.Contains));
        Assert.Equal(wanted, cut.Split('\n', StringSplitOptions.RemoveEmptyEntries));
        Assert.Equal(3, wanted.Count());
    }

    [Fact]
    public void NoOtherTableIsExported() => Assert.Equal(["arrivals", "activities", "days", "findings", "alerts", "today"], Exporter.Tables);

    private List<JsonElement> Rows(string table) =>
        [.. folder.Export(table).Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(line => JsonDocument.Parse(line).RootElement)];

    private static string Keys(JsonElement row) => string.Join(',', row.EnumerateObject().Select(property => property.Name));
}
