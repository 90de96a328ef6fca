using NodaTime;
using NodaTime.Text;

namespace LoadWatch.People;

/// <summary>Stretches of dates, sorted, none of which touches another. Equal where they cover the same dates.</summary>
public sealed class DatePeriods : IEquatable<DatePeriods>
{
    private readonly IReadOnlyList<DatePeriod> periods;

    private DatePeriods(IReadOnlyList<DatePeriod> periods) => this.periods = periods;

    /// <summary>No date.</summary>
    public static DatePeriods Never { get; } = new([]);

    /// <summary>Every date.</summary>
    public static DatePeriods Always { get; } = Since(LocalDate.MinIsoValue);

    public bool IsEmpty => periods.Count == 0;

    public IReadOnlyList<DatePeriod> All => periods;

    /// <summary>A date and all after it.</summary>
    public static DatePeriods Since(LocalDate from) => new([new DatePeriod(from, null)]);

    /// <summary>Those of any order; what overlaps or adjoins becomes one.</summary>
    /// <exception cref="ArgumentException">One ends before it begins.</exception>
    public static DatePeriods Of(IEnumerable<DatePeriod> periods)
    {
        var merged = new List<DatePeriod>();
        foreach (var next in periods.OrderBy(period => period.From).Select(Open))
        {
            if (next.Until < next.From)
            {
                throw new ArgumentException($"{next} ends before it begins", nameof(periods));
            }

            if (merged.Count > 0 && !(merged[^1].Until?.PlusDays(1) < next.From))
            {
                merged[^1] = merged[^1] with { Until = Later(merged[^1].Until, next.Until) };
            }
            else
            {
                merged.Add(next);
            }
        }

        return new DatePeriods(merged);
    }

    /// <summary>The reverse of <see cref="ToString"/>.</summary>
    public static DatePeriods Parse(string text) => Of(text.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(DatePeriod.Parse));

    public bool Covers(LocalDate date) => BeginningOf(date) is not null;

    /// <summary>First date of the stretch that covers a date, or null.</summary>
    public LocalDate? BeginningOf(LocalDate date)
    {
        foreach (var period in periods)
        {
            if (period.Covers(date))
            {
                return period.From;
            }
        }

        return null;
    }

    /// <summary>The first and the last date that only one of the two covers; null where they are equal, the last null where it goes on for ever.</summary>
    public (LocalDate First, LocalDate? Last)? DifferenceTo(DatePeriods other)
    {
        var (own, others) = (Edges().ToList(), other.Edges().ToList());
        var differing = own.Except(others).Concat(others.Except(own)).ToList();
        return differing.Count == 0 ? null : (differing.Min(), own.Count % 2 == others.Count % 2 ? differing.Max().PlusDays(-1) : null);
    }

    public bool Equals(DatePeriods? other) => other is not null && periods.SequenceEqual(other.periods);

    public override bool Equals(object? obj) => Equals(obj as DatePeriods);

    public override int GetHashCode() => periods.Aggregate(0, HashCode.Combine);

    /// <summary><c>2026-02-01/2026-04-30 2026-08-01</c>; empty for none.</summary>
    public override string ToString() => string.Join(' ', periods);

    /// <summary>What lasts to the last date that there is has no end.</summary>
    private static DatePeriod Open(DatePeriod period) => period.Until >= LocalDate.MaxIsoValue ? period with { Until = null } : period;

    /// <summary>Dates on which a stretch begins, or the first behind one.</summary>
    private IEnumerable<LocalDate> Edges() => periods.SelectMany(period => period.Until is { } until ? new[] { period.From, until.PlusDays(1) } : [period.From]);

    private static LocalDate? Later(LocalDate? one, LocalDate? other) => one is { } a && other is { } b ? LocalDate.Max(a, b) : null;
}

/// <param name="Until">Last date, inclusive; null while it is open.</param>
public sealed record DatePeriod(LocalDate From, LocalDate? Until)
{
    public bool Covers(LocalDate date) => From <= date && !(date > Until);

    public static DatePeriod Parse(string text)
    {
        var dates = text.Split('/').Select(date => LocalDatePattern.Iso.Parse(date).Value).ToList();
        return new DatePeriod(dates[0], dates.Count > 1 ? dates[1] : null);
    }

    public override string ToString() =>
        Until is { } until ? $"{LocalDatePattern.Iso.Format(From)}/{LocalDatePattern.Iso.Format(until)}" : LocalDatePattern.Iso.Format(From);
}
