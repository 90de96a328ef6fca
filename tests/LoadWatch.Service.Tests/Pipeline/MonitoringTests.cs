using LoadWatch.Days;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using NodaTime;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A watch that writes the whole day: a walk is an activity, a day on which it was only worn is rest.</summary>
public sealed class MonitoringTests : IDisposable
{
    private const int Walking = 6;
    private static readonly Instant Epoch = Instant.FromUtc(1989, 12, 31, 0, 0);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void APersonWhoOnlyWalksHasARecord()
    {
        folder.Put("cara/day.fit", Log(Some.Yesterday, walkedMinutes: 30));
        folder.Sweep();
        var activity = Assert.Single(folder.Read((_, session) => session.Activities.OfPerson("cara")));
        Assert.Equal((new Sport("walking"), Some.Yesterday), (activity.Session.Sport, activity.Session.Date));
    }

    [Fact]
    public void AWatchThatWasOnlyWornMakesTheDayRest()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday.PlusDays(-3)));
        folder.Put("anna/day.fit", Log(Some.Yesterday.PlusDays(-1), walkedMinutes: 0));
        folder.Sweep();
        Assert.Equal([DayState.Recorded, DayState.Unknown, DayState.Rest, DayState.Unknown], States());
    }

    [Fact]
    public void TrainingOnTheSameDayStands()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday.PlusDays(-3)));
        folder.Put("anna/day.fit", Log(Some.Yesterday.PlusDays(-3), walkedMinutes: 0));
        folder.Sweep();
        Assert.Equal(DayState.Recorded, States()[0]);
    }

    [Fact]
    public void ALogOfAWalkAndOfAWornDayTellsOfBoth()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday.PlusDays(-3)));
        folder.Put("anna/days.fit", Log(Some.Yesterday.PlusDays(-2), walkedMinutes: 30, wornDaysBehind: 1));
        folder.Sweep();
        Assert.Equal([DayState.Recorded, DayState.Recorded, DayState.Rest, DayState.Unknown], States());
        folder.Rebuild();
        Assert.Equal([DayState.Recorded, DayState.Recorded, DayState.Rest, DayState.Unknown], States());
    }

    private List<DayState> States() => [.. folder.Read((_, session) => session.Days.OfPerson("anna")).Select(day => day.State)];

    /// <summary>Heart rate every half hour from six in the morning until ten at night, and a walk at noon of the first day.</summary>
    internal static byte[] Log(LocalDate date, int walkedMinutes, int wornDaysBehind = 0)
    {
        var midnight = (int)(date.AtMidnight().InUtc().ToInstant() - Epoch).TotalSeconds;
        var writer = new FitPartWriter()
            .Define(0, new(0, new(0, Enumeration), new(1, Unsigned16), new(2, Unsigned16), new(3, Unsigned32Z))).Message(0, 32, 255, 7, 42)
            .Define(1, new(103, new(253, Unsigned32), new(0, Unsigned32))).Message(1, midnight, midnight)
            .Define(2, new(55, new(253, Unsigned32), new(27, Unsigned8)))
            .Define(3, new(55, new(253, Unsigned32), new(5, Enumeration), new(3, Unsigned32)));
        for (var halfHour = 12; halfHour < 44; halfHour++)
            writer.Message(2, midnight + (1800 * halfHour), 62);

        for (var minute = 0; minute <= walkedMinutes; minute++)
            writer.Message(3, midnight + (12 * 3600) + (60 * minute), Walking, 100 * minute);

        for (var halfHour = 48; halfHour < 48 * (1 + wornDaysBehind); halfHour++)
            writer.Message(2, midnight + (1800 * halfHour), 62);

        return writer.ToBytes();
    }
}
