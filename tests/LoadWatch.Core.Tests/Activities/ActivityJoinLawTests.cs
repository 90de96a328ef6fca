using CsCheck;
using LoadWatch.Rows;
using NodaTime;
using static LoadWatch.Activities.Told;

namespace LoadWatch.Activities;

public class ActivityJoinLawTests
{
    private static readonly string[] Sports = ["running", "soccer", "generic", "training/strength_training", "cycling"];

    private static readonly Gen<RecordedActivity[]> Recordings =
        Gen.Select(Gen.Int[0, 4], Gen.Int[5, 20], Gen.Int[0, 1], Gen.Int[0, 1])
            .Select((sport, hour, sets, day) => Recorded(Sports[sport], hour, sets: sets, date: Given.Date.PlusDays(day), quantities: Distance(hour * 100)))
            .Array[0, 5]
            .Select(list => list.DistinctBy(one => one.Winner.Key).ToArray());

    private static readonly Gen<OwnedRow> SessionRows =
        Gen.Select(Gen.Int[0, 1], Gen.Int[0, 3], Gen.Int[0, 20], Gen.Int[-1, 4], Gen.Int[0, 3], Gen.Int[0, 9], Gen.Int[-3, 4], Gen.Int[0, 1])
            .Select((layout, order, hour, sport, drill, rating, content, day) => Session(
                layout == 0 ? "ratings" : "pods",
                order == 0 ? null : order,
                hour < 12 ? null : new LocalTime(hour, 15),
                sport < 0 ? null : Sports[sport],
                drill < 2 ? null : $"{drill}",
                hour % 3 == 0 ? 45 : null,
                rating,
                content < 0 ? null : (DeclaredContent)content,
                Given.Date.PlusDays(day),
                key: null,
                rating % 2 == 0 ? [Distance(hour * 110.7)] : []));

    private static readonly Gen<OwnedRow> SetRows =
        Gen.Select(Gen.Int[0, 1], Gen.Int[0, 2], Gen.Int[0, 20], Gen.Int[1, 4], Gen.Int[0, 2], Gen.Int[0, 1])
            .Select((layout, order, hour, set, exercise, day) => Set(
                set,
                exercise switch { 0 => "squat", 1 => "row", _ => "zebra press" },
                reserve: set,
                order: order == 0 ? null : order,
                time: hour < 12 ? null : new LocalTime(hour, 20),
                layout: layout == 0 ? "gym" : "class",
                date: Given.Date.PlusDays(day)));

    private static readonly Gen<OwnedRow[]> Rows = Gen.OneOf(SessionRows, SetRows).Array[0, 12]
        .Select(list => list.DistinctBy(row => (row.Layout, row.Date, row.Key)).ToArray());

    /// <summary>I-5.</summary>
    [Fact]
    public void TheOrderOfRecordingsAndRowsChangesNothing() =>
        Gen.Select(Recordings, Rows, Gen.Int[0, 1000]).Sample((recorded, rows, seed) =>
            Text(Join(recorded, rows)) == Text(Join(Shuffled(recorded, seed), [.. Shuffled(rows, seed)])));

    /// <summary>I-9: every recording is one activity; whatever else there is has rows alone, each session of a table at most once.</summary>
    [Fact]
    public void RowsNeverAddASecondSessionOfARecording() =>
        Gen.Select(Recordings, Rows).Sample((recorded, rows) =>
        {
            var activities = Join(recorded, rows).Activities;
            var ofRows = activities.Where(activity => activity.Key.StartsWith("rows/", StringComparison.Ordinal)).ToList();
            return activities.Count == recorded.Length + ofRows.Count
                && activities.Select(activity => activity.Key).Distinct().Count() == activities.Count
                && recorded.All(one => activities.Any(activity => activity.Key == one.Winner.Key))
                && ofRows.Count <= rows.Length;
        });

    /// <summary>I-9: rows that carry only a date join the only recording of it, however many tables tell of it.</summary>
    [Fact]
    public void RowsThatCarryOnlyADateJoinTheOnlyRecordingOfIt() =>
        Gen.Select(Gen.Int[0, 20], Rows).Sample((hour, rows) =>
        {
            OwnedRow[] bare = [.. rows.Where(row => row.Date == Given.Date).Select(Bare).DistinctBy(row => (row.Layout, row.Key))];
            var result = Join([Recorded("generic", hour)], bare);
            return result.Activities.Count == 1 && result.Activities[0].Tables.Count == bare.Select(row => row.Layout).Distinct().Count();
        });

    /// <summary>What a date comes to rests on nothing of another date.</summary>
    [Fact]
    public void RowsOfAnotherDateChangeNothing() =>
        Gen.Select(Recordings, Rows).Sample((recorded, rows) =>
            Text(Join(recorded, rows), Given.Date) == Text(Join(recorded, [.. rows.Where(row => row.Date == Given.Date)]), Given.Date));

    private static OwnedRow Bare(OwnedRow row) => row.Content switch
    {
        SessionRow session => row with { Key = session.Drill ?? "", Content = session with { Order = null, Start = null, Sport = null } },
        SetRow set => row with { Content = set with { Order = null, Time = null } },
        _ => row,
    };

    private static IEnumerable<RecordedActivity> Shuffled(IEnumerable<RecordedActivity> recorded, int seed) =>
        recorded.OrderBy(one => Place(one.Winner.Key, seed));

    private static IEnumerable<OwnedRow> Shuffled(IEnumerable<OwnedRow> rows, int seed) =>
        rows.OrderBy(row => Place($"{row.Layout} {row.Date} {row.Key}", seed));

    private static int Place(string text, int seed) => unchecked(text.Aggregate(seed, (sum, letter) => (sum * 31) + letter) % 97);

    private static string Text(JoinResult result, LocalDate? date = null) => string.Join('\n', [
        .. result.Activities.Where(one => date is null || one.Date == date).Select(Text),
        .. result.Questions.Where(one => date is null || one.Date == date).Select(one => $"{one.Date} {one.Sentence}"),
        .. result.UnknownExercises.Where(one => date is null || one.Date == date).Select(one => $"{one.Date} {one.Word}")]);

    private static string Text(JoinedActivity one) => string.Join(
        ", ",
        [
            one.Key, one.Date, one.Start, one.Sport, one.AddsLoad,
            .. one.Sources, .. one.Tables, .. one.Quantities, .. one.Remarks,
            .. one.Stimulus.Select(region => region with { NotSeen = [] }), .. one.Stimulus.SelectMany(region => region.NotSeen),
        ]);
}
