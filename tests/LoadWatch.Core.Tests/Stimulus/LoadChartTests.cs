namespace LoadWatch.Stimulus;

public class LoadChartTests
{
    /// <summary>Training load chart of the National Strength and Conditioning Association; 11 and halves interpolated by hand.</summary>
    [Theory]
    [InlineData(1, 1.00)]
    [InlineData(2, 0.95)]
    [InlineData(5, 0.87)]
    [InlineData(8, 0.80)]
    [InlineData(8.5, 0.785)]
    [InlineData(10, 0.75)]
    [InlineData(11, 0.725)]
    [InlineData(12, 0.70)]
    public void RepetitionsToFailureNameALoad(double repetitions, double share) => Assert.Equal(share, LoadChart.Share(repetitions)!.Value, 1e-9);

    [Theory]
    [InlineData(0.5)]
    [InlineData(12.5)]
    [InlineData(double.NaN)]
    public void OutsideTheChartTheLoadIsUnknown(double repetitions) => Assert.Null(LoadChart.Share(repetitions));
}
