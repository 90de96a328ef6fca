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
        var speeds = Speeds(file.Recordings);
        var outliers = speeds.Count > OthersWanted
            ? speeds.Select(one => (one.Subject, Times: Times(one, speeds))).Where(one => one.Times is not null).ToList()
            : [];
        return outliers.Count == 0 ? file : file with
        {
            Recordings = [.. file.Recordings.Select(recording =>
                outliers.Exists(one => one.Subject == recording.Subject) ? WithoutSpeed(recording) : recording)],
            Problems = [.. file.Problems, .. outliers.Select(one => Warning(one.Subject, one.Times!.Value))],
        };
    }

    private static List<SubjectSpeed> Speeds(IReadOnlyList<Recording> recordings)
    {
        // One list for all, one after the other: a squad's match holds more than a million readings.
        var moving = new List<double>();
        var byPerson = recordings.Where(recording => recording.Subject is not null && recording.Samples.Has(Channel.Speed)).GroupBy(recording => recording.Subject!);
        return [.. byPerson.Select(ofOne => SubjectSpeed.Of(ofOne.Key, ofOne, moving)).OfType<SubjectSpeed>()];
    }

    private static double? Times(SubjectSpeed one, List<SubjectSpeed> all)
    {
        var others = all.Where(other => other != one).Select(other => other.Median).Order().ToList();
        var times = one.Median / SubjectSpeed.Share(others, 0.5);
        return times > TimesTheOthers && one.High > HighSpeed ? times : null;
    }

    private static Recording WithoutSpeed(Recording recording) => recording with
    {
        Samples = recording.Samples.Without(Channel.Speed, Channel.Distance),
        DistanceMetres = null,
    };

    private static Problem Warning(string subject, double times) => new(
        ProblemSeverity.Warning,
        string.Create(
            CultureInfo.InvariantCulture,
            $"{subject}: speeds {times:0.0} times those of the others: another unit? Neither speed nor distance is used"));

    /// <summary>How fast one person moved, over all rows that the file has of them.</summary>
    /// <param name="Median">Of the readings from <see cref="MovingFrom"/> on, m/s.</param>
    /// <param name="High">Their 99th percentile, m/s.</param>
    private sealed record SubjectSpeed(string Subject, double Median, double High)
    {
        public static SubjectSpeed? Of(string subject, IEnumerable<Recording> recordings, List<double> moving)
        {
            moving.Clear();
            foreach (var recording in recordings)
            {
                AddMoving(moving, recording.Samples[Channel.Speed]);
            }

            moving.Sort();
            return moving.Count == 0 ? null : new SubjectSpeed(subject, Share(moving, 0.5), Share(moving, 0.99));
        }

        /// <summary>The value at a share of a sorted row: the nearest rank.</summary>
        public static double Share(List<double> sorted, double share) => sorted[Math.Max(0, (int)Math.Ceiling(share * sorted.Count) - 1)];

        private static void AddMoving(List<double> moving, ReadOnlySpan<double> speeds)
        {
            foreach (var speed in speeds)
            {
                if (speed >= MovingFrom)
                {
                    moving.Add(speed);
                }
            }
        }
    }
}
