using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>How hard a working set was against the person's maximum.</summary>
/// <param name="Repetitions">1 or more; 0 of a hold.</param>
/// <param name="RelativeLoad">Load over one-repetition maximum, above 0; of a hold its hardness over 10; 0 where only the declaration is known.</param>
/// <param name="RelativeError">Of the maximum.</param>
/// <param name="Reserve">Repetitions that would still have been possible; null where not stated or not asked.</param>
public sealed record SetDemand(int Repetitions, double RelativeLoad, double RelativeError, double? Reserve, Grade Grade, SetRule Rule)
{
    /// <summary>What each repetition counts for, s; of a hold, the part of it that is read.</summary>
    public double SecondsEach { get; init; } = 1;

    /// <summary>How many times the load a repetition counts that was fast.</summary>
    public double FastFactor { get; init; } = 1;

    /// <summary>Whether it was declared fast, but measured slower.</summary>
    public bool IsSlowerThanDeclared { get; init; }

    /// <summary>Whether the maximum of the exercise alone stood in for that of the machine.</summary>
    public bool IsMaximumBorrowed { get; init; }

    /// <summary>
    /// The demand, or null with what is missing. In this order:
    /// <list type="bullet">
    /// <item>A hold, with seconds and a hardness or reserve: <see cref="SetRule.Hold"/>, D. The rating says how near the end was, so the last 3 s are
    /// read at e = hardness / 10 and what came before is left out: a lower bound, a choice. The load is not asked: a maximum of lifting is none of
    /// holding.</item>
    /// <item>No repetitions: unknown.</item>
    /// <item>Fast, with load and maximum, within <see cref="FastDrive"/>: <see cref="SetRule.Fast"/>, B by a measured speed of the bar, C as declared; one that
    /// was measured slower is not fast. Without either: <see cref="SetRule.DeclaredFast"/>, D; the reserve is not asked, fast work ends long before failure.</item>
    /// <item>Load and maximum: <see cref="SetRule.LoadAndMaximum"/>; A with a counted reserve against a freshly measured maximum of this machine, else
    /// B.</item>
    /// <item>Repetitions done and in reserve up to 12: <see cref="SetRule.Chart"/>; B with a load, D without (body weight, band, pin).</item>
    /// <item>Otherwise unknown.</item>
    /// </list>
    /// </summary>
    public static (SetDemand? Demand, string? Missing) Of(StrengthSet set, LocalDate date, string person, AnchorBook anchors, EquationChoices equations)
    {
        var stated = new StatedSet(set);
        if (set.IsHold)
        {
            return OfHold(stated);
        }

        if (stated.Repetitions is not { } repetitions)
        {
            return (null, "repetitions");
        }

        var demand = stated.Kilograms is { } load && SetMaximum.Of(set, date, person, anchors) is { } maximum
            ? FromMaximum(stated, repetitions, load, maximum, equations)
            : set.IsFast
                ? new SetDemand(repetitions, 0, 0, Reserve: null, Grade.D, SetRule.DeclaredFast)
                : FromRepetitions(stated, repetitions, equations.OneRepetitionMaxByRepetitions);
        return demand is null
            ? (null, $"{(stated.Kilograms is null ? "load" : "one_repetition_max")}, or repetitions in reserve up to 12 in all")
            : (demand with { SecondsEach = stated.RepetitionSeconds }, null);
    }

    /// <summary>
    /// Relative drive of each repetition in a variant, or of the end of a hold. Without a stated reserve it is the load alone, a lower bound, and the high
    /// variant reads the set as taken to failure.
    /// </summary>
    public IEnumerable<double> Drives(Variant variant)
    {
        var load = RelativeLoad / variant.Capacity(1, RelativeError);
        double? failing = Reserve is { } left ? Repetitions + left : variant.Side > 0 ? Repetitions : null;
        return Rule switch
        {
            SetRule.Hold => [Math.Min(1, load)],
            SetRule.Fast => Enumerable.Repeat(FastDrive.Of(load, FastFactor, variant), Repetitions),
            SetRule.DeclaredFast => Enumerable.Repeat(FastDrive.Declared(variant), Repetitions),
            _ => Enumerable.Range(1, Repetitions).Select(repetition => StrengthDrive.Of(load, repetition, failing)),
        };
    }

    private static (SetDemand? Demand, string? Missing) OfHold(StatedSet stated)
    {
        if (stated.HeldSeconds is not { } held)
        {
            return (null, "seconds of the hold");
        }

        return stated.HoldHardness is { } hardness
            ? (new SetDemand(0, hardness / 10, CapacityError.Population, Reserve: null, Grade.D, SetRule.Hold)
            {
                SecondsEach = Math.Min(held, HardBouts.ShortestSeconds),
            }, null)
            : (null, "hardness of the hold");
    }

    private static SetDemand FromMaximum(StatedSet stated, int repetitions, double load, SetMaximum maximum, EquationChoices equations)
    {
        var share = load / maximum.Kilograms;
        bool? isMeasuredFast = stated.BarSpeed is { } speed ? speed >= equations.FastBarSpeed : null;
        var demand = (isMeasuredFast ?? stated.Set.IsFast) && FastDrive.Applies(share)
            ? new SetDemand(repetitions, share, maximum.RelativeError, Reserve: null, isMeasuredFast is null ? Grade.C : Grade.B, SetRule.Fast)
            {
                FastFactor = equations.FastLoadFactor,
            }
            : new SetDemand(repetitions, share, maximum.RelativeError, stated.Reserve, GradeOf(stated, maximum), SetRule.LoadAndMaximum)
            {
                IsSlowerThanDeclared = stated.Set.IsFast && isMeasuredFast == false && FastDrive.Applies(share),
            };
        return demand with { IsMaximumBorrowed = !maximum.IsOfMachine };
    }

    private static Grade GradeOf(StatedSet stated, SetMaximum maximum) =>
        maximum.IsFresh && stated.CountedReserve is not null ? Grade.A : Grade.B;

    private static SetDemand? FromRepetitions(StatedSet stated, int repetitions, OneRepetitionMaxEquation equation)
    {
        if (stated.Reserve is not { } left || equation.Share(repetitions + left) is not { } share)
        {
            return null;
        }

        return stated.Kilograms is null
            ? new SetDemand(repetitions, share, CapacityError.Population, left, Grade.D, SetRule.Chart)
            : new SetDemand(repetitions, share, CapacityError.Estimated, left, Grade.B, SetRule.Chart);
    }
}
