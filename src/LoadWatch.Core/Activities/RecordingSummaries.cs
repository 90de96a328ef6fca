using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What merging needs to know of a recording, taken from the recording itself.</summary>
public static class RecordingSummaries
{
    /// <param name="sha">SHA-256 of the arrival, 64 lower-case hex digits.</param>
    /// <param name="sourceName">The layout of a CSV; null for FIT.</param>
    /// <exception cref="ArgumentException">The recording carries no date.</exception>
    public static RecordingSummary Of(string sha, UsableRecording usable, Person person, string? sourceName)
    {
        var recording = usable.Recording;
        var start = LocalStart.Of(recording, person);
        return new RecordingSummary(
            sha,
            recording.Part,
            person.Id,
            start.ToInstant(),
            start.Offset,
            recording.Sport,
            recording.ElapsedSeconds,
            recording.TimerSeconds,
            Source(recording.Device, sourceName),
            ChannelExtents.Of(usable),
            recording.Samples.Count,
            recording.Sets.Count,
            SamplesDigest.Of(recording))
        {
            DistanceMetres = recording.DistanceMetres,
            DayBegins = Duration.FromNanoseconds(person.DayBeginsAt.NanosecondOfDay),
        };
    }

    private static string Source(Device device, string? sourceName)
    {
        long?[] stated = [device.Manufacturer, device.Product, device.Serial];
        var known = stated.OfType<long>().ToList();
        if (known.Count > 0)
        {
            return $"device {string.Join('/', known)}";
        }

        return sourceName is null ? "unnamed device" : $"layout {sourceName}";
    }
}
