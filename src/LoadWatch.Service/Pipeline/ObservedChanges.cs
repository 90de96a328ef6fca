using LoadWatch.Anchors;
using LoadWatch.People;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Reference values from a person's own sessions that are to be stored in place of others.</summary>
/// <param name="First">First month that is replaced.</param>
/// <param name="Anchors">All from that month on.</param>
/// <param name="Spans">The dates on which sessions are computed differently by them.</param>
public sealed record ObservedChanges(string Person, LocalDate First, IReadOnlyList<ObservedAnchor> Anchors, IReadOnlyList<ObservedChange> Spans)
{
    /// <summary>A recording's local date and the date of its start in UTC are one apart at most, and a reference value is asked for on either side of midnight.</summary>
    private const int NearDays = 2;

    private static readonly Instant End = Instant.FromUtc(9999, 1, 1, 0, 0);

    /// <param name="standing">All that are stored.</param>
    /// <param name="stated">What was measured.</param>
    /// <returns>Null where nothing changes.</returns>
    public static ObservedChanges? Between(string person, LocalDate first, IReadOnlyList<ObservedAnchor> standing, IReadOnlyList<ObservedAnchor> now, AnchorBook stated)
    {
        List<ObservedAnchor> wanted = [.. standing.Where(one => one.From < first), .. now];
        return wanted.ToHashSet().SetEquals(standing)
            ? null
            : new ObservedChanges(person, first, now, [.. ObservedChange.Between(standing, wanted).Where(change => Matters(change, stated))]);
    }

    /// <summary>What is stored by then and bears on it is asked for again.</summary>
    /// <returns>Number of contents that are.</returns>
    public int Write(StoreSession session)
    {
        session.ObservedAnchors.Replace(Person, First, Anchors);
        var asked = 0;
        foreach (var span in Spans)
        {
            asked += session.Outdated.AddRecordings(Person, Near(span.From, -NearDays), span.Before is { } before ? Near(before, NearDays) : End);
            session.People.MarkDirty(Person, span.From);
        }

        return asked;
    }

    /// <summary>A measured value goes before an observed one for ever; but a maximal power counts for some months only, however it came about.</summary>
    private static bool Matters(ObservedChange change, AnchorBook stated) => change.Anchor.Kind == AnchorKind.PowerMax || stated.MeasuredOn(change.From, change.Anchor) is null;

    private static Instant Near(LocalDate date, int days) => date.PlusDays(days).AtMidnight().InUtc().ToInstant();
}
