using System.Globalization;
using System.Reflection;
using System.Security.Cryptography;
using System.Text;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>
/// A checksum over everything that an activity's row, its histograms and its best means hold. The engine checks the structure of its file, not what stands in the cells: a
/// flipped bit of a value is found by nothing else.
/// </summary>
internal static class ActivityChecksum
{
    private const int Digits = 32;

    private static readonly PropertyInfo[] Columns =
    [
        .. typeof(ActivityRow).GetProperties(BindingFlags.Public | BindingFlags.Instance | BindingFlags.DeclaredOnly)
            .Where(property => property.Name != nameof(ActivityRow.Checksum))
            .OrderBy(property => property.Name, StringComparer.Ordinal),
    ];

    /// <param name="histograms">In ordinal order of their channels.</param>
    /// <param name="means">Likewise.</param>
    public static string Of(ActivityRow row, IEnumerable<ChannelRow> histograms, IEnumerable<ChannelRow> means)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        Append(hash, row.Sha);
        Append(hash, row.Part.ToString(CultureInfo.InvariantCulture));
        Append(hash, row.Person);
        foreach (var column in Columns)
        {
            Append(hash, Text(column.GetValue(row)));
        }

        foreach (var kind in new[] { histograms, means })
        {
            foreach (var one in kind)
            {
                Append(hash, one.Channel);
                Append(hash, Convert.ToHexString(one.Bytes));
            }

            Append(hash, null);
        }

        return Convert.ToHexStringLower(hash.GetHashAndReset())[..Digits];
    }

    /// <summary>Null and the empty text differ, and so do the same letters in other cells.</summary>
    private static void Append(IncrementalHash hash, string? text)
    {
        hash.AppendData(Encoding.UTF8.GetBytes(text is null ? "-" : string.Create(CultureInfo.InvariantCulture, $"{text.Length}:{text}")));
    }

    private static string? Text(object? value) => value switch
    {
        null => null,
        string text => text,
        LocalDate date => ColumnTypes.Date.Format(date),
        double number => number.ToString("R", CultureInfo.InvariantCulture),
        IFormattable other => other.ToString(null, CultureInfo.InvariantCulture),
        _ => throw new InvalidOperationException($"a column of type {value.GetType().Name} has no text"),
    };
}

/// <summary>A row of <c>histogram</c> or of <c>best_mean</c>.</summary>
internal sealed class ChannelRow
{
    public string Activity { get; init; } = "";

    public string Channel { get; init; } = "";

    public byte[] Bytes { get; init; } = [];
}
