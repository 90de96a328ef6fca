using System.Text.Json;
using LoadWatch.Service.Export;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Health;

/// <summary>The file <c>status.json</c> in the data folder: whole or not at all, and never in the way of the work.</summary>
public static class StatusFile
{
    private const string Name = "status.json";

    /// <summary>The last status written; null where there is none, or where a power cut tore it.</summary>
    public static ServiceStatus? Read(string dataFolder)
    {
        try
        {
            return JsonSerializer.Deserialize<ServiceStatus>(File.ReadAllBytes(Path.Combine(dataFolder, Name)), Words.Json);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or JsonException)
        {
            return null;
        }
    }

    /// <returns>False when it could not be written: the disk may be full, and the log says what is wrong.</returns>
    public static bool Write(string dataFolder, ServiceStatus status)
    {
        try
        {
            DurableFile.Replace(Path.Combine(dataFolder, Name), JsonSerializer.SerializeToUtf8Bytes(status, Words.Json));
            return true;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return false;
        }
    }
}
