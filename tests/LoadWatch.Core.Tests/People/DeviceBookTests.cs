using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Tests.People;

public class DeviceBookTests
{
    private static readonly DeviceBook Book = new(
    [
        new DeviceAssignment("4711", "anna", null, March(10), null, 2),
        new DeviceAssignment("4711", "bo", March(12), null, null, 3),
        new DeviceAssignment("pod-A", "anna", March(2), March(2), 1, 4),
        new DeviceAssignment("pod-A", "bo", March(2), March(2), 2, 5),
    ]);

    [Theory]
    [InlineData("4711", 1, null, "anna")]
    [InlineData("4711", 10, null, "anna")]
    [InlineData("4711", 11, null, null)]
    [InlineData("4711", 12, 3, "bo")]
    [InlineData("POD-a", 2, 1, "anna")]
    [InlineData("pod-A", 2, 2, "bo")]
    [InlineData("pod-A", 2, 3, null)]
    [InlineData("pod-A", 2, null, null)] // Only the session's number would tell.
    [InlineData("pod-B", 2, 1, null)]
    public void ASerialNumberIsSomebodysOnADate(string serial, int day, int? session, string? person) => Assert.Equal(person, Book.On(serial, March(day), session));

    [Theory]
    [InlineData(1, 5, null, 5, 9, null, true)]
    [InlineData(1, 5, null, 6, 9, null, false)]
    [InlineData(1, null, null, 9, 9, null, true)]
    [InlineData(1, 5, 1, 5, 5, 2, false)]
    [InlineData(1, 5, 1, 5, 5, 1, true)]
    [InlineData(1, 5, 1, 5, 5, null, true)]
    public void TwoOfOneDeviceOverlapWhereASessionWouldBeBoths(int from, int? to, int? session, int otherFrom, int? otherTo, int? otherSession, bool overlap)
    {
        var one = new DeviceAssignment("4711", "anna", March(from), to is { } last ? March(last) : null, session, 2);
        var other = new DeviceAssignment("4711", "bo", March(otherFrom), otherTo is { } otherLast ? March(otherLast) : null, otherSession, 3);

        Assert.Equal((overlap, overlap), (one.Overlaps(other), other.Overlaps(one)));
        Assert.False(one.Overlaps(other with { Serial = "4712" }));
    }

    [Fact]
    public void EverybodyWhoEverHadItIsKnown() => Assert.Equal(["anna", "bo"], Book.PeopleOf("4711"));

    private static LocalDate March(int day) => new(2026, 3, day);
}
