using LoadWatch.Recordings;

namespace LoadWatch.Activities;

public class SamplesDigestTests
{
    private static readonly StrengthSet Plain = Given.Set("squat", 8, 80, 2);

    /// <summary>The digest is stored, so it must not change between versions. Computed independently (in Python) over the set's seven fields.</summary>
    [Fact]
    public void ASetOfADeviceKeepsItsDigest() => Assert.Equal(2978078002626050689, Of(Plain));

    [Fact]
    public void WhateverASetLogSaysMakesAnotherDigest()
    {
        StrengthSet[] sets =
        [
            Plain,
            Plain with { Machine = "2" },
            Plain with { Hardness = 2 },
            Plain with { Pin = 2 },
            Plain with { ConcentricSeconds = 2 },
            Plain with { Load = SetLoad.Pin },
            Plain with { Load = SetLoad.BodyWeight },
            Plain with { Load = SetLoad.Band },
            Plain with { IsHold = true },
            Plain with { IsFast = true },
            Plain with { BarSpeedMetresPerSecond = 2 },
        ];

        Assert.Equal(sets.Length, sets.Select(Of).Distinct().Count());
    }

    private static long Of(StrengthSet set) => SamplesDigest.Of(Given.Recording("training", SampleSeries.Empty, set));
}
