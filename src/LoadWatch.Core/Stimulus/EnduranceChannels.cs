using System.Buffers;
using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>Reads the channels of a session, best first: power or speed wherever they are usable, heart rate in what they leave.</summary>
internal static class EnduranceChannels
{
    /// <param name="power">Null where power is not read.</param>
    /// <param name="speed">Null where speed is not read.</param>
    public static EnduranceEstimate Of(
        UsableRecording usable, PowerCapacity? power, SpeedCapacity? speed, LocalDate date, Person person, AnchorBook anchors)
    {
        var variants = Variants.Of(person.AgeOn(date));
        var (best, channel) = Best(usable, power, speed, variants);
        if (usable[Channel.HeartRate] is not { } heartRate || HeartRateReserve.On(date, person, anchors).Reserve is not { } reserve)
        {
            return best ?? EnduranceEstimate.Nothing with { NotSeen = [EnduranceRemarks.NoChannel] };
        }

        var drive = HeartRateDrive.On(date, person.Id, anchors, reserve);
        return best is null || channel is null
            ? HeartRateStimulus.Of(heartRate, heartRate.Milliseconds, drive, variants)
            : Filled(best, channel, heartRate, drive, variants);
    }

    private static (EnduranceEstimate? Estimate, UsableChannel? Channel) Best(
        UsableRecording usable, PowerCapacity? power, SpeedCapacity? speed, Variants variants)
    {
        if (power is not null && usable[Channel.Power] is { } watts)
        {
            return (PowerStimulus.Of(watts, power, variants).SeenIn(watts.Share), watts);
        }

        return speed is not null && usable[Channel.Speed] is { } metresPerSecond
            ? (SpeedStimulus.Of(metresPerSecond, usable[Channel.Altitude], usable.Recording.Sport, speed, variants).SeenIn(metresPerSecond.Share), metresPerSecond)
            : (null, null);
    }

    private static EnduranceEstimate Filled(
        EnduranceEstimate best, UsableChannel better, UsableChannel heartRate, HeartRateDrive drive, Variants variants)
    {
        var room = ArrayPool<int>.Shared.Rent(heartRate.Count);
        try
        {
            var left = room.AsSpan(0, heartRate.Count);
            var milliseconds = UncoveredTime.Of(heartRate, better, left);
            return milliseconds == 0 ? best : best.FilledBy(HeartRateStimulus.Of(heartRate, left, drive, variants), milliseconds);
        }
        finally
        {
            ArrayPool<int>.Shared.Return(room);
        }
    }
}
