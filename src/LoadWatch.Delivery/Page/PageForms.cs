using LoadWatch.Notices;

namespace LoadWatch.Delivery.Page;

/// <summary>One session of today, a sheet of paper.</summary>
/// <param name="Count"><c>16 people</c>.</param>
internal sealed record PageSheet(string Heading, string Count, IReadOnlyList<PageSheetRow> Rows)
{
    public static PageSheet Of(ClassSheet sheet) => new(
        OneLine.Of(sheet.Heading),
        sheet.People.Count == 1 ? "1 person" : $"{sheet.People.Count} people",
        [.. sheet.People.Select(PageSheetRow.Of)]);
}

internal sealed record PageSheetRow(string Name, string Note, bool Away)
{
    public static PageSheetRow Of(ClassPerson person) => new(
        OneLine.Of(person.Name),
        OneLine.Of(string.Join(' ', new[] { person.Note, person.Room }.OfType<string>())),
        person.IsAway);
}

/// <summary>Whom to call, a sheet of paper.</summary>
internal sealed record PageCalls(IReadOnlyList<PageCall> Calls, string? More)
{
    /// <summary>Null where nobody is to be called.</summary>
    public static PageCalls? Of(CallList? list) => list is null || list.Calls.Count == 0
        ? null
        : new PageCalls([.. list.Calls.Select(PageCall.Of)], list.Beyond == 0 ? null : BriefText.More(list.Beyond));
}

internal sealed record PageCall(string Name, string Last, string Why)
{
    public static PageCall Of(Call call) => new(OneLine.Of(call.Name), call.LastSeen is { } seen ? BriefNumbers.Day(seen) : "never", OneLine.Of(call.Why));
}

/// <summary>The week of the groups.</summary>
internal sealed record PageWeek(
    string Dates, IReadOnlyList<WeekOfGroup> Groups, IReadOnlyList<BriefLine> Standing, string? StandingMore, IReadOnlyList<BriefLine> Lost, string? LostMore)
{
    public static PageWeek? Of(BriefWeek? week) => week is null
        ? null
        : new PageWeek(
            $"{BriefText.DateInWords(week.From)} to {BriefText.DateInWords(week.To)}",
            [.. week.Groups.Select(group => new WeekOfGroup(OneLine.Of(group.Name), [.. group.Sentences.Select(OneLine.Of)]))],
            [.. week.Standing.Select(PageModel.Clean)],
            week.StandingBeyond == 0 ? null : BriefText.More(week.StandingBeyond),
            [.. week.Lost.Select(PageModel.Clean)],
            week.LostBeyond == 0 ? null : BriefText.More(week.LostBeyond));
}
