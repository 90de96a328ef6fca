using NodaTime;

namespace LoadWatch.Chaos.Inputs;

/// <summary>
/// The moment at which the service judges. Fixed where it is told by <c>--as-of</c>, which sends no mail; else the machine's, in a time zone in which it is
/// morning for hours to come: the date must not change under a run.
/// </summary>
public sealed record Clock(Instant Now, string Zone, bool IsFixed)
{
    private const int MorningHour = 9;

    /// <summary>Monday 15 June 2026, 09:00 UTC.</summary>
    public static readonly Clock Fixed = new(Instant.FromUtc(2026, 6, 15, MorningHour, 0), "UTC", IsFixed: true);

    public static Clock Machine { get; } = OfMachine(SystemClock.Instance.GetCurrentInstant());

    public DateTimeZone TimeZone => DateTimeZoneProviders.Tzdb[Zone];

    public LocalDate Today => Now.InZone(TimeZone).Date;

    /// <summary>The signs of the zones' names are those of POSIX: <c>Etc/GMT+5</c> is five hours behind.</summary>
    private static Clock OfMachine(Instant now)
    {
        var behind = (now.InUtc().Hour - MorningHour + 12 + 24) % 24 - 12;
        return new Clock(now, behind == 0 ? "UTC" : FormattableString.Invariant($"Etc/GMT{behind:+0;-0}"), IsFixed: false);
    }
}
