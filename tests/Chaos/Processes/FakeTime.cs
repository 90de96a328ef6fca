using System.Globalization;

namespace LoadWatch.Chaos.Processes;

/// <summary>Lets one program see another time than the machine has; what it measures intervals by goes on as it is.</summary>
/// <param name="file">Where the program reads the offset from, at every look at the clock.</param>
public sealed class FakeTime(string file)
{
    private static readonly string[] Places =
    [
        "/usr/lib/x86_64-linux-gnu/faketime/libfaketimeMT.so.1", "/usr/lib/aarch64-linux-gnu/faketime/libfaketimeMT.so.1", "/usr/local/lib/faketime/libfaketimeMT.so.1",
    ];

    /// <summary>Null where it is not installed.</summary>
    public static string? Library { get; } = Places.FirstOrDefault(File.Exists);

    public IEnumerable<(string Name, string Value)> Environment =>
    [
        ("LD_PRELOAD", Library!), ("FAKETIME_TIMESTAMP_FILE", file), ("FAKETIME_NO_CACHE", "1"), ("DONT_FAKE_MONOTONIC", "1"), ("FAKETIME_FORCE_MONOTONIC_FIX", "0"),
    ];

    /// <param name="offset">From the machine's time.</param>
    public void Set(TimeSpan offset)
    {
        // A reader must never find the file half written.
        File.WriteAllText(file + ".next", offset.TotalSeconds.ToString("+0;-0;+0", CultureInfo.InvariantCulture) + "\n");
        File.Move(file + ".next", file, overwrite: true);
    }
}
