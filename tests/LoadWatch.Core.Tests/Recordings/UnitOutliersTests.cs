namespace LoadWatch.Recordings;

public class UnitOutliersTests
{
    /// <summary>
    /// By hand: the others move at 1, 2, 3 m/s in turn, median 2; the wrong one writes 3.6, 7.2, 10.8, median 7.2, 3.6 times 2, and its
    /// 99th percentile is 10.8.
    /// </summary>
    [Fact]
    public void SpeedsInAnotherUnitAreLeftOutAndThePersonIsNamed()
    {
        var file = UnitOutliers.LeaveOut(File([.. Others(5), Recording("Ida", 3.6, 7.2, 10.8)]));

        var warning = Assert.Single(file.Problems);
        Assert.Equal(ProblemSeverity.Warning, warning.Severity);
        Assert.Equal("Ida: speeds 3.6 times those of the others: another unit? Neither speed nor distance is used", warning.ToString());
        Assert.Equal([Channel.HeartRate], file.Recordings[5].Samples.Channels);
        Assert.Equal(30, file.Recordings[5].Samples.Count);
        Assert.Null(file.Recordings[5].DistanceMetres);
        Assert.All(file.Recordings.Take(5), recording => Assert.True(recording.Samples.Has(Channel.Speed)));
    }

    [Fact]
    public void WithFewerThanFiveOthersNothingIsSaid() => AssertSame(File([.. Others(4), Recording("Ida", 3.6, 7.2, 10.8)]));

    /// <summary>By hand: 5.0 is 2.5 times the others' 2, 5.1 is more.</summary>
    [Theory]
    [InlineData(5.0, false)]
    [InlineData(5.1, true)]
    public void MoreThanTwoAndAHalfTimesTheOthersIsTooMuch(double median, bool found) =>
        Assert.Equal(found, UnitOutliers.LeaveOut(File([.. Others(6), Recording("Ida", 3, median, 9)])).Problems.Count == 1);

    [Theory]
    [InlineData(8.0, false)]
    [InlineData(8.1, true)]
    public void OnlyOneWhoIsFastAtAllStandsOut(double fastest, bool found) =>
        Assert.Equal(found, UnitOutliers.LeaveOut(File([.. Others(6), Recording("Ida", 5, 6, fastest)])).Problems.Count == 1);

    [Fact]
    public void StandingIsLeftOutOfTheComparison() =>
        Assert.Single(UnitOutliers.LeaveOut(File([.. Others(6), Recording("Ida", 0, 0, 0.4, 0.49, 7, 9, double.NaN)])).Problems);

    [Fact]
    public void SeveralRecordingsOfAPersonAreJudgedTogether()
    {
        var file = UnitOutliers.LeaveOut(File([.. Others(5), Recording("Ida", 1, 2), Recording("Ida", 7, 8, 9), Recording("Ida", 7, 8, 9)]));

        Assert.StartsWith("Ida: speeds 3.5 times", Assert.Single(file.Problems).Reason); // 7 is the middle of 1, 2, 7, 7, 8, 8, 9, 9 by nearest rank.
        Assert.All(file.Recordings.Skip(5), recording => Assert.False(recording.Samples.Has(Channel.Speed)));
    }

    [Fact]
    public void AFileOfOneOwnerIsLeftAlone() => AssertSame(File([Recording(null, 100, 200, 300)]));

    [Fact]
    public void PeopleWithoutSpeedCountForNothing() =>
        AssertSame(File([.. Others(4), Recording("Ida", 3.6, 7.2, 10.8), Recording("Ole"), Recording("Pia", double.NaN)]));

    private static void AssertSame(DecodedFile file) => Assert.Same(file, UnitOutliers.LeaveOut(file));

    private static IEnumerable<Recording> Others(int count) => Enumerable.Range(0, count).Select(other => Recording($"P{other}", 1, 2, 3));

    private static DecodedFile File(IReadOnlyList<Recording> recordings) => new("csv", null, "pods", recordings, []);

    /// <summary>Each speed ten times, with as many distances and heart rates.</summary>
    private static Recording Recording(string? subject, params double[] speeds)
    {
        var column = Enumerable.Repeat(speeds, 10).SelectMany(one => one).ToArray();
        var series = Given.EverySecond(
            (Channel.HeartRate, [.. column.Select(_ => 140.0)]), (Channel.Speed, column), (Channel.Distance, [.. column.Select((_, row) => (double)row)]));
        return Given.Recording("soccer", series) with { Subject = subject, DistanceMetres = 29 };
    }
}
