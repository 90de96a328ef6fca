using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads power: relative drive from critical power, maximal power and the balance of W', then the pool.</summary>
public static class PowerStimulus
{
    /// <param name="power">Usable readings, W.</param>
    public static EnduranceEstimate Of(UsableChannel power, PowerCapacity capacity, Variants variants) =>
        EnduranceReading.Of(new Readings(power), capacity.Limits, variants, capacity.Grade, StimulusChannels.Power, capacity.NotSeen);
}
