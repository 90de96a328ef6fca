using LoadWatch.People;

namespace LoadWatch.Notices;

/// <summary>
/// A brief as it may leave the machine: with full names, with initials, or with counts only (I-12). Pure; page and notice file hold the brief itself.
/// </summary>
public static class MailNames
{
    /// <param name="people">Everybody whose name may turn up: the roster, also those whom the brief is not about.</param>
    public static Brief Of(Brief brief, NamesShown shown, IEnumerable<Person> people) => shown switch
    {
        NamesShown.Full => brief,
        NamesShown.Initials => new InitialledBrief(brief, [.. people]).Write(),
        NamesShown.None => CountsOnly(brief),
        _ => throw new ArgumentOutOfRangeException(nameof(shown)),
    };

    private static Brief CountsOnly(Brief brief) => brief with
    {
        ContactName = InitialledBrief.You,
        FirstLine = $"{brief.FirstLine} {(brief.Returned.Count > 0 ? $"No longer to look at: {brief.Returned.Count}. " : "")}The page has the rest.",
        Flagged = [],
        FlaggedBeyond = 0,
        Returned = [],
        Changed = [],
        Questions = [],
        Groups = [],
        Week = null,
        Calls = null,
        Sheets = [],
        People = [],
    };
}
