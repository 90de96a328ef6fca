namespace LoadWatch.Stimulus;

/// <summary>
/// Load as a share of the one-repetition maximum from repetitions to failure: the training load chart of the National Strength and
/// Conditioning Association.
/// The chart has no row for 11 repetitions; between rows it is interpolated. Beyond 12 it says too little.
/// </summary>
public static class LoadChart
{
    private static readonly (double Repetitions, double Share)[] Rows =
    [
        (1, 1.00), (2, 0.95), (3, 0.93), (4, 0.90), (5, 0.87), (6, 0.85), (7, 0.83), (8, 0.80), (9, 0.77), (10, 0.75), (12, 0.70),
    ];

    /// <summary>0.70 to 1, or null outside 1 to 12 repetitions.</summary>
    /// <param name="repetitionsToFailure">Done and in reserve together.</param>
    public static double? Share(double repetitionsToFailure)
    {
        for (var row = 1; row < Rows.Length; row++)
        {
            var (from, to) = (Rows[row - 1], Rows[row]);
            if (repetitionsToFailure >= from.Repetitions && repetitionsToFailure <= to.Repetitions)
            {
                var along = (repetitionsToFailure - from.Repetitions) / (to.Repetitions - from.Repetitions);
                return from.Share + (along * (to.Share - from.Share));
            }
        }

        return null;
    }
}
