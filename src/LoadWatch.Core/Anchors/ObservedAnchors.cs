// A month's values rest on the 12 months before it, and on nothing else: on best means and on sets, which no reference value bears on. So none depends on another or on
// itself, sessions computed again by an adopted value show the same bests, and neither the order of files nor that of months computed matters.
// A value is adopted for a month where there is none yet, or where it lies further from the adopted one than its error; else the adopted one goes on.
using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>Reference values of a person from own data, month by month.</summary>
public static class ObservedAnchors
{
    /// <summary>Sessions this long before a month count for it.</summary>
    public const int Months = 12;

    /// <summary>The first of the month of a date.</summary>
    public static LocalDate MonthOf(LocalDate date) => date.PlusDays(1 - date.Day);

    /// <summary>The first month that a session of a date bears on.</summary>
    public static LocalDate MonthBehind(LocalDate date) => MonthOf(date).PlusMonths(1);

    /// <summary>What is adopted from one month through another, in the order of months and kinds.</summary>
    /// <param name="equations">What age lets expect of a maximal heart rate, and how far above it one may lie.</param>
    /// <param name="sessions">Of the person, in any order; those of 12 months before the first month and on.</param>
    /// <param name="maxima">Likewise.</param>
    /// <param name="standing">Adopted for earlier months.</param>
    public static IReadOnlyList<ObservedAnchor> Of(
        Person person,
        EquationChoices equations,
        IReadOnlyCollection<SessionBests> sessions,
        IReadOnlyCollection<ShownMaximum> maxima,
        IEnumerable<ObservedAnchor> standing,
        LocalDate first,
        LocalDate last)
    {
        var holding = standing.Where(one => one.From < first).OrderBy(one => one.From).GroupBy(one => one.Of).ToDictionary(same => same.Key, same => same.Last());
        var adopted = new List<ObservedAnchor>();
        for (var month = MonthOf(first); month <= last; month = month.PlusMonths(1))
        {
            var since = month.PlusMonths(-Months);
            var proposals = AnchorProposals.Of(
                person, equations, month, [.. sessions.Where(one => one.Date >= since && one.Date < month)], [.. maxima.Where(one => one.Date >= since && one.Date < month)]);
            foreach (var one in proposals.Where(proposal => proposal.Count > 0).SelectMany(proposal => Adopted(proposal, holding)))
            {
                holding[one.Of] = one;
                adopted.Add(one);
            }
        }

        return adopted;
    }

    /// <summary>Values of one fit are adopted together: the critical power of one and the W' of another say nothing.</summary>
    private static IReadOnlyList<ObservedAnchor> Adopted(IReadOnlyList<ObservedAnchor> proposal, Dictionary<AnchorOf, ObservedAnchor> holding)
    {
        if (proposal.Any(one => !holding.TryGetValue(one.Of, out var held) || Math.Abs(one.Value - held.Value) > one.Error))
        {
            return proposal;
        }

        // A maximal power counts for some months after it was shown, so it matters that it was shown again.
        return proposal is [{ Kind: AnchorKind.PowerMax } again] && holding[again.Of] is var shown && again.ShownOn > shown.ShownOn
            ? [shown with { From = again.From, ShownOn = again.ShownOn }]
            : [];
    }
}
