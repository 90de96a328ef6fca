using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>
/// The stimulus of one recording by body region. Working sets speak for themselves; otherwise the sport says which regions the endurance
/// channels
/// speak for. Power beats heart rate; channels are never added.
/// </summary>
/// <param name="Regions">Legs first; empty where the sport or the exercises name no region.</param>
/// <param name="Remarks">In plain words.</param>
public sealed record SessionStimulus(IReadOnlyList<RegionStimulus> Regions, IReadOnlyList<string> Remarks)
{
    /// <summary>Exercises of working sets that no body region is known for, in canonical form: to be asked for once, over all people.</summary>
    public IReadOnlyList<string> Questions { get; init; } = [];

    private const string NoChannel =
        "nothing to read it from: power with critical_power, or heart rate with heart_rate_rest and heart_rate_max";

    public static SessionStimulus Of(
        UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var work = usable.Recording.Sets.Where(set => set.Active).ToList();
        return work.Count > 0
            ? SessionOfSets.Of(work, date, person.Id, anchors, settings.Exercises)
            : OfSport(usable, date, person, anchors, settings.Sports);
    }

    private static SessionStimulus OfSport(
        UsableRecording usable,
        LocalDate date,
        Person person,
        AnchorBook anchors,
        IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> sports)
    {
        var sport = usable.Recording.Sport;
        if (SportRegions.Of(sport, sports) is not { } regions)
        {
            var question = SportRegions.Question(sport);
            return new SessionStimulus([.. BodyRegions.All.Select(region => EnduranceEstimate.Nothing.For(region, [question]))], [question]);
        }

        var capacity = sport.IsOnFoot ? null : PowerCapacity.On(date, person.Id, anchors, sport);
        var notSeen = NotRead(usable, capacity).ToList();
        var estimate = Best(usable, capacity, date, person, anchors);
        return new SessionStimulus([.. regions.Select(region => estimate.For(region, notSeen))], []);
    }

    private static EnduranceEstimate Best(
        UsableRecording usable, PowerCapacity? capacity, LocalDate date, Person person, AnchorBook anchors)
    {
        if (usable[Channel.Power] is { } power && capacity is not null)
        {
            return PowerStimulus.Of(power, capacity);
        }

        return usable[Channel.HeartRate] is { } heartRate && HeartRateReserve.On(date, person, anchors).Reserve is { } reserve
            ? HeartRateStimulus.Of(heartRate, HeartRateDrive.On(date, person.Id, anchors, reserve))
            : EnduranceEstimate.Nothing with { NotSeen = [NoChannel] };
    }

    private static IEnumerable<string> NotRead(UsableRecording usable, PowerCapacity? capacity)
    {
        if (usable[Channel.Power] is not null)
        {
            if (capacity is null)
            {
                yield return usable.Recording.Sport.IsOnFoot
                    ? "power on foot is a model of the watch and is not read"
                    : "power: no critical_power to read it against";
            }
        }
        else if (usable.Channels.ContainsKey(Channel.Power))
        {
            yield return "power: too little of it is usable";
        }
        else if (usable.Channels.ContainsKey(Channel.Speed))
        {
            yield return "speed is not read for stimulus: power with critical_power and power_max, or logged sets, would tell";
        }

        if (usable.Recording.Sport.Name is "running" or "walking" or "hiking")
        {
            yield return "downhill and other lengthening work: cheap in energy, heavy on the muscle";
        }
    }
}
