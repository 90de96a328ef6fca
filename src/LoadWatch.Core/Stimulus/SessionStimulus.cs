using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>
/// The stimulus of one recording by body region. Working sets speak for themselves; the sport says which regions the endurance channels speak for. Of a region
/// with both, the better graded counts. Moment by moment the best channel counts: power, on foot speed, and heart rate where they tell nothing. They are never added.
/// </summary>
/// <param name="Regions">Legs first; empty where the sport or the exercises name no region.</param>
/// <param name="Remarks">In plain words.</param>
public sealed record SessionStimulus(IReadOnlyList<RegionStimulus> Regions, IReadOnlyList<string> Remarks)
{
    /// <summary>Exercises of working sets that no body region is known for, in canonical form: to be asked for once, over all people.</summary>
    public IReadOnlyList<string> Questions { get; init; } = [];

    /// <summary>How each working set was read, in their order; empty without sets.</summary>
    public IReadOnlyList<ReadSet> Sets { get; init; } = [];

    /// <summary>What lies between power or speed and what they tell; null where neither was read.</summary>
    public EnduranceSteps? Endurance { get; init; }

    /// <summary>By what heart rate was read; null where it was not.</summary>
    public HeartRateDrive? HeartRate { get; init; }

    public static SessionStimulus Of(
        UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var channels = OfSport(usable, date, person, anchors, settings.Sports);
        var work = usable.Recording.Sets.Where(set => set.Active).ToList();
        if (work.Count == 0)
        {
            return channels;
        }

        var sets = SessionOfSets.Of(work, date, person, anchors, settings);
        return channels with { Regions = SetsAndChannels.Best(sets.Regions, channels.Regions), Remarks = sets.Remarks, Questions = sets.Questions, Sets = sets.Sets };
    }

    /// <summary>Where speed is a body's own running or walking, and power a watch's model of it.</summary>
    internal static bool ReadsSpeed(Sport sport) => sport.IsOnFoot || sport.IsTeamSport;

    private static SessionStimulus OfSport(
        UsableRecording usable,
        LocalDate date,
        Person person,
        AnchorBook anchors,
        IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> sports)
    {
        var sport = usable.Recording.Sport;
        var power = ReadsSpeed(sport) ? null : PowerCapacity.On(date, person.Id, anchors, sport);
        var speed = ReadsSpeed(sport) ? SpeedCapacity.On(date, person.Id, anchors) : null;
        if (SportRegions.Of(sport, sports) is { } regions)
        {
            var notSeen = EnduranceRemarks.OfSession(usable, power, speed).ToList();
            var estimate = EnduranceChannels.Of(usable, power, speed, date, person, anchors);
            return new SessionStimulus([.. regions.Select(region => estimate.For(region, notSeen))], []) { Endurance = estimate.Steps, HeartRate = estimate.HeartRate };
        }

        var question = SportRegions.Question(sport);
        var legs = usable[Channel.Speed] is not null && speed is not null
            ? EnduranceChannels.Of(usable, power: null, speed, date, person, anchors)
            : EnduranceEstimate.Nothing;
        return new SessionStimulus(
            [.. BodyRegions.All.Select(region => (region == BodyRegion.Legs ? legs : EnduranceEstimate.Nothing).For(region, [question]))],
            [question])
        {
            Endurance = legs.Steps,
            HeartRate = legs.HeartRate,
        };
    }
}
