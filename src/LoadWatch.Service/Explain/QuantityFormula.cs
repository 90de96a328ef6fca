using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Service.Explain;

/// <summary>How a quantity of a session is computed, and after whom.</summary>
/// <param name="Formula">In symbols or plain words.</param>
/// <param name="Source">Authors, year, title; "common practice" where nothing is published; what is from memory says so.</param>
public sealed record QuantityFormula(string Formula, string Source)
{
    private const string NoSource = "a plain total, no source needed";
    private const string Practice = "common practice, no published source";
    private const string EffortSource = "Tudor-Locke et al. 2019, 2020, 2021, Int J Behav Nutr Phys Act; Bushman 2020, ACSM's Health Fit J 24(4)";

    /// <summary>Null for a quantity that a table states: it is taken as it stands.</summary>
    /// <param name="ageYears">Of the person on the date of the session; null where not known.</param>
    public static QuantityFormula? Of(string quantity, EquationChoices equations, int? ageYears) => quantity switch
    {
        QuantityNames.BanisterTrimp => new(
            "sum over the readings of minutes x a exp(b x), x = (heart rate - resting) / (maximal - resting), held within 0 and 1",
            "Morton, Fitz-Clarke and Banister 1990, J Appl Physiol 69:1171-1177; factors from secondary pages that agree"),
        QuantityNames.IndividualTrimp => new(
            "sum over the readings of minutes x a exp(b x), with the person's own a and b",
            "Manzi et al. 2009, Med Sci Sports Exerc 41:2090-2096 (pages from memory)"),
        QuantityNames.EdwardsLoad => new(
            "sum of minutes x weight in the zones from 50, 60, 70, 80 and 90 % of maximal heart rate",
            "Edwards 1993, The Heart Rate Monitor Book (weights from memory)"),
        QuantityNames.LuciaLoad => new(
            "sum of minutes x weight below the first threshold, between the two, and above the second",
            "Lucia et al. 2003, Med Sci Sports Exerc 35:872-878 (multipliers from memory)"),
        QuantityNames.StagnoLoad => new(
            "sum of minutes x weight in five zones of maximal heart rate",
            "Stagno, Thatcher and van Someren 2007, J Sports Sci 25:629-634 (zones and weights from memory)"),
        QuantityNames.FosterLoad => new("rating of effort (0 to 10) x minutes", "Foster 1998, Med Sci Sports Exerc 30:1164-1168; Foster et al. 2001, J Strength Cond Res 15:109-115 (titles from memory)"),
        QuantityNames.Minutes => new("timer time, else elapsed time", NoSource),
        QuantityNames.Distance => new("as the session states it, else largest less smallest reading", NoSource),
        QuantityNames.Climb => new("sum of the rises from each low to the next high, a turn counting from 3 m on", Practice),
        QuantityNames.Work => new("sum of power x time over usable readings", NoSource),
        QuantityNames.SpeedTop or QuantityNames.PowerTop => new("highest value held for 1 s", Practice),
        QuantityNames.SpeedTopShare => new("top speed / the person's best speed", Practice),
        QuantityNames.Accelerations or QuantityNames.Decelerations => new(
            "efforts of 2.5 m/s2 or more, by the slope of speed over half a second, held for 0.5 s at ten readings a second or more, for 1 s at fewer",
            "bound and sampling: Harper, Carling and Kiely 2019, Sports Med 49:1923 (above 2.5 m/s2; 2.5 itself counts here); how long an effort lasts is a choice"),
        QuantityNames.MinutesModerate => OfEffort("3", StepCadence.Lines(equations.StepCadence, ageYears).Moderate),
        QuantityNames.MinutesVigorous => OfEffort("6", StepCadence.Lines(equations.StepCadence, ageYears).Vigorous),
        QuantityNames.Sets or QuantityNames.Repetitions => new("counted over the working sets", NoSource),
        QuantityNames.Kilograms => new("sum of kilograms x repetitions over the working sets", NoSource),
        _ when quantity.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal) => OfMaximum(equations.OneRepetitionMaxByRepetitions),
        _ when quantity.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal) => new("sum of speed x time at the bound and faster, a reading taken as the middle of its tenth of a metre per second (up to 0.05 m/s off)", "common practice; no consensus on bounds (Gualtieri et al. 2023, Front Sports Act Living 5:1116293)"),
        _ => null,
    };

    private static QuantityFormula OfEffort(string mets, double stepsPerMinute) => new(
        FormattableString.Invariant(
            $"minutes of {mets} METs and more: on foot from {stepsPerMinute} steps a minute on where cadence is usable, else by the oxygen cost of speed and climb; on a bicycle by that of power and body mass"),
        EffortSource);

    private static QuantityFormula OfMaximum(OneRepetitionMaxEquation equation) =>
        new("kilograms / the share of the maximum that repetitions done and in reserve let expect, the highest of the sets", SourceOf(equation));

    /// <summary>Of the share of the maximum that so many repetitions to failure let expect.</summary>
    public static string SourceOf(OneRepetitionMaxEquation equation) => equation switch
    {
        OneRepetitionMaxEquation.Epley => "1 + r / 30: Epley 1985, Poundage chart",
        OneRepetitionMaxEquation.Brzycki => "36 / (37 - r): Brzycki 1993, J Phys Educ Recreat Dance 64:88-90",
        OneRepetitionMaxEquation.Lander => "100 / (101.3 - 2.67123 r): Lander 1985 (from memory)",
        OneRepetitionMaxEquation.Mayhew => "100 / (52.2 + 41.9 exp(-0.055 r)): Mayhew et al. 1992",
        OneRepetitionMaxEquation.Wathan => "100 / (48.8 + 53.8 exp(-0.075 r)): Wathan 1994, Load assignment",
        _ => "the training load chart of the National Strength and Conditioning Association",
    };
}
