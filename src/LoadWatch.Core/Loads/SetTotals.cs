using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>Working sets, repetitions and kilograms of a session, and the maxima that they let expect. The rest between two sets is no work.</summary>
public static class SetTotals
{
    /// <summary>Beyond it a stated load is a slip of writing; no one lifts it.</summary>
    public const double MostKilograms = 10_000;

    /// <summary>
    /// Sums over what is stated; a total of which nothing is stated is absent, and the remark says which sets lack what. A hold has no repetitions, and
    /// body weight alone is 0 kg: neither lacks anything.
    /// </summary>
    public static (IReadOnlyList<Quantity> Quantities, string? Remark) Of(IReadOnlyList<StrengthSet> sets, OneRepetitionMaxEquation equation)
    {
        var work = sets.Where(set => set.Active).ToList();
        if (work.Count == 0)
        {
            return ([], null);
        }

        var moved = work.FindAll(set => !set.IsHold);
        var counted = moved.FindAll(set => set.Repetitions is not null);
        var weighed = counted.FindAll(set => Kilograms(set) is >= 0 and <= MostKilograms);
        List<Quantity> quantities = [new(QuantityNames.Sets, work.Count, "count", Estimated: false)];
        if (counted.Count > 0)
        {
            quantities.Add(new(QuantityNames.Repetitions, counted.Sum(set => (long)set.Repetitions!), "count", Estimated: false));
        }

        if (weighed.Count > 0)
        {
            var kilograms = weighed.Sum(set => Kilograms(set)!.Value * set.Repetitions!.Value);
            quantities.Add(new(QuantityNames.Kilograms, Significant.Round(kilograms), "kg", Estimated: false));
        }

        quantities.AddRange(OneRepetitionMaxEstimate.Of(counted, equation));
        return (quantities, Remark(work.Count, moved.Count, counted.Count, weighed.Count));
    }

    private static double? Kilograms(StrengthSet set) => set.Kilograms ?? (set.Load == SetLoad.BodyWeight ? 0 : null);

    private static string? Remark(int sets, int moved, int counted, int weighed)
    {
        List<string> lacking = [];
        if (counted < moved)
        {
            lacking.Add($"{moved - counted} without repetitions");
        }

        if (weighed < counted)
        {
            lacking.Add($"{counted - weighed} without kilograms");
        }

        return lacking.Count == 0 ? null : $"of {sets} working sets {string.Join(", ", lacking)}: the totals are of the others";
    }
}
