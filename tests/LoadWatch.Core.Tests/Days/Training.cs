using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Tests.Days;

/// <summary>Builds activities and days of an invented person; day 0 is Monday, 5 January 2026.</summary>
internal static class Training
{
    public static readonly LocalDate Monday = new(2026, 1, 5);

    public static readonly Person Anna = new("anna", "Anna", "squad", 1990, null, DateTimeZone.Utc);

    public static LocalDate On(int day) => Monday.PlusDays(day);

    public static ActivityOnDay Activity(int day, double? load = 100, string source = "watch", string key = "a", params RegionStimulus[] stimulus) =>
        new($"{key}{day}", On(day), [source], load, stimulus);

    public static IReadOnlyList<Day> Build(int through, params ActivityOnDay[] activities) => LoadCalendar.Build("anna", activities, On(through));

    /// <summary>A recorded activity every day: null is an activity whose load could not be computed.</summary>
    public static IReadOnlyList<Day> Daily(IEnumerable<double?> loads)
    {
        var activities = loads.Select((load, day) => Activity(day, load)).ToArray();
        return Build(activities.Length - 1, activities);
    }

    public static IReadOnlyList<Day> Daily(params double[] loads) => Daily(loads.Select(load => (double?)load));

    public static IEnumerable<double?> Repeat(double? load, int days) => Enumerable.Repeat(load, days);

    public static RegionStimulus Bouts(double mid, BodyRegion region = BodyRegion.Legs) => new(
        region, Grade.B, "power", new Band(mid, mid, mid), null, null, null, null, null, []);

    public static RegionStimulus Repetitions(double mid, int sets, BodyRegion region = BodyRegion.Legs) => new(
        region, Grade.B, "sets", null, new Band(mid, mid, mid), sets, null, null, null, []);

    public static RegionStimulus Unseen(BodyRegion region = BodyRegion.Legs) => new(
        region, Grade.E, "heart_rate", null, null, null, null, null, null, ["hard bouts cannot be seen by heart rate"]);

    public static void Near(double expected, double? actual, double tolerance = 1e-6) =>
        Assert.True(actual is { } value && Math.Abs(value - expected) <= tolerance * Math.Max(1, Math.Abs(expected)), $"{actual} is not {expected}");
}
