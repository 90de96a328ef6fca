using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Limits;
using LoadWatch.People;
using LoadWatch.Plans;

namespace LoadWatch.Notices;

/// <summary>What a brief is built from for one person.</summary>
/// <param name="Group">The person's group.</param>
/// <param name="Days">
/// Unbroken days up to the evaluation date, oldest first: the last <see cref="BriefDays.Usual"/>, and as many more as <see cref="BriefDays"/> asks for.
/// </param>
/// <param name="Alerts">Every alert that is not normal, and those that became normal or returned since the contact's last brief.</param>
/// <param name="Remarks">Why something could not be computed lately, in plain words.</param>
public sealed record BriefSubject(
    Person Person,
    Group Group,
    IReadOnlyList<Day> Days,
    IReadOnlyList<AlertNews> Alerts,
    IReadOnlyList<string> Remarks)
{
    /// <summary>Notes of the last date that are to be told.</summary>
    public IReadOnlyList<Finding> Notes { get; init; } = [];

    /// <summary>What would hold on the last date if plan or answers did not turn its rule off.</summary>
    public IReadOnlyList<Finding> Suppressed { get; init; } = [];

    /// <summary>The inbox by which the person's recordings come cannot be looked into: nobody is named for what may lie in it.</summary>
    public bool InboxIsAway { get; init; }

    /// <summary>Lines of the plan that cover the brief's date.</summary>
    public IReadOnlyList<PlanEntry> Planned { get; init; } = [];

    /// <summary>What plan and answers say of the brief's date; null where it was not asked for.</summary>
    public DayPlan? Today { get; init; }

    /// <summary>What the limits leave open on the date behind the last day; null where it is not known yet.</summary>
    public TodaysRoom? Room { get; init; }
}

/// <summary>An alert as a contact meets it.</summary>
/// <param name="IsNew">Raised, raised again or risen since the contact's last brief.</param>
/// <param name="ReturnedSince">It returned since the contact's last brief.</param>
/// <param name="Corrected">It returned because later data undid it.</param>
public sealed record AlertNews(Alert Alert, bool IsNew, bool ReturnedSince, bool Corrected)
{
    /// <summary>Why it is over, where the limits of its rule were changed or its rule is no longer watched; null: it returned, or see <see cref="Corrected"/>.</summary>
    public AlertChangeReason? Ended { get; init; }
}
