using System.Diagnostics;
using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Benchmarks;

/// <summary>
/// Everything computed from one session (quality cuts, histograms, loads, zones, stimulus) at 1, 3 and 9 hours: the best of many runs, so that what else the
/// machine does counts least, and the time an hour of it takes over that of the shortest, which stays near 1 where time is linear in samples. Ends with 1 where a
/// bound is missed.
/// </summary>
internal static class ComputeSpeed
{
    public const string Name = "compute";

    private const int Runs = 200;

    /// <summary>Of 3 h of one reading a second with power, heart rate and speed, on one core.</summary>
    private const double MostMilliseconds = 1.5;

    /// <summary>Of an hour of any session to that of the shortest.</summary>
    private const double MostHourly = 1.5;

    /// <summary>By then the code is compiled a second time, also on a busy machine.</summary>
    private static readonly TimeSpan WarmUp = TimeSpan.FromSeconds(2);

    private static readonly Instant Start = Instant.FromUtc(2026, 3, 10, 7, 0);

    private static readonly ComputationSettings Settings = new();

    private static readonly AnchorBook Anchors = LongRide.Anchors.With(
    [
        new Anchor("p1", null, AnchorKind.CriticalSpeed, 4, AnchorSource.Measured),
        new Anchor("p1", null, AnchorKind.DPrime, 200, AnchorSource.Measured),
        new Anchor("p1", new LocalDate(2026, 2, 1), AnchorKind.SpeedMax, 8, AnchorSource.Measured),
    ]);

    public static int Run()
    {
        Console.WriteLine("| session | hours | ms | ms an hour, to that of 1 h |");
        Console.WriteLine("| --- | --- | --- | --- |");
        var ride = IsFast("ride: power, heart rate, speed, cadence, height", "cycling", [Channel.Power, Channel.HeartRate, Channel.Speed, Channel.Cadence, Channel.Distance, Channel.Altitude]);
        var run = IsFast("run: heart rate, speed, cadence, height", "running", [Channel.HeartRate, Channel.Speed, Channel.Cadence, Channel.Distance, Channel.Altitude]);
        return ride && run ? 0 : 1;
    }

    private static bool IsFast(string what, string sport, Channel[] channels)
    {
        var isFast = true;
        double? hourly = null;
        Warm(Session(sport, 3600, channels));
        foreach (var hours in new[] { 1, 3, 9 })
        {
            var milliseconds = Best(Session(sport, hours * 3600, channels));
            hourly ??= milliseconds;
            Console.WriteLine(string.Create(
                CultureInfo.InvariantCulture, $"| {what} | {hours} | {milliseconds:0.00} | {milliseconds / hours / hourly:0.00} |"));
            isFast &= (hours != 3 || !channels.Contains(Channel.Power) || milliseconds < MostMilliseconds) && milliseconds / hours / hourly <= MostHourly;
        }

        return isFast;
    }

    private static void Warm(Recording recording)
    {
        for (var started = Stopwatch.GetTimestamp(); Stopwatch.GetElapsedTime(started) < WarmUp;)
        {
            Milliseconds(recording);
        }
    }

    private static double Best(Recording recording) => Enumerable.Range(0, Runs).Min(_ => Milliseconds(recording));

    private static double Milliseconds(Recording recording)
    {
        var started = Stopwatch.GetTimestamp();
        ActivityComputation.Compute(recording, LongRide.Person, Anchors, Settings);
        return Stopwatch.GetElapsedTime(started).TotalMilliseconds;
    }

    private static Recording Session(string sport, int seconds, Channel[] channels) => new()
    {
        Part = 1,
        Sport = new Sport(sport),
        Start = Start,
        Samples = new SampleSeries(
            [.. Enumerable.Range(0, seconds).Select(second => Start.ToUnixTimeMilliseconds() + (second * 1000L))],
            channels.ToDictionary(channel => channel, channel => Enumerable.Range(0, seconds).Select(second => Value(channel, second)).ToArray())),
    };

    /// <summary>Steps of what devices write; sprints of 20 s every ten minutes.</summary>
    private static double Value(Channel channel, int second) => channel switch
    {
        Channel.HeartRate => Math.Round(130 + (20 * Math.Sin(second / 200.0))),
        Channel.Power => Math.Round(180 + (60 * Math.Sin(second / 90.0)) + (second % 600 < 20 ? 400 : 0)),
        Channel.Speed => Math.Round(3.5 + Math.Sin(second / 60.0) + (second % 600 < 20 ? 2 : 0), 3),
        Channel.Cadence => 88,
        Channel.Altitude => Math.Round((500 + (60 * Math.Sin(second / 300.0))) * 5) / 5,
        _ => 3.5 * second,
    };
}
