// The usual number of heavy-or-fast days in 14: those of the 56 days before the 14, per known day, times 14. A choice.
namespace LoadWatch.Days;

/// <summary>Heavy-or-fast days of one body region, to be counted over any stretch. Takes every date in order, oldest first.</summary>
internal sealed class HeavyTally
{
    /// <summary>The days that are held against the usual.</summary>
    public const int WindowDays = 14;

    /// <summary>The days before them that make the usual.</summary>
    public const int UsualDays = 56;

    /// <summary>Of all dates up to each.</summary>
    private readonly List<HeavyCount> sums = [new(0, 0)];

    /// <param name="heavyOrFast">Null: not known.</param>
    public void Add(bool? heavyOrFast) =>
        sums.Add(new HeavyCount(sums[^1].Heavy + (heavyOrFast is true ? 1 : 0), sums[^1].Known + (heavyOrFast.HasValue ? 1 : 0)));

    /// <summary>Of some days up to a date.</summary>
    /// <param name="index">Of the date; the first one has 0. Dates before it are not known.</param>
    public HeavyCount Among(int index, int days)
    {
        var (until, before) = (sums[Math.Max(0, index + 1)], sums[Math.Max(0, index + 1 - days)]);
        return new HeavyCount(until.Heavy - before.Heavy, until.Known - before.Known);
    }

    /// <summary>The usual number in <see cref="WindowDays"/> before those that end with a date, days; null where less than a share of the days behind it is known.</summary>
    public double? Usual(int index, double knownShare)
    {
        var before = Among(index - WindowDays, UsualDays);
        return before.Known == 0 || before.Known < Significant.Round(knownShare * UsualDays) ? null : Significant.Round((double)before.Heavy / before.Known * WindowDays);
    }
}

/// <param name="Heavy">Heavy-or-fast days.</param>
/// <param name="Known">Days of which it is known.</param>
internal readonly record struct HeavyCount(int Heavy, int Known);
