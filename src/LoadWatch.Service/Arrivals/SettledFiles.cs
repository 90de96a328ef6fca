using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>Whether a file that does not show by its content that it is whole has stood still long enough to be judged.</summary>
public static class SettledFiles
{
    /// <summary>
    /// True when the file's time lies at least the settle time away from now, before or after: a copy that kept an old date or a writer with a wrong
    /// clock has not been writing just now.
    /// </summary>
    public static bool IsSettled(FileStamp stamp, Instant now, Duration settle)
    {
        var age = now - Instant.FromUnixTimeMilliseconds(stamp.ModifiedUnixMs);
        return age >= settle || age <= -settle;
    }
}
