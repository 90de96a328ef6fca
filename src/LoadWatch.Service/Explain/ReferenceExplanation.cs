using System.Globalization;
using System.Text;
using LoadWatch.Anchors;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>By which reference values the windows of a date are read (I-15).</summary>
internal static class ReferenceExplanation
{
    /// <summary>Nothing where the person's loads hang on none.</summary>
    public static void Append(StringBuilder text, Person person, Group group, TableBasis basis, LocalDate date)
    {
        var anchors = basis.AnchorsOf(person);
        var periods = ReferencePeriods.Of(person, group, anchors);
        var now = periods.On(date);
        foreach (var value in now.Values)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    for every session of the windows of this date: {Stated(value, now, person, anchors)}");
        }

        foreach (var (earlier, later) in periods.All.Zip(periods.All.Skip(1)).Where(pair => pair.Second.From <= date && pair.Second.From > date.PlusDays(-LoadCalendar.LookBackDays)))
        {
            var also = later.From > date.PlusDays(-ReferencePeriods.WindowDays) ? "; rules of load are read by the values before it, too" : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"    changed on {Words.Date(later.From)}: {ReferenceWords.Of(later.ChangesSince(earlier))}{also}");
        }
    }

    private static string Stated(ReferenceValue value, ReferencePeriod period, Person person, AnchorBook anchors)
    {
        var on = value.Kind == AnchorKind.SpeedMax ? period.ValuesOn : period.HeartRateOn;
        return anchors.On(on, person.Id, value.Kind) is { } anchor ? AnchorText.Of(anchor)
            : value is { Kind: AnchorKind.HeartRateMax, Value: not null } && AnchorText.ByAge(person, on, anchors.HeartRateMaxEquation) is { } byAge ? byAge
            : $"{AnchorText.Name(value.Kind)} unknown";
    }

    /// <summary>What the person's own sessions tell on a date: used where nothing was measured, shown where it contradicts what was.</summary>
    public static void AppendObserved(StringBuilder text, Person person, TableBasis basis, LocalDate date)
    {
        var (observed, stated) = (basis.ObservedOf(person), basis.StatedOf(person));
        foreach (var one in observed.Where(one => one.From <= date).GroupBy(one => one.Of).Select(same => same.MaxBy(one => one.From)!))
        {
            var use = stated.MeasuredOn(date, one.ToAnchor()) is null ? "used" : "not used, one is measured";
            text.AppendLine(
                CultureInfo.InvariantCulture,
                $"    from own sessions {AnchorText.Name(one.Kind, one.Sport, one.Exercise, one.Machine)} = {one.Value:0.###} {AnchorKinds.Of(one.Kind).Unit} (within {one.Error:0.###}) from {Words.Date(one.From)} on, {use}: {OneLine.Of(one.Basis)}{AnchorText.Age(one, date)}");
        }

        AppendContradictions(text, date, observed, stated);
    }

    public static void AppendContradictions(StringBuilder text, LocalDate date, IEnumerable<ObservedAnchor> observed, AnchorBook stated)
    {
        foreach (var contradiction in AnchorContradiction.On(date, observed, stated))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {OneLine.Of(contradiction.Words)}");
        }
    }
}
