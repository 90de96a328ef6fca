namespace LoadWatch.Loads;

/// <summary>
/// Oxygen uptake in a steady state, rest included, mL per kg of body mass and minute. Source: American College of Sports Medicine, Guidelines for exercise
/// testing and prescription, 10th edition, table 6.3, as printed by Bushman 2020, Metabolic calculations in action: part 2, ACSM's Health Fit J 24(4):5-8.
/// S speed, m/min; G gradient, rise over way; W power, kg m/min; M body mass, kg:
///   walking      3.5 + 0.1 S + 1.8 S G
///   running      3.5 + 0.2 S + 0.9 S G
///   leg cycling  7 + 1.8 W / M
/// Made for walking at 50 to 100 m/min, running from 134 m/min (from 80 on where it is truly running), cycling at 300 to 1200 kg m/min. Departures: a watt is
/// 60 / 9.80665 = 6.118 kg m/min, not the round 6; going down counts as level, since the equations do not know it; no speed or power is refused, so far
/// outside of these ranges the value is a rough one.
/// </summary>
public static class OxygenCost
{
    /// <summary>One metabolic equivalent (MET), the uptake at rest.</summary>
    public const double Rest = 3.5;

    private const double KilogramMetresPerWattMinute = 60 / 9.80665;

    /// <param name="metresPerSecond">0 or more.</param>
    public static double Walking(double metresPerSecond, double gradient) => Rest + OnFoot(metresPerSecond * 60, gradient, 0.1, 1.8);

    /// <inheritdoc cref="Walking"/>
    public static double Running(double metresPerSecond, double gradient) => Rest + OnFoot(metresPerSecond * 60, gradient, 0.2, 0.9);

    /// <param name="watts">0 or more.</param>
    /// <param name="kilograms">Above 0.</param>
    public static double LegCycling(double watts, double kilograms) => (2 * Rest) + (1.8 * watts * KilogramMetresPerWattMinute / kilograms);

    private static double OnFoot(double metresPerMinute, double gradient, double along, double up) =>
        metresPerMinute * (along + (up * Math.Max(gradient, 0)));
}
