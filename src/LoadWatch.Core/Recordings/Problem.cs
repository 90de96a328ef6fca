namespace LoadWatch.Recordings;

public enum ProblemSeverity
{
    /// <summary>What was decoded stands.</summary>
    Warning,

    /// <summary>The part, row or file that it names is not used.</summary>
    Error,
}

/// <summary>Something wrong with an input, with its place (I-10): a byte offset for binary files, a line and column for text.</summary>
public sealed record Problem(
    ProblemSeverity Severity,
    string Reason,
    long? ByteOffset = null,
    long? Line = null,
    int? Column = null,
    string? Field = null)
{
    /// <summary><c>byte 771: not a FIT header</c>, <c>line 12, column 3 (heart_rate): not a number</c>.</summary>
    public override string ToString()
    {
        var place = (ByteOffset, Line, Column) switch
        {
            ({ } offset, _, _) => $"byte {offset}",
            (_, { } line, { } column) => $"line {line}, column {column}",
            (_, { } line, _) => $"line {line}",
            _ => null,
        };
        var field = Field is null ? "" : $" ({Field})";
        return place is null ? $"{Reason}{field}" : $"{place}{field}: {Reason}";
    }
}
