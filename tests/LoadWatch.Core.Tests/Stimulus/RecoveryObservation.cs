namespace LoadWatch.Stimulus;

/// <summary>How much of W' was seen to come back in a rest after it had been spent.</summary>
/// <param name="RestWatts">Power of the rest.</param>
internal sealed record RecoveryObservation(string Study, double CriticalWatts, double WPrimeJoules, double RestWatts, double Seconds, double Percent)
{
    /// <summary>
    /// Ferguson et al. 2010, J Appl Physiol 108:866-874; Caen et al. 2021; Bartram et al. 2018, Int J Sports Physiol Perform 13:724-728; the rows of Caen et al.
    /// 2019 as Weigend et al. 2022 derived them. Means of groups.
    /// </summary>
    public static IReadOnlyList<RecoveryObservation> All { get; } =
    [
        .. Of("Ferguson 2010", 212, 21_600, (20, 120, 37), (20, 360, 65), (20, 900, 86)),
        .. Of(
            "Caen 2021", 269, 19_200,
            (161, 30, 28.6), (161, 60, 34.8), (161, 120, 44.2), (161, 180, 50.5), (161, 240, 55.1), (161, 300, 56.8), (161, 600, 73.7), (161, 900, 71.3)),
        .. Of("Bartram 2018", 393, 23_300, (393, 60, 0), (343, 60, 33), (293, 60, 47), (243, 60, 57), (193, 60, 64)),
        .. Of("Caen 2019", 248, 18_200, (81, 120, 55), (81, 240, 61), (81, 360, 70.5), (163, 120, 49), (163, 240, 55), (163, 360, 58)),
    ];

    /// <summary>Percentage points by which a form says more than was seen.</summary>
    public double Miss(WPrimeForm form) => (100 * form.Recovered(WPrimeJoules, CriticalWatts - RestWatts, Seconds)) - Percent;

    private static IEnumerable<RecoveryObservation> Of(
        string study, double critical, double wPrime, params (double Watts, double Seconds, double Percent)[] rests) =>
        rests.Select(rest => new RecoveryObservation(study, critical, wPrime, rest.Watts, rest.Seconds, rest.Percent));
}
