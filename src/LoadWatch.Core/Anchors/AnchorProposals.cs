using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>What the sessions of 12 months say of a person's reference values. Numbers are choices where no source stands beside them.</summary>
internal static class AnchorProposals
{
    /// <summary>A best that one session alone shows may be a fault of a strap or a slip of a pen; so the second highest counts.</summary>
    private const int SessionsWanted = 2;

    private const int HeartRateSeconds = 15;
    private const double HeartRateErrorBpm = 3;

    /// <summary>A maximal power counts for so long, as <see cref="PowerCapacity"/> wants it.</summary>
    private const int PowerMaxMonths = 6;

    private const double PowerMaxError = 0.05;

    /// <summary>A sprint holds most of its best second for two; one reading among others of less is a fault of the meter.</summary>
    private const double SprintShare = 0.85;

    private const int SprintSeconds = 2;

    /// <summary>Each entry stands and falls as one.</summary>
    public static IEnumerable<IReadOnlyList<ObservedAnchor>> Of(
        Person person, EquationChoices equations, LocalDate month, IReadOnlyList<SessionBests> sessions, IReadOnlyList<ShownMaximum> maxima) =>
    [
        HeartRate(person, equations, month, sessions),
        .. SessionBests.BySport(sessions, Channel.Power).SelectMany(sport => new[] { Power(person.Id, month, sport.Key, [.. sport]), PowerMax(person.Id, month, sport.Key, [.. sport]) }),
        .. SessionBests.BySport(sessions, Channel.Speed).Select(runs => Speed(person.Id, month, [.. runs])),
        .. maxima.GroupBy(one => (one.Exercise, one.Machine)).OrderBy(same => same.Key.Exercise, StringComparer.Ordinal).ThenBy(same => same.Key.Machine, StringComparer.Ordinal)
            .Select(same => OneRepetition(person.Id, month, [.. same])),
    ];

    /// <summary>
    /// The highest heart rate held for 15 s that two sessions reached. Of those who never go to their limit it lies below the true one; so it is taken only above what age
    /// lets expect, where the birth year is known.
    /// </summary>
    private static IReadOnlyList<ObservedAnchor> HeartRate(Person person, EquationChoices equations, LocalDate month, IReadOnlyList<SessionBests> sessions)
    {
        var expected = person.AgeOn(month) is { } age ? equations.HeartRateMaxByAge.BpmAt(age, person.Sex) : null;
        var shown = sessions
            .Select(session => (session.Date, Best: session.Best(Channel.HeartRate, HeartRateSeconds)))
            .Where(one => one.Best is not null)
            .Select(one => (one.Date, Bpm: Math.Floor(one.Best!.Value)))
            .Where(one => !(one.Bpm > expected + equations.HeartRateAboveEquation))
            .OrderByDescending(one => one.Bpm).ThenByDescending(one => one.Date)
            .ToList();
        return shown.Count < SessionsWanted || shown[SessionsWanted - 1].Bpm <= expected + HeartRateErrorBpm
            ? []
            : Plausible(new ObservedAnchor(
                person.Id, AnchorKind.HeartRateMax, month, shown[SessionsWanted - 1].Bpm, HeartRateErrorBpm, shown.Take(SessionsWanted).Max(one => one.Date), "highest heart rate held for 15 s that two sessions reached"));
    }

    private static IReadOnlyList<ObservedAnchor> Power(string person, LocalDate month, string sport, IReadOnlyList<SessionBests> sessions) =>
        Fitted(person, month, TrialChoice.Of(sessions, Channel.Power), AnchorKind.CriticalPower, AnchorKind.WPrime, sport);

    private static IReadOnlyList<ObservedAnchor> Speed(string person, LocalDate month, IReadOnlyList<SessionBests> sessions) =>
        Fitted(person, month, TrialChoice.Of(sessions, Channel.Speed), AnchorKind.CriticalSpeed, AnchorKind.DPrime, sport: null);

    private static IReadOnlyList<ObservedAnchor> Fitted(string person, LocalDate month, TrialChoice choice, AnchorKind critical, AnchorKind reserve, string? sport)
    {
        if (choice.Fit is not { } fit)
        {
            return [];
        }

        var shown = choice.Trials.Max(one => one.Date);
        var done = critical == AnchorKind.CriticalPower ? "work" : "distance";
        var basis = FormattableString.Invariant(
            $"{done} on time, {choice.Trials.Count} bests of {choice.Trials[0].Trial.Seconds:0} to {choice.Trials[^1].Trial.Seconds:0} s from {choice.Trials.DistinctBy(one => one.Session).Count()} sessions");
        return Plausible(
            new ObservedAnchor(person, critical, month, fit.Critical, choice.CriticalError!.Value, shown, basis) { Sport = sport },
            new ObservedAnchor(person, reserve, month, fit.Reserve, choice.ReserveError!.Value, shown, basis) { Sport = sport });
    }

    private static IReadOnlyList<ObservedAnchor> PowerMax(string person, LocalDate month, string sport, IReadOnlyList<SessionBests> sessions)
    {
        var since = month.PlusMonths(-PowerMaxMonths);
        var best = sessions
            .Where(session => session.Date >= since && IsSprint(session))
            .Select(session => (session.Date, Watts: session.Best(Channel.Power, 1)!.Value))
            .OrderByDescending(one => one.Watts).ThenByDescending(one => one.Date)
            .ToList();
        return best.Count == 0
            ? []
            : Plausible(new ObservedAnchor(person, AnchorKind.PowerMax, month, best[0].Watts, PowerMaxError * best[0].Watts, Again(best), "highest mean power of 1 s in the 6 months before") { Sport = sport });
    }

    private static bool IsSprint(SessionBests session) => session.Best(Channel.Power, SprintSeconds) >= SprintShare * session.Best(Channel.Power, 1);

    /// <summary>The last date on which the best was reached within its error.</summary>
    private static LocalDate Again(IReadOnlyList<(LocalDate Date, double Watts)> best) => best.Where(one => one.Watts >= (1 - PowerMaxError) * best[0].Watts).Max(one => one.Date);

    private static IReadOnlyList<ObservedAnchor> OneRepetition(string person, LocalDate month, IReadOnlyList<ShownMaximum> same)
    {
        var shown = same.OrderByDescending(one => one.Kilograms).ThenByDescending(one => one.Date).DistinctBy(one => one.Date).ToList();
        if (shown.Count < SessionsWanted)
        {
            return [];
        }

        var kilograms = shown[SessionsWanted - 1].Kilograms;
        return Plausible(new ObservedAnchor(
            person,
            AnchorKind.OneRepetitionMax,
            month,
            kilograms,
            CapacityError.Estimated * kilograms,
            shown.Take(SessionsWanted).Max(one => one.Date),
            "highest maximum that the sets of two dates let expect by their repetitions")
        {
            Exercise = same[0].Exercise,
            Machine = same[0].Machine,
        });
    }

    /// <summary>Rounded; none where one of them is out of the range that its kind may have.</summary>
    private static IReadOnlyList<ObservedAnchor> Plausible(params IReadOnlyList<ObservedAnchor> anchors) =>
        anchors.All(one => one.Value >= AnchorKinds.Of(one.Kind).Lowest && one.Value <= AnchorKinds.Of(one.Kind).Highest)
            ? [.. anchors.Select(one => one with { Value = Significant.Round(one.Value), Error = Significant.Round(one.Error) })]
            : [];
}
