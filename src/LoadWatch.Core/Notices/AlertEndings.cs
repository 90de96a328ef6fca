using LoadWatch.Alerts;

namespace LoadWatch.Notices;

/// <summary>How a brief tells that an alert is over although nothing in the training was.</summary>
internal static class AlertEndings
{
    /// <summary>Behind the name of what it was about; null where it returned or was corrected.</summary>
    public static string? Of(AlertNews news) => news.Ended switch
    {
        AlertChangeReason.RuleSwitchedOff => "not watched any more, the rule is switched off",
        AlertChangeReason.LimitsChanged => "over by limits that were changed",
        _ => null,
    };
}
