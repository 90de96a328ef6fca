namespace LoadWatch.Quality;

/// <summary>Cuts readings outside what can be true at all, takes over cuts made before, and notes rows without a reading.</summary>
internal static class OutOfRange
{
    public static void Cut(ReadOnlySpan<double> values, (double Least, double Most) range, ReadingMarks marks)
    {
        if (Within(values, range) == values.Length)
        {
            return;
        }

        for (var row = 0; row < values.Length; row++)
        {
            if (!(values[row] >= range.Least && values[row] <= range.Most))
            {
                marks.Cut(row, Reason(values[row]));
            }
        }
    }

    private static int Within(ReadOnlySpan<double> values, (double Least, double Most) range)
    {
        var count = 0;
        foreach (var value in values)
        {
            count += value >= range.Least && value <= range.Most ? 1 : 0;
        }

        return count;
    }

    private static CutReason Reason(double value) => double.IsNaN(value) ? CutMark.ReasonOf(value) ?? CutReason.NoReading : CutReason.OutOfRange;
}
