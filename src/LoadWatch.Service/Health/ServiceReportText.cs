using System.Net;
using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>The words of the daily report on the service and of a trouble: about folders, files and machines, never about people.</summary>
public static class ServiceReportText
{
    public const string TroubleSubject = "LoadWatch: the service is in trouble";

    private const string WhereToLook = "loadwatch status tells the same at any time; deploy/README.md says what to do about each.";

    public static string Subject(LocalDate date, ServiceStatus status) => $"LoadWatch, {BriefText.DateInWords(date)}: {Outcome(status)}";

    public static string Of(LocalDate date, ServiceStatus status) => Lines(
    [
        $"LoadWatch on {BriefText.DateInWords(date)}: {Outcome(status)}.",
        "",
        .. status.Troubles.Select(trouble => $"- {(trouble.Critical ? "critical" : "warning")}: {OneLine.Of(trouble.Sentence)}"),
        .. status.Troubles.Count > 0 ? [""] : Array.Empty<string>(),
        $"Last sweep that ended well: {status.LastDone ?? "none yet"}",
        $"Something new last came in: {status.LastArrival ?? "never"}",
        $"Inboxes: {string.Join(", ", status.Inboxes.Select(inbox => $"{OneLine.Of(inbox.Name)} ({(inbox.Away is null ? $"{inbox.Files} files" : "not available")})"))}",
        $"Arrivals that wait: {status.Waiting ?? 0}; that wait for an answer of staff: {status.Held ?? 0}; files that cannot be read: {status.Unreadable}",
        $"Deliveries that wait: {status.DeliveriesWaiting ?? 0}",
        $"Database: {Megabytes(status.DatabaseBytes)}; free on its disk: {(status.DiskFreeBytes is { } free ? Megabytes(free) : "unknown")}",
        "",
        "This report comes every day. When it does not come, the service or its mail is in trouble.",
        WhereToLook,
    ]);

    public static string OfTrouble(string sentence) => Lines(["LoadWatch needs somebody to look after it.", "", OneLine.Of(sentence), "", "This is told once for each trouble, and daily in the report.", WhereToLook]);

    public static string Html(string subject, string text) =>
        $"<!doctype html>\n<html lang=\"en\"><head><meta charset=\"utf-8\"><title>{WebUtility.HtmlEncode(subject)}</title></head>"
        + $"<body><pre style=\"font: inherit; white-space: pre-wrap\">{WebUtility.HtmlEncode(text)}</pre></body></html>\n";

    private static string Outcome(ServiceStatus status) => status.Troubles.Count switch
    {
        0 => "all well",
        1 => "1 thing is not well",
        var count => $"{count} things are not well",
    };

    private static string Megabytes(long bytes) => $"{bytes / (1024 * 1024)} MB";

    private static string Lines(IEnumerable<string> lines) => string.Concat(lines.Select(line => line + "\n"));
}
