using System.Globalization;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Service.Demo;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <param name="Owner">Id of the person whom its folder names; empty where the content or its device tells, or nobody.</param>
/// <param name="Name">Without folders; file and member names are all different.</param>
internal sealed record SquadFile(string Owner, string Name, byte[] Bytes)
{
    public string Path => Owner.Length == 0 ? $"club/{Name}" : $"{Owner}/{Name}";
}

/// <summary>
/// Ten weeks of five people in some 220 contents: FIT and CSV, bare and packed, two devices for one session, files of several people, pods that are handed
/// out, every kind of table, copies under other names, contents that two people claim, and broken ones. The last recording lies eleven days before
/// <see cref="WorkingFolder.Now"/>, so that ten nights of arrivals fit in between. No name in it names anybody but as a folder.
/// </summary>
internal static class SquadFiles
{
    public static readonly LocalDate Last = Some.Yesterday.PlusDays(-10);

    public const string Roster = """
        person,name,group,birth_year,sex,time_zone,aliases
        anna,Anna Ahola,squad,1996,f,UTC,Nan;A7
        bo,Bo Björk,squad,1991,m,UTC,Boss
        cara,Cara Costa,squad,1958,f,UTC,7
        dora,Dora Dahl,squad,1999,f,UTC,22
        emil,Emil Ek,squad,1988,m,Europe/Helsinki,

        """;

    public const string Devices = """
        serial,person,from,to,session
        9001,emil,,,
        9002,dora,2026-05-10,,
        9002,cara,,2026-05-09,

        """;

    public const string Layout = """
        "layouts": [{
          "name": "tracking", "header": ["player", "moment"], "person_column": "player", "time": { "column": "moment" }, "sport": "soccer",
          "columns": [{ "column": "hr", "channel": "heart_rate", "unit": "bpm" }, { "column": "v", "channel": "speed", "unit": "m/s" }]
        }]
        """;

    private const int Days = 72;

    /// <summary>As they lie in the inbox at first.</summary>
    public static IReadOnlyList<SquadFile> Packed { get; } = [.. Plain().Concat(Copies()).Concat(Bundles()).Concat(Tables()).Concat(Broken())];

    /// <summary>The same contents, each alone.</summary>
    public static IReadOnlyList<SquadFile> Bare { get; } =
        [.. Plain().Concat(Copies()).Concat(Bundled().SelectMany(bundle => bundle.Members)).Concat(Tables()).Concat(Broken())];

    private static LocalDate Day(int day) => Last.PlusDays(day - Days + 1);

    private static string Text(LocalDate date) => date.ToString("uuuu-MM-dd", CultureInfo.InvariantCulture);

    private static byte[] Fit(int day, int minutesAfterNoon, int heartRate, uint? serial, string sport = "cycling")
    {
        var ride = Some.Ride(Day(day), minutesAfterNoon, heartRate);
        return FitEncoder.Encode(ride with { Device = new Device(FitActivity.Development, 1, serial), Sport = new Sport(sport) });
    }

    private static IEnumerable<SquadFile> Plain()
    {
        for (var day = 0; day < Days; day++)
        {
            if (day % 3 != 2)
            {
                yield return new SquadFile("anna", $"watch {day:00}.fit", Fit(day, 0, 135 + (day % 20), 101));
            }

            if (day % 8 == 3)
            {
                yield return new SquadFile("anna", $"bike computer {day:00}.fit", Fit(day, 0, 150, 102));
            }

            if (day % 5 is 0 or 3 && day < 45)
            {
                yield return new SquadFile("bo", $"run {day:00}.fit", Fit(day, 7, 140, 103, "running"));
            }

            if (day % 4 == 1)
            {
                yield return new SquadFile("emil", $"sent {day:00}.csv", CsvSamplesWriter.Write(DemoRecording.Of(Some.Ride(Day(day), 20, 120 + (day % 9)))));
            }

            if (day % 4 == 3)
            {
                yield return new SquadFile("", $"pod {day:00}.fit", Fit(day, 40, 125, 9001));
            }

            if (day % 6 == 2)
            {
                yield return new SquadFile("", $"wrist {day:00}.fit", Fit(day, 50, 115, 9002));
            }

            if (day % 9 == 4)
            {
                yield return new SquadFile("", $"squad {day:00}.csv", Squad(day));
            }
        }

        yield return new SquadFile("", "nobody 1.fit", Fit(11, 90, 141, null));
        yield return new SquadFile("", "nobody 2.fit", Fit(12, 90, 142, null));
        yield return new SquadFile("anna", "claimed.fit", Fit(20, 95, 143, null));
        yield return new SquadFile("bo", "claimed too.fit", Fit(20, 95, 143, null));
    }

    private static IEnumerable<SquadFile> Copies() =>
        Plain().Where((_, at) => at % 12 == 5).Select(file => file with { Name = $"copy of {file.Name}" });

    private static IEnumerable<(string Owner, string Name, IReadOnlyList<SquadFile> Members)> Bundled()
    {
        for (var week = 0; week < 10; week++)
        {
            yield return ("cara", $"week {week}.zip", [.. new[] { 1, 3, 6 }.Select(day =>
                new SquadFile("cara", $"gym {(7 * week) + day:00}.csv", Some.Csv(Day((7 * week) + day), 30, 100 + week)))]);
            yield return ("bo", $"ride {week}.fit.gz", [new SquadFile("bo", $"ride {week}.fit", Fit((7 * week) + 4, 15, 145, 103))]);
        }
    }

    private static IEnumerable<SquadFile> Bundles() => Bundled().Select(bundle => new SquadFile(
        bundle.Owner,
        bundle.Name,
        bundle.Name.EndsWith(".gz", StringComparison.Ordinal)
            ? Some.Gzip(bundle.Members[0].Bytes)
            : Some.Zip([.. bundle.Members.Select(member => (member.Name, member.Bytes))])));

    private static IEnumerable<SquadFile> Tables()
    {
        var thirds = Enumerable.Range(0, Days).Where(day => day % 3 == 1).ToList();
        yield return Table("", "sets.csv", "date,person,exercise,set,repetitions,kilograms,reserve", thirds.SelectMany(day => Enumerable.Range(1, 3).SelectMany(set => new[]
        {
            $"{Text(Day(day))},Dora Dahl,leg_press,{set},6,{100 + day},2", $"{Text(Day(day))},7,squat,{set},8,{40 + set},3",
        })));
        yield return Table("", "ratings.csv", "date,person,start,sport,minutes,rating", thirds.SelectMany(day => new[]
        {
            $"{Text(Day(day))},Nan,12:00,cycling,3,{3 + (day % 6)}", $"{Text(Day(day))},22,,soccer,60,4",
        }));
        yield return Table("emil", "own ratings.csv", "date,minutes,rating,sport", thirds.Select(day => $"{Text(Day(day))},40,5,cycling"));
        yield return Table("", "plan.csv", "from,group,until,plan,start,end,recording,sport",
        [
            $"{Text(Day(13))},squad,,team_session,12:00,12:01,yes,soccer", $"{Text(Day(30))},squad,{Text(Day(36))},light_week,,,,", $"{Text(Day(50))},squad,,match,18:00,20:00,yes,soccer",
        ]);
        yield return Table("", "tests.csv", "date,person,test,value,unit,exercise",
            [$"{Text(Day(25))},anna,heart_rate_max,188,bpm,", $"{Text(Day(10))},dora,one_repetition_max,170,kg,leg_press", $"{Text(Day(41))},bo,critical_power,265,W,"]);
        yield return Table("", "days.csv", "date,person,day", [$"{Text(Day(8))},cara,rest", $"{Text(Day(47))},bo,ill", $"{Text(Day(48))},bo,ill"]);
        yield return Table("", "answers.csv", "date,person,answer,until,file",
            [$"{Text(Day(12))},bo,belongs_to,,{WorkingFolder.Sha(Fit(11, 90, 141, null))[..16]}", $"{Text(Day(52))},cara,away,{Text(Day(55))},", $"{Text(Day(50))},emil,match,,"]);
    }

    private static IEnumerable<SquadFile> Broken() =>
    [
        new("anna", "cut.fit", Fit(30, 70, 130, 101)[..^11]),
        new("bo", "damaged.fit", Flipped(Fit(31, 70, 130, 103))),
        new("cara", "notes.txt", Some.Text("felt fine\n")),
        new("dora", "saved page.csv", Some.Text("<html><body>please log in</body></html>\n")),
        new("dora", "empty.fit", []),
        new("emil", "damaged.zip", Flipped(Some.Zip(("ride in it.fit", Fit(32, 70, 130, 9001))))),
        new("anna", "before all clocks.fit", FitEncoder.Encode(Some.Ride(new LocalDate(1995, 1, 1)))),
        new("", "broken rows.csv", Some.Text("date,person,exercise,set,repetitions,kilograms,reserve\n2026-05-20,dora,squat,1,5,x,2\n2026-05-20,dora,squat,2,5,50,2\n")),
    ];

    private static byte[] Flipped(byte[] bytes)
    {
        bytes[bytes.Length / 2] ^= 4;
        return bytes;
    }

    private static SquadFile Table(string owner, string name, string header, IEnumerable<string> lines) =>
        new(owner, name, Some.Text(string.Join('\n', [header, .. lines]) + "\n"));

    /// <summary>Two minutes of several people, of one in whose folder the same session lies as well, and of somebody unknown.</summary>
    private static byte[] Squad(int day) => Some.Text(string.Join('\n',
    [
        "player,moment,hr,v",
        .. new[] { "anna", "Bo Björk", "22", "9001", "Ghost" }.SelectMany((player, place) => Enumerable.Range(0, 121).Select(second => string.Create(
            CultureInfo.InvariantCulture,
            $"{player},{Text(Day(day))}T{(place == 0 ? 12 : 18):00}:{second / 60:00}:{second % 60:00}Z,{110 + (second % 40) + place},{2 + (second % 7 * 0.5):0.0}"))),
    ]) + "\n");
}
