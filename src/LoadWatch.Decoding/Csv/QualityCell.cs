using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Marks the readings of a row that was received too badly.</summary>
internal sealed class QualityCell(CsvTable table, CsvQuality wanted, char decimalMark)
{
    private readonly int column = table.Find(wanted.Column)!.Value;

    public static IEnumerable<string> Complaints(CsvQuality? quality)
    {
        if (quality is null)
        {
            yield break;
        }

        if (string.IsNullOrWhiteSpace(quality.Column))
        {
            yield return "quality.column is missing";
        }

        if (quality is { AtLeast: null, AtMost: null })
        {
            yield return "quality needs at_least or at_most";
        }

        if (quality.AtLeast > quality.AtMost)
        {
            yield return "quality.at_least is above quality.at_most: no row could be good enough";
        }

        if (quality.Channels.Count == 0)
        {
            yield return "quality.channels names no channel";
        }
    }

    /// <param name="rows">The row.</param>
    /// <param name="readings">By channel number; NaN for none.</param>
    /// <returns>Not null where the cell is no number.</returns>
    public Problem? Take(CsvRows rows, double[] readings)
    {
        var value = double.NaN;
        var cell = rows[column];
        if (!cell.IsEmpty && !StrictNumber.TryRead(cell, decimalMark, out value))
        {
            return table.Wrong(rows, column, $"not a number with the decimal mark {decimalMark}");
        }

        if (!IsGoodEnough(value))
        {
            foreach (var channel in wanted.Channels)
            {
                readings[(int)channel] = double.IsNaN(readings[(int)channel]) ? double.NaN : CutMark.Of(CutReason.MarkedBad);
            }
        }

        return null;
    }

    /// <summary>Never for an empty cell: where the signal was lost nothing vouches for the position.</summary>
    private bool IsGoodEnough(double value) =>
        !double.IsNaN(value) && !(value < wanted.AtLeast) && !(value > wanted.AtMost);
}
