using LoadWatch.Delivery.Pictures;
using LoadWatch.Findings;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Page;

/// <summary>What the template writes: text and shapes, already in words; it decides nothing.</summary>
internal sealed record PageModel(
    string Date,
    string? DataUpTo,
    string Contact,
    string Past,
    string FirstLine,
    string Headline,
    string? Lead,
    IReadOnlyList<PagePerson> Flagged,
    string? Beyond,
    IReadOnlyList<BriefLine> Returned,
    IReadOnlyList<BriefLine> Changed,
    IReadOnlyList<BriefLine> Questions,
    IReadOnlyList<PageGroup> Groups,
    IReadOnlyList<ReadingNote> Terms,
    IReadOnlyList<string> Cautions)
{
    public IReadOnlyList<PageSheet> Sheets { get; init; } = [];

    public PageCalls? Calls { get; init; }

    public PageWeek? Week { get; init; }

    /// <param name="pictures">Whether there are pictures; asked only where one is wanted.</param>
    public static PageModel Of(Brief brief, PictureProbe pictures)
    {
        var (headline, lead) = Split(OneLine.Of(brief.FirstLine));
        return new PageModel(
            BriefText.DateInWords(brief.Date),
            brief.DataUpTo is { } upTo ? BriefText.DateInWords(upTo) : null,
            OneLine.Of(brief.ContactName),
            PageFile.PastName(Uri.EscapeDataString(brief.ContactId)),
            OneLine.Of(brief.FirstLine),
            headline,
            lead,
            [.. brief.Flagged.Select(person => PagePerson.Of(person, pictures))],
            brief.FlaggedBeyond > 0 ? BriefText.Beyond(brief.FlaggedBeyond) : null,
            [.. brief.Returned.Select(Clean)],
            [.. brief.Changed.Select(Clean)],
            [.. brief.Questions.Select(Clean)],
            [.. brief.Groups.Select(PageGroup.Of)],
            ReadingNotes.Terms,
            ReadingNotes.Cautions)
        {
            Sheets = [.. brief.Sheets.Select(PageSheet.Of)],
            Calls = PageCalls.Of(brief.Calls),
            Week = PageWeek.Of(brief.Week),
        };
    }

    /// <summary>The first sentence stands large, the others below it.</summary>
    private static (string Headline, string? Lead) Split(string firstLine)
    {
        var end = firstLine.IndexOf(". ", StringComparison.Ordinal);
        return end < 0 ? (firstLine, null) : (firstLine[..(end + 1)], firstLine[(end + 2)..]);
    }

    internal static BriefLine Clean(BriefLine line) => new(OneLine.Of(line.Subject), OneLine.Sentence(line.Sentence));
}

/// <summary>One person to act on: the parts of one sentence.</summary>
/// <param name="Since"><c>new</c>, or since when; may be empty.</param>
/// <param name="When">Within which time it wants a look; may be empty.</param>
internal sealed record PagePerson(string Name, string Severity, string Since, string What, string Consider, string When, string Decides, PagePicture? Picture)
{
    /// <summary>What a picture would say, where none can be drawn.</summary>
    public string? PictureWords { get; init; }

    public static PagePerson Of(FlaggedPerson person, PictureProbe pictures) => new(
        OneLine.Of(person.Name),
        BriefText.SeverityWord(person.Severity),
        person.Since,
        OneLine.Of(person.What),
        OneLine.Of(person.Consider),
        OneLine.Of(person.When),
        OneLine.Of(person.Decides),
        person.Picture is { } picture && pictures.CanDraw ? new PagePicture(picture) : null)
    {
        PictureWords = person.Picture is { } told && !pictures.CanDraw ? OneLine.Of(told.Words) : null,
    };
}

internal sealed record PageGroup(string Name, string Unit, string People, IReadOnlyList<PageRow> Rows, IReadOnlyList<string> NotWatched)
{
    public static PageGroup Of(BriefGroup group) => new(
        OneLine.Of(group.Name),
        OneLine.Of(group.LoadUnit),
        group.Rows.Count == 1 ? "1 person" : $"{group.Rows.Count} people",
        [.. group.Rows.Select(row => PageRow.Of(row, group.LoadUnit))],
        [.. group.NotWatched.Select(OneLine.Sentence)]);
}

/// <summary>One row of a table; a number that is unknown is null, and the template says so.</summary>
internal sealed record PageRow(
    string Name,
    bool Flagged,
    string? Week,
    string? Usual,
    string? Times,
    string Known,
    string? LegsSince,
    string? LegsDays,
    string? Last,
    Strip Strip,
    string? Remark)
{
    public static PageRow Of(BriefRow row, string unit) => new(
        OneLine.Of(row.Name),
        row.Flagged,
        row.WeekLoad is null ? null : BriefNumbers.SoFar(row),
        row.UsualWeekLoad is null ? null : BriefNumbers.Load(row.UsualWeekLoad),
        row.Ratio is null ? null : BriefNumbers.Ratio(row.Ratio),
        BriefNumbers.Count(row.KnownDays),
        row.DaysSinceHeavyLegs is null ? null : BriefNumbers.Count(row.DaysSinceHeavyLegs),
        row.HeavyLegsDays28 is null ? null : BriefNumbers.Count(row.HeavyLegsDays28),
        row.LastRecorded is null ? null : BriefNumbers.Day(row.LastRecorded),
        Strip.Of(row, unit),
        row.Remark is null ? null : OneLine.Sentence(row.Remark));
}
