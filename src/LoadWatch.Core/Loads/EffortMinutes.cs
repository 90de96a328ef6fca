using System.Buffers;
using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// Minutes of moderate effort and more (3 METs) and of vigorous effort (6 METs), without heart rate: on foot by step cadence (<see cref="StepCadence"/>), or
/// where it is not usable by speed and climb, on a bicycle by power and body mass (<see cref="OxygenCost"/>). Absolute classes, the same for everybody: what is
/// light for an athlete may be all that a frail person can do. 3 and 6 METs as the bounds are those of the studies of step cadence. A reading counts for the time
/// that it stands for, however short the bout.
/// </summary>
internal static class EffortMinutes
{
    private const double ModerateMets = 3;
    private const double VigorousMets = 6;

    /// <summary>The gait of a run below it, 80 m/min, is read as walking.</summary>
    private const double SlowestRun = 80 / 60.0;

    /// <summary>Both or none; estimated, since no oxygen was measured.</summary>
    public static IEnumerable<Quantity> Of(UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, EquationChoices equations)
    {
        if (Time(usable, date, person, anchors, equations) is { } time)
        {
            yield return Minutes(QuantityNames.MinutesModerate, time.Moderate);
            yield return Minutes(QuantityNames.MinutesVigorous, time.Vigorous);
        }
    }

    private static Quantity Minutes(string name, long milliseconds) => new(name, Significant.Round(milliseconds / 60_000.0), "min", Estimated: true);

    private static EffortTime? Time(UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, EquationChoices equations)
    {
        var sport = usable.Recording.Sport;
        if (sport.IsOnFoot)
        {
            return usable[Channel.Cadence] is { } cadence ? BySteps(cadence, StepCadence.Lines(equations.StepCadence, person.AgeOn(date)))
                : usable[Channel.Speed] is { } speed ? BySpeed(speed, usable[Channel.Altitude], sport)
                : null;
        }

        return sport.Family == "cycling" && usable[Channel.Power] is { } power && anchors.On(date, person.Id, AnchorKind.BodyMass) is { Value: > 0 } mass
            ? ByPower(power, mass.Value)
            : null;
    }

    /// <summary>Cadence is that of one foot.</summary>
    private static EffortTime BySteps(UsableChannel cadence, (double Moderate, double Vigorous) lines)
    {
        var time = default(EffortTime);
        for (var at = 0; at < cadence.Count; at++)
        {
            time.Add(cadence.Values[at] * 2, lines, cadence.Milliseconds[at]);
        }

        return time;
    }

    private static EffortTime BySpeed(UsableChannel speed, UsableChannel? altitude, Sport sport)
    {
        var gradients = ArrayPool<double>.Shared.Rent(speed.Count);
        try
        {
            gradients.AsSpan(0, speed.Count).Clear();
            if (Gradients.AreKnown(altitude, sport))
            {
                Gradients.Along(speed, altitude, gradients.AsSpan(0, speed.Count));
            }

            return BySpeed(speed, gradients, isRun: sport.Name == "running");
        }
        finally
        {
            ArrayPool<double>.Shared.Return(gradients);
        }
    }

    private static EffortTime BySpeed(UsableChannel speed, double[] gradients, bool isRun)
    {
        var time = default(EffortTime);
        for (var at = 0; at < speed.Count; at++)
        {
            var metresPerSecond = speed.Values[at];
            var uptake = isRun && metresPerSecond >= SlowestRun
                ? OxygenCost.Running(metresPerSecond, gradients[at])
                : OxygenCost.Walking(metresPerSecond, gradients[at]);
            time.AddUptake(uptake, speed.Milliseconds[at]);
        }

        return time;
    }

    private static EffortTime ByPower(UsableChannel power, double kilograms)
    {
        var time = default(EffortTime);
        for (var at = 0; at < power.Count; at++)
        {
            if (power.Values[at] > 0)
            {
                time.AddUptake(OxygenCost.LegCycling(power.Values[at], kilograms), power.Milliseconds[at]);
            }
        }

        return time;
    }

    /// <summary>Milliseconds at each line and above.</summary>
    private struct EffortTime
    {
        public long Moderate { get; private set; }

        public long Vigorous { get; private set; }

        public void AddUptake(double uptake, int milliseconds) => Add(uptake / OxygenCost.Rest, (ModerateMets, VigorousMets), milliseconds);

        public void Add(double value, (double Moderate, double Vigorous) lines, int milliseconds)
        {
            Moderate += value >= lines.Moderate ? milliseconds : 0;
            Vigorous += value >= lines.Vigorous ? milliseconds : 0;
        }
    }
}
