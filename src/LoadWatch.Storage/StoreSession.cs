using System.Data.Common;
using Dapper;
using LoadWatch.Storage.Activities;
using LoadWatch.Storage.Alerts;
using LoadWatch.Storage.Anchors;
using LoadWatch.Storage.Audits;
using LoadWatch.Storage.Configurations;
using LoadWatch.Storage.Days;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Findings;
using LoadWatch.Storage.Inboxes;
using LoadWatch.Storage.Notices;
using LoadWatch.Storage.People;
using LoadWatch.Storage.Recordings;
using LoadWatch.Storage.Rows;
using LoadWatch.Storage.Services;

namespace LoadWatch.Storage;

/// <summary>The tables within one transaction. Not to be kept beyond it.</summary>
public sealed class StoreSession
{
    private readonly DbConnection connection;
    private readonly DbTransaction transaction;
    private readonly Action<int>? rowsRead;

    static StoreSession() => ColumnTypes.Register();

    internal StoreSession(Dialect dialect, DbConnection connection, DbTransaction transaction, Action<int>? rowsRead = null)
    {
        this.rowsRead = rowsRead;
        Dialect = dialect;
        this.connection = connection;
        this.transaction = transaction;
        Arrivals = new ArrivalTable(this);
        Sightings = new SightingTable(this);
        Recordings = new RecordingTable(this);
        Activities = new ActivityTable(this);
        ObservedAnchors = new ObservedAnchorTable(this);
        Days = new DayTable(this);
        Rooms = new TodaysRoomTable(this);
        Findings = new FindingTable(this);
        Evaluations = new EvaluationTable(this);
        Alerts = new AlertTable(this);
        Decisions = new DecisionTable(this);
        Notices = new NoticeTable(this);
        TableRows = new RowTable(this);
        TableVersions = new TableVersionTable(this);
        Questions = new QuestionTable(this);
        Recomputations = new RecomputationTable(this);
        Outdated = new OutdatedTable(this);
        People = new PersonStateTable(this);
        Configurations = new ConfigurationTable(this);
        Derived = new DerivedRows(this);
        Basis = new BasisTable(this);
        Audits = new AuditTable(this);
        InboxRoots = new InboxRootTable(this);
        Troubles = new TroubleTable(this);
        Moments = new ServiceMomentTable(this);
    }

    public ArrivalTable Arrivals { get; }

    public SightingTable Sightings { get; }

    public RecordingTable Recordings { get; }

    public ActivityTable Activities { get; }

    public ObservedAnchorTable ObservedAnchors { get; }

    public DayTable Days { get; }

    public TodaysRoomTable Rooms { get; }

    public FindingTable Findings { get; }

    public EvaluationTable Evaluations { get; }

    public AlertTable Alerts { get; }

    public DecisionTable Decisions { get; }

    public NoticeTable Notices { get; }

    public RowTable TableRows { get; }

    public TableVersionTable TableVersions { get; }

    public QuestionTable Questions { get; }

    public RecomputationTable Recomputations { get; }

    public OutdatedTable Outdated { get; }

    public PersonStateTable People { get; }

    public ConfigurationTable Configurations { get; }

    public DerivedRows Derived { get; }

    public BasisTable Basis { get; }

    public AuditTable Audits { get; }

    public InboxRootTable InboxRoots { get; }

    public TroubleTable Troubles { get; }

    public ServiceMomentTable Moments { get; }

    internal Dialect Dialect { get; }

    /// <summary>All rows, read to the end: an error in any of them is thrown here.</summary>
    internal List<T> Rows<T>(string sql, object? values = null)
    {
        var rows = Connection.Query<T>(sql, values, transaction).AsList();
        rowsRead?.Invoke(rows.Count);
        return rows;
    }

    /// <summary>Goes through the rows one by one, column by column: for results of which nobody wants objects.</summary>
    internal void EachRow(string sql, object? values, Action<DbDataReader> row)
    {
        using var reader = (DbDataReader)Connection.ExecuteReader(sql, values, transaction);
        var rows = 0;
        for (; reader.Read(); rows++)
        {
            row(reader);
        }

        rowsRead?.Invoke(rows);
    }

    /// <summary>The only row, or null.</summary>
    internal T? Row<T>(string sql, object? values = null)
        where T : class
    {
        rowsRead?.Invoke(1);
        return Connection.QuerySingleOrDefault<T>(sql, values, transaction);
    }

    internal T? Value<T>(string sql, object? values = null)
    {
        rowsRead?.Invoke(1);
        return Connection.ExecuteScalar<T>(sql, values, transaction);
    }

    /// <summary>Number of rows changed.</summary>
    internal int Execute(string sql, object? values = null) => Connection.Execute(sql, values, transaction);

    /// <summary>Runs one prepared statement for each row.</summary>
    internal void ExecuteEach<T>(string sql, IEnumerable<T> rows)
        where T : class =>
        Connection.Execute(sql, rows, transaction);

    private DbConnection Connection => transaction.Connection is null ? throw new InvalidOperationException("the transaction of this session is over") : connection;
}
