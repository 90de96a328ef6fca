using System.Globalization;
using LoadWatch.Stimulus;

namespace LoadWatch.Service.Explain;

/// <summary>How a channel is read for what it asked of the motor units, and after whom.</summary>
internal sealed record StimulusFormula(string Formula, string Source)
{
    /// <summary>When a day of a region is heavy or fast.</summary>
    public const string HeavyOrFast = "heavy or fast: 3 hard bouts (3 s or more at a relative drive of 0.70), or 6 hard repetitions in 2 sets (a choice; mid values)";

    private const string Pool = "the pool of 120 motor units of Potvin and Fuglevand 2017, PLoS Comput Biol 13(6):e1005581; how intensity becomes drive is an assumption";

    /// <summary>Null where nothing was read.</summary>
    public static StimulusFormula? Of(string channel) => channel switch
    {
        StimulusChannels.Power => new("drive 0.65 at critical power, 1 at the maximal power that what is left of W' allows; class seconds = recruited share of the class x time", Pool),
        StimulusChannels.Speed => new("drive 0.65 at critical speed, 1 at the maximal speed that what is left of D' allows; slopes as the speed on the level of the same cost", $"{Pool}; slopes by Minetti et al. 2002"),
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

    /// <summary>What no measurement stands behind; nothing where nothing was read.</summary>
    /// <param name="age">Full years on the date, or null where unknown.</param>
    public static IEnumerable<string> Assumptions(string channel, int? age) => channel is StimulusChannels.None or StimulusChannels.Declared
        ? []
        :
        [
            $"the low and high ends of each band are the same session read with large units joining late and early (recruitment range 70 and 30, usually 50; {Spans(age)} either way)",
        ];

    private static string Spans(int? age)
    {
        var older = Variants.Of(age) == Variants.Older;
        var critical = (Variants.Of(age).High.CriticalDrive - Variant.Mid.CriticalDrive).ToString("0.###", CultureInfo.InvariantCulture);
        return $"class shares {(older ? 15 : 10)} points and critical drive {critical}{(older ? $" from {Variants.OlderFrom} years on" : "")}";
    }
}
