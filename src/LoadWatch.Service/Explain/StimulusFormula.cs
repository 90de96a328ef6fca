using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Explain;

/// <summary>How a channel is read for what it asked of the motor units, and after whom.</summary>
internal sealed record StimulusFormula(string Formula, string Source)
{
    /// <summary>When a day of a region is heavy or fast.</summary>
    public const string HeavyOrFast = "heavy or fast: 3 hard bouts (3 s or more at a relative drive of 0.70), or 6 hard repetitions in 2 sets (a choice; mid values)";

    private const string Pool = "the pool of 120 motor units of Potvin and Fuglevand 2017, PLoS Comput Biol 13(6):e1005581; how intensity becomes drive is an assumption";

    private const string Zourdos = "Zourdos et al. 2016, J Strength Cond Res 30:267-275";

    /// <summary>Null where nothing was read.</summary>
    public static StimulusFormula? Of(string channel) => channel switch
    {
        StimulusChannels.Power => new("drive 0.65 at critical power, 1 at the maximal power that what is left of W' allows, where there is a true one; class seconds = recruited share of the class x time", Pool),
        StimulusChannels.Speed => new("drive 0.65 at critical speed, 1 at the maximal speed that what is left of D' allows, where there is a true one; slopes as the speed on the level of the same cost", $"{Pool}; slopes by Minetti et al. 2002"),
        StimulusChannels.HeartRate => new("drive 0.65 at the second threshold (85 % of the reserve where none is anchored), in proportion below", Pool),
        StimulusChannels.Sets => new("drive = load / capacity, which falls evenly from the rested maximum to the load at the repetition that fails", Pool),
        StimulusChannels.Declared => new("taken as staff declared it", "no source: a statement"),
        _ => null,
    };

    public static string Of(Grade grade) => grade switch
    {
        Grade.A => "demand and maximum measured",
        Grade.B => "one of them estimated from own bests, or a lower bound of a logged set",
        Grade.C => "inferred",
        Grade.D => "a lower bound, declared, or without load",
        _ => "heart rate only: bouts unknown, never none",
    };

    /// <summary>How a set is read by a rule, and after whom.</summary>
    public static StimulusFormula Of(SetRule rule, EquationChoices equations) => rule switch
    {
        SetRule.LoadAndMaximum => new(
            "load and maximum: L = load / one-repetition maximum; before repetition k of m to failure the capacity is 1 - (1 - L)(k - 1)/(m - 1), drive = L / capacity; without a reserve drive = L",
            $"{Pool}; reserve = 10 - hardness: {Zourdos}"),
        SetRule.Chart => new(
            "repetitions to failure: L is what so many repetitions, done and in reserve, let expect, up to 12 in all; then as with load and maximum",
            $"{QuantityFormula.SourceOf(equations.OneRepetitionMaxByRepetitions)}; reserve = 10 - hardness: {Zourdos}"),
        SetRule.Fast => new(
            string.Create(CultureInfo.InvariantCulture, $"fast: drive = {equations.FastLoadFactor:0.##} x L, at most 1, from 30 to 70 % of the maximum; the low reading takes L alone; a measured bar is fast from {equations.FastBarSpeed:0.##} m/s on"),
            "Desmedt and Godaux 1977, J Physiol 264:673-693: units join a fast contraction at about a third of the force (the third from memory)"),
        SetRule.DeclaredFast => new("fast as declared, nothing else known: drive 0.70, low 0, high 1", "no source: a statement, the numbers are a choice"),
        _ => new(
            "hold: drive = hardness / 10 over its last 3 s; what came before is left out, a lower bound",
            $"no source: a choice; hardness = 10 - reserve where only that is stated: {Zourdos}"),
    };

    /// <summary>What no measurement stands behind; nothing where nothing was read.</summary>
    /// <param name="age">Full years on the date, or null where unknown.</param>
    /// <param name="steps">Of power or speed; null where they are not known, and nothing is said of what lies above the critical value.</param>
    /// <param name="rules">By which sets were read; empty where that is not known.</param>
    public static IEnumerable<string> Assumptions(string channel, int? age, EnduranceSteps? steps, IReadOnlyCollection<SetRule> rules) =>
        channel is StimulusChannels.None or StimulusChannels.Declared ? [] : [.. OfChannel(channel, steps, rules), .. OfAll(channel, age)];

    private static IEnumerable<string> OfChannel(string channel, EnduranceSteps? steps, IReadOnlyCollection<SetRule> rules) => channel switch
    {
        StimulusChannels.Power => [AtCritical("critical power"), .. Above("critical power", "W'", steps)],
        StimulusChannels.Speed =>
        [
            AtCritical("critical speed"),
            .. Above("critical speed", "D'", steps),
            .. steps is { LowestLeft: not null } ? [string.Create(CultureInfo.InvariantCulture, $"D' comes back as W' does, critical speed standing for {WPrimeBalance.FittedCriticalWatts:0} W")] : Array.Empty<string>(),
        ],
        StimulusChannels.HeartRate => [AtCritical("the second threshold") + ", in proportion below it"],
        _ =>
        [
            .. rules.Count == 0 || rules.Any(rule => rule is SetRule.LoadAndMaximum or SetRule.Chart)
                ? ["within a set the capacity falls evenly, from the rested maximum to the load at the repetition that fails"]
                : Array.Empty<string>(),
            .. rules.All(rule => rule == SetRule.Hold) && rules.Count > 0 ? Array.Empty<string>() : ["a repetition lifts for 1 s where nothing else is stated"],
        ],
    };

    private static string AtCritical(string critical) => string.Create(CultureInfo.InvariantCulture, $"the relative drive at {critical} is {Variant.Mid.CriticalDrive:0.00}");

    private static IEnumerable<string> Above(string critical, string reserve, EnduranceSteps? steps) => steps switch
    {
        null => [],
        { Limits.Maximum: null } => [$"without a true maximum every moment above {critical} is read as at it, a lower bound"],
        { LowestLeft: null } => [$"every moment above {critical} is read as fresh"],
        _ => [$"what can be given above {critical} falls in proportion to what is left of {reserve}"],
    };

    private static IEnumerable<string> OfAll(string channel, int? age)
    {
        yield return "one pool of motor units stands for all muscles that the work goes through, its three classes by their share of force";
        if (channel != StimulusChannels.HeartRate)
        {
            yield return string.Create(CultureInfo.InvariantCulture, $"work is hard from a relative drive of {HardLine.Drive:0.00} on");
        }

        yield return $"the low and high ends of each band are the same session read with large units joining late and early (recruitment range 70 and 30, usually 50; {Spans(age)} either way)";
    }

    private static string Spans(int? age)
    {
        var older = Variants.Of(age) == Variants.Older;
        var critical = (Variants.Of(age).High.CriticalDrive - Variant.Mid.CriticalDrive).ToString("0.###", CultureInfo.InvariantCulture);
        return $"class shares {(older ? 15 : 10)} points and critical drive {critical}{(older ? $" from {Variants.OlderFrom} years on" : "")}";
    }
}
