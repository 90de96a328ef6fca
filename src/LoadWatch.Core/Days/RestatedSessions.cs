using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>
/// Sessions of a person by other reference values than those of their own dates (I-15), from their histograms. What a table states is no matter of reference values: a
/// quantity counts as computed only where the histograms tell, by the values of its own date, the very number that the session has.
/// </summary>
/// <param name="quantities">Names of those to restate.</param>
/// <param name="histograms">Of the person's sessions, by key; a session that is not among them stays as it is.</param>
public sealed class RestatedSessions(
    Person person,
    AnchorBook anchors,
    ComputationSettings settings,
    IReadOnlySet<string> quantities,
    IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, Histogram>> histograms)
{
    private readonly Dictionary<(string Key, LocalDate HeartRateOn, LocalDate ValuesOn), DaySession> known = [];

    /// <summary>The session with its quantities by the values of a period; its load is left as it is.</summary>
    public DaySession In(ReferencePeriod period, LocalDate date, DaySession session)
    {
        if (!histograms.TryGetValue(session.Key, out var ofSession))
        {
            return session;
        }

        var key = (session.Key, period.HeartRateOn, period.ValuesOn);
        if (!known.TryGetValue(key, out var restated))
        {
            known[key] = restated = Restate(session, Told(session, ofSession, date, date), Told(session, ofSession, period.HeartRateOn, period.ValuesOn));
        }

        return restated;
    }

    private DaySession Restate(DaySession session, Dictionary<string, double> own, Dictionary<string, double> wanted)
    {
        var now = new SortedDictionary<string, double>(session.Quantities.ToDictionary(), StringComparer.Ordinal);
        foreach (var name in quantities.Where(name => IsComputed(session, own, name)))
        {
            now.Remove(name);
            if (wanted.TryGetValue(name, out var value))
            {
                now[name] = value;
            }
        }

        return session with { Quantities = now };
    }

    private static bool IsComputed(DaySession session, Dictionary<string, double> own, string name) =>
        session.Quantities.TryGetValue(name, out var value) == own.TryGetValue(name, out var told) && value.Equals(told);

    private Dictionary<string, double> Told(DaySession session, IReadOnlyDictionary<Channel, Histogram> ofSession, LocalDate heartRateOn, LocalDate speedOn)
    {
        var (ofHeartRate, _) = HeartRateLoads.Of(ofSession.GetValueOrDefault(Channel.HeartRate), heartRateOn, person, anchors, settings.Equations);
        var top = session.Quantities.TryGetValue(QuantityNames.SpeedTop, out var metresPerSecond) ? metresPerSecond : (double?)null;
        var ofSpeed = SpeedLoads.OfHistogram(
            ofSession.GetValueOrDefault(Channel.Speed), Sport.Parse(session.Sport), top, anchors.On(speedOn, person.Id, AnchorKind.SpeedMax), settings);
        return ofHeartRate.Concat(ofSpeed).Where(quantity => quantities.Contains(quantity.Name)).ToDictionary(quantity => quantity.Name, quantity => quantity.Value, StringComparer.Ordinal);
    }
}
