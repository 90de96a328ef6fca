using LoadWatch.Findings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>One contact's morning page as values, before it becomes text or HTML.</summary>
public sealed record Brief
{
    public required string ContactId { get; init; }

    public required string ContactName { get; init; }

    /// <summary>The contact's local date on which it is due.</summary>
    public required LocalDate Date { get; init; }

    /// <summary>The last date that the brief looks at; null when nobody has a day yet.</summary>
    public LocalDate? DataUpTo { get; init; }

    /// <summary>Readable in five seconds, without names.</summary>
    public required string FirstLine { get; init; }

    /// <summary>At most ten people to act on, warnings first, then by name.</summary>
    public required IReadOnlyList<FlaggedPerson> Flagged { get; init; }

    /// <summary>Flagged people beyond those ten, count.</summary>
    public required int FlaggedBeyond { get; init; }

    /// <summary>Alerts that returned since the contact's last brief.</summary>
    public required IReadOnlyList<BriefLine> Returned { get; init; }

    /// <summary>Limits that only a changed reference value makes break: told, and no alert (I-15).</summary>
    public IReadOnlyList<BriefLine> Changed { get; init; } = [];

    /// <summary>Files held or refused and other things that need an answer.</summary>
    public required IReadOnlyList<BriefLine> Questions { get; init; }

    public required IReadOnlyList<BriefGroup> Groups { get; init; }

    /// <summary>The week; null where it is not told.</summary>
    public BriefWeek? Week { get; init; }

    /// <summary>Whom to call; null where the contact is not asked to.</summary>
    public CallList? Calls { get; init; }

    /// <summary>Today's sessions, one sheet each.</summary>
    public IReadOnlyList<ClassSheet> Sheets { get; init; } = [];

    /// <summary>Nobody of the brief has a known day: quiet is not said.</summary>
    public bool NothingIsKnown { get; init; }

    /// <summary>The first line counts people without a known day in the last week: quiet is not said.</summary>
    public bool SomeAreUnknown { get; init; }

    /// <summary>Ids of everybody whom it may name.</summary>
    public IReadOnlyList<string> People { get; init; } = [];
}

/// <summary>One person to act on.</summary>
public sealed record FlaggedPerson(string PersonId, string Name, Severity Severity, IReadOnlyList<FlaggedReason> Reasons)
{
    /// <summary>The last 56 days; null where no picture is wanted.</summary>
    public PersonPicture? Picture { get; init; }

    /// <summary>One sentence, the gravest reason first: what, since when, against the usual, what else, what to consider, by when, who decides.</summary>
    public string Sentence => $"{What}; consider {Consider}; {(When.Length == 0 ? "" : $"when: {When}; ")}decides: {Decides}.";

    /// <summary>The first part of the sentence, without a full stop.</summary>
    public string What => PersonSentence.What(this);

    /// <summary>What to consider about the gravest reason, without a full stop.</summary>
    public string Consider => PersonSentence.Part(Reasons[0].Consider);

    /// <summary>Within which time the gravest reason wants a look, without a full stop; may be empty.</summary>
    public string When => PersonSentence.Lowered(PersonSentence.Part(Reasons[0].TimeToRespond));

    /// <summary>Everybody named as deciding over one of the reasons, once.</summary>
    public string Decides => string.Join("; ", PersonSentence.WithoutBeginnings([.. Reasons.Select(reason => PersonSentence.Part(reason.Decides)).Distinct(StringComparer.Ordinal)]));

    /// <summary><c>new</c>, or since when the gravest reason stands.</summary>
    public string Since => PersonSentence.Since(Reasons[0]);
}

/// <summary>One alert of a flagged person.</summary>
/// <param name="Sentence">What, since when, against the usual.</param>
/// <param name="Consider">What to consider.</param>
/// <param name="Decides">Who decides.</param>
/// <param name="IsNew">Not told in an earlier brief.</param>
/// <param name="IsSeen">Somebody acknowledged it.</param>
public sealed record FlaggedReason(
    string AlertId,
    string Rule,
    BodyRegion? Region,
    Severity Severity,
    string Sentence,
    string Consider,
    string Decides,
    bool IsNew,
    bool IsSeen)
{
    /// <summary>The thing itself: <c>load well above the usual</c>; empty where only the sentence says it.</summary>
    public string Named { get; init; } = "";

    /// <summary>Within which time a look makes a difference; empty where that is not told.</summary>
    public string TimeToRespond { get; init; } = "";

    /// <summary>The date on which it was raised last; null where that is not told.</summary>
    public LocalDate? StandsSince { get; init; }
}

/// <summary>One line about somebody or something.</summary>
/// <param name="Subject">A name, or a file name.</param>
/// <param name="OfDelivery">It tells of a notice that did not reach its reader.</param>
public sealed record BriefLine(string Subject, string Sentence, bool OfDelivery = false);

/// <summary>One group in a compact table, sorted by name.</summary>
public sealed record BriefGroup(string Id, string Name, string LoadUnit, IReadOnlyList<BriefRow> Rows)
{
    /// <summary>What no rule looks at, and why, a sentence each: quiet there is not all well.</summary>
    public IReadOnlyList<string> NotWatched { get; init; } = [];
}

/// <summary>One person in the group's table. Unknown is null.</summary>
/// <param name="LastRecorded">Date of the last recording.</param>
/// <param name="WeekLoad">Load of the known ones of the last 7 days, in the group's unit: of a week that is not known whole, so far. Null when none is known.</param>
/// <param name="UsualWeekLoad">Mean week of the 21 days before.</param>
/// <param name="Ratio">The uncoupled ratio of the two; null unless all 7 days are known.</param>
/// <param name="KnownDays">Days with known load among the last 7.</param>
/// <param name="DaysSinceHeavyLegs">
/// Days since the last heavy-or-fast day of the legs; null where unknown or where none was ever seen, which the remark says.
/// </param>
/// <param name="HeavyLegsDays28">Heavy-or-fast days of the legs among the last 28.</param>
/// <param name="Recent">The last 28 days, oldest first.</param>
/// <param name="Remark">Why a number is missing, in plain words, or null.</param>
public sealed record BriefRow(
    string PersonId,
    string Name,
    bool Flagged,
    LocalDate? LastRecorded,
    double? WeekLoad,
    double? UsualWeekLoad,
    double? Ratio,
    int KnownDays,
    int? DaysSinceHeavyLegs,
    int? HeavyLegsDays28,
    IReadOnlyList<BriefDay> Recent,
    string? Remark);

/// <summary>One day of a strip or picture.</summary>
/// <param name="Known">False where nothing is known.</param>
/// <param name="Load">In the group's unit; null where unknown or not computable.</param>
/// <param name="HeavyLegs">Heavy or fast work of the legs; null where unknown.</param>
public sealed record BriefDay(LocalDate Date, bool Known, double? Load, bool? HeavyLegs);
