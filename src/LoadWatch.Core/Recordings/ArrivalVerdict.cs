using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>What becomes of an arrival: its state and the reason shown with it. Pure.</summary>
/// <param name="Person">Id of the owner where stored and there is one, else null.</param>
public sealed record ArrivalVerdict(ArrivalState State, string? Reason, string? Person)
{
    /// <summary>No recording can be older: devices that lost their clock write earlier dates.</summary>
    private static readonly Instant Earliest = Instant.FromUtc(2000, 1, 1, 0, 0);

    /// <summary>
    /// Judges decoded content. Refused when nothing but errors came out, aside when it is whole but holds no training, held when a date or one owner is
    /// missing, else stored; a stored one names its first problem.
    /// </summary>
    /// <param name="claims">Ids of the people whom its sightings name.</param>
    /// <param name="now">A session cannot begin more than a day after it.</param>
    public static ArrivalVerdict Of(DecodedFile file, IReadOnlyCollection<string> claims, Instant now)
    {
        if (file.Worn.FirstOrDefault(day => !IsUsable(day, now)) is { } strange)
        {
            return new ArrivalVerdict(ArrivalState.Held, $"date implausible: a log of {strange.Start:uuuu-MM-dd}", null);
        }

        if (file is { Table: { } table, Recordings.Count: 0 })
        {
            return OfTable(file, table, claims);
        }

        if (file.Recordings.Count == 0)
        {
            return WithoutRecordings(file);
        }

        if (file.Recordings.All(recording => recording.Start is null))
        {
            return new ArrivalVerdict(ArrivalState.Held, "no date: the device wrote its uptime instead of the time of day", null);
        }

        if (!file.Recordings.Any(recording => IsUsable(recording, now)))
        {
            return new ArrivalVerdict(ArrivalState.Held, $"date implausible: starts {file.Recordings[0].Start:uuuu-MM-dd}", null);
        }

        return claims.Count switch
        {
            0 => new ArrivalVerdict(ArrivalState.Held, "owner unknown: no folder above it is named after a person of the roster", null),
            1 => new ArrivalVerdict(ArrivalState.Stored, FirstRemark(file, now), claims.Single()),
            _ => new ArrivalVerdict(
                ArrivalState.Held, $"claimed by {string.Join(" and ", claims.Order(StringComparer.Ordinal))}", null),
        };
    }

    /// <summary>The first problem, else the first session that does not count although its file is stored; null when all is well.</summary>
    private static string? FirstRemark(DecodedFile file, Instant now) =>
        file.Problems.Count > 0
            ? file.Problems[0].ToString()
            : file.Recordings.Where(recording => !IsUsable(recording, now))
                .Select(recording => $"session {recording.Part} does not count: {(recording.Start is null ? "no date" : "date implausible")}")
                .FirstOrDefault();

    /// <summary>Whether a recording carries a plausible date and so counts once its arrival is stored.</summary>
    public static bool IsUsable(Recording recording, Instant now) =>
        recording.Start is { } start && start >= Earliest && start <= now + Duration.FromDays(1);

    /// <summary>A table whose rows name people needs no owner, and neither does a plan, which is about everybody where it names nobody.</summary>
    private static ArrivalVerdict OfTable(DecodedFile file, DecodedTable table, IReadOnlyCollection<string> claims)
    {
        var owner = claims.Count == 1 ? claims.Single() : null;
        var needsOwner = table.Kind is not (RowKind.Plan or RowKind.Answers) && table.Rows.Any(row => row.Subject is null);
        return needsOwner && owner is null
            ? new ArrivalVerdict(ArrivalState.Held, "owner unknown: a table that names no people, and no one folder above it is named after a person of the roster", null)
            : new ArrivalVerdict(ArrivalState.Stored, file.Problems.Count > 0 ? file.Problems[0].ToString() : null, owner);
    }

    private static ArrivalVerdict WithoutRecordings(DecodedFile file)
    {
        var error = file.Problems.FirstOrDefault(problem => problem.Severity == ProblemSeverity.Error);
        return error is not null
            ? new ArrivalVerdict(ArrivalState.Refused, file is { Kind: "table", Problems: [_, var row, ..] } ? $"{error}; the first: {row}" : error.ToString(), null)
            : new ArrivalVerdict(ArrivalState.Aside, $"no training in it: {file.FileType ?? file.Kind}", null);
    }
}
