using LoadWatch.Alerts;
using LoadWatch.Service.Export;

namespace LoadWatch.Service.Explain;

/// <summary>What stands beside an alert's state, in words.</summary>
internal static class AlertWords
{
    /// <summary>Behind the state; empty where it is told, or was.</summary>
    public static string Aside(Alert alert)
    {
        var shelved = alert.ShelvedUntil is { } until ? $", shelved until {Words.Date(until)}" : "";
        return alert.Watch == AlertWatch.Watched ? shelved : $"{shelved}, {Words.Of(alert.Watch).Replace('_', ' ')}";
    }
}
