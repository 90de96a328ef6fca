using System.Globalization;

namespace LoadWatch.Activities;

/// <summary>The key of a recording, and of the activity that it wins: <c>sha/part</c>.</summary>
public static class RecordingKey
{
    public static string Of(string sha, int part) => string.Create(CultureInfo.InvariantCulture, $"{sha}/{part}");

    /// <exception cref="FormatException">Not a key.</exception>
    public static (string Sha, int Part) Parse(string key)
    {
        ArgumentNullException.ThrowIfNull(key);
        var slash = key.LastIndexOf('/');
        return slash < 0 ? throw new FormatException($"\"{key}\" is no key of a recording") : (key[..slash], int.Parse(key[(slash + 1)..], CultureInfo.InvariantCulture));
    }
}
