namespace LoadWatch.Capacity;

/// <summary>
/// The regressions that are in use for critical power and speed, through the same trials. Each makes other errors small (of work, of power, of time), so what lies between
/// them says how far a value hangs on which of them is taken.
/// </summary>
/// <param name="WorkTime">Work, or distance, on time: the one that is taken, since trials are chosen by it (<see cref="TrialChoice"/>).</param>
/// <param name="InverseTime">Power, or speed, on the inverse of time.</param>
/// <param name="Time">Least squares in time.</param>
/// <param name="ThreeParameter">With a highest power, or speed; null where the third parameter degenerates.</param>
public sealed record TrialRegressions(CapacityFit? WorkTime, CapacityFit? InverseTime, CapacityFit? Time, ThreeParameterFit? ThreeParameter)
{
    /// <summary>Each is null where the trials allow none.</summary>
    public static TrialRegressions Of(IReadOnlyCollection<Trial> trials) => new(WorkTimeFit.Of(trials), InverseTimeFit.Of(trials), TimeFit.Of(trials), ThreeParameterFit.Of(trials));

    /// <summary>Those that there are.</summary>
    public IReadOnlyList<CapacityFit> All => [.. new[] { WorkTime, InverseTime, Time, ThreeParameter?.Fit }.OfType<CapacityFit>()];
}
