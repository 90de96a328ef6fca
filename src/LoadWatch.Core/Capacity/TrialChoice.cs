// Which of a person's bests may stand for efforts that could have gone on no longer. Training is mostly submaximal, and any ride has a best two minutes; so:
// 1. for each duration of 2 to 20 minutes the best mean of all sessions counts (the envelope of bests);
// 2. of work, or distance, on time only what lies within 1 % of the upper hull stays: an effort below the line between two others was not all out;
// 3. the shortest corner of the hull goes as long as it is a mere piece of the next: the line through both meets time 0 at less than 5 % of what was done;
// 4. at least 3 of 3 sessions must be left, the longest 3 times as long as the shortest;
// 5. the line through them must be sure: critical value within 5 %, reserve within 25 %, both above 0; else the longest goes, since long efforts are rarely all out;
// 6. the mean of the shortest must be above that of the longest by 10 % of power, 5 % of speed: bests so alike at all durations are those of steady work, and tell no curve.
// Durations of 2 to 15, at most 30 minutes are those for which the line holds (Monod and Scherrer 1965; Moritani et al. 1981). All numbers are choices.
// Speed is taken as it was recorded, not as that on the level of the same cost: bests downhill raise the line, hilly routes lower it.
using System.Globalization;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Capacity;

/// <summary>The trials that were chosen, with the line through them, or why there are none.</summary>
/// <param name="Trials">From the shortest to the longest; empty where refused.</param>
/// <param name="Fit">Work, or distance, on time; null where refused.</param>
/// <param name="Refusal">In plain words; null where there is a fit.</param>
public sealed record TrialChoice(IReadOnlyList<ChosenTrial> Trials, CapacityFit? Fit, string? Refusal)
{
    public const int FewestTrials = 3;
    public const int FewestSessions = 3;
    public const double LongestOverShortest = 3;
    public const double CriticalWithin = 0.05;
    public const double ReserveWithin = 0.25;

    private const int ShortestSeconds = 120;
    private const int LongestSeconds = 1200;
    private const double LeastCurvePower = 0.10;
    private const double LeastCurveSpeed = 0.05;
    private const double NearHull = 0.99;
    private const double PieceShare = 0.05;

    /// <summary>Corners flatter than that are the last digits of one line.</summary>
    private const double Flat = 1e-6;

    /// <summary>However well a line fits, what is measured is no surer than that. Share of the value.</summary>
    public const double LeastCriticalError = CapacityError.Measured;

    /// <inheritdoc cref="LeastCriticalError"/>
    public const double LeastReserveError = 0.10;

    /// <summary>The shortest and the longest duration that is looked at, s.</summary>
    public static IReadOnlyList<int> Span { get; } = [ShortestSeconds, LongestSeconds];

    /// <summary>Standard error of the critical value, W or m/s, at least 2 % of it; null where refused.</summary>
    public double? CriticalError => Fit is null ? null : Math.Max(Fit.CriticalError!.Value, LeastCriticalError * Fit.Critical);

    /// <summary>Standard error of the reserve, J or m, at least 10 % of it; null where refused.</summary>
    public double? ReserveError => Fit is null ? null : Math.Max(Fit.ReserveError!.Value, LeastReserveError * Fit.Reserve);

    /// <summary>All durations that are looked at, s, rising.</summary>
    internal static IReadOnlyList<int> Durations { get; } = [.. BestMeans.Durations.Where(seconds => seconds is >= ShortestSeconds and <= LongestSeconds)];

    /// <param name="sessions">Of one person and one kind of movement, in any order.</param>
    /// <param name="channel">Power, or speed.</param>
    public static TrialChoice Of(IReadOnlyCollection<SessionBests> sessions, Channel channel) => Of(new TrialEnvelopes(sessions, channel).Of(null, null), channel);

    /// <param name="envelope">As <see cref="TrialEnvelopes"/> tells it.</param>
    internal static TrialChoice Of(IReadOnlyList<ChosenTrial> envelope, Channel channel)
    {
        if (envelope.Count == 0)
        {
            return Refused("no session with an unbroken stretch of 2 minutes or more");
        }

        var trials = Near(WithoutPieces(Hull(envelope)), envelope);
        string? doubted = null;
        while (Lack(trials) is null)
        {
            var fit = WorkTimeFit.Of([.. trials.Select(one => one.Trial)])!;
            if ((Flatness(trials, channel) ?? Doubt(fit, channel)) is not { } doubt)
            {
                return new TrialChoice(trials, fit, Refusal: null);
            }

            doubted ??= $"; with longer ones {doubt}";
            trials = trials[..^1];
        }

        return Refused(Lack(trials) + doubted);
    }

    private static TrialChoice Refused(string reason) => new([], null, reason);

    /// <summary>The corners of the upper hull of what was done on time.</summary>
    private static List<ChosenTrial> Hull(IReadOnlyList<ChosenTrial> envelope)
    {
        var hull = new List<ChosenTrial>();
        foreach (var next in envelope)
        {
            while (hull.Count >= 2 && hull[^1].Trial.Done <= On(hull[^2], next, hull[^1].Trial.Seconds) * (1 + Flat))
            {
                hull.RemoveAt(hull.Count - 1);
            }

            hull.Add(next);
        }

        return hull;
    }

    private static List<ChosenTrial> WithoutPieces(List<ChosenTrial> hull)
    {
        while (hull.Count >= 2 && On(hull[0], hull[1], 0) < PieceShare * hull[0].Trial.Done)
        {
            hull = hull[1..];
        }

        return hull;
    }

    /// <summary>What of the envelope lies on the hull or next to it.</summary>
    private static List<ChosenTrial> Near(List<ChosenTrial> hull, IReadOnlyList<ChosenTrial> envelope) =>
    [
        .. envelope.Where(one =>
        {
            var behind = hull.FindIndex(corner => corner.Trial.Seconds >= one.Trial.Seconds);
            return one == hull[Math.Max(behind, 0)] || (behind > 0 && one.Trial.Done >= NearHull * On(hull[behind - 1], hull[behind], one.Trial.Seconds));
        }),
    ];

    /// <summary>What the line through two trials has done by a time.</summary>
    private static double On(ChosenTrial one, ChosenTrial other, double seconds) =>
        one.Trial.Done + ((other.Trial.Done - one.Trial.Done) / (other.Trial.Seconds - one.Trial.Seconds) * (seconds - one.Trial.Seconds));

    private static string? Lack(List<ChosenTrial> trials)
    {
        var sessions = trials.Select(one => one.Session).Distinct(StringComparer.Ordinal).Count();
        if (trials.Count < FewestTrials || sessions < FewestSessions)
        {
            return $"bests that may have been all out: {trials.Count}, of sessions: {sessions}; wanted are {FewestTrials} of {FewestSessions} sessions";
        }

        var (shortest, longest) = (trials[0].Trial.Seconds, trials[^1].Trial.Seconds);
        return longest < LongestOverShortest * shortest
            ? $"bests that may have been all out last {Number(shortest)} to {Number(longest)} s; the longest is to last {Number(LongestOverShortest)} times as long as the shortest"
            : null;
    }

    /// <summary>Whoever rides or runs alike for two minutes and for ten was not at a limit in both, however well a line fits.</summary>
    private static string? Flatness(List<ChosenTrial> trials, Channel channel)
    {
        var above = (trials[0].Trial.Mean / trials[^1].Trial.Mean) - 1;
        var wanted = channel == Channel.Speed ? LeastCurveSpeed : LeastCurvePower;
        return above < wanted
            ? $"the best of {Number(trials[0].Trial.Seconds)} s is above that of {Number(trials[^1].Trial.Seconds)} s by {Percent(above)} %, wanted is {Percent(wanted)} %; they were hardly all out"
            : null;
    }

    private static string? Doubt(CapacityFit fit, Channel channel)
    {
        var (critical, reserve) = channel == Channel.Speed ? ("critical speed", "D'") : ("critical power", "W'");
        if (fit is not { Critical: > 0, Reserve: > 0, CriticalError: { } criticalError, ReserveError: { } reserveError })
        {
            return $"no line with {critical} and {reserve} above 0 goes through the bests: they were hardly all out";
        }

        return criticalError > CriticalWithin * fit.Critical || reserveError > ReserveWithin * fit.Reserve
            ? $"the bests lie on no line: {critical} within {Percent(criticalError / fit.Critical)} %, {reserve} within {Percent(reserveError / fit.Reserve)} %, "
                + $"wanted are {Percent(CriticalWithin)} and {Percent(ReserveWithin)} %; some were hardly all out"
            : null;
    }

    private static string Percent(double share) => Number(share * 100);

    private static string Number(double value) => value.ToString("0", CultureInfo.InvariantCulture);
}

/// <summary>A best that stands for an effort that could have gone on no longer.</summary>
/// <param name="Session">Key of its activity.</param>
public sealed record ChosenTrial(Trial Trial, string Session, LocalDate Date);
