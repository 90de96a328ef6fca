using NodaTime;

namespace LoadWatch.People;

/// <summary>Who looks after the service and is told how it is; never anything about people watched.</summary>
/// <param name="ReportAt">Local time of the daily report.</param>
public sealed record Administrator(string Id, DateTimeZone Zone, LocalTime ReportAt)
{
    /// <summary>Address for mail, or null for none.</summary>
    public string? Mail { get; init; }
}
