using LoadWatch.Notices;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Tests.Notices;

/// <summary>
/// Briefs at half past two in the night, at which clocks are set, and at midnight, around every change of 30 zones: Lord Howe sets its clock by half an hour,
/// Troll by two hours, Cairo and Santiago at midnight, Apia left out 30 December 2011.
/// </summary>
public class BriefTimesOfZonesTests
{
    private static readonly Duration Step = Duration.FromMinutes(15);
    private static readonly Duration Around = Duration.FromDays(3);

    private static readonly string[] Zones =
    [
        "Europe/Helsinki", "Europe/London", "Europe/Dublin", "Europe/Lisbon", "Europe/Berlin", "Europe/Chisinau", "Europe/Moscow", "Atlantic/Azores", "America/New_York", "America/Chicago",
        "America/Denver", "America/Los_Angeles", "America/Anchorage", "America/St_Johns", "America/Havana", "America/Santiago", "America/Asuncion", "America/Sao_Paulo", "America/Scoresbysund",
        "Africa/Cairo", "Africa/Casablanca", "Asia/Jerusalem", "Asia/Beirut", "Asia/Gaza", "Asia/Kathmandu", "Australia/Sydney", "Australia/Lord_Howe", "Pacific/Auckland", "Pacific/Chatham",
        "Antarctica/Troll",
    ];

    public static TheoryData<string, int> Changes => new(Zones.Select(zone => (zone, 2026)).Append(("Pacific/Apia", 2011)));

    [Theory]
    [MemberData(nameof(Changes))]
    public void EveryDateThatThereIsHasOneBriefAtItsTime(string id, int year)
    {
        var zone = DateTimeZoneProviders.Tzdb[id];
        var (from, to) = (Instant.FromUtc(year, 1, 1, 0, 0), Instant.FromUtc(year + 2, 12, 31, 0, 0));
        foreach (var at in new[] { new LocalTime(2, 30), LocalTime.Midnight })
        {
            foreach (var change in zone.GetZoneIntervals(from, to).Select(interval => interval.HasEnd ? interval.End : to))
            {
                Assert.Equal(Stated(zone, at, change), Decided(zone, at, change));
            }
        }
    }

    /// <summary>The first of the steps at or behind the stated time of each date; a time that the clocks skipped is moved on by the gap.</summary>
    private static List<(LocalDate Date, Instant Moment)> Stated(DateTimeZone zone, LocalTime at, Instant change) =>
    [
        .. Moments(change).Select(moment => moment.InZone(zone).Date).Distinct()
            .Select(date => (Date: date, Time: zone.MapLocal(date + at) is { Count: > 0 } found ? found.First().ToInstant() : (date + at).WithOffset(zone.MapLocal(date + at).EarlyInterval.WallOffset).ToInstant()))
            .SelectMany(stated => Moments(change).Where(moment => moment >= stated.Time && moment - Step < stated.Time).Select(moment => (stated.Date, moment))),
    ];

    private static List<(LocalDate Date, Instant Moment)> Decided(DateTimeZone zone, LocalTime at, Instant change)
    {
        var contact = new Contact("ada", "Ada", ContactRole.Coach, ["boat"], [], zone, at, Enum.GetValues<IsoDayOfWeek>().Where(day => day != IsoDayOfWeek.None).ToHashSet());
        var before = Moments(change).First() - Step;
        LocalDate? last = before.InZone(zone).Date is var today && NoticePolicy.Decide(contact, before, today.PlusDays(-1), _ => false).Reason == NoticeReason.BriefDue ? today : today.PlusDays(-1);
        var decided = new List<(LocalDate, Instant)>();
        foreach (var moment in Moments(change))
        {
            if (NoticePolicy.Decide(contact, moment, last, _ => false) is { Reason: NoticeReason.BriefDue } due)
            {
                decided.Add((due.Date, moment));
                last = due.Date;
            }
        }

        return decided;
    }

    private static IEnumerable<Instant> Moments(Instant change)
    {
        for (var moment = change - Around; moment <= change + Around; moment += Step)
        {
            yield return moment;
        }
    }
}
