using NodaTime;

namespace LoadWatch.People;

/// <summary>What a contact is to the people watched; decides what a brief may show.</summary>
public enum ContactRole
{
    Coach,
    Physiotherapist,
    Clinician,
    FrontDesk,
    Self,
}

/// <summary>How the people watched are named in what leaves the machine.</summary>
public enum NamesShown
{
    Full,

    /// <summary>First and last initial, with a number where two people of a brief share them.</summary>
    Initials,

    /// <summary>Nobody: counts only.</summary>
    None,
}

/// <summary>Who is told, about which groups, when.</summary>
/// <param name="Groups">Ids of the groups in the brief, in the order shown.</param>
/// <param name="People">Ids of single people in the brief, for somebody who watches only themselves; empty for whole groups.</param>
/// <param name="BriefAt">Local time of the brief.</param>
/// <param name="BriefDays">Weekdays on which it comes; all seven for daily.</param>
public sealed record Contact(
    string Id,
    string Name,
    ContactRole Role,
    IReadOnlyList<string> Groups,
    IReadOnlyList<string> People,
    DateTimeZone Zone,
    LocalTime BriefAt,
    IReadOnlySet<IsoDayOfWeek> BriefDays)
{
    /// <summary>What the brief holds; without <see cref="BriefForm.Daily"/> nobody is told of as somebody to look at.</summary>
    public IReadOnlyList<BriefForm> Forms { get; init; } = [BriefForm.Daily];

    /// <summary>Address for mail, or null for none.</summary>
    public string? Mail { get; init; }

    /// <summary>Names in the bodies of mail and webhook; page and notice file, which stay on the machine, hold them in full.</summary>
    public NamesShown Names { get; init; } = NamesShown.Full;
}
