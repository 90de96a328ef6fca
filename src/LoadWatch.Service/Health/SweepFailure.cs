using System.Data.Common;
using LoadWatch.Storage;

namespace LoadWatch.Service.Health;

/// <summary>Why a sweep failed, for the one who has to act on it.</summary>
/// <param name="Words">In plain words, the same while the cause is the same.</param>
public sealed record SweepFailure(StoreTrouble Trouble, string Words)
{
    public static SweepFailure Of(Exception e) => e switch
    {
        AggregateException { InnerException: { } inner } => Of(inner),
        DbException error => Of(StoreTroubles.Of(error), error),
        IOException or UnauthorizedAccessException => new SweepFailure(StoreTrouble.Disk, $"a file could not be written or read: {e.Message}"),
        _ => new SweepFailure(StoreTrouble.Other, $"a defect of LoadWatch, please report it: {e.GetType().Name}"),
    };

    private static SweepFailure Of(StoreTrouble trouble, DbException error) => new(trouble, trouble switch
    {
        StoreTrouble.Damaged => StoreTroubles.AdviceOfDamage,
        StoreTrouble.Busy => "another program holds the database",
        StoreTrouble.Disk => $"the disk of the data folder is full, read-only or failing: {error.Message}",
        _ => $"the database refused: {error.Message}",
    });
}
