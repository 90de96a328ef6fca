namespace LoadWatch.Service.Tests.Health;

/// <summary>A clock that a test moves: time passes for both its hands, setting it moves the wall's alone.</summary>
internal sealed class HandClock : TimeProvider
{
    private long ticks;
    private DateTimeOffset wall = new(2026, 6, 15, 6, 0, 0, TimeSpan.Zero);

    public override long TimestampFrequency => TimeSpan.TicksPerSecond;

    public override long GetTimestamp() => ticks;

    public override DateTimeOffset GetUtcNow() => wall;

    public void Pass(int seconds)
    {
        ticks += seconds * TimeSpan.TicksPerSecond;
        wall += TimeSpan.FromSeconds(seconds);
    }

    public void Set(TimeSpan by) => wall += by;
}
