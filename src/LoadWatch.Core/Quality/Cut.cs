using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>What of a recording does not count, where, and why. Those of one reason that lie close together are one.</summary>
/// <param name="Channel">Whose readings; null where it is whole rows or time without rows.</param>
/// <param name="Stretch">From the first to the end of the last; open where its rows have no time.</param>
/// <param name="Readings">How many readings, or rows where no channel is named; 0 where there are none.</param>
/// <param name="Milliseconds">How long they would have stood; at most the length of the stretch.</param>
/// <param name="Share">
/// 0 to 1. Of readings the share of the sampled time, so that those of a channel and its usable share add up to 1; of time without rows, of a stopped timer
/// and outside the plan the share of the time from the first row to the last; of undated, unordered and repeated rows the share of all rows.
/// </param>
public sealed record Cut(Channel? Channel, CutReason Reason, Stretch Stretch, int Readings, long Milliseconds, double Share);
