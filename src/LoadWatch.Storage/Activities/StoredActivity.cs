using LoadWatch.Activities;
using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>What counts: one or more recordings of the same session, merged.</summary>
/// <param name="Values">As read by person or date they hold no histograms and no best means: <see cref="ActivityTable.Histogram"/> and <see cref="ActivityTable.Bests"/> read those.</param>
public sealed record StoredActivity(StoredMerge Merge, ActivityValues Values)
{
    /// <summary>An activity of one recording alone.</summary>
    public StoredActivity(RecordingSummary alone, ActivityValues values)
        : this(StoredMerge.Of(alone), values)
    {
    }

    public string Key => Winner.Key;

    /// <summary>The recording that the activity is named by.</summary>
    public RecordingSummary Winner => Merge.Winner;

    /// <inheritdoc cref="StoredMerge.Session"/>
    public RecordingSummary Session => Merge.Session;

    /// <inheritdoc cref="StoredMerge.Date"/>
    public LocalDate Date => Merge.Date;

    /// <summary>Keys of all its recordings, sorted ordinally, the winner's among them.</summary>
    public IReadOnlyList<string> RecordingKeys => [.. Merge.Contributions.Select(one => one.Key).Order(StringComparer.Ordinal)];
}
