using System.Text.Json;

namespace LoadWatch.Service.Configuration;

/// <summary>Where the data folder lies by a configuration that may be faulty otherwise.</summary>
public static class DataPlace
{
    /// <summary>Absolute; null where the file does not say.</summary>
    public static string? Of(string configPath)
    {
        try
        {
            using var document = JsonDocument.Parse(File.ReadAllBytes(configPath), ConfigurationJson.DocumentOptions);
            var data = document.RootElement.TryGetProperty("data", out var value) ? value.GetString() : new LoadWatchFile().Data;
            return data is null ? null : Path.GetFullPath(Path.Combine(Path.GetDirectoryName(Path.GetFullPath(configPath))!, data));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or JsonException or InvalidOperationException)
        {
            return null;
        }
    }
}
