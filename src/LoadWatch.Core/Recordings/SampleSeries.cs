using LoadWatch.Quality;
using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>
/// The samples of one recording as columns, one row per record of the file, in file order. Times may repeat, run backwards or be unknown:
/// nothing is cut or sorted here.
/// </summary>
public sealed class SampleSeries
{
    /// <summary>The time of a row that carries none.</summary>
    public const long Undated = long.MinValue;

    private static readonly Channel[] Every = Enum.GetValues<Channel>();

    private readonly long[] times;
    private readonly double[]?[] columns;

    /// <param name="unixMilliseconds">Time of each row, milliseconds since 1970-01-01T00:00:00Z, or <see cref="Undated"/>.</param>
    /// <param name="columns">
    /// Values by channel, one per row; NaN marks a row without a reading, or with one that was cut (<see cref="CutMark"/>). Channels never recorded are left out.
    /// </param>
    /// <exception cref="ArgumentException">A column has another length than the times.</exception>
    public SampleSeries(long[] unixMilliseconds, IReadOnlyDictionary<Channel, double[]> columns)
    {
        ArgumentNullException.ThrowIfNull(unixMilliseconds);
        ArgumentNullException.ThrowIfNull(columns);
        times = unixMilliseconds;
        this.columns = new double[]?[Every.Length];
        foreach (var (channel, values) in columns)
        {
            if (values.Length != times.Length)
            {
                throw new ArgumentException($"{channel} has {values.Length} values for {times.Length} rows", nameof(columns));
            }

            this.columns[(int)channel] = values;
        }
    }

    /// <summary>A series without rows.</summary>
    public static SampleSeries Empty { get; } = new([], new Dictionary<Channel, double[]>());

    /// <summary>Number of rows.</summary>
    public int Count => times.Length;

    /// <summary>Time of each row, milliseconds since 1970-01-01T00:00:00Z, or <see cref="Undated"/>.</summary>
    public ReadOnlySpan<long> UnixMilliseconds => times;

    /// <summary>The channels that hold at least one reading, cut or not.</summary>
    public IEnumerable<Channel> Channels => Every.Where(Has);

    /// <summary>The column of a channel, one value per row, NaN where a row has no reading; empty if the channel was never recorded.</summary>
    public ReadOnlySpan<double> this[Channel channel] => columns[(int)channel];

    /// <summary>Whether the channel holds at least one reading, cut or not.</summary>
    public bool Has(Channel channel) => columns[(int)channel] is { } values && Array.Exists(values, CutMark.IsTaken);

    /// <summary>Earliest dated row, or null.</summary>
    public Instant? First
    {
        get
        {
            var first = long.MaxValue;
            foreach (var time in times)
            {
                first = time < first && time != Undated ? time : first;
            }

            return Array.Exists(times, time => time != Undated) ? Instant.FromUnixTimeMilliseconds(first) : null;
        }
    }

    /// <summary>Latest dated row, or null.</summary>
    public Instant? Last
    {
        get
        {
            var last = Undated;
            foreach (var time in times)
            {
                last = Math.Max(last, time);
            }

            return last == Undated ? null : Instant.FromUnixTimeMilliseconds(last);
        }
    }

    /// <summary>Every channel that there is, in its order.</summary>
    internal static IReadOnlyList<Channel> EveryChannel => Every;

    /// <summary>The times themselves, to be shared, never written.</summary>
    internal long[] Times => times;

    /// <summary>The rows named by their number from 0, in the order given; channels without a reading in them are left out.</summary>
    public SampleSeries Take(IReadOnlyList<int> rows)
    {
        ArgumentNullException.ThrowIfNull(rows);
        var taken = Channels.ToDictionary(channel => channel, channel => Of(columns[(int)channel]!, rows));
        return new SampleSeries(
            Of(times, rows),
            taken.Where(column => Array.Exists(column.Value, CutMark.IsTaken)).ToDictionary(column => column.Key, column => column.Value));
    }

    /// <summary>The same rows without some of the channels.</summary>
    public SampleSeries Without(params IReadOnlyCollection<Channel> channels) =>
        new(times, Channels.Except(channels).ToDictionary(channel => channel, channel => columns[(int)channel]!));

    /// <summary>A column itself, to be shared, never written; null if the channel was never recorded.</summary>
    internal double[]? Column(Channel channel) => columns[(int)channel];

    private static T[] Of<T>(T[] column, IReadOnlyList<int> rows)
    {
        var taken = new T[rows.Count];
        for (var row = 0; row < taken.Length; row++)
        {
            taken[row] = column[rows[row]];
        }

        return taken;
    }
}
