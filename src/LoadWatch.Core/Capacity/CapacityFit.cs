namespace LoadWatch.Capacity;

/// <summary>
/// What a person can keep up, and what is there beside it: critical power and W', or critical speed and D', after Monod and Scherrer 1965, "The work capacity of a
/// synergic muscular group", Ergonomics 8:329-338, and Moritani et al. 1981, Ergonomics 24:339-350; of running the same with distance for work. Holds for efforts of
/// about 2 to 15, at most 30 minutes. The three regressions are <see cref="WorkTimeFit"/>, <see cref="InverseTimeFit"/> and <see cref="TimeFit"/>.
/// </summary>
/// <param name="Critical">CP, W, or CS, m/s.</param>
/// <param name="Reserve">W', J, or D', m; may be below 0 where the trials were none.</param>
/// <param name="CriticalError">Standard error in the unit of the value; null where the trials are no more than the parameters.</param>
/// <param name="ReserveError">Likewise.</param>
/// <param name="RSquared">Of the straight lines, 0 to 1; null elsewhere.</param>
public sealed record CapacityFit(double Critical, double Reserve, double? CriticalError, double? ReserveError, double? RSquared = null);
