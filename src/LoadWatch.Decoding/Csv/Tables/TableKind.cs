using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>What one kind of table holds: its fields, how they make a row, and what tells its rows apart.</summary>
internal abstract class TableKind
{
    public abstract RowKind Rows { get; }

    /// <summary>What a row is about, for messages.</summary>
    public abstract string One { get; }

    /// <summary>What its columns may say.</summary>
    public abstract IReadOnlyList<FieldRole> Roles { get; }

    /// <summary>Fields without one of which no row says anything; empty where any field does.</summary>
    public abstract IReadOnlyList<string> Needed { get; }

    /// <summary>Whether a version speaks for all dates unless the layout says otherwise.</summary>
    public virtual bool CoversEverything => true;

    /// <summary>Whether a row may be about a group.</summary>
    public virtual bool TakesGroups => false;

    /// <summary>Whether a row that names nobody is about everybody.</summary>
    public virtual bool TakesEverybody => false;

    public static TableKind Of(CsvKind kind) => kind switch
    {
        CsvKind.Sessions => SessionsTable.Kind,
        CsvKind.Sets => SetsTable.Kind,
        CsvKind.Tests => TestsTable.Kind,
        CsvKind.Days => DaysTable.Kind,
        CsvKind.Plan => PlanTable.Kind,
        CsvKind.Answers => AnswersTable.Kind,
        _ => throw new ArgumentOutOfRangeException(nameof(kind), kind, "no kind of table"),
    };

    public FieldRole? Role(string name) => Roles.FirstOrDefault(role => role.Name == name);

    public abstract RowMade Make(LocalDate date, RowValues values);

    public abstract RowKey Key(LocalDate date, RowContent content);

    /// <summary>Whether two rows of one key say the same.</summary>
    public virtual bool AreEqual(RowContent one, RowContent other) => one.Equals(other);
}
