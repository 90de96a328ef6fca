using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Finds the recordings that may bear on what becomes of a stretch of time: whole components, and only those.</summary>
public static class SessionNeighbours
{
    /// <summary>Every recording within reach of the stretch, or of one that is, and so on; no other one touches any of them.</summary>
    /// <param name="starting">A person's recordings that start in a range, both ends included.</param>
    public static IReadOnlyList<RecordingSummary> Around(Instant from, Instant to, Func<Instant, Instant, IEnumerable<RecordingSummary>> starting)
    {
        while (true)
        {
            var (lowest, highest) = (from - SessionOverlap.StartTolerance, to + SessionOverlap.StartTolerance);
            var found = starting(lowest - RecordingSummary.Longest, highest).Where(one => one.End >= lowest).ToList();
            var (first, last) = (found.Select(one => one.Start).Append(from).Min(), found.Select(one => one.End).Append(to).Max());
            if (first == from && last == to)
            {
                return found;
            }

            (from, to) = (first, last);
        }
    }
}
