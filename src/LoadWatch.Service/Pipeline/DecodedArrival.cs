using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Decoding.Csv;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;

namespace LoadWatch.Service.Pipeline;

/// <summary>An arrival decoded, judged and computed, ready for its one commit.</summary>
/// <param name="Kind"><c>fit</c>, <c>csv</c>, <c>table</c>, <c>gzip</c>, <c>zip</c> or <c>unknown</c>.</param>
/// <param name="Recordings">Where stored: its recordings with everything computed from them; else empty.</param>
public sealed record DecodedArrival(string Sha, string Kind, ArrivalVerdict Verdict, IReadOnlyList<ComputedRecording> Recordings)
{
    /// <summary>Where stored and a table: what it holds. Its rows are taken up once everything of the group is settled (<see cref="Tables"/>).</summary>
    public DecodedTable? Table { get; init; }

    /// <summary>Reads the recordings where they are too many to be held; else null.</summary>
    public TextContent? Through { get; init; }

    /// <summary>What is wrong with the content, with the place of each: the first <see cref="MostProblems"/>, then how many more.</summary>
    public IReadOnlyList<string> Problems { get; init; } = [];

    /// <summary>More of them help nobody, and a hostile file cannot fill the store. A choice.</summary>
    public const int MostProblems = 20;

    /// <summary>What staff would have to say so that all of it counts.</summary>
    public IReadOnlyList<string> Questions { get; init; } = [];
}

/// <summary>An arrival decoded and judged.</summary>
/// <param name="Arrival">What becomes of it; with recordings only where they are too many to be held, which are computed as they are read.</param>
/// <param name="Kept">Where stored: its recordings that are yet to be computed.</param>
public sealed record JudgedArrival(DecodedArrival Arrival, IReadOnlyList<KeptRecording> Kept);

/// <summary>A recording that has an owner, after the quality cuts.</summary>
/// <param name="Bests">Of the recording as an activity by itself.</param>
public sealed record KeptRecording(RecordingSummary Summary, UsableRecording Usable, Person Owner, SessionBests Bests);

/// <param name="Recording">Null in a long content: its samples were let go once they were computed from.</param>
/// <param name="Values">Of the recording as an activity by itself.</param>
public sealed record ComputedRecording(RecordingSummary Summary, Recording? Recording, ActivityValues Values);
