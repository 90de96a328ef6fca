// Where no plan tells which sessions to expect, a session that left no recording is taken as rest, and its week looks smaller than it was: the usual of all weeks comes out too
// small for a week of which everything was recorded. So a week is compared with weeks that hold as many training days. Fitted by simulation (tests/README.md).
namespace LoadWatch.Days;

/// <summary>Finds the weeks that a week may be compared with where no plan tells what is missing.</summary>
internal static class FullWeek
{
    /// <summary>Weeks with as many training days as the one given; where too few hold so many, those with the most.</summary>
    /// <param name="before">Weeks before it, the newest first.</param>
    /// <param name="wanted">Ordinary weeks that there must be, count.</param>
    public static IEnumerable<PastWeek> LikeOf(TrainingWeek week, IReadOnlyList<TrainingWeek> before, int wanted)
    {
        var counts = before.Where(one => one.Past.IsOrdinary).Select(one => one.Trained).OrderDescending().ToList();
        var full = counts.Count < wanted ? 0 : Math.Min(week.Trained, counts[wanted - 1]);
        return before.Where(one => one.Trained >= full).Select(one => one.Past);
    }
}
