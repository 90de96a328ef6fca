using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Tests.Notices;

// The waits are a choice after common practice, no published source; the five days are the upper end of RFC 5321 (Klensin, 2008), section 4.5.4.1.
public sealed class DeliveryScheduleTests
{
    private static readonly Instant First = Instant.FromUtc(2026, 3, 1, 5, 30);

    [Theory]
    [InlineData(1, 1)]
    [InlineData(2, 2)]
    [InlineData(3, 5)]
    [InlineData(4, 10)]
    [InlineData(5, 20)]
    [InlineData(6, 30)]
    [InlineData(7, 30)]
    [InlineData(200, 30)]
    public void TheWaitGrowsToHalfAnHour(int attempts, int minutes) =>
        Assert.Equal(Duration.FromMinutes(minutes), DeliverySchedule.Next(First, First, attempts, DeliveryTrouble.Passing) - First);

    [Theory]
    [InlineData(1, 15)]
    [InlineData(4, 15)]
    [InlineData(5, 20)]
    [InlineData(6, 30)]
    public void ARefusedLoginIsTriedAfterAQuarterOfAnHourAtTheLeast(int attempts, int minutes) =>
        Assert.Equal(Duration.FromMinutes(minutes), DeliverySchedule.Next(First, First, attempts, DeliveryTrouble.Standing) - First);

    [Theory]
    [InlineData(DeliveryTrouble.Passing)]
    [InlineData(DeliveryTrouble.Standing)]
    public void AfterFiveDaysItIsGivenUp(DeliveryTrouble trouble)
    {
        var last = First + Duration.FromDays(5);

        Assert.NotNull(DeliverySchedule.Next(First, last - Duration.FromMilliseconds(1), 240, trouble));
        Assert.Null(DeliverySchedule.Next(First, last, 240, trouble));
    }

    [Fact]
    public void ADeliveryThatNeverFailedHasNoNextTry() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => DeliverySchedule.Next(First, First, 0, DeliveryTrouble.Passing));
}
