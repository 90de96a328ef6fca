using System.Globalization;
using System.Text;
using LoadWatch.Activities;
using LoadWatch.Quality;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Explain;

/// <summary>How good the readings of a session are: the usable share of each channel, and each cut with its reason, its place and its share.</summary>
public static class CutText
{
    private static readonly LocalTimePattern Clock = LocalTimePattern.CreateWithInvariantCulture("HH:mm:ss");

    /// <param name="offset">Of the session, for times of day.</param>
    /// <param name="indent">Blanks in front of each line.</param>
    public static void Append(StringBuilder text, ActivityValues values, Offset offset, string indent)
    {
        foreach (var cut in values.Cuts.Where(cut => cut.Channel is null || !values.UsableShare.ContainsKey(cut.Channel.Value)))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"{indent}{Of(cut, offset)}");
        }

        foreach (var (channel, share) in values.UsableShare.OrderBy(one => one.Key))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"{indent}{ChannelWords.Of(channel)} usable in {Percent(share)} of the sampled time");
            foreach (var cut in values.Cuts.Where(cut => cut.Channel == channel))
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"{indent}    {Of(cut, offset)}");
            }
        }
    }

    /// <summary><c>no reading, 12:00:10 to 12:04:00: 3.2 % of the sampled time</c>.</summary>
    private static string Of(Cut cut, Offset offset)
    {
        var place = cut.Stretch is { From: { } from, To: { } to } ? $", {Moment(from, offset)} to {Moment(to, offset)}" : "";
        return string.Create(CultureInfo.InvariantCulture, $"{CutWords.Of(cut.Reason)}{place}: {Percent(cut.Share)} of the {CutWords.WholeOf(cut.Reason)}{Count(cut)}");
    }

    private static string Count(Cut cut) => (cut.Readings, cut.Channel) switch
    {
        (0, _) => "",
        (1, null) => ", 1 row",
        (var rows, null) => $", {rows} rows",
        (1, _) => ", 1 reading",
        var (readings, _) => $", {readings} readings",
    };

    private static string Percent(double share) => (share * 100).ToString("0.##", CultureInfo.InvariantCulture) + " %";

    private static string Moment(long unixMilliseconds, Offset offset) =>
        Clock.Format(Instant.FromUnixTimeMilliseconds(unixMilliseconds).WithOffset(offset).TimeOfDay);
}
