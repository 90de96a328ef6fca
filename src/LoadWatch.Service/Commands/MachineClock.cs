using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary>The only place that reads the clock of the machine.</summary>
public static class MachineClock
{
    /// <summary>Now, cut to the millisecond.</summary>
    public static Instant Now(TimeProvider? clock = null) =>
        Instant.FromUnixTimeMilliseconds((clock ?? TimeProvider.System).GetUtcNow().ToUnixTimeMilliseconds());
}
