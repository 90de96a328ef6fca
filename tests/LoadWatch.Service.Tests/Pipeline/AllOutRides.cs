using LoadWatch.Decoding.Fit;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Rides of anna with one effort on the line W = 18 kJ + 250 W t.</summary>
internal static class AllOutRides
{
    /// <summary>Of an easy ride, behind the month of the others.</summary>
    public static LocalDate Last { get; } = new(2026, 6, 8);

    /// <summary>Efforts of 120, 300 and 720 s in May 2026, and the easy ride of June.</summary>
    public static IReadOnlyList<(string Path, byte[] Bytes)> Season() =>
    [
        ("anna/a.fit", Ride(new LocalDate(2026, 5, 6), 120)),
        ("anna/b.fit", Ride(new LocalDate(2026, 5, 13), 300)),
        ("anna/c.fit", Ride(new LocalDate(2026, 5, 20), 720)),
        ("anna/d.fit", Ride(Last, 0)),
    ];

    /// <summary>25 minutes at 100 W, of which the first after 5 minutes as hard as can be for so long.</summary>
    /// <param name="more">Watts above that.</param>
    /// <param name="length">Seconds in all.</param>
    public static byte[] Ride(LocalDate date, int seconds, int more = 0, int length = 1500)
    {
        var ride = Some.Ride(date);
        return FitEncoder.Encode(ride with
        {
            Samples = [.. Enumerable.Range(0, length + 1).Select(second => new FitSample(
                ride.Start + Duration.FromSeconds(second),
                Power: second >= 300 && second < 300 + seconds ? 250 + more + (18_000 / seconds) : 100,
                Distance: 8.0 * second))],
        });
    }
}
