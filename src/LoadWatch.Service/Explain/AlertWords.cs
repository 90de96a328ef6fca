using LoadWatch.Alerts;
using LoadWatch.Service.Export;

namespace LoadWatch.Service.Explain;

/// <summary>What stands beside an alert's state, in words.</summary>
internal static class AlertWords
{
    /// <summary>When it was raised; both dates where it was raised again since.</summary>
    public static string Since(Alert alert) => alert.StandsSince == alert.Raised
        ? $"raised {Words.Date(alert.Raised)}"
        : $"raised {Words.Date(alert.Raised)}, again {Words.Date(alert.StandsSince)}";

    /// <summary>Behind the state; empty where it is told, or was.</summary>
    public static string Aside(Alert alert)
    {
        var shelved = alert.ShelvedUntil is { } until ? $", shelved until {Words.Date(until)}" : "";
        return alert.Watch == AlertWatch.Watched ? shelved : $"{shelved}, {Words.Of(alert.Watch).Replace('_', ' ')}";
    }
}
