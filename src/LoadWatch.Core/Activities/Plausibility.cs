using System.Globalization;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>
/// Whether a recording can be its owner's: pods and straps are handed out and mixed up. All limits are choices, no published source; they
/// are wide, since a person may beat an old anchor.
/// </summary>
public static class Plausibility
{
    /// <summary>How many times the anchored top speed is too much.</summary>
    public const double TimesTopSpeed = 1.25;

    /// <summary>Only above it, m/s: a slow person's anchor is often from a slow day.</summary>
    public const double TopSpeedFrom = 9;

    /// <summary>How far above the measured maximum is too much, beats per minute.</summary>
    public const int AboveHeartRateMaxBpm = 15;

    /// <summary>The share of the time that must lie below, so that a few seconds of a bad contact decide nothing.</summary>
    public const double HeartRateShare = 0.995;

    /// <summary>
    /// Why the recording should be held, or null where it may be the person's own or no anchor says anything. Top speed: the highest held
    /// for 1 s, on foot and in team sports, against the anchor whatever its source. Heart rate: against a measured maximum only.
    /// </summary>
    /// <param name="recording">After the quality cuts, whatever share of it is left.</param>
    /// <param name="date">The recording's local date: anchors are taken as they hold on it.</param>
    public static string? Of(UsableRecording recording, Person person, AnchorBook anchors, LocalDate date) =>
        TooFast(recording, anchors.On(date, person.Id, AnchorKind.SpeedMax))
        ?? TooHigh(recording, anchors.On(date, person.Id, AnchorKind.HeartRateMax));

    private static string? TooFast(UsableRecording usable, Anchor? anchor)
    {
        if (anchor is null || !(usable.Recording.Sport.IsOnFoot || usable.Recording.Sport.IsTeamSport) || !usable.Channels.TryGetValue(Channel.Speed, out var speed))
        {
            return null;
        }

        return HeldForThree(speed) is { } top && top > TopSpeedFrom && top > TimesTopSpeed * anchor.Value
            ? string.Create(CultureInfo.InvariantCulture, $"top speed {top:0.0} m/s where {anchor.Value:0.0} m/s is the person's: of another person?")
            : null;
    }

    /// <summary>The top speed that three readings in a row show, at 1 s or more: one jump of a position decides nothing.</summary>
    private static double? HeldForThree(UsableChannel speed)
    {
        if (SpeedTop.MetresPerSecond(speed) is not { } top || speed.Count < 3)
        {
            return null;
        }

        var values = speed.Values;
        var three = 0.0;
        for (var at = 2; at < values.Length; at++)
        {
            three = Math.Max(three, Math.Min(values[at], Math.Min(values[at - 1], values[at - 2])));
        }

        return Math.Min(top, three);
    }

    private static string? TooHigh(UsableRecording usable, Anchor? anchor)
    {
        if (anchor is not { Source: AnchorSource.Measured } || !usable.Channels.TryGetValue(Channel.HeartRate, out var heartRate))
        {
            return null;
        }

        return High(heartRate) is { } bpm && bpm > anchor.Value + AboveHeartRateMaxBpm
            ? string.Create(CultureInfo.InvariantCulture, $"heart rate {bpm} bpm where {anchor.Value:0} bpm is the person's maximum: of another person?")
            : null;
    }

    /// <summary>The lowest heart rate that at least <see cref="HeartRateShare"/> of the time does not exceed; null without any time.</summary>
    private static int? High(UsableChannel heartRate)
    {
        var histogram = ChannelHistogram.Of(heartRate);
        var wanted = HeartRateShare * histogram.TotalMilliseconds;
        var below = 0L;
        foreach (var (bpm, milliseconds) in histogram.Bins)
        {
            below += milliseconds;
            if (below >= wanted)
            {
                return bpm;
            }
        }

        return null;
    }
}
