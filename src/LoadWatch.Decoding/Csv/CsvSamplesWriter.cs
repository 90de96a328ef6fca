using System.Globalization;
using System.Text;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv;

/// <summary>Writes the format of <see cref="BuiltInLayouts.Samples"/>: the same recording always gives the same bytes.</summary>
public static class CsvSamplesWriter
{
    private const string Moment = "uuuu'-'MM'-'dd'T'HH':'mm':'ss;FFF";

    private static readonly OffsetDateTimePattern LocalPattern = OffsetDateTimePattern.CreateWithInvariantCulture(Moment + "o<+HH:mm>");
    private static readonly InstantPattern UtcPattern = InstantPattern.CreateWithInvariantCulture(Moment + "'Z'");

    /// <summary>
    /// UTF-8 without a byte order mark, lines ended by LF, only the channels that hold a reading. Times carry the recording's local offset
    /// to the
    /// minute, or <c>Z</c>. Undated rows are left out.
    /// </summary>
    public static byte[] Write(Recording recording)
    {
        ArgumentNullException.ThrowIfNull(recording);
        var columns = BuiltInLayouts.SampleColumns.Where(column => recording.Samples.Has(column.Channel)).ToList();
        var text = new StringBuilder();
        text.AppendJoin(',', [BuiltInLayouts.TimeColumn, BuiltInLayouts.SportColumn, .. columns.Select(column => column.Column)]);
        text.Append('\n');
        for (var row = 0; row < recording.Samples.Count; row++)
        {
            AppendRow(text, recording, columns, row);
        }

        return Encoding.UTF8.GetBytes(text.ToString());
    }

    private static void AppendRow(StringBuilder text, Recording recording, List<CsvChannelColumn> columns, int row)
    {
        var time = recording.Samples.UnixMilliseconds[row];
        if (time == SampleSeries.Undated)
        {
            return;
        }

        text.Append(Written(Instant.FromUnixTimeMilliseconds(time), recording.LocalOffset)).Append(',').Append(recording.Sport);
        foreach (var column in columns)
        {
            var value = recording.Samples[column.Channel][row];
            text.Append(',').Append(double.IsNaN(value) ? "" : value.ToString("R", CultureInfo.InvariantCulture));
        }

        text.Append('\n');
    }

    private static string Written(Instant time, Offset? offset) =>
        offset is { } local ? LocalPattern.Format(time.WithOffset(local)) : UtcPattern.Format(time);
}
