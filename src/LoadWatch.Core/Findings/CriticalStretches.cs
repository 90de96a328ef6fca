using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// What the best means of a person's sessions say of critical power, or speed, in the stretch up to a date and in the one before. A best on the bicycle says nothing of one
/// on the ergometer: the sport with the most sessions of both stretches is read.
/// </summary>
public sealed class CriticalStretches
{
    private readonly int days;
    private readonly IReadOnlyDictionary<string, BestMeans> heartRates;
    private readonly List<SportStretches> sports;

    /// <param name="subject">With the best means of its activities.</param>
    /// <param name="quantity">Critical power or critical speed.</param>
    public CriticalStretches(RuleSubject subject, CriticalQuantity quantity)
    {
        ArgumentNullException.ThrowIfNull(subject);
        ArgumentNullException.ThrowIfNull(quantity);
        days = subject.Limits.FallingCapacity.Days;
        var faults = new SensorFaults(subject);
        var shown = subject.Activities
            .Where(activity => SessionBests.CriticalSport(activity.Sport, quantity.Channel) is not null)
            .Where(activity => Means(subject, activity, quantity.Channel) is not null && !faults.Mutes(activity, quantity.Channel))
            .ToList();
        heartRates = shown
            .Where(activity => subject.Person.HeartRateIsValidOn(activity.Date) && !faults.Mutes(activity, Channel.HeartRate) && Means(subject, activity, Channel.HeartRate) is not null)
            .ToDictionary(activity => activity.Key, activity => Means(subject, activity, Channel.HeartRate)!, StringComparer.Ordinal);
        sports =
        [
            .. shown
                .GroupBy(activity => activity.Sport.Family, StringComparer.Ordinal)
                .OrderBy(sport => sport.Key, StringComparer.Ordinal)
                .Select(sport => new SportStretches(
                    sport.Key, quantity.Channel, sport.Select(activity => new SessionBests(activity.Key, activity.Date, activity.Sport, subject.BestMeans[activity.Key])))),
        ];
    }

    /// <summary>Whether no session shows a best of two minutes or more.</summary>
    internal bool AreEmpty => sports.TrueForAll(sport => sport.IsEmpty);

    /// <summary>Whether a session of the two stretches does.</summary>
    internal bool AreShownOn(LocalDate date) => sports.Exists(sport => sport.Count(date.PlusDays(1 - (2 * days)), date) > 0);

    /// <summary>Null where no session of the stretches shows a best of two minutes or more.</summary>
    public CriticalReading? On(LocalDate date)
    {
        var (late, early) = ((First: date.PlusDays(1 - days), Last: date), (First: date.PlusDays(1 - (2 * days)), Last: date.PlusDays(-days)));
        if (sports.Where(one => one.Count(early.First, late.Last) > 0).MaxBy(one => one.Count(early.First, late.Last)) is not { } sport)
        {
            return null;
        }

        var (now, before) = (sport.Choice(late.First, late.Last), sport.Choice(early.First, early.Last));
        if ((Refusal(now, late) ?? Refusal(before, early)) is { } refusal)
        {
            return new CriticalReading(null, refusal);
        }

        var fall = new CriticalFall(sport.Sport, Stretch(now, late), Stretch(before, early), HeartRateBelow(now.Trials, before.Trials));
        return new CriticalReading(fall, null);
    }

    private static BestMeans? Means(RuleSubject subject, JoinedActivity activity, Channel channel) =>
        subject.BestMeans.TryGetValue(activity.Key, out var means) ? means.GetValueOrDefault(channel) : null;

    private static string? Refusal(TrialChoice choice, (LocalDate First, LocalDate Last) stretch) =>
        choice.Refusal is { } refusal ? $"{Wording.IsoDate(stretch.First)} to {Wording.IsoDate(stretch.Last)}: {refusal}" : null;

    private static CriticalStretch Stretch(TrialChoice choice, (LocalDate First, LocalDate Last) stretch) => new(
        stretch.First,
        stretch.Last,
        Significant.Round(choice.Fit!.Critical),
        Significant.Round(choice.CriticalError!.Value),
        Significant.Round(choice.Fit.Reserve),
        Significant.Round(choice.ReserveError!.Value),
        choice.Trials.Count,
        choice.Trials.DistinctBy(trial => trial.Session).Count(),
        choice.Trials[0].Trial.Seconds,
        choice.Trials[^1].Trial.Seconds);

    /// <summary>Mean over the later trials of what the earlier ones tell at the same duration less what was shown; null with fewer than 3 trials of known heart rate in either.</summary>
    private double? HeartRateBelow(IReadOnlyList<ChosenTrial> late, IReadOnlyList<ChosenTrial> early)
    {
        var (now, before) = (HeartRates(late), HeartRates(early));
        return now.Count < TrialChoice.FewestTrials || before.Count < TrialChoice.FewestTrials
            ? null
            : Significant.Round(now.Average(one => At(before, one.Seconds) - one.Bpm));
    }

    /// <summary>The best mean heart rate of the session of each trial over as long as the trial.</summary>
    private List<(double Seconds, double Bpm)> HeartRates(IReadOnlyList<ChosenTrial> trials) =>
    [
        .. trials
            .Select(trial => (trial.Trial.Seconds, Bpm: heartRates.GetValueOrDefault(trial.Session)?[(int)trial.Trial.Seconds]))
            .Where(one => one.Bpm is not null)
            .Select(one => (one.Seconds, one.Bpm!.Value)),
    ];

    /// <summary>Straight on the logarithm of time between two trials; beyond the outermost as there.</summary>
    private static double At(List<(double Seconds, double Bpm)> known, double seconds)
    {
        var behind = known.FindIndex(one => one.Seconds >= seconds);
        if (behind <= 0)
        {
            return behind == 0 ? known[0].Bpm : known[^1].Bpm;
        }

        var ((from, low), (to, high)) = (known[behind - 1], known[behind]);
        return low + ((high - low) * Math.Log(seconds / from) / Math.Log(to / from));
    }

    /// <summary>Stretches of one kind of movement. The bests of a stretch are the same for days on end, so a line is drawn anew only where they changed.</summary>
    private sealed class SportStretches(string sport, Channel channel, IEnumerable<SessionBests> sessions)
    {
        private readonly TrialEnvelopes envelopes = new(sessions, channel);
        private readonly Dictionary<LocalDate, TrialChoice> choices = [];
        private (IReadOnlyList<ChosenTrial> Envelope, TrialChoice Choice)? latest;

        public string Sport => sport;

        public bool IsEmpty => envelopes.IsEmpty;

        public int Count(LocalDate first, LocalDate last) => envelopes.Count(first, last);

        /// <param name="first">Hangs on the last date alone: all stretches are of one length.</param>
        public TrialChoice Choice(LocalDate first, LocalDate last)
        {
            if (!choices.TryGetValue(last, out var choice))
            {
                var envelope = envelopes.Of(first, last);
                choice = latest is { } known && known.Envelope.SequenceEqual(envelope) ? known.Choice : TrialChoice.Of(envelope, channel);
                latest = (envelope, choice);
                choices[last] = choice;
            }

            return choice;
        }
    }
}

/// <param name="Fall">Both values; null where one of them cannot be told.</param>
/// <param name="Refusal">Why not, in plain words with the dates of the stretch; null where both can.</param>
public sealed record CriticalReading(CriticalFall? Fall, string? Refusal)
{
    /// <summary>Why nothing can be told: no value of a stretch, or a fall whose bests do not look as hard-won; null where it can.</summary>
    public string? Untold(CriticalQuantity quantity, FallingCapacityLimits limits) => Fall is { } fall && fall.Holds(limits) ? fall.HeldBack(quantity) : Refusal;

    /// <summary>Both values and the fall, or why they are not compared: <c>225 W of late, 250 W before, 10 % below (limit 5.4 %)</c>.</summary>
    public string Words(CriticalQuantity quantity, FallingCapacityLimits limits)
    {
        var values = Fall is { } fall
            ? $"{quantity.Value(fall.Late.Critical)} of late, {quantity.Value(fall.Early.Critical)} before ({fall.Sport.Replace('_', ' ')}), "
                + $"{Wording.Number(Math.Abs(fall.Percent))} % {(fall.Percent < 0 ? "above" : "below")} (limit {Wording.Number(fall.LimitPercent(limits))} %)"
            : null;
        return Untold(quantity, limits) is not { } untold ? values! : values is null ? $"not compared: {untold}" : $"{values}; not told: {untold}";
    }
}
