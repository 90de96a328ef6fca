using System.Globalization;
using LoadWatch.Recordings;
using NodaTime.Text;

namespace LoadWatch.Decoding.References;

/// <summary>GPSBabel (GPL, run as a program) reads a FIT file and prints its points as a table, whose columns are rounded for the eye.</summary>
internal static class Babel
{
    private static readonly LocalDateTimePattern Moment = LocalDateTimePattern.CreateWithInvariantCulture("uuuu/MM/dd HH:mm:ss");

    public static void SkipUnlessThere() => Programs.SkipUnless("gpsbabel", Programs.Has("gpsbabel"), "gpsbabel is not on this machine");

    /// <summary>The points of a file in the form of <see cref="ReferencePart.Records"/>; null where it is refused.</summary>
    public static IReadOnlyList<double?[]>? Read(byte[] file)
    {
        var path = Path.GetTempFileName();
        try
        {
            File.WriteAllBytes(path, file);
            return Programs.TryLines("gpsbabel", ["-t", "-i", "garmin_fit,allpoints=1", "-f", path, "-o", "unicsv,utc=0", "-F", "-"]) is { } lines ? Rows(lines) : null;
        }
        finally
        {
            File.Delete(path);
        }
    }

    /// <summary>How far a printed value may lie from the one it was rounded from: half of its last digit.</summary>
    public static double RoundedTo(Channel channel) => channel switch
    {
        Channel.Speed => 0.00501,
        Channel.Altitude => 0.0501,
        _ => 1e-9,
    };

    private static List<double?[]> Rows(IReadOnlyList<string> lines)
    {
        var names = lines.Count > 0 ? lines[0].Split(',') : [];
        return [.. lines.Skip(1).Select(line => Row(names.Zip(line.Split(',')).ToDictionary(cell => cell.First, cell => cell.Second, StringComparer.Ordinal)))];
    }

    private static double?[] Row(Dictionary<string, string> cells)
    {
        double? Number(string name) => cells.TryGetValue(name, out var text) && text.Length > 0 ? double.Parse(text, CultureInfo.InvariantCulture) : null;
        var time = cells.TryGetValue("Date", out var date) && date.Length > 0 && cells.TryGetValue("Time", out var hour) && hour.Length > 0
            ? (double?)Moment.Parse($"{date} {hour}").Value.InUtc().ToInstant().ToUnixTimeMilliseconds()
            : null;
        return [time, Number("Heartrate"), Number("Power"), Number("Speed"), Number("Cadence"), null, Number("Altitude")];
    }
}
