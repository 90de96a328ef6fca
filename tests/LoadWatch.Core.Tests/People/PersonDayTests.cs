using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Tests.People;

/// <summary>
/// Dates of changed clocks: of the European Union by directive 2000/84/EC (last Sundays of March and October, 01:00 UTC); of New South Wales (first Sundays of
/// April and October, 02:00 standard time), of Lord Howe Island (half an hour), of Chile (at midnight) and of Newfoundland until 2011 (at one minute past midnight) by the
/// time zone database of IANA.
/// </summary>
public sealed class PersonDayTests
{
    private static readonly Duration Step = Duration.FromMinutes(5);

    [Theory]
    [InlineData("Europe/Helsinki", "2026-03-29", 23)]
    [InlineData("Europe/Helsinki", "2026-10-25", 25)]
    [InlineData("Australia/Sydney", "2026-10-04", 23)]
    [InlineData("Australia/Sydney", "2026-04-05", 25)]
    [InlineData("Australia/Lord_Howe", "2026-10-04", 23.5)]
    [InlineData("Australia/Lord_Howe", "2026-04-05", 24.5)]
    [InlineData("America/Santiago", "2026-09-06", 23)]
    [InlineData("America/Santiago", "2026-04-04", 25)]
    [InlineData("America/New_York", "2026-11-01", 25)]
    [InlineData("Asia/Kolkata", "2026-03-29", 24)]
    public void ADayIsOverAfterItsOwnHours(string zone, string date, double hours)
    {
        var (person, day) = (Of(zone), Date(date));
        var begins = FirstOver(person, day.PlusDays(-1));
        var ends = FirstOver(person, day);

        Assert.Equal(Duration.FromHours(hours), ends - begins);
        Assert.Equal((day, day), (PersonDay.On(begins, person), PersonDay.On(ends - Step, person)));
        Assert.Equal(day.PlusDays(1), PersonDay.On(ends, person));
    }

    /// <summary>Whatever the zone and whenever the day begins: what is over stays over, and nothing that happens later counts for it.</summary>
    [Theory]
    [InlineData("Europe/Helsinki", "2026-03-29")]
    [InlineData("Europe/Helsinki", "2026-10-25")]
    [InlineData("Australia/Lord_Howe", "2026-04-05")]
    [InlineData("America/Santiago", "2026-04-04")]
    [InlineData("America/Santiago", "2026-09-06")]
    [InlineData("America/St_Johns", "2010-11-07")]
    [InlineData("Pacific/Apia", "2011-12-30")]
    public void NothingCountsForADayThatIsOver(string zone, string date)
    {
        foreach (var begins in new[] { new LocalTime(0, 0), new LocalTime(0, 30), new LocalTime(2, 30), new LocalTime(3, 0), new LocalTime(3, 30), new LocalTime(6, 0) })
        {
            var person = Of(zone) with { DayBeginsAt = begins };
            var over = LocalDate.MinIsoValue;
            for (var now = Date(date).PlusDays(-1).AtMidnight().InUtc().ToInstant(); now < Date(date).PlusDays(3).AtMidnight().InUtc().ToInstant(); now += Step)
            {
                Assert.True(PersonDay.LastOver(now, person) >= over && PersonDay.On(now, person) > over, $"{zone} {begins} {now}");
                over = PersonDay.LastOver(now, person);
            }
        }
    }

    /// <summary>On 7 November 2010 clocks went from 00:01 back to 23:01 of the date before.</summary>
    [Fact]
    public void AMinuteOfTheNextDateEndsNoDay()
    {
        var person = Of("America/St_Johns");
        var minute = Instant.FromUtc(2010, 11, 7, 2, 30);

        Assert.Equal(Date("2010-11-07"), PersonDay.On(minute, person));
        Assert.Equal(Date("2010-11-06"), PersonDay.On(minute + Duration.FromMinutes(30), person));
        Assert.Equal(Date("2010-11-05"), PersonDay.LastOver(minute, person));
        Assert.Equal(Date("2010-11-06"), PersonDay.LastOver(minute + Duration.FromHours(2), person));
    }

    [Theory]
    [InlineData(3, 59, "2026-03-09")]
    [InlineData(4, 0, "2026-03-10")]
    [InlineData(23, 0, "2026-03-10")]
    public void WhatBeginsBeforeTheDayCountsForTheDateBefore(int hour, int minute, string date)
    {
        var person = Given.Person() with { DayBeginsAt = new LocalTime(4, 0) };
        var recording = Recording(Instant.FromUtc(2026, 3, 10, hour, minute), Offset.Zero);

        Assert.Equal(Date(date), LocalStart.DateOf(recording, person));
        Assert.Equal(Date(date), RecordingSummaries.Of("a", new UsableRecording(recording, 0.5, new()), person, null).Date);
    }

    /// <summary>Both passes of the hour that comes twice, and the moment on either side of the one that is left out.</summary>
    [Theory]
    [InlineData("Europe/Helsinki", "2026-10-25T00:30:00Z", "2026-10-25")]
    [InlineData("Europe/Helsinki", "2026-10-25T01:30:00Z", "2026-10-25")]
    [InlineData("Europe/Helsinki", "2026-10-24T20:59:00Z", "2026-10-24")]
    [InlineData("Europe/Helsinki", "2026-10-25T21:59:00Z", "2026-10-25")]
    [InlineData("Europe/Helsinki", "2026-03-29T00:59:00Z", "2026-03-29")]
    [InlineData("Europe/Helsinki", "2026-03-29T01:00:00Z", "2026-03-29")]
    [InlineData("America/Santiago", "2026-04-05T02:30:00Z", "2026-04-04")]
    [InlineData("America/Santiago", "2026-04-05T03:30:00Z", "2026-04-04")]
    [InlineData("America/Santiago", "2026-09-06T03:59:00Z", "2026-09-05")]
    [InlineData("America/Santiago", "2026-09-06T04:00:00Z", "2026-09-06")]
    [InlineData("Australia/Sydney", "2026-04-04T15:30:00Z", "2026-04-05")]
    [InlineData("Australia/Sydney", "2026-04-04T16:30:00Z", "2026-04-05")]
    public void ASessionFallsOnItsDateWhereClocksChange(string zone, string start, string date)
    {
        var begun = NodaTime.Text.InstantPattern.ExtendedIso.Parse(start).Value;

        Assert.Equal(Date(date), LocalStart.DateOf(Recording(begun, offset: null), Of(zone)));
    }

    /// <summary>Home in Helsinki, at 21:30 of 9 March; the watch is in Tokyo, at 04:30 of the 10th, or in New York, at 15:30 of the 9th.</summary>
    [Theory]
    [InlineData(9, "2026-03-10")]
    [InlineData(-4, "2026-03-09")]
    public void ATravellersWatchNamesTheDate(int offsetHours, string date) =>
        Assert.Equal(Date(date), LocalStart.DateOf(Recording(Instant.FromUtc(2026, 3, 9, 19, 30), Offset.FromHours(offsetHours)), Of("Europe/Helsinki")));

    private static Person Of(string zone) => Given.Person() with { Zone = DateTimeZoneProviders.Tzdb[zone] };

    private static LocalDate Date(string text) => NodaTime.Text.LocalDatePattern.Iso.Parse(text).Value;

    private static Recording Recording(Instant start, Offset? offset) => Given.Recording("running", SampleSeries.Empty) with { Start = start, LocalOffset = offset };

    /// <summary>The first moment, in steps, at which a date is over.</summary>
    private static Instant FirstOver(Person person, LocalDate date)
    {
        var now = date.PlusDays(-1).AtMidnight().InUtc().ToInstant();
        while (PersonDay.LastOver(now, person) < date)
        {
            now += Step;
        }

        return now;
    }
}
