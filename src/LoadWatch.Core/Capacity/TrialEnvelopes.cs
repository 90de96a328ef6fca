using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Capacity;

/// <summary>For each duration of trials (<see cref="TrialChoice"/>) the best mean of the sessions of a stretch of dates. Made once, asked for many stretches.</summary>
internal sealed class TrialEnvelopes
{
    private readonly SessionBests[] sessions;
    private readonly LocalDate[] dates;

    /// <summary>By session, then duration; not a number where no unbroken stretch lasted as long.</summary>
    private readonly double[][] means;

    /// <param name="sessions">Of one person and one kind of movement, in any order.</param>
    /// <param name="channel">Power, or speed.</param>
    public TrialEnvelopes(IEnumerable<SessionBests> sessions, Channel channel)
    {
        this.sessions =
        [
            .. sessions.Where(session => session.Best(channel, TrialChoice.Durations[0]) is > 0).OrderBy(session => session.Date).ThenBy(session => session.Key, StringComparer.Ordinal),
        ];
        dates = Array.ConvertAll(this.sessions, session => session.Date);
        means = Array.ConvertAll(this.sessions, session => TrialChoice.Durations.Select(seconds => session.Best(channel, seconds) ?? double.NaN).ToArray());
    }

    /// <summary>Whether no session shows a best of any of the durations.</summary>
    public bool IsEmpty => sessions.Length == 0;

    /// <summary>Sessions of a stretch, both ends included, that show a best of any of the durations.</summary>
    public int Count(LocalDate first, LocalDate last) => FirstFrom(last.PlusDays(1)) - FirstFrom(first);

    /// <summary>From the shortest to the longest; of equal ones the earliest. Empty where no session lasted long enough.</summary>
    /// <param name="first">Null: from the first session on.</param>
    /// <param name="last">Null: up to the last session.</param>
    public IReadOnlyList<ChosenTrial> Of(LocalDate? first, LocalDate? last)
    {
        var (begin, end) = (first is { } from ? FirstFrom(from) : 0, last is { } to ? FirstFrom(to.PlusDays(1)) : sessions.Length);
        var envelope = new List<ChosenTrial>(TrialChoice.Durations.Count);
        for (var at = 0; at < TrialChoice.Durations.Count; at++)
        {
            var (best, winner) = (0.0, -1);
            for (var session = begin; session < end; session++)
            {
                if (means[session][at] > best)
                {
                    (best, winner) = (means[session][at], session);
                }
            }

            if (winner >= 0)
            {
                envelope.Add(new ChosenTrial(Trial.OfMean(TrialChoice.Durations[at], best), sessions[winner].Key, dates[winner]));
            }
        }

        return envelope;
    }

    private int FirstFrom(LocalDate date) => Sorted.FirstFrom<LocalDate, LocalDate>(dates, date, one => one);
}
