using LoadWatch.Activities;
using NodaTime;

namespace LoadWatch.Storage.Recordings;

/// <summary>Table <c>recording</c>: the sessions within stored arrivals (I-3).</summary>
public sealed class RecordingTable
{
    private const string Insert = $"""
        INSERT INTO recording ({RecordingRow.Columns})
        VALUES (
            @Sha, @Part, @Person, @Start, @LocalOffsetSeconds, @Sport, @ElapsedSeconds, @TimerSeconds,
            @Source, @Channels, @Samples, @Sets, @SamplesDigest, @DistanceMetres, @DayBeginsSeconds)
        """;

    private const string SelectOfPerson = $"SELECT {RecordingRow.Columns} FROM recording WHERE person = @person ORDER BY start, sha, part";
    private const string SelectStarting = $"""
        SELECT {RecordingRow.Columns} FROM recording WHERE person = @person AND start >= @from AND start <= @to ORDER BY start, sha, part
        """;

    private const string SelectOfArrival = $"SELECT {RecordingRow.Columns} FROM recording WHERE sha = @sha ORDER BY part";
    private const string SelectAll = $"SELECT {RecordingRow.Columns} FROM recording ORDER BY person, start, sha, part";
    private const string DeleteOfArrival = "DELETE FROM recording WHERE sha = @sha";

    private readonly StoreSession session;

    internal RecordingTable(StoreSession session) => this.session = session;

    /// <summary>Adds a recording of a known arrival; an error when it is there.</summary>
    public void Add(RecordingSummary recording) => session.Execute(Insert, RecordingRow.From(recording));

    /// <summary>Sorted by start, then content and part.</summary>
    public IReadOnlyList<RecordingSummary> OfPerson(string person) => Select(SelectOfPerson, new { person });

    /// <summary>A person's recordings that start in the range, both ends included, sorted by start, then content and part.</summary>
    public IReadOnlyList<RecordingSummary> Starting(string person, Instant from, Instant to) => Select(SelectStarting, new { person, from, to });

    /// <summary>Sorted by part.</summary>
    public IReadOnlyList<RecordingSummary> OfArrival(string sha) => Select(SelectOfArrival, new { sha });

    /// <summary>Sorted by person, then start, content and part.</summary>
    public IReadOnlyList<RecordingSummary> All() => Select(SelectAll);

    /// <summary>Removes the recordings of an arrival, and with them the activities that they had won: those are to be merged anew.</summary>
    public void RemoveArrival(string sha) => session.Execute(DeleteOfArrival, new { sha });

    private List<RecordingSummary> Select(string sql, object? values = null) =>
        session.Rows<RecordingRow>(sql, values).ConvertAll(row => row.ToRecording());
}
