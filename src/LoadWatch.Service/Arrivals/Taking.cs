using LoadWatch.Notices;

namespace LoadWatch.Service.Arrivals;

/// <summary>What came of looking into a file.</summary>
public abstract record Taking
{
    private Taking()
    {
    }

    public sealed record Taken(TakenFile File) : Taking;

    /// <summary>It may still be growing; a later sweep looks again.</summary>
    public sealed record Settling : Taking;

    /// <summary>It could not be opened or read; a later sweep tries again.</summary>
    public sealed record Unreadable(BriefLine Line) : Taking;

    public sealed record Gone : Taking;
}
