using LoadWatch.Alerts;

namespace LoadWatch.Notices;

/// <summary>
/// Who had a standing alert, seen or not, when a notice was decided: ids, one a line, sorted. Kept with the notice to tell a change later.
/// </summary>
public static class FlaggedList
{
    /// <param name="alerts">Of the contact's people. What somebody has seen still stands, so acknowledging changes no list; what is shelved or suppressed is not told.</param>
    public static string Of(IEnumerable<Alert> alerts) => string.Join(
        '\n',
        alerts
            .Where(alert => alert.IsTold)
            .Select(alert => alert.Key.Person)
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal));

    /// <summary>
    /// The change in one sentence without names:
    /// <c>Since the morning brief 2 people came onto the list and 1 person left the list.</c>
    /// </summary>
    public static string ChangeInWords(string told, string now)
    {
        var before = Ids(told);
        var after = Ids(now);
        var parts = new[]
        {
            Part(after.Except(before, StringComparer.Ordinal).Count(), "came onto the list"),
            Part(before.Except(after, StringComparer.Ordinal).Count(), "left the list"),
        };
        return $"Since the morning brief {string.Join(" and ", parts.OfType<string>())}.";
    }

    private static string[] Ids(string list) => list.Split('\n', StringSplitOptions.RemoveEmptyEntries);

    private static string? Part(int count, string verb) => count switch
    {
        0 => null,
        1 => $"1 person {verb}",
        _ => $"{count} people {verb}",
    };
}
