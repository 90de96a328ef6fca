using System.Text.Json;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>People who are seen by a set log alone.</summary>
public sealed class SetLogTests : IDisposable
{
    private const int Weeks = 12;
    private const string Header = "date,person,exercise,set,repetitions,kilograms,reserve";

    /// <summary>Tuesday of the last week; <see cref="WorkingFolder.Now"/> is the Monday after it.</summary>
    private static readonly LocalDate LastTuesday = new(2026, 6, 9);

    private readonly WorkingFolder folder = new();

    public SetLogTests() => folder.Edit("loadwatch.json", "\"name\": \"Squad\"", "\"name\": \"Squad\", \"load_quantity\": \"kilograms\"");

    public void Dispose() => folder.Dispose();

    [Fact]
    public void WhoTrainsTheArmsIsNotLookedAtForTheLegs()
    {
        folder.PutTable("sets.csv", 0, [Header, .. Visits([]).SelectMany(date => Sets(date, "cara", "bench_press"))]);
        folder.Sweep();

        var last = folder.Lines("days", "cara")[^1];
        Assert.Equal(JsonValueKind.Null, Since(last, "legs").ValueKind);
        Assert.Equal(3, Since(last, "arms").GetInt32());
        Assert.DoesNotContain("\"region\":\"legs\"", folder.Export("findings"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(null)]
    [InlineData(2)]
    [InlineData(13)]
    [InlineData(22)]
    [InlineData(23)]
    public void TwoVisitsAWeekRaiseNothingAndNeitherDoesOneMissed(int? missed)
    {
        var seen = Visits(missed is { } one ? [one] : []).ToList();
        folder.PutTable("sets.csv", 0, [Header, .. seen.SelectMany(date => Sets(date, "anna", "leg_press"))]);
        folder.PutTable("plan.csv", 0, ["from,person,plan,start,end,recording", .. Visits([]).Select(date => $"{date:uuuu-MM-dd},anna,class,10:00,11:00,yes")]);
        folder.Sweep();

        Assert.Equal(seen.Count, folder.Activities("anna").Count);
        Assert.Equal("", folder.Export("findings"));
        Assert.Equal("", folder.Export("alerts"));
    }

    [Fact]
    public void AnUnknownExerciseIsAskedForOnce()
    {
        var odd = Visits([]).TakeLast(4).SelectMany(date => Sets(date, "anna", "Sled march").Concat(Sets(date, "cara", "sled_march")));
        folder.PutTable("sets.csv", 0, [Header, .. odd]);
        folder.Sweep();

        Assert.Equal(1, Nights.Count(folder.Brief(), "Exercise \"sled_march\": which body regions?"));
        Assert.Contains("2 people", folder.Brief(), StringComparison.Ordinal);

        folder.Configure("\"computation\": { \"exercises\": { \"sled_march\": [\"legs\"] } }");
        folder.Sweep();
        Assert.DoesNotContain("sled_march", folder.Brief(), StringComparison.Ordinal);
    }

    private static JsonElement Since(JsonElement day, string region) => day.GetProperty("days_since_heavy_or_fast").GetProperty(region);

    /// <summary>Tuesdays and Thursdays, oldest first, but for those of these places.</summary>
    private static IEnumerable<LocalDate> Visits(int[] missed) => Enumerable.Range(0, Weeks)
        .SelectMany(week => new[] { 0, 2 }.Select(day => LastTuesday.PlusWeeks(week - Weeks + 1).PlusDays(day)))
        .Where((_, at) => !missed.Contains(at));

    private static IEnumerable<string> Sets(LocalDate date, string person, string exercise) =>
        Enumerable.Range(1, 3).Select(set => $"{date:uuuu-MM-dd},{person},{exercise},{set},5,80,2");
}
