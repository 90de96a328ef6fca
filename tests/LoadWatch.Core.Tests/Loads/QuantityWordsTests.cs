using LoadWatch.Loads;

namespace LoadWatch.Tests.Loads;

public class QuantityWordsTests
{
    [Theory]
    [InlineData("distance_above_5_5_m_s", "distance at 5.5 m/s and faster")]
    [InlineData("distance_above_7_m_s", "distance at 7 m/s and faster")]
    [InlineData("distance_above_80_percent_speed_max", "distance at 80 % of the own top speed and faster")]
    [InlineData("distance_above_percent_speed_max", "\"distance above percent speed max\"")]
    [InlineData("one_repetition_max_of_leg_press", "estimated maximum of leg press")]
    [InlineData("distance_above_the_line", "\"distance above the line\"")]
    [InlineData("distance_above__m_s", "\"distance above  m s\"")]
    [InlineData("distance_above_m_s", "\"distance above m s\"")]
    [InlineData("sprints_of_pods", "\"sprints of pods\"")]
    [InlineData("kilograms", "weight lifted")]
    public void ANameIsSaidInWords(string name, string words) => Assert.Equal(words, QuantityWords.Of(name));

    [Fact]
    public void EveryBuiltInQuantityHasWords() =>
        Assert.All(QuantityNames.AllWith([5.5, 6.25], [0.8, 0.925]).Concat(["speed_top", "speed_top_share", "power_top", "rating"]), name => Assert.DoesNotMatch("[_\"]", QuantityWords.Of(name)));
}
