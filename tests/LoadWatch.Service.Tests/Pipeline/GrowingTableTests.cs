using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-5 for tables: what stands does not depend on how many exports told it.</summary>
public sealed class GrowingTableTests : IDisposable
{
    private const int Last = 29;
    private const string BuiltIn = "date,person,exercise,set,repetitions,kilograms,reserve";
    private const string Own = "day,member,what,no,reps,kg,left";

    private const string OwnLayout = """
        "layouts": [{
          "name": "gym", "kind": "sets", "header": ["day", "member", "what"], "table": "folder", "person_column": "member", "date_column": "day",
          "fields": [
            { "column": "what", "field": "exercise" }, { "column": "no", "field": "set" }, { "column": "reps", "field": "repetitions" },
            { "column": "kg", "field": "kilograms" }, { "column": "left", "field": "repetitions_in_reserve" }
          ]
        }]
        """;

    private readonly WorkingFolder nightly = new();
    private readonly WorkingFolder once = new();

    public void Dispose()
    {
        nightly.Dispose();
        once.Dispose();
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void ThirtyExportsWithCorrectionsLeaveWhatTheLastOneTells(bool ownLayout)
    {
        foreach (var folder in new[] { nightly, once })
        {
            folder.Configure(ownLayout ? OwnLayout : "\"layouts\": []");
        }

        foreach (var night in Enumerable.Range(0, Last + 1))
        {
            Put(nightly, night, ownLayout);
            nightly.Sweep(Nights.Before(Last - night));
        }

        Put(once, Last, ownLayout);
        once.Sweep();

        Assert.Equal(once.Rows(), nightly.Rows());
        Assert.Equal((2 * (Last + 1)) - 1, nightly.Rows().Count);
        Assert.Equal(once.Computed(), nightly.Computed());
        Assert.Contains("\"kilograms\"", nightly.Export("activities"), StringComparison.Ordinal);
        AssertTold(nightly);

        var before = nightly.Everything();
        nightly.Rebuild();
        Assert.Equal(before, nightly.Everything());
    }

    /// <summary>The corrected sets of the fourth and the ninth day, and the one set left of the twelfth.</summary>
    private static void AssertTold(WorkingFolder folder)
    {
        var days = folder.Activities("bo").ToDictionary(activity => activity.GetProperty("date").GetString()!, StringComparer.Ordinal);
        Assert.Equal(Last + 1, days.Count);
        Assert.Equal(90 * 5 * 2, days[Nights.Day(Last - 3)].Value("kilograms"));
        Assert.Equal(80 * (4 + 5), days[Nights.Day(Last - 8)].Value("kilograms"));
        Assert.Equal(80 * 5, days[Nights.Day(Last - 11)].Value("kilograms"));
    }

    private static void Put(WorkingFolder folder, int night, bool ownLayout) => folder.PutTable(
        ownLayout ? $"gym/export {Nights.Day(Last - night)}.csv" : "sets.csv",
        Last - night,
        Enumerable.Range(0, night + 1).SelectMany(day => Sets(day, night)).Prepend(ownLayout ? Own : BuiltIn));

    /// <summary>Two sets a day, as the export of that night tells them.</summary>
    private static IEnumerable<string> Sets(int day, int night)
    {
        var kilograms = day == 3 && night >= 10 ? 90 : 80;
        var first = day == 8 && night >= 20 ? 4 : 5;
        yield return $"{Nights.Day(Last - day)},bo,leg_press,1,{first},{kilograms},2";
        if (!(day == 11 && night >= 15))
        {
            yield return $"{Nights.Day(Last - day)},bo,leg_press,2,5,{kilograms},2";
        }
    }
}
