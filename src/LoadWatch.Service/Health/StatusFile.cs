using System.Text.Json;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>Writes <c>status.json</c> in the data folder after every sweep, whole or not at all.</summary>
public sealed class StatusFile(Workplace workplace)
{
    private const string Name = "status.json";

    /// <summary>The last status written, or null where the service has not run.</summary>
    public static StatusLine? Read(string dataFolder)
    {
        var path = Path.Combine(dataFolder, Name);
        return File.Exists(path) ? JsonSerializer.Deserialize<StatusLine>(File.ReadAllBytes(path), Words.Json) : null;
    }

    /// <param name="configurationFault">Why the configuration on disk is not the one in force, or null.</param>
    public void Write(Instant now, SweepReport report, string? configurationFault) =>
        Write(new StatusLine(
            Words.Utc(now)!, true, null, configurationFault, report.MissingInboxes, report.Unreadable.Count, report.Settling, report.Missed));

    public void WriteFailure(Instant now, Exception failure) =>
        Write(new StatusLine(Words.Utc(now)!, false, failure.GetType().Name, null, [], 0, 0, 0));

    private void Write(StatusLine line) => DurableFile.Replace(Path.Combine(workplace.Folder.Root, Name), JsonSerializer.SerializeToUtf8Bytes(line, Words.Json));
}

/// <param name="LastSweep">UTC.</param>
/// <param name="Undelivered">Contacts and channels by which nothing got through at the last try.</param>
/// <param name="Failure">Kind of the failure that ended the sweep, or null.</param>
public sealed record StatusLine(
    string LastSweep,
    bool Done,
    string? Failure,
    string? ConfigurationFault,
    IReadOnlyList<string> MissingInboxes,
    int Unreadable,
    int Settling,
    int Undelivered);
