using System.Globalization;
using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>From one recording to everything that it says: quality cuts, histograms, loads, times in zone, stimulus. Pure.</summary>
public static class ActivityComputation
{
    /// <summary>Raised by one whenever a formula, a cut or a quantity changes: what an older program computed is then computed again.</summary>
    public const int Version = 11;

    /// <summary>Anchors are taken as they hold on the recording's local date.</summary>
    /// <exception cref="ArgumentException">The recording carries no date.</exception>
    public static ActivityValues Compute(Recording recording, Person person, AnchorBook anchors, ComputationSettings settings) =>
        Compute(new UsableRecording(recording, settings.UsableShareWanted, settings.Quality), person, anchors, settings);

    /// <param name="cut">The recording after the quality cuts.</param>
    /// <inheritdoc cref="Compute(Recording, Person, AnchorBook, ComputationSettings)"/>
    public static ActivityValues Compute(UsableRecording cut, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        ArgumentNullException.ThrowIfNull(cut);
        var date = LocalStart.DateOf(cut.Recording, person);
        var valid = Valid(cut, date, person, settings);
        var usable = UpToMaximum(valid, HeartRateMaximum.On(date, person, anchors), settings.Quality);
        var loads = ActivityLoads.Of(usable, date, person, anchors, settings);
        var stimulus = SessionStimulus.Of(usable, date, person, anchors, settings);
        return new ActivityValues
        {
            HeartRateMeanBpm = Mean(usable[Channel.HeartRate]),
            HeartRateMaxBpm = (int?)Largest(usable[Channel.HeartRate]),
            PowerMeanWatts = Mean(usable[Channel.Power]),
            PowerMaxWatts = Significant.Round(Largest(usable[Channel.Power])),
            UsableShare = usable.Channels.Values.ToDictionary(channel => channel.Channel, channel => Significant.Round(channel.Share)),
            Cuts = usable.Cuts,
            Histograms = usable.Histograms,
            BestMeans = valid.BestMeans, // Of what no reference value has cut, since reference values are told from them.
            TimesInZone = loads.TimesInZone,
            Quantities = loads.Quantities,
            Stimulus = stimulus.Regions,
            Remarks = [.. usable.TooLittle.Select(TooLittle), .. loads.Remarks, .. stimulus.Remarks, .. loads.HistogramRemarks],
        };
    }

    /// <summary>The stimulus alone, with what lies between it and the readings.</summary>
    /// <inheritdoc cref="Compute(UsableRecording, Person, AnchorBook, ComputationSettings)"/>
    public static SessionStimulus StimulusOf(UsableRecording cut, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        ArgumentNullException.ThrowIfNull(cut);
        var date = LocalStart.DateOf(cut.Recording, person);
        var usable = UpToMaximum(Valid(cut, date, person, settings), HeartRateMaximum.On(date, person, anchors), settings.Quality);
        return SessionStimulus.Of(usable, date, person, anchors, settings);
    }

    private static UsableRecording Valid(UsableRecording cut, LocalDate date, Person person, ComputationSettings settings) =>
        person.HeartRateIsValidOn(date) ? cut : new UsableRecording(WithoutHeartRate(cut.Recording), settings.UsableShareWanted, settings.Quality);

    /// <summary>Without what is too far above the person's maximum; where none is known all of it stays.</summary>
    private static UsableRecording UpToMaximum(UsableRecording cut, HeartRateMaximum? maximum, QualityLimits limits) =>
        maximum is null ? cut : cut.WithHeartRateUpTo(maximum.Bpm + limits.HeartRateAboveMaximumBpm);

    /// <summary>Where heart rate says nothing about the person's effort, it is as if it had not been recorded.</summary>
    private static Recording WithoutHeartRate(Recording recording) =>
        recording with
        {
            Samples = recording.Samples.Without(Channel.HeartRate),
            Gathered = recording.Gathered.Where(one => one.Key != Channel.HeartRate).ToDictionary(),
            LateHeartRates = [],
        };

    /// <summary>Weighted by time; the plain mean where the readings stand for no time.</summary>
    private static double? Mean(UsableChannel? channel)
    {
        if (channel is null)
        {
            return null;
        }

        var milliseconds = channel.Milliseconds();
        return Significant.Round(milliseconds == 0 ? channel.PlainMean() : channel.ValueMilliseconds() / milliseconds);
    }

    private static double? Largest(UsableChannel? channel) => channel?.Extremes().Largest;

    private static string TooLittle(UsableChannel channel)
    {
        var words = ChannelWords.Of(channel.Channel);
        var percent = (channel.Share * 100).ToString("0", CultureInfo.InvariantCulture);
        return $"{words} usable in {percent} % of the time: no load, zone or stimulus from {words}";
    }
}
