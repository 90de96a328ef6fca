using CsCheck;
using LoadWatch.Stimulus;

namespace LoadWatch.Recordings;

public class ExerciseWordTests
{
    [Theory]
    [InlineData("leg_press", "leg_press")]
    [InlineData("Leg Press", "leg_press")]
    [InlineData("  LEG -  press ", "leg_press")]
    [InlineData("leg\u2013press", "leg_press")]
    [InlineData("leg\u00a0press\t", "leg_press")]
    [InlineData("_leg__press_", "leg_press")]
    [InlineData("Legpress", "legpress")]
    [InlineData("Ylätalja 2", "ylätalja_2")]
    [InlineData("IRON", "iron")]
    [InlineData(" - ", null)]
    [InlineData("", null)]
    [InlineData(null, null)]
    public void CaseBlanksAndHyphensDoNotMatter(string? word, string? canonical) => Assert.Equal(canonical, ExerciseWord.Canonical(word));

    [Fact]
    public void TheCanonicalFormIsItsOwn() =>
        Gen.String.Sample(word => ExerciseWord.Canonical(ExerciseWord.Canonical(word)) == ExerciseWord.Canonical(word));

    [Fact]
    public void TheShippedWordsAreCanonical() =>
        Assert.All(DefaultRegions.Exercises.Keys, word => Assert.Equal(word, ExerciseWord.Canonical(word)));
}
