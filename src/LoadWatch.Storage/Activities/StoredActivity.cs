using LoadWatch.Activities;

namespace LoadWatch.Storage.Activities;

/// <summary>What counts: one or more recordings of the same session, merged.</summary>
/// <param name="Winner">The recording that the activity is named by.</param>
/// <param name="Values">
/// Computed from it. As read by person or date it holds no histograms: <see cref="ActivityTable.Histogram"/> reads those.
/// </param>
/// <param name="RecordingKeys">Keys of all its recordings, sorted ordinally, the winner's among them.</param>
public sealed record StoredActivity(RecordingSummary Winner, ActivityValues Values, IReadOnlyList<string> RecordingKeys)
{
    public string Key => Winner.Key;
}
