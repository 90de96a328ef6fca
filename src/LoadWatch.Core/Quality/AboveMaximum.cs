namespace LoadWatch.Quality;

/// <summary>Cuts heart rates that are further above the person's maximum than a maximum can be wrong.</summary>
internal static class AboveMaximum
{
    public static void Cut(ReadOnlySpan<double> bpm, double most, ReadingMarks marks)
    {
        for (var row = 0; row < bpm.Length; row++)
        {
            if (bpm[row] > most)
            {
                marks.Cut(row, CutReason.AboveMaximum);
            }
        }
    }
}
