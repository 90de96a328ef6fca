using System.Globalization;
using CsCheck;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>
/// Every combination of what a set log may state. Where stated: 8 repetitions, 20 s, 50 kg, maximum 100 kg, 2 in reserve, hardness 9.
/// By hand, hard from c = 0.5/0.7 = 0.714 down: 10 to failure, c(k) = 1 - 0.5(k-1)/9, repetitions 7 and 8; 9 to failure (hardness 9 leaves 1), c(k) = 1 -
/// 0.5(k-1)/8, repetitions 6 to 8; load alone 0.5, none. Chart: 10 are 0.75, 9 are 0.77, all 8 hard.
/// </summary>
public class SetDemandTests
{
    private const string Loads = "weight pin_kg none zero body body_kg band pin";
    private const string Maxima = "fresh machine old undated estimated observed borrowed other none";

    /// <summary>Hold, fast, repetitions, seconds, load, maximum, reserve, hardness: then the rule, grade, share, error, hard repetitions, hard bouts.</summary>
    private static readonly string[] Table =
    [
        "yes *   *   no  *            *                  *   *   | unknown: seconds of the hold",
        "yes *   *   yes *            *                  no  no  | unknown: hardness of the hold",
        "yes *   *   yes *            *                  yes no  | Hold D 0.8 0.2 0 1",
        "yes *   *   yes *            *                  *   yes | Hold D 0.9 0.2 0 1",
        "no  *   no  *   *            *                  *   *   | unknown: repetitions",
        "no  yes yes *   weight,pin_kg fresh,machine,old,undated    * * | Fast C 0.5 0.02 8 0",
        "no  yes yes *   weight,pin_kg estimated,observed,borrowed  * * | Fast C 0.5 0.1 8 0",
        "no  yes yes *   weight,pin_kg other,none         *   *   | DeclaredFast D 0 0 8 0",
        "no  yes yes *   none,zero,body,body_kg,band,pin * * *    | DeclaredFast D 0 0 8 0",
        "no  no  yes *   weight,pin_kg fresh,machine      yes *   | LoadAndMaximum A 0.5 0.02 2 0",
        "no  no  yes *   weight,pin_kg fresh,machine      no  yes | LoadAndMaximum B 0.5 0.02 3 0",
        "no  no  yes *   weight,pin_kg fresh,machine      no  no  | LoadAndMaximum B 0.5 0.02 0 0",
        "no  no  yes *   weight,pin_kg old,undated        yes *   | LoadAndMaximum B 0.5 0.02 2 0",
        "no  no  yes *   weight,pin_kg old,undated        no  yes | LoadAndMaximum B 0.5 0.02 3 0",
        "no  no  yes *   weight,pin_kg old,undated        no  no  | LoadAndMaximum B 0.5 0.02 0 0",
        "no  no  yes *   weight,pin_kg estimated,observed,borrowed yes *   | LoadAndMaximum B 0.5 0.1 2 0",
        "no  no  yes *   weight,pin_kg estimated,observed,borrowed no  yes | LoadAndMaximum B 0.5 0.1 3 0",
        "no  no  yes *   weight,pin_kg estimated,observed,borrowed no  no  | LoadAndMaximum B 0.5 0.1 0 0",
        "no  no  yes *   weight,pin_kg other,none         yes *   | Chart B 0.75 0.1 8 0",
        "no  no  yes *   weight,pin_kg other,none         no  yes | Chart B 0.77 0.1 8 0",
        "no  no  yes *   weight,pin_kg other,none         no  no  | unknown: one_repetition_max, or repetitions in reserve up to 12 in all",
        "no  no  yes *   none,zero,body,body_kg,band,pin * yes *   | Chart D 0.75 0.2 8 0",
        "no  no  yes *   none,zero,body,body_kg,band,pin * no  yes | Chart D 0.77 0.2 8 0",
        "no  no  yes *   none,zero,body,body_kg,band,pin * no  no  | unknown: load, or repetitions in reserve up to 12 in all",
    ];

    [Fact]
    public void EveryCombinationOfASetLogIsReadByExactlyOneRow()
    {
        var rows = Table.Select(row => row.Split('|', StringSplitOptions.TrimEntries)).Select(row => (Pattern: Cells(row[0]), Told: row[1])).ToList();
        var faults = new List<string>();
        foreach (var combination in Combinations())
        {
            var told = rows.Where(row => row.Pattern.Zip(combination).All(pair => Fits(pair.First, pair.Second))).Select(row => row.Told).ToList();
            var read = Read(combination);
            if (told.Count != 1 || told[0] != read)
            {
                faults.Add($"{string.Join(' ', combination)}: {string.Join(" or ", told)}, not {read}");
            }
        }

        Assert.Empty(faults);
    }

    [Fact]
    public void TheTableHasARowForNothingElse()
    {
        var combinations = Combinations().ToList();

        Assert.Equal(64 * 8 * 9, combinations.Count);
        Assert.All(Table, row =>
        {
            var pattern = Cells(row.Split('|')[0]);
            Assert.Equal(8, pattern.Length);
            Assert.Contains(combinations, combination => pattern.Zip(combination).All(pair => Fits(pair.First, pair.Second)));
        });
    }

    /// <summary>Load chart: 8 repetitions are 0.80, 10.5 are 0.7375, 11.5 are 0.7125, 12 are 0.70, beyond it ends.</summary>
    [Theory]
    [InlineData(10, 0.80)]
    [InlineData(7.5, 0.7375)]
    [InlineData(6.5, 0.7125)]
    [InlineData(6, 0.70)]
    [InlineData(5.9, null)]
    [InlineData(10.1, null)]
    [InlineData(-1, null)]
    [InlineData(double.NaN, null)]
    public void AHardnessIsAReserveAndHalfPointsCount(double hardness, double? share)
    {
        var demand = Demand(Given.Set("squat", 8, null) with { Hardness = hardness });

        Assert.Equal(share, demand is null ? null : Math.Round(demand.RelativeLoad, 9));
    }

    /// <summary>At 30 % the mid reading is 0.9; from 70 % on every repetition is hard whatever the speed, and the better rule reads it.</summary>
    [Theory]
    [InlineData(29, SetRule.LoadAndMaximum, Grade.B, 0)]
    [InlineData(30, SetRule.Fast, Grade.C, 5)]
    [InlineData(69, SetRule.Fast, Grade.C, 5)]
    [InlineData(70, SetRule.LoadAndMaximum, Grade.B, 5)]
    public void FastWorkIsReadFromThirtyToSeventyPercent(double kilograms, SetRule rule, Grade grade, int hard)
    {
        var demand = Demand(Given.Set("squat", 5, kilograms) with { IsFast = true }, Anchor("fresh"))!;

        Assert.Equal((rule, grade), (demand.Rule, demand.Grade));
        Assert.Equal(hard, SetStimulus.Read([demand], Variant.Mid).HardRepetitions);
    }

    [Theory]
    [InlineData(50.0)]
    [InlineData(null)]
    public void NobodySawTheSpeedSoTheLowReadingOfFastWorkIsNone(double? kilograms)
    {
        var region = Region(Given.Set("squat", 8, kilograms) with { IsFast = true });

        Assert.Equal(new Band(0, 8, 8), region.HardRepetitions);
        Assert.Equal(1, region.HardSets);
        Assert.Contains("declared", Assert.Single(region.NotSeen), StringComparison.Ordinal);
    }

    /// <summary>60 % of the maximum; fast from 0.8 m/s on.</summary>
    [Theory]
    [InlineData(0.8, false, SetRule.Fast, Grade.B)]
    [InlineData(0.8, true, SetRule.Fast, Grade.B)]
    [InlineData(0.79, true, SetRule.LoadAndMaximum, Grade.B)]
    [InlineData(0.79, false, SetRule.LoadAndMaximum, Grade.B)]
    [InlineData(null, true, SetRule.Fast, Grade.C)]
    [InlineData(double.NaN, true, SetRule.Fast, Grade.C)]
    [InlineData(0.0, true, SetRule.Fast, Grade.C)]
    public void AMeasuredSpeedGoesBeforeTheDeclaration(double? speed, bool declared, SetRule rule, Grade grade)
    {
        var demand = Demand(Given.Set("squat", 5, 60) with { BarSpeedMetresPerSecond = speed, IsFast = declared }, Anchor("fresh"))!;

        Assert.Equal((rule, grade), (demand.Rule, demand.Grade));
    }

    [Fact]
    public void AMeasuredSpeedLeavesNothingToSayOfIt()
    {
        var measured = Region(Given.Set("squat", 8, 50) with { BarSpeedMetresPerSecond = 1 });

        Assert.Equal((new Band(0, 8, 8), Grade.B), (measured.HardRepetitions, measured.Grade));
        Assert.Empty(measured.NotSeen);
    }

    [Fact]
    public void WhatWasDeclaredFastButMeasuredSlowerSaysSo()
    {
        var slow = Region(Given.Set("squat", 8, 50, 2) with { BarSpeedMetresPerSecond = 0.5, IsFast = true });

        Assert.Equal("speed of 1 of 1 sets: declared fast, measured slower: read by the load", Assert.Single(slow.NotSeen));
    }

    /// <summary>0.7 / 1.2 = 0.583 and 0.7 / 0.8 = 0.875; the last 3 s count, all of the slow class from 0.33 on.</summary>
    [Fact]
    public void AHoldIsOneBoutAndOneSetAndNoRepetition()
    {
        var region = Region(Hold(60, 7));

        Assert.Equal(new Band(0, 1, 1), region.HardBouts);
        Assert.Equal(new Band(0, 0, 0), region.HardRepetitions);
        Assert.Equal((1, Grade.D, 3.0), (region.HardSets, region.Grade, region.SlowSeconds!.Value.Mid));
        Assert.Equal("force of 1 of 1 sets: held, only the last 3 s are read, by the rating", Assert.Single(region.NotSeen));
    }

    [Theory]
    [InlineData(60, 6.9, 3)]
    [InlineData(2.9, 10, 2.9)]
    [InlineData(3, 0, 0)]
    public void AnEasyOrShortHoldIsNoBout(double seconds, double hardness, double slow)
    {
        var reading = SetStimulus.Read([Demand(Hold(seconds, hardness))!], Variant.Mid);

        Assert.Equal((0, 0, 0), (reading.HardBouts, reading.HardSets, reading.HardRepetitions));
        Assert.Equal(slow, reading.Seconds.Slow, 1e-9);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(-1)]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    public void ATimeThatCannotBeIsNoHold(double seconds) => Assert.Null(Demand(Hold(seconds, 9)));

    [Fact]
    public void BoutsBesideAHoldThatCannotBeReadAreUnknownUntilTheLineIsReached()
    {
        var hold = Demand(Hold(20, 9))!;

        var two = SetStimulus.Of(BodyRegion.Legs, [hold, hold], unread: 1, [], Variants.Usual);
        var three = SetStimulus.Of(BodyRegion.Legs, [hold, hold, hold], unread: 1, [], Variants.Usual);

        Assert.True(two is { HardBouts: null, HardRepetitions: null, HardSets: null }, "unknown, not two");
        Assert.Equal((3, 3), (three.HardBouts!.Value.Mid, three.HardSets));
    }

    [Fact]
    public void ASessionWithoutAHoldHasNoBouts() => Assert.Null(Region(Given.Set("squat", 8, 50, 2)).HardBouts);

    /// <summary>80 % to failure: all 8 repetitions call on the whole of the largest class.</summary>
    [Theory]
    [InlineData(2.5, 20)]
    [InlineData(null, 8)]
    [InlineData(0.0, 8)]
    [InlineData(-2.0, 8)]
    [InlineData(21.0, 8)]
    [InlineData(double.NaN, 8)]
    public void StatedLiftingSecondsReplaceTheOneSecondARepetition(double? each, double seconds)
    {
        var demand = Demand(Given.Set("squat", 8, 80, 0) with { ConcentricSeconds = each }, Anchor("fresh"))!;

        Assert.Equal(seconds, SetStimulus.Read([demand], Variant.Mid).Seconds.Large, 1e-9);
        Assert.Equal(8, SetStimulus.Read([demand], Variant.Mid).HardRepetitions);
    }

    [Fact]
    public void AMaximumThatStandsInIsTold() =>
        Assert.Equal(
            ["maximum on the machine of 1 of 1 sets: that of the exercise stands in"],
            Region(Given.Set("squat", 8, 50, 2) with { Machine = "Rack 2" }).NotSeen);

    /// <summary>Whatever a log says, slips of writing too: drives are shares, in the order of the variants, and more hardness never asks for less.</summary>
    [Fact]
    public void DrivesAreOrderedSharesWhateverTheLogSays() =>
        Gen.Select(AnySet, OneOf(Maxima.Split(' ')), Gen.Double[0, 9.5]).Sample((set, maximum, hardness) =>
        {
            Anchor[] anchors = maximum == "none" ? [] : [Anchor(maximum)];
            var easier = Demand(set with { Hardness = hardness, RepetitionsInReserve = null }, anchors);
            var harder = Demand(set with { Hardness = hardness + 0.5, RepetitionsInReserve = null }, anchors);
            return IsOrdered(Demand(set, anchors)) && IsOrdered(easier) && IsOrdered(harder)
                && (easier is null || easier.Drives(Variant.Mid).Sum() <= harder!.Drives(Variant.Mid).Sum() + 1e-9);
        });

    private static Gen<double?> AnyNumber { get; } = Gen.OneOf(
        Gen.Double[0, 200].Select(number => (double?)number), OneOf<double?>(null, 0, -1, double.NaN, double.PositiveInfinity, 1e300));

    private static Gen<StrengthSet> AnySet { get; } = Gen.Select(
        Gen.Select(AnyNumber, AnyNumber, AnyNumber, AnyNumber),
        Gen.OneOf(Gen.Int[-2, 60].Select(number => (int?)number), OneOf<int?>(null, int.MaxValue)),
        Gen.Enum<SetLoad>(),
        Gen.Bool,
        Gen.Bool,
        (numbers, repetitions, load, hold, fast) => Given.Set("squat", repetitions, numbers.Item1, numbers.Item2) with
        {
            DurationSeconds = numbers.Item3,
            ConcentricSeconds = numbers.Item4,
            Load = load,
            IsHold = hold,
            IsFast = fast,
        });

    private static Gen<T> OneOf<T>(params T[] values) => Gen.Int[0, values.Length - 1].Select(index => values[index]);

    /// <summary>Of a quotient of numbers that differ in their last digits only.</summary>
    private const double Rounding = 1e-12;

    private static bool IsOrdered(SetDemand? demand)
    {
        if (demand is null)
        {
            return true;
        }

        var (low, mid, high) = (demand.Drives(Variant.Low).ToList(), demand.Drives(Variant.Mid).ToList(), demand.Drives(Variant.High).ToList());
        return Enumerable.Range(0, mid.Count).All(index => low[index] >= 0 && low[index] <= mid[index] + Rounding && mid[index] <= high[index] + Rounding && high[index] <= 1)
            && demand.SecondsEach > 0;
    }

    private static StrengthSet Hold(double seconds, double hardness) =>
        Given.Set("wall_sit", null, null) with { IsHold = true, DurationSeconds = seconds, Hardness = hardness };

    private static RegionStimulus Region(StrengthSet set) => SetStimulus.Of(BodyRegion.Legs, [Demand(set, Anchor("fresh"))!], unread: 0, [], Variants.Usual);

    private static SetDemand? Demand(StrengthSet set, params Anchor[] anchors) => SetDemand.Of(set, Given.Date, "p1", Given.Anchors(anchors), new()).Demand;

    private static string[] Cells(string pattern) => pattern.Split(' ', StringSplitOptions.RemoveEmptyEntries);

    private static bool Fits(string pattern, string word) => pattern == "*" || pattern.Split(',').Contains(word);

    private static IEnumerable<string[]> Combinations()
    {
        string[] dimensions = ["yes no", "yes no", "yes no", "yes no", Loads, Maxima, "yes no", "yes no"];
        return dimensions.Aggregate(
            (IEnumerable<string[]>)[[]],
            (all, words) => all.SelectMany(begun => words.Split(' ').Select(word => begun.Append(word).ToArray())));
    }

    private static string Read(string[] stated)
    {
        var (load, maximum) = (stated[4], stated[5]);
        var set = new StrengthSet(Given.Start, stated[3] == "yes" ? 20 : null, true, "squat", stated[2] == "yes" ? 8 : null, Kilograms(load))
        {
            IsHold = stated[0] == "yes",
            IsFast = stated[1] == "yes",
            RepetitionsInReserve = stated[6] == "yes" ? 2 : null,
            Hardness = stated[7] == "yes" ? 9 : null,
            Load = LoadOf(load),
            Pin = load is "pin" or "pin_kg" ? 7 : null,
            Machine = maximum is "machine" or "borrowed" or "other" ? "Rack 2" : null,
        };
        Anchor[] anchors = maximum == "none" ? [] : [Anchor(maximum)];
        var (demand, missing) = SetDemand.Of(set, Given.Date, "p1", Given.Anchors(anchors), new());
        return demand is null ? $"unknown: {missing}" : Told(demand);
    }

    private static string Told(SetDemand demand)
    {
        var reading = SetStimulus.Read([demand], Variant.Mid);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{demand.Rule} {demand.Grade} {demand.RelativeLoad} {demand.RelativeError} {reading.HardRepetitions} {reading.HardBouts}");
    }

    private static double? Kilograms(string load) => load switch
    {
        "weight" or "pin_kg" or "body_kg" or "band" => 50,
        "zero" => 0,
        _ => null,
    };

    private static SetLoad LoadOf(string load) => load switch
    {
        "pin" or "pin_kg" => SetLoad.Pin,
        "body" or "body_kg" => SetLoad.BodyWeight,
        "band" => SetLoad.Band,
        _ => SetLoad.Weight,
    };

    private static Anchor Anchor(string maximum)
    {
        var fresh = Given.Anchor(AnchorKind.OneRepetitionMax, 100, Given.Date.PlusDays(-7), exercise: "squat");
        return maximum switch
        {
            "machine" => fresh with { Machine = "rack 2" },
            "other" => fresh with { Machine = "rack 1" },
            "old" => fresh with { Date = Given.Date.PlusDays(-57) },
            "undated" => fresh with { Date = null },
            "estimated" => fresh with { Source = AnchorSource.Estimated },
            "observed" => fresh with { Source = AnchorSource.Observed },
            _ => fresh,
        };
    }
}
