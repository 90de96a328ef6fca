using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Reference values of an invented person that change some times, and histograms of most sessions with heart rate.</summary>
internal static class RandomReferences
{
    public static AnchorBook Anchors(Func<int, int> below, LocalDate first, int days)
    {
        AnchorKind[] kinds = [AnchorKind.HeartRateRest, AnchorKind.HeartRateMax, AnchorKind.HeartRateMax];
        var changes = Enumerable.Range(0, below(6)).Select(_ => Anchor(kinds[below(kinds.Length)], first.PlusDays(below(days)), below));
        return new AnchorBook(
        [
            Anchor(AnchorKind.HeartRateRest, below(4) == 0 ? first.PlusDays(below(days)) : null, below),
            Anchor(AnchorKind.HeartRateMax, below(4) == 0 ? first.PlusDays(below(days)) : null, below),
            .. changes,
        ]);
    }

    /// <summary>Most sessions with heart rate, with what their new histograms tell by the values of their dates instead of what they had.</summary>
    public static (IReadOnlyList<JoinedActivity> Sessions, IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, Histogram>> Histograms) Computed(
        IReadOnlyList<JoinedActivity> sessions, Person person, AnchorBook anchors, Func<int, int> below)
    {
        var histograms = new Dictionary<string, IReadOnlyDictionary<Channel, Histogram>>(StringComparer.Ordinal);
        var computed = sessions.Select(session =>
        {
            if (session[QuantityNames.BanisterTrimp] is not { } load || below(8) == 0)
            {
                return session;
            }

            var heartRate = HeartRate(load * 0.6, 110 + below(60));
            histograms[session.Key] = new Dictionary<Channel, Histogram> { [Channel.HeartRate] = heartRate };
            return WithLoads(session, heartRate, person, anchors);
        }).ToList();
        return (computed, histograms);
    }

    /// <summary>Two thirds of the time at a rate, the rest 15 bpm above.</summary>
    public static Histogram HeartRate(double minutes, int bpm)
    {
        var histogram = new Histogram();
        histogram.Add(bpm, (long)(minutes * 40_000));
        histogram.Add(bpm + 15, (long)(minutes * 20_000));
        return histogram;
    }

    public static JoinedActivity WithLoads(JoinedActivity session, Histogram heartRate, Person person, AnchorBook anchors) => session with
    {
        Quantities =
        [
            .. session.Quantities.Where(quantity => !QuantityNames.IsOfHeartRate(quantity.Name))
                .Concat(HeartRateLoads.Of(heartRate, session.Date, person, anchors, new()).Quantities)
                .OrderBy(quantity => quantity.Name, StringComparer.Ordinal),
        ],
    };

    private static Anchor Anchor(AnchorKind kind, LocalDate? date, Func<int, int> below) =>
        new("anna", date, kind, kind == AnchorKind.HeartRateRest ? 42 + below(20) : 170 + below(35), AnchorSource.Measured);
}
