using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Limits;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>A person's row in the group's table.</summary>
internal static class BriefRows
{
    /// <summary>Days in the strip beside a name.</summary>
    public const int StripDays = 28;

    private const int WeekDays = 7;
    private const int RemarksShown = 2;

    /// <summary>Recorded days from which on, and up to which, a region that no channel sees is told. A choice.</summary>
    internal const int UnseenFrom = 5;

    private const int UnseenTo = 10;

    /// <summary>The last days before a recording comes in are ordinary.</summary>
    private const int TailDays = 5;

    /// <param name="view">What the reader may be told of somebody's health.</param>
    /// <param name="upTo">The last date of the brief; dates without a day are unknown.</param>
    public static BriefRow Of(BriefSubject subject, LocalDate upTo, RoleView view, bool self)
    {
        var days = subject.Days.ToDictionary(day => day.Date);
        var today = days.GetValueOrDefault(upTo);
        var legs = today?.Regions.GetValueOrDefault(BodyRegion.Legs);
        var known = Enumerable.Range(0, WeekDays).Count(back => days.GetValueOrDefault(upTo.PlusDays(-back))?.Load is not null);
        var back = ReturnPhase.Of(subject, today);
        return new BriefRow(
            subject.Person.Id,
            BriefBuilder.NameOf(subject.Person, self),
            BriefBuilder.ToLookAt(subject),
            PersonNotes.LastRecorded(subject),
            SoFar(days, upTo),
            back is null ? today?.ChronicBefore : back.UsualWeek,
            back is null && known == WeekDays ? today?.RatioUncoupled : null,
            known,
            EverHeavy(days, upTo, legs) ? legs?.DaysSince : null,
            legs?.Days28,
            [.. Enumerable.Range(1 - StripDays, StripDays).Select(offset => DayOf(days, upTo.PlusDays(offset)))],
            Remark(subject, [.. Absent(days, upTo, view), .. RoomOf(subject, upTo, self), .. Own(subject, upTo, today, back, known, NeverHeavy(days, upTo, legs))]));
    }

    /// <summary>A date without a day is unknown.</summary>
    public static BriefDay DayOf(Dictionary<LocalDate, Day> days, LocalDate date)
    {
        var day = days.GetValueOrDefault(date);
        return new BriefDay(
            date,
            day is not null && day.State != DayState.Unknown,
            day?.Load,
            day?.Regions.GetValueOrDefault(BodyRegion.Legs)?.HeavyOrFast);
    }

    /// <summary>Load of the known days of the last 7, not scaled up: a week with an open end is told as it stands. Null when none is known.</summary>
    public static double? SoFar(Dictionary<LocalDate, Day> days, LocalDate upTo)
    {
        var loads = Enumerable.Range(0, WeekDays).Select(back => days.GetValueOrDefault(upTo.PlusDays(-back))?.Load).OfType<double>().ToList();
        return loads.Count == 0 ? null : Significant.Round(loads.Sum());
    }

    private static bool EverHeavy(Dictionary<LocalDate, Day> days, LocalDate upTo, RegionDay? legs) =>
        legs?.DaysSince is not null && NeverHeavy(days, upTo, legs) is null;

    /// <summary>Days without any, where the count began at the first covered day instead of at a heavy-or-fast one; else null.</summary>
    private static int? NeverHeavy(Dictionary<LocalDate, Day> days, LocalDate upTo, RegionDay? legs)
    {
        if (legs is { Never: true, DaysSince: { } all })
        {
            return all;
        }

        if (legs?.DaysSince is not { } since || !days.TryGetValue(upTo.PlusDays(-since), out var start))
        {
            return null;
        }

        return start.Regions.GetValueOrDefault(BodyRegion.Legs)?.HeavyOrFast == true ? null : since;
    }

    private static string? Remark(BriefSubject subject, IReadOnlyList<string> own)
    {
        var given = subject.Remarks.Select(OneLine.Of).Where(remark => remark.Length > 0).Distinct(StringComparer.Ordinal).ToList();
        var all = own
            .Concat(given.Take(RemarksShown))
            .Concat(given.Count > RemarksShown ? [$"{given.Count - RemarksShown} more of the kind"] : Array.Empty<string>());
        var remark = string.Join("; ", all);
        return remark.Length == 0 ? null : remark;
    }

    /// <summary>Told to whoever reads about themselves, where there is a figure.</summary>
    private static IEnumerable<string> RoomOf(BriefSubject subject, LocalDate upTo, bool self)
    {
        if (self && subject.Room is { Load: not null } room && room.Date == upTo.PlusDays(1))
        {
            yield return RoomWords.WithMeaning(room);
        }
    }

    /// <summary><c>away since 2 March</c>.</summary>
    private static IEnumerable<string> Absent(Dictionary<LocalDate, Day> days, LocalDate upTo, RoleView view)
    {
        if (days.GetValueOrDefault(upTo)?.Plan.Absence is not { } absence)
        {
            yield break;
        }

        var since = upTo;
        while (view.TellsTheSame(days.GetValueOrDefault(since.PlusDays(-1))?.Plan.Absence, absence))
        {
            since = since.PlusDays(-1);
        }

        yield return $"{view.Word(absence)} since {since.ToString("d MMMM", CultureInfo.InvariantCulture)}";
    }

    /// <summary>Told while a record is young, then no more: a person with heart rate alone is not reminded of it every morning.</summary>
    internal static bool IsFirstUnseen(BriefSubject subject, Day? today) =>
        today?.Regions.GetValueOrDefault(BodyRegion.Legs, RegionDay.NotCovered).DaysSince is null
        && subject.Days.Count(day => day.State == DayState.Recorded) is >= UnseenFrom and <= UnseenTo
        && (subject.Days.Count < BriefDays.Usual || subject.Days[0].DaysSinceRecorded is null);

    private static bool IsHeldBack(AlertNews news) => news.Alert.Watch == AlertWatch.SuppressedByDesign && AlertLife.IsActive(news.Alert.State);

    private static IEnumerable<string> Own(BriefSubject subject, LocalDate upTo, Day? today, ReturnPhase? back, int knownOf7, int? neverHeavyDays)
    {
        if (back is not null)
        {
            yield return back.Remark;
        }

        foreach (var news in BriefBuilder.ToLookAt(subject) ? [] : BriefBuilder.Active(subject))
        {
            yield return $"seen before and still standing: {RuleTexts.Named(news.Alert.Key, self: false)}";
        }

        foreach (var news in subject.Alerts.Where(news => AlertLife.IsActive(news.Alert.State) && news.Alert.ShelvedUntil is not null).OrderBy(news => news.Alert.Id, StringComparer.Ordinal))
        {
            yield return $"shelved until {BriefNumbers.Day(news.Alert.ShelvedUntil)}: {RuleTexts.Named(news.Alert.Key, self: false)}";
        }

        foreach (var news in subject.Alerts.Where(IsHeldBack).OrderBy(news => news.Alert.Id, StringComparer.Ordinal))
        {
            yield return $"not watched for now by plan or answers: {RuleTexts.Named(news.Alert.Key, self: false)}";
        }

        var suppressed = subject.Suppressed.Where(finding => !subject.Alerts.Any(news => news.Alert.Key == finding.Key)).OrderBy(finding => RuleTexts.Order(finding.Rule)).ToList();
        foreach (var finding in suppressed.Take(RemarksShown))
        {
            yield return RuleTexts.Quiet(finding.Key, QuietReason.SuppressedByPlan, today?.Plan ?? DayPlan.None, self: false);
        }

        if (suppressed.Count > RemarksShown)
        {
            yield return $"{suppressed.Count - RemarksShown} more not watched for now, explain tells";
        }

        if (PersonNotes.LastRecorded(subject) is null)
        {
            yield return "nothing recorded yet";
            yield break;
        }

        if (subject.Days.LastOrDefault(day => PlannedPresence.IsNotInYet(subject, day, upTo)) is { } waited)
        {
            yield return $"recording of {BriefNumbers.Day(waited.Date)} not in yet";
        }

        if (today?.Acute is null)
        {
            yield return $"load known on {knownOf7} of the last 7 days, 5 wanted";
        }

        if (today?.ChronicBefore is null && back is null)
        {
            yield return "too few known days for a usual week";
        }

        if (IsFirstUnseen(subject, today))
        {
            yield return "leg work cannot be seen so far: logged sets, or power with critical_power, would tell";
        }

        if (neverHeavyDays is { } days)
        {
            yield return $"no heavy or fast leg work seen in {days + 1} days on record";
        }
        else if (today?.Regions.GetValueOrDefault(BodyRegion.Legs) is { DaysSince: >= TailDays and { } since } legs
            && !subject.Group.Limits.StimulusGap.KnownEnough(legs.KnownDaysSince, since))
        {
            yield return $"leg work known on {legs.KnownDaysSince} of the {since} days since the last heavy or fast one";
        }
    }
}
