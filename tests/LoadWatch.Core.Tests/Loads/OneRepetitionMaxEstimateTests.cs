using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class OneRepetitionMaxEstimateTests
{
    /// <summary>By hand from the load chart: 8 done and 2 in reserve are 75 %, 75 / 0.75 = 100; 5 and 0 are 87 %, 87 / 0.87 = 100.</summary>
    [Fact]
    public void TheBestSetOfAnExerciseOnAMachineTells()
    {
        var quantities = OneRepetitionMaxEstimate.Of(
        [
            Given.Set("Leg Press", 8, 75, 2),
            Given.Set("leg_press", 8, 60, 2),
            Given.Set("leg-press", 5, 174, 0) with { Machine = "Press 2" },
            Given.Set("leg press", 8, 75, null) with { Hardness = 8 },
        ],
        OneRepetitionMaxEquation.LoadChart);

        Assert.Equal(
            [("one_repetition_max_of_leg_press", 100.0), ("one_repetition_max_of_leg_press_on_press_2", 200.0)],
            quantities.Select(one => (one.Name, one.Value)));
    }

    [Fact]
    public void WhatIsNoLoadOrFarFromFailureTellsNothing()
    {
        var set = Given.Set("pull_up", 8, 75, 2);

        Assert.NotNull(OneRepetitionMaxEstimate.KilogramsOf(set with { Load = SetLoad.Pin }, default));
        Assert.All(
            [
                set with { Load = SetLoad.BodyWeight },
                set with { Load = SetLoad.Band },
                set with { IsFast = true },
                set with { IsHold = true },
                set with { RepetitionsInReserve = 5 },
                set with { RepetitionsInReserve = null },
                set with { Kilograms = 0 },
            ],
            one => Assert.Null(OneRepetitionMaxEstimate.KilogramsOf(one, default)));
    }
}
