using System.Globalization;
using CsCheck;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Rows;
using Microsoft.Data.Sqlite;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-5 in the store: whatever comes in whatever order and portions, days, findings and questions end as if all had been there from the start; three times in them a reference value changes.</summary>
public sealed class StoredDaysTests
{
    private const int Days = 620;

    private const string Anchors = """
        person,date,anchor,value,unit,source,exercise
        anna,,heart_rate_rest,50,bpm,,
        anna,,heart_rate_max,190,bpm,,
        anna,2025-01-20,heart_rate_max,178,bpm,,
        anna,2025-03-10,heart_rate_rest,58,bpm,,
        anna,2025-11-03,heart_rate_max,201,bpm,,

        """;

    private static readonly LocalDate First = new(2024, 9, 2);

    [Fact]
    public void PortionsInAnyOrderEndWithTheSameRows() => Gen.UInt.Sample(number =>
    {
        var history = new RandomHistory(number);
        var changes = Changes(history);

        Assert.Equal(AtOnce(changes), InPortions(history, changes));
    }, iter: 2, threads: 1);

    private static string AtOnce(List<Change> changes)
    {
        using var folder = new WorkingFolder(anchors: Anchors);
        using (var workplace = Workplace.OpenToWork(folder.ConfigPath))
        {
            workplace.Store.Write(session => changes.ForEach(change => change.Make(session, workplace.Configuration)));
            StoredTraining.Update(workplace.Configuration, workplace.Store, First.PlusDays(Days));
        }

        return Rows(folder);
    }

    /// <summary>Mostly as the dates pass, some much later; and some rows that are taken back again.</summary>
    private static string InPortions(RandomHistory history, List<Change> changes)
    {
        using var folder = new WorkingFolder(anchors: Anchors);
        using (var workplace = Workplace.OpenToWork(folder.ConfigPath))
        {
            var left = changes.OrderBy(change => change.Date.PlusDays(history.Below(8) == 0 ? history.Below(500) : 0)).ToList();
            var through = First.PlusDays(20);
            while (left.Count > 0)
            {
                var portion = left.Take(1 + history.Below(90)).ToList();
                left.RemoveRange(0, portion.Count);
                var mistaken = Mistake(portion[^1].Date);
                workplace.Store.Write(session => portion.ForEach(change => change.Make(session, workplace.Configuration)));
                workplace.Store.Write(session => PutRow(session, mistaken));
                through = LocalDate.Min(First.PlusDays(Days - 1), LocalDate.Max(through, portion[^1].Date.PlusDays(history.Below(4))));
                StoredTraining.Update(workplace.Configuration, workplace.Store, through);
                workplace.Store.Write(session => TakeBack(session, mistaken));
            }

            StoredTraining.Update(workplace.Configuration, workplace.Store, First.PlusDays(Days));
        }

        return Rows(folder);
    }

    private static List<Change> Changes(RandomHistory history)
    {
        var changes = new List<Change>();
        var (rate, size) = (2, 60);
        for (var day = 0; day < Days; day++)
        {
            (rate, size) = history.Below(50) == 0 ? (1 + history.Below(9), 30 + history.Below(150)) : (rate, size);
            if (history.Below(rate) == 0)
            {
                var load = size + history.Below(40);
                var isStated = history.Below(9) == 0;
                changes.Add(new Change(First.PlusDays(day), (session, date) => StoredTraining.Put(session, "anna", date, load))
                {
                    Computed = isStated ? null : (session, configuration, date) => StoredTraining.Put(session, configuration.People["anna"], configuration.Anchors, date, load),
                });
            }

            if (history.Below(5) == 0)
            {
                changes.Add(Row(RowKind.Sessions, day, new SessionRow(null, null, null, null, history.Below(3) == 0 ? 60 : null, 1 + history.Below(9), [], null)));
            }

            if (history.Below(9) == 0)
            {
                var exercise = history.Below(6) == 0 ? "zebra press" : "leg press";
                changes.Add(Row(RowKind.Sets, day, new SetRow(1, null, exercise, null, 1, 8, 100, null, 1, null, null, SetLoad.Weight, false, false)));
            }
        }

        foreach (var _ in Enumerable.Range(0, 60))
        {
            changes.Add(Row(RowKind.Days, history.Below(Days), new DayRow((DayWord)history.Below(6))));
            changes.Add(Row(RowKind.Plan, history.Below(Days), Planned(history)));
            changes.Add(Row(RowKind.Tests, history.Below(Days), new TestRow("gait_speed", 0.6 + (history.Below(80) / 100.0), null, null, null, null, null, null, null)));
        }

        changes.AddRange(Enumerable.Range(0, 25).Select(number => Decided(history, number)));
        return [.. changes.DistinctBy(change => (change.Date, change.Name))];
    }

    private static PlanRow Planned(RandomHistory history)
    {
        var words = Enum.GetValues<PlanWord>();
        return new PlanRow(words[history.Below(words.Length)], history.Below(3) == 0 ? First.PlusDays(history.Below(Days)) : null, null, null, history.Below(2) == 0, null);
    }

    private static Change Decided(RandomHistory history, int number)
    {
        DecisionKind[] kinds = [DecisionKind.Ill, DecisionKind.Away, DecisionKind.Returning, DecisionKind.Rest, DecisionKind.Match];
        var (kind, date) = (kinds[history.Below(kinds.Length)], First.PlusDays(history.Below(Days)));
        var until = history.Below(2) == 0 ? date.PlusDays(history.Below(30)) : (LocalDate?)null;
        var decision = new Decision(kind, "anna", "anna", WorkingFolder.Now.Plus(Duration.FromMinutes(number)), "staff", null) { From = date, Until = until };
        return new Change(
            date,
            (session, from) =>
            {
                session.Decisions.Add(decision);
                session.People.MarkDirty("anna", from);
            },
            $"decision {number}");
    }

    private static Change Row(RowKind kind, int day, RowContent content) =>
        new(First.PlusDays(day), (session, date) => StoredTraining.Put(session, "anna", kind, date, content), $"{kind}");

    private static StoredRow Mistake(LocalDate date) => new(
        "inbox/mistake.csv", RowKind.Sets, "own Sets", "anna", "anna", date, $"{date:uuuu-MM-dd} mistake", WorkingFolder.Now,
        new SetRow(1, null, "ant walk", null, 1, 8, 100, null, 1, null, null, SetLoad.Weight, false, false));

    private static void PutRow(StoreSession session, StoredRow row)
    {
        session.TableRows.Put([row]);
        session.People.MarkDirty("anna", row.Date);
    }

    private static void TakeBack(StoreSession session, StoredRow row)
    {
        session.TableRows.Remove([row]);
        session.People.MarkDirty("anna", row.Date);
    }

    private static string Rows(WorkingFolder folder)
    {
        using var connection = new SqliteConnection($"Data Source={Path.Combine(folder.Data, "loadwatch.db")};Pooling=False");
        connection.Open();
        return string.Join('\n', new[] { "day", "finding", "question", "todays_room" }.SelectMany(table => Rows(connection, table)));
    }

    private static List<string> Rows(SqliteConnection connection, string table)
    {
        using var command = connection.CreateCommand();
        command.CommandText = $"SELECT * FROM {table}";
        using var reader = command.ExecuteReader();
        var rows = new List<string>();
        while (reader.Read())
        {
            var values = new object[reader.FieldCount];
            reader.GetValues(values);
            rows.Add($"{table} {string.Join(" | ", values.Select(value => value is double number ? number.ToString("R", CultureInfo.InvariantCulture) : Convert.ToString(value, CultureInfo.InvariantCulture)))}");
        }

        rows.Sort(StringComparer.Ordinal);
        return rows;
    }

    private sealed record Change(LocalDate Date, Action<StoreSession, LocalDate> Effect, string Name = "recording")
    {
        public Action<StoreSession, WorkingConfiguration, LocalDate>? Computed { get; init; }

        public void Make(StoreSession session, WorkingConfiguration configuration)
        {
            if (Computed is { } computed)
            {
                computed(session, configuration, Date);
            }
            else
            {
                Effect(session, Date);
            }
        }
    }
}
