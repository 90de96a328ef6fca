namespace LoadWatch.Stimulus;

/// <summary>
/// Excitation by force of the rested pool: a hundred rows a unit of excitation, and two at each threshold, since force jumps where a unit joins. Between rows it
/// is interpolated.
/// </summary>
internal sealed class InverseTable
{
    private const int RowsPerUnit = 100;
    private const double SmallestStep = 1e-9;

    private readonly double[] excitations;
    private readonly double[] fractions;

    public InverseTable(MotorUnitPool pool)
    {
        var even = Enumerable.Range(0, (int)(pool.HighestExcitation * RowsPerUnit)).Select(row => (double)row / RowsPerUnit);
        excitations = [.. even.Concat(pool.Thresholds).Concat(pool.Thresholds.Select(Math.BitDecrement)).Append(pool.HighestExcitation).Distinct().Order()];
        fractions = [.. excitations.Select(excitation => pool.ForceAt(excitation) / pool.MaximumForce)];
    }

    /// <param name="fraction">Share of the maximal force; outside 0 to 1 it reads as the nearer end.</param>
    public double At(double fraction)
    {
        var row = Array.BinarySearch(fractions, fraction);
        if (row >= 0)
        {
            return excitations[Array.IndexOf(fractions, fraction)];
        }

        return ~row switch
        {
            0 => 0,
            var next when next == fractions.Length => excitations[^1],
            var next => Between(next, fraction),
        };
    }

    private double Between(int next, double fraction)
    {
        if (excitations[next] - excitations[next - 1] < SmallestStep)
        {
            return excitations[next]; // A unit joins here.
        }

        var along = (fraction - fractions[next - 1]) / (fractions[next] - fractions[next - 1]);
        return excitations[next - 1] + (along * (excitations[next] - excitations[next - 1]));
    }
}
