using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A fortnight of recordings with a table of every kind.</summary>
internal static class FortnightTables
{
    /// <param name="sets">Rows of a set log behind those that are always there.</param>
    /// <param name="lightGroup">The group whose week is light by the plan.</param>
    public static IReadOnlyList<(string Path, byte[] Bytes)> Files(string lightGroup, params string[] sets) =>
    [
        .. Some.Fortnight(),
        ("squad.csv", Squad()),
        ("sets.csv", Table(["date,person,exercise,set,repetitions,kilograms,reserve", "2026-06-02,bo,leg_press,1,5,80,2", "2026-06-11,bo,leg_press,1,5,85,2", .. sets])),
        ("cara/sessions.csv", Table("date,minutes,rating,sport", "2026-06-03,40,5,cycling", "2026-06-08,,6,cycling")),
        ("ratings.csv", Table("date,person,start,sport,minutes,rating", "2026-06-06,anna,12:00,cycling,3,7", "2026-06-12,Anna Ahola,,soccer,60,4")),
        ("tests.csv", Table("date,person,test,value,unit,exercise", "2026-06-07,anna,heart_rate_max,188,bpm,", "2026-06-05,bo,one_repetition_max,110,kg,leg_press")),
        ("days.csv", Table("date,person,day", "2026-06-09,cara,rest", "2026-06-10,bo,ill")),
        ("plan.csv", Table("from,group,until,plan,start,end,recording,sport", "2026-06-13,squad,,team_session,12:00,12:10,no,soccer", $"2026-06-01,{lightGroup},2026-06-04,light_week,,,no,")),
        ("answers.csv", Table("date,person,answer,until,file", "2026-06-04,bo,belongs_to,,nobody.fit", "2026-06-02,cara,away,2026-06-04,")),
    ];

    private static byte[] Table(params string[] lines) => Some.Text(string.Join('\n', lines) + "\n");

    /// <summary>Forty minutes of two people and of somebody unknown.</summary>
    private static byte[] Squad() => Table(
    [
        "player,moment,hr",
        .. new[] { "anna", "bo", "stranger" }.SelectMany(player => Enumerable.Range(0, 241).Select(at =>
            $"{player},{(Nights.Date(1) + new LocalTime(12, 0)).PlusSeconds(10 * at):uuuu-MM-dd'T'HH:mm:ss}Z,{130 + (at % 7)}")),
    ]);
}
