namespace LoadWatch.Loads;

/// <summary>A named number with a unit that a session has.</summary>
/// <param name="Name">Lower-case words joined by underscores; the built-in ones are in <see cref="QuantityNames"/>.</param>
/// <param name="Value">Finite, rounded to 9 significant digits.</param>
/// <param name="Estimated">True when an anchor behind it was estimated by an equation or a population mean.</param>
public sealed record Quantity(string Name, double Value, string Unit, bool Estimated);

/// <summary>Names and units of the quantities that LoadWatch computes itself.</summary>
public static class QuantityNames
{
    /// <summary>Banister's training impulse summed over samples, arbitrary units (AU).</summary>
    public const string BanisterTrimp = "banister_trimp";

    /// <summary>Edwards' summated-zone load, arbitrary units (AU).</summary>
    public const string EdwardsLoad = "edwards_load";

    /// <summary>Lucia's three-zone load by the ventilatory thresholds, arbitrary units (AU).</summary>
    public const string LuciaLoad = "lucia_load";

    /// <summary>Stagno's load of team sports, arbitrary units (AU).</summary>
    public const string StagnoLoad = "stagno_load";

    /// <summary>Training impulse with a person's own weighting (Manzi), arbitrary units (AU).</summary>
    public const string IndividualTrimp = "individual_trimp";

    /// <summary>Rating of effort times minutes, arbitrary units (AU).</summary>
    public const string FosterLoad = "foster_load";

    /// <summary>Rating of effort of the whole session, 0 to 10 points (points). No load: a day's sum of it would mean nothing.</summary>
    public const string Rating = "rating";

    /// <summary>Timer time, else elapsed time, minutes (min).</summary>
    public const string Minutes = "minutes";

    /// <summary>Time at 3 METs and more by step cadence, speed or power, minutes (min).</summary>
    public const string MinutesModerate = "minutes_moderate";

    /// <summary>The part of it at 6 METs and more, minutes (min).</summary>
    public const string MinutesVigorous = "minutes_vigorous";

    /// <summary>Distance, metres (m).</summary>
    public const string Distance = "distance";

    /// <summary>Sum of the rises of altitude, metres (m).</summary>
    public const string Climb = "climb";

    /// <summary>Highest speed held for 1 s, metres per second (m/s). No load: a day's sum of it would mean nothing.</summary>
    public const string SpeedTop = "speed_top";

    /// <summary>The same over the person's best, a pure number (1). No load either.</summary>
    public const string SpeedTopShare = "speed_top_share";

    /// <summary>High accelerations, count.</summary>
    public const string Accelerations = "accelerations";

    /// <summary>High decelerations, count.</summary>
    public const string Decelerations = "decelerations";

    /// <summary>Highest power held for 1 s, watts (W), not on foot. No load.</summary>
    public const string PowerTop = "power_top";

    /// <summary>Begins the name of an estimated one-repetition maximum, kilograms (kg); exercise and machine follow. No load.</summary>
    public const string OneRepetitionMaxOf = "one_repetition_max_of_";

    /// <summary>Mechanical work, kilojoules (kJ).</summary>
    public const string Work = "work";

    /// <summary>Working sets, count.</summary>
    public const string Sets = "sets";

    /// <summary>Repetitions over all working sets, count.</summary>
    public const string Repetitions = "repetitions";

    /// <summary>Kilograms times repetitions over all working sets, kilograms (kg).</summary>
    public const string Kilograms = "kilograms";

    /// <summary>Every quantity that a group's load may be, whatever the bounds of the speed zones and the shares of the best speed.</summary>
    public static IReadOnlyList<string> All { get; } =
    [
        BanisterTrimp, EdwardsLoad, LuciaLoad, StagnoLoad, IndividualTrimp, FosterLoad, Minutes, MinutesModerate, MinutesVigorous, Distance, Climb, Accelerations,
        Decelerations, Work, Sets, Repetitions, Kilograms,
    ];

    /// <summary>The same, the distances above those bounds that are fast (<see cref="DistanceAbove"/>), and those above shares of the best speed
    /// (<see cref="SpeedMaxShares"/>).</summary>
    public static IReadOnlyList<string> AllWith(IReadOnlyList<double> speedBounds, IReadOnlyList<double> speedMaxShares) =>
    [
        .. All,
        .. DistanceAbove.Bounds(speedBounds).Select(DistanceAbove.Name),
        .. SpeedMaxShares.Distinct(speedMaxShares).Select(SpeedMaxShares.Name),
    ];

    /// <summary>True for a load that is computed from heart rate.</summary>
    public static bool IsOfHeartRate(string name) => name is BanisterTrimp or EdwardsLoad or LuciaLoad or StagnoLoad or IndividualTrimp;
}
