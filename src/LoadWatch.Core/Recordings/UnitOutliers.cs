using System.Globalization;

namespace LoadWatch.Recordings;

/// <summary>
/// Finds the person of a file whose speeds seem to be written in another unit than those of the others. The limits of a reading do not
/// see it: in km/h taken for m/s a sprint is cut, and a jog stays as a sprint. Nothing is corrected: what the file means only its owner
/// knows. All limits are choices, no published source: 2.5 lies below the 3.6 of km/h, as slow steps that the others leave out count
/// here, and above what tells a defender from a goalkeeper.
/// </summary>
public static class UnitOutliers
{
    /// <summary>Slower is standing, m/s.</summary>
    public const double MovingFrom = 0.5;

    /// <summary>How many times the others' median of moving speed is too much.</summary>
    public const double TimesTheOthers = 2.5;

    /// <summary>Only where the 99th percentile of moving speed is above it, m/s: else the others merely stood about.</summary>
    public const double HighSpeed = 8;

    /// <summary>Fewer others say nothing about what is usual.</summary>
    public const int OthersWanted = 5;

    /// <summary>The file without speed and distance of such a person, who is named by a warning; the same file where there is none.</summary>
    public static DecodedFile LeaveOut(DecodedFile file)
    {
        ArgumentNullException.ThrowIfNull(file);
        var speeds = new SpeedTally();
        foreach (var recording in file.Recordings)
        {
            speeds.Add(recording);
        }

        return LeaveOut(file, Of(speeds));
    }

    /// <inheritdoc cref="LeaveOut(DecodedFile)"/>
    /// <param name="outliers">Who they are.</param>
    public static DecodedFile LeaveOut(DecodedFile file, IReadOnlyList<UnitOutlier> outliers)
    {
        ArgumentNullException.ThrowIfNull(file);
        ArgumentNullException.ThrowIfNull(outliers);
        return outliers.Count == 0 ? file : file with
        {
            Recordings = [.. file.Recordings.Select(recording => LeaveOut(recording, outliers))],
            Problems = [.. file.Problems, .. outliers.Select(Warning)],
        };
    }

    /// <summary>The people of a file whose speeds seem to be in another unit, in the order of the file.</summary>
    public static IReadOnlyList<UnitOutlier> Of(SpeedTally speeds)
    {
        ArgumentNullException.ThrowIfNull(speeds);
        var all = speeds.People.Where(person => speeds.Median(person) is not null).ToList();
        return all.Count > OthersWanted
            ? [.. all.Select(person => (Person: person, Times: Times(person, all, speeds))).Where(one => one.Times is not null).Select(one => new UnitOutlier(one.Person, one.Times!.Value))]
            : [];
    }

    /// <summary>The recording without speed and distance where it is of such a person, else itself.</summary>
    public static Recording LeaveOut(Recording recording, IReadOnlyList<UnitOutlier> outliers)
    {
        ArgumentNullException.ThrowIfNull(recording);
        return !outliers.Any(one => one.Subject == recording.Subject) ? recording : recording with
        {
            Samples = recording.Samples.Without(Channel.Speed, Channel.Distance),
            DistanceMetres = null,
        };
    }

    private static Problem Warning(UnitOutlier outlier) => new(
        ProblemSeverity.Warning,
        string.Create(
            CultureInfo.InvariantCulture,
            $"{outlier.Subject}: speeds {outlier.TimesTheOthers:0.0} times those of the others: another unit? Neither speed nor distance is used"));

    private static double? Times(string person, List<string> all, SpeedTally speeds)
    {
        var others = all.Where(other => other != person).Select(other => speeds.Median(other)!.Value).Order().ToList();
        var times = speeds.Median(person) / others[Math.Max(0, (int)Math.Ceiling(0.5 * others.Count) - 1)];
        return times > TimesTheOthers && speeds.High(person) > HighSpeed ? times : null;
    }
}

/// <param name="Subject">As the file writes the person.</param>
/// <param name="TimesTheOthers">The person's median of moving speed to that of the others' medians.</param>
public sealed record UnitOutlier(string Subject, double TimesTheOthers);
