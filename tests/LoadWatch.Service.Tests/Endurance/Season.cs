using System.Globalization;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Endurance;

/// <summary>
/// Two years of three people, or as many nights as LOADWATCH_NIGHTS says, as files come in, night by night: FIT of one and of two devices, an export of several people a week, a set log that grows every
/// week and is sent whole, a plan. Heavy blocks, breaks and late files among them, so that every kind of look-back has something to find.
/// </summary>
internal static class Season
{
    private const int Usual = 730;

    public static readonly int Nights = int.Parse(
        Environment.GetEnvironmentVariable("LOADWATCH_NIGHTS") ?? Usual.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);

    private static readonly LocalDate First = Some.Yesterday.PlusDays(1 - Nights);

    /// <summary>The morning after a night's date.</summary>
    public static Instant Morning(int night) => WorkingFolder.Now - Duration.FromDays(Nights - 1 - night);

    public static WorkingFolder Folder()
    {
        var folder = new WorkingFolder();
        folder.Configure("""
            "layouts": [{
              "name": "tracking", "header": ["player", "moment"], "person_column": "player", "time": { "column": "moment" }, "sport": "soccer",
              "columns": [{ "column": "hr", "channel": "heart_rate", "unit": "bpm" }, { "column": "v", "channel": "speed", "unit": "m/s" }]
            }]
            """);

        // So near the usual that a season of these people crosses it.
        folder.Edit("loadwatch.json", "\"extra_days\": 2 }", "\"extra_days\": 2 }, \"load_ratio\": { \"raise\": 1.8, \"return\": 1.6, \"on_days\": 1 }");
        return folder;
    }

    /// <summary>What comes in the night after each date; a name that comes again is a later version.</summary>
    public static ILookup<int, (string Path, byte[] Bytes)> ByNight() => Files()
        .ToLookup(file => Math.Min(file.Night, Nights - 1), file => (file.Path, file.Bytes));

    private static IEnumerable<(int Night, string Path, byte[] Bytes)> Files() => Enumerable.Range(0, Nights).SelectMany(OfDate)
        .Append((0, "plan.csv", Plan()));

    private static IEnumerable<(int Night, string Path, byte[] Bytes)> OfDate(int day)
    {
        var date = First.PlusDays(day);
        var hard = Hardness(day);
        var night = day + Late(day);
        if (date.DayOfWeek is IsoDayOfWeek.Monday or IsoDayOfWeek.Wednesday or IsoDayOfWeek.Friday or IsoDayOfWeek.Saturday && day % 190 > 12)
        {
            yield return (night, $"anna/{date:uuuu-MM-dd}.fit", Ride(date, 1, 125 + hard, 150, day));
        }

        if (date.DayOfWeek is IsoDayOfWeek.Tuesday or IsoDayOfWeek.Thursday or IsoDayOfWeek.Saturday && day % 260 > 20)
        {
            yield return (night, $"bo/{date:uuuu-MM-dd}.fit", Ride(date, 1, 130 + hard, 200 + (4 * hard), day));
        }

        if (date.DayOfWeek == IsoDayOfWeek.Saturday)
        {
            yield return (day, $"bo/{date:uuuu-MM-dd} other device.fit", Ride(date, 2, 131 + hard, null, day));
        }

        if (date.DayOfWeek == IsoDayOfWeek.Sunday)
        {
            yield return (day + 2, $"squad {date:uuuu-MM-dd}.csv", Squad(date, hard));
        }

        if (date.DayOfWeek == IsoDayOfWeek.Friday)
        {
            yield return (day, "sets.csv", Sets(day));
        }
    }

    /// <summary>Most come at once, some after a few days, a few after weeks.</summary>
    private static int Late(int day) => (day % 41, day % 13) switch
    {
        (7, _) => 40,
        (_, 5) => 3,
        _ => 0,
    };

    /// <summary>Three weeks that rise and one that is easy, and now and then a block that is far above.</summary>
    private static int Hardness(int day) => (day / 7 % 4) switch
    {
        3 => 0,
        var week => 8 + (6 * week) + (day / 28 % 5 == 3 ? 22 : 0),
    };

    /// <summary>A minute; the harder, the longer; now and then one far beyond the others.</summary>
    private static byte[] Ride(LocalDate date, int device, int heartRate, int? watts, int day)
    {
        var start = date.At(new LocalTime(12, day % 50)).InUtc().ToInstant();
        return FitEncoder.Encode(new FitActivity
        {
            Start = start,
            Sport = new Sport("cycling"),
            Device = new Device(FitActivity.Development, device, 4711),
            Samples = [.. Enumerable.Range(0, 61 + heartRate - 125 + (day % 97 == 50 ? 200 : 0)).Select(second => new FitSample(
                start + Duration.FromSeconds(second),
                HeartRate: heartRate + (second % 11),
                Power: watts + (second % 20 < 5 ? 150 : 0),
                Distance: 7.0 * second))],
        });
    }

    private static byte[] Squad(LocalDate date, int hard) => Some.Text(string.Join('\n',
    [
        "player,moment,hr,v",
        .. new[] { "anna", "Bo Björk", "cara" }.SelectMany(player => Enumerable.Range(0, 31).Select(at => string.Create(
            CultureInfo.InvariantCulture,
            $"{player},{date:uuuu-MM-dd}T18:{at / 6:00}:{at % 6 * 10:00}Z,{120 + hard + (at % 17)},{2.5 + (at % 4 * 0.5):0.0}"))),
    ]) + "\n");

    /// <summary>Two visits a week since the first date, with a month off; the newest export holds all of them.</summary>
    private static byte[] Sets(int until) => Some.Text(string.Join('\n',
    [
        "date,person,exercise,set,repetitions,kilograms,reserve",
        .. Enumerable.Range(0, until + 1)
            .Where(day => First.PlusDays(day).DayOfWeek is IsoDayOfWeek.Tuesday or IsoDayOfWeek.Friday && day % 300 > 30)
            .Select(day => string.Create(CultureInfo.InvariantCulture, $"{First.PlusDays(day):uuuu-MM-dd},cara,leg_press,1,6,{80 + (day / 30)},2")),
    ]) + "\n");

    private static byte[] Plan() => Some.Text(string.Join('\n',
    [
        "from,group,until,plan,start,end,recording,sport",
        .. Enumerable.Range(0, Nights / 91).Select(quarter => $"{First.PlusDays((91 * quarter) + 21):uuuu-MM-dd},squad,{First.PlusDays((91 * quarter) + 27):uuuu-MM-dd},light_week,,,,"),
        .. Enumerable.Range(0, Nights / 70).Select(match => $"{First.PlusDays((70 * match) + 40):uuuu-MM-dd},squad,,match,18:00,20:00,yes,soccer"),
    ]) + "\n");
}
