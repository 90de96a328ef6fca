using System.Globalization;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>Which maximal power or speed the stimulus reads on a date, and why not another one.</summary>
/// <param name="Critical">Critical power or speed, or null: then none is read.</param>
/// <param name="Reserve">W' or D', or null.</param>
/// <param name="Maximum">The one that is read, or null.</param>
internal sealed record MaximumReading(LocalDate Date, Anchor? Critical, Anchor? Reserve, Anchor? Maximum)
{
    /// <summary>What is read of the three.</summary>
    public IEnumerable<Anchor> Read => new[] { Critical, Reserve, Maximum }.OfType<Anchor>();

    public static MaximumReading OfPower(AnchorBook book, LocalDate date, string person, Sport sport) =>
        PowerCapacity.On(date, person, book, sport) is { } capacity ? new(date, capacity.Critical, capacity.WPrime, capacity.Maximum) : new(date, null, null, null);

    public static MaximumReading OfSpeed(AnchorBook book, LocalDate date, string person) =>
        SpeedCapacity.On(date, person, book) is { } capacity ? new(date, capacity.Critical, capacity.DPrime, capacity.Maximum) : new(date, null, null, null);

    /// <summary>In plain words; null of the one that is read.</summary>
    /// <param name="one">A maximal power or speed that holds on the date.</param>
    public string? WhyNot(Anchor one)
    {
        var critical = one.Kind == AnchorKind.PowerMax ? "critical_power" : "critical_speed";
        var ratio = one.Kind == AnchorKind.PowerMax ? PowerCapacity.LeastRatio : SpeedCapacity.LeastRatio;
        return one == Maximum ? null
            : Critical is null ? $"no {critical} holds"
            : (one.ShownOn ?? one.Date) is not { } shown ? "undated"
            : shown < Date.PlusDays(-PowerCapacity.RecentDays) ? $"older than {PowerCapacity.RecentDays} days"
            : Maximum is null && one.Value < ratio * Critical.Value ? string.Create(CultureInfo.InvariantCulture, $"below {ratio} times {critical}, so it is not from a sprint")
            : "another goes before";
    }
}
