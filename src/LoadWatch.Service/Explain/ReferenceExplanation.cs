using System.Globalization;
using System.Text;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Service.Export;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>By which reference values the windows of a date are read (I-15).</summary>
internal static class ReferenceExplanation
{
    /// <summary>Nothing where the person's loads hang on none.</summary>
    public static void Append(StringBuilder text, Person person, Group group, AnchorBook anchors, LocalDate date)
    {
        var periods = ReferencePeriods.Of(person, group, anchors);
        var now = periods.On(date);
        foreach (var value in now.Values)
        {
            var number = value.Value is { } known ? $"{known.ToString("0.###", CultureInfo.InvariantCulture)} {AnchorKinds.Of(value.Kind).Unit}" : "unknown";
            text.AppendLine(CultureInfo.InvariantCulture, $"    reference value {AnchorKinds.Of(value.Kind).Name} = {number}, for every session of the windows of this date");
        }

        foreach (var (earlier, later) in periods.All.Zip(periods.All.Skip(1)).Where(pair => pair.Second.From <= date && pair.Second.From > date.PlusDays(-LoadCalendar.LookBackDays)))
        {
            var also = later.From > date.PlusDays(-ReferencePeriods.WindowDays) ? "; rules of load are read by the values before it, too" : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"    changed on {Words.Date(later.From)}: {ReferenceWords.Of(later.ChangesSince(earlier))}{also}");
        }
    }
}
