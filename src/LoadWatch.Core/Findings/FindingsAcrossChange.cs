using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// What rules of load find while a changed reference value lies in the window (I-15). Both readings take every session by one set of values: those of the date, and
/// those before the change. What holds by both is a finding. What holds by the new values alone is a note. What holds by the former values alone stays a finding where it stood
/// before the change, else it is none. Where nothing is known by the former values the new ones speak alone.
/// </summary>
/// <param name="changes">Former values and those of the date.</param>
/// <param name="since">The first change that lies in the window.</param>
/// <param name="formerIsSilent">Whether, on a date and by a quantity (null: the group's load), the former values leave unknown what the new ones tell.</param>
public sealed class FindingsAcrossChange(IReadOnlyList<ReferenceChange> changes, LocalDate since, Func<LocalDate, string?, bool> formerIsSilent)
{
    /// <summary>Begins what a note and a kept finding say of the change.</summary>
    public const string Words = "Reference value changed";

    /// <param name="now">Of all rules, by the values of each date.</param>
    /// <param name="former">Of the rules of load, by the former values.</param>
    public IReadOnlyList<Finding> Judge(IReadOnlyList<Finding> now, IReadOnlyList<Finding> former)
    {
        var before = former.Where(IsWatched).ToDictionary(finding => (finding.Date, finding.Key));
        var names = RuleBook.OfLoad.Select(rule => rule.Name).ToHashSet(StringComparer.Ordinal);
        var judged = now.Select(finding => names.Contains(finding.Rule) && IsWatched(finding) ? Judge(finding, before.GetValueOrDefault((finding.Date, finding.Key))) : finding);
        var held = now.Select(finding => (finding.Date, finding.Key)).ToHashSet();
        var kept = former.Where(finding => IsWatched(finding) && finding.Since < since && !held.Contains((finding.Date, finding.Key))).Select(Kept);
        return RuleBook.InOrder(judged.Concat(kept));
    }

    /// <summary>What plan or answers suppress is no alert by any value.</summary>
    private static bool IsWatched(Finding finding) => finding.Severity != Severity.Suppressed;

    private Finding Judge(Finding now, Finding? former)
    {
        if (former is null)
        {
            return formerIsSilent(now.Date, now.Quantity) ? WithChanges(now) : Note(now);
        }

        // A change alone makes nothing graver; nor milder what stood before it.
        var severity = former.Since < since || former.Severity < now.Severity ? former.Severity : now.Severity;
        return WithChanges(severity == now.Severity ? now : former with { Text = $"{former.Text} {Sentence(former.Date)}; told by the value before." });
    }

    private Finding Note(Finding finding) => WithChanges(finding) with
    {
        Severity = Severity.Note,
        Text = $"{finding.Text} {Sentence(finding.Date)}; by the value before, the limit is not passed, so no alert.",
    };

    private Finding Kept(Finding finding) => WithChanges(finding) with
    {
        Text = $"{finding.Text} {Sentence(finding.Date)}; this is by the value before, by the new one it would be over.",
    };

    private string Sentence(LocalDate told) => $"{Words} on {Wording.Date(since, told)}: {ReferenceWords.Of(changes)}";

    private Finding WithChanges(Finding finding) => finding with
    {
        Evidence = finding.Evidence with
        {
            Inputs =
            [
                .. finding.Evidence.Inputs,
                .. changes.SelectMany(change => new EvidenceItem[]
                {
                    new($"{change.Name}_before", change.Before, change.Unit, $"up to {Wording.IsoDate(since.PlusDays(-1))}"),
                    new(change.Name, change.Now, change.Unit, $"on {Wording.IsoDate(finding.Date)}; the window is read by each of the two"),
                }),
            ],
        },
    };
}
