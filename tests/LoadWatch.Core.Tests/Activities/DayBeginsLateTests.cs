using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>A day that begins at 04:00: what runs past midnight is one session of the date on which the evening was.</summary>
public sealed class DayBeginsLateTests
{
    private static readonly Person Late = Given.Person() with { DayBeginsAt = new LocalTime(4, 0) };

    private static readonly LocalDate Next = Given.Date.PlusDays(1);

    [Fact]
    public void SetsOnBothSidesOfMidnightAreOneSession()
    {
        var session = Assert.Single(Join([], Told.Set(1, time: new LocalTime(23, 40)), Told.Set(2, time: new LocalTime(0, 20), date: Next)).Activities);

        Assert.Equal((Given.Date, 2.0), (session.Date, session["sets"]));
        Assert.Equal(Given.Date.At(new LocalTime(23, 40)).InUtc().ToInstant(), session.Start);
    }

    [Fact]
    public void ARatingAfterMidnightJoinsTheRecordingOfTheEvening()
    {
        var recording = Of(Given.Recording("running", SampleSeries.Empty) with { Start = Next.At(new LocalTime(0, 15)).InUtc().ToInstant(), ElapsedSeconds = 3600, TimerSeconds = 3600 });
        var session = Assert.Single(Join([recording], Told.Session(start: new LocalTime(0, 10), date: Next, rating: 5)).Activities);

        Assert.Equal((Given.Date, 5.0), (session.Date, session["rating"]));
        Assert.Equal(recording.Winner.Start, session.Start);
    }

    [Fact]
    public void ARowWithoutATimeStaysOnItsDate() =>
        Assert.Equal(Next, Assert.Single(Join([], Told.Session(date: Next, rating: 5, minutes: 60)).Activities).Date);

    private static JoinResult Join(RecordedActivity[] recorded, params OwnedRow[] rows) =>
        ActivityJoin.Join(Late, recorded, [.. rows.Select(row => row.ByClockOf(Late))], Told.Anchors, new ComputationSettings());

    private static RecordedActivity Of(Recording recording)
    {
        var summary = RecordingSummaries.Of("a", new UsableRecording(recording, 0.5, new()), Late, null);
        return new RecordedActivity(summary, summary.Clock, new ActivityValues());
    }
}
