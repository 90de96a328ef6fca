using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>What was wrong with rows: the first hundred are listed, the rest is counted.</summary>
internal sealed class RowProblems
{
    private const int Listed = 100;

    private readonly List<Problem> problems = [];
    private int unlisted;

    /// <summary>Lines that cannot be used; a row over several lines counts with all of them.</summary>
    public long BadLines { get; private set; }

    public void AddBad(Problem problem, int lines)
    {
        BadLines += lines;
        Add(problem);
    }

    public void Add(Problem problem)
    {
        if (problems.Count < Listed)
        {
            problems.Add(problem);
        }
        else
        {
            unlisted++;
        }
    }

    public IReadOnlyList<Problem> Close() => unlisted == 0
        ? problems
        : [.. problems, new Problem(ProblemSeverity.Error, $"{unlisted} more rows have problems like these")];
}
