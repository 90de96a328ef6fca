using System.Globalization;
using System.Text;
using LoadWatch.Anchors;
using LoadWatch.Capacity;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>The bests behind critical power, or speed, of own sessions with all regressions through them beside each other, or why they tell none.</summary>
internal static class TrialText
{
    private const string Sources = "Monod and Scherrer 1965, Ergonomics 8:329-338; Moritani et al. 1981, Ergonomics 24:339-350; three parameters: Morton 1996, Ergonomics 39:611-619";

    private const string SpeedAsRecorded = "; speed as it was recorded, slopes not reckoned in: bests downhill raise the line, hilly routes lower it";

    /// <summary>Of the months whose values stand, and of the month of the date; nothing of a kind that no such line tells.</summary>
    /// <param name="observed">Of the person and the kind.</param>
    public static void Append(StringBuilder text, StoreSession session, Person person, AnchorKind kind, IReadOnlyList<ObservedAnchor> observed, LocalDate on)
    {
        if (QuantityOf(kind) is not { } quantity || on == LocalDate.MinIsoValue)
        {
            return;
        }

        var month = ObservedAnchors.MonthOf(on);
        var standing = observed.Where(one => one.From <= on).GroupBy(one => one.Sport).Select(same => same.MaxBy(one => one.From)!).ToList();
        var months = standing.Select(one => one.From).Append(month).Distinct().Order().ToDictionary(from => from, from => ChoicesOf(session, person.Id, quantity.Channel, from));
        var sports = months.Values.SelectMany(of => of.Keys).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal).ToList();
        foreach (var sport in sports)
        {
            var earlier = standing.Find(one => (one.Sport ?? sport) == sport && one.From < month)?.From;
            var behind = earlier is { } from ? months[from].GetValueOrDefault(sport) : null;
            if (behind is not null)
            {
                AppendMonth(text, quantity, sport, earlier!.Value, behind);
            }

            AppendNow(text, quantity, sport, month, months[month].GetValueOrDefault(sport), behind);
            if (earlier is { } since)
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"        so the value of {Words.Date(since)} goes on: another has to lie beyond its error");
            }
        }

        text.AppendLine(CultureInfo.InvariantCulture, $"    {(sports.Count == 0 ? $"no session of the {ObservedAnchors.Months} months before {Words.Date(month)} may tell it: {Wanted(quantity.Channel)}" : $"lines after {Sources}{(quantity.Channel == Channel.Speed ? SpeedAsRecorded : "")}")}");
    }

    private static CriticalQuantity? QuantityOf(AnchorKind kind) => kind switch
    {
        AnchorKind.CriticalPower or AnchorKind.WPrime => CriticalQuantity.Power,
        AnchorKind.CriticalSpeed or AnchorKind.DPrime => CriticalQuantity.Speed,
        _ => null,
    };

    private static Dictionary<string, TrialChoice> ChoicesOf(StoreSession session, string person, Channel channel, LocalDate month) => SessionBests
        .BySport(session.Activities.Bests(person, month.PlusMonths(-ObservedAnchors.Months), month.PlusDays(-1)), channel)
        .ToDictionary(sport => sport.Key, sport => TrialChoice.Of([.. sport], channel), StringComparer.Ordinal);

    private static string Wanted(Channel channel) => channel == Channel.Power
        ? "wanted is power with unbroken stretches of 2 minutes and more, not on foot and of no motor"
        : "wanted is speed on foot with unbroken stretches of 2 minutes and more";

    private static void AppendNow(StringBuilder text, CriticalQuantity quantity, string sport, LocalDate month, TrialChoice? now, TrialChoice? behind)
    {
        if (now is null || (behind is not null && now.Trials.Count > 0 && now.Trials.SequenceEqual(behind.Trials)))
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {Of(sport, month)}: {(now is null ? "no session that shows it" : "the same bests")}");
        }
        else
        {
            AppendMonth(text, quantity, sport, month, now);
        }
    }

    private static string Of(string sport, LocalDate month) => $"the {ObservedAnchors.Months} months before {Words.Date(month)}, {sport.Replace('_', ' ')}";

    private static void AppendMonth(StringBuilder text, CriticalQuantity quantity, string sport, LocalDate month, TrialChoice choice)
    {
        if (choice.Fit is null)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {Of(sport, month)}: no value; {choice.Refusal}");
            return;
        }

        text.AppendLine(CultureInfo.InvariantCulture, $"    {Of(sport, month)}: {choice.Trials.Count} bests that may have been all out, from {choice.Trials.DistinctBy(one => one.Session).Count()} sessions");
        foreach (var one in choice.Trials)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"        {one.Trial.Seconds:0} s at {Number(one.Trial.Mean)} {quantity.Unit} on {Words.Date(one.Date)}, session {one.Session[..Math.Min(12, one.Session.Length)]}");
        }

        AppendRegressions(text, quantity, choice);
    }

    private static void AppendRegressions(StringBuilder text, CriticalQuantity quantity, TrialChoice choice)
    {
        var regressions = TrialRegressions.Of([.. choice.Trials.Select(one => one.Trial)]);
        var (critical, reserve, mean) = quantity.Channel == Channel.Power ? ("CP", "W'", "P") : ("CS", "D'", "v");
        Line(text, quantity, quantity.Line, regressions.WorkTime);
        Line(text, quantity, $"{(mean == "P" ? "power" : "speed")} on the inverse of time, {mean} = {critical} + {reserve} / t", regressions.InverseTime);
        Line(text, quantity, $"least squares in time, t = {reserve} / ({mean} - {critical})", regressions.Time);
        var third = $"three parameters, least squares in time, t = {reserve} / ({mean} - {critical}) + k";
        if (regressions.ThreeParameter is { } three)
        {
            Line(text, quantity, third, three.Fit, $", k {Number(three.AsymptoteSeconds)} s{Within(three.AsymptoteError, "s")}, highest {(mean == "P" ? "power" : "speed")} {Number(three.Maximum)} {quantity.Unit}{Within(three.MaximumError, quantity.Unit)}");
        }
        else
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"        {third}: none, the third parameter degenerates with these bests");
        }

        var all = regressions.All;
        text.AppendLine(
            CultureInfo.InvariantCulture,
            $"        they lie between {Number(all.Min(fit => fit.Critical))} and {Number(all.Max(fit => fit.Critical))} {quantity.Unit}, {Number(all.Min(fit => fit.Reserve))} and {Number(all.Max(fit => fit.Reserve))} {quantity.ReserveUnit}");
        text.AppendLine(
            CultureInfo.InvariantCulture,
            $"        taken: {quantity.Line.Split(',')[0]}, as the bests are chosen on its upper edge (a choice); {Number(choice.Fit!.Critical)} {quantity.Unit} within {Number(choice.CriticalError!.Value)} {quantity.Unit}, {quantity.ReserveWord} {Number(choice.Fit.Reserve)} {quantity.ReserveUnit} within {Number(choice.ReserveError!.Value)} {quantity.ReserveUnit}: its standard errors, but {TrialChoice.LeastCriticalError * 100:0} and {TrialChoice.LeastReserveError * 100:0} % at least");
    }

    private static void Line(StringBuilder text, CriticalQuantity quantity, string name, CapacityFit? fit, string rest = "") => text.AppendLine(
        CultureInfo.InvariantCulture,
        $"        {name}: {(fit is null ? "none, the squares have no least value" : $"{Number(fit.Critical)} {quantity.Unit}{Within(fit.CriticalError, quantity.Unit)}, {quantity.ReserveWord} {Number(fit.Reserve)} {quantity.ReserveUnit}{Within(fit.ReserveError, quantity.ReserveUnit)}{(fit.RSquared is { } share ? string.Create(CultureInfo.InvariantCulture, $", R2 {share:0.#####}") : "")}{rest}")}");

    /// <summary>A standard error; unknown where as many parameters are fitted as there are bests.</summary>
    private static string Within(double? error, string unit) => error is { } known ? $" (standard error {Number(known)} {unit})" : " (standard error unknown)";

    /// <summary>To four digits, and whole where larger.</summary>
    private static string Number(double value) => value.ToString(Math.Abs(value) switch { >= 1000 => "0", >= 100 => "0.#", >= 10 => "0.##", _ => "0.###" }, CultureInfo.InvariantCulture);
}
