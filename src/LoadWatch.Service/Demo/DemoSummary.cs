using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>What was written.</summary>
/// <param name="Until">The morning of the brief; the last session is of the day before.</param>
/// <param name="Files">Count, the configuration included.</param>
/// <param name="Story">What happens, one sentence a line.</param>
/// <param name="Alerts">What stands on the last date under the shipped limits, whatever the seed.</param>
public sealed record DemoSummary(
    string Folder,
    LocalDate Until,
    int People,
    int Files,
    long Bytes,
    IReadOnlyList<string> Story,
    IReadOnlyList<DemoAlert> Alerts);
