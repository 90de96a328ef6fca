using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Tests;

/// <summary>Invented people on an invented morning: a rowing squad of 24, a strength class of 16, and small parts to build others from.</summary>
internal static class MorningExamples
{
    public static readonly LocalDate Today = new(2026, 3, 1);

    public static readonly LocalDate Yesterday = new(2026, 2, 28);

    public static readonly Group Squad = new("squad", "Rowing squad", "banister_trimp", new RuleLimits());

    public static readonly Group Class = new("class", "Saturday strength class", "kilograms", new RuleLimits());

    private static readonly string[] SquadNames =
    [
        "Ottilie Brandvold", "Jasper Quillfeather", "Imke Saarberg", "Caspian Rowntree", "Thandeka Mbelu", "Lorcan Tidewell", "Solveig Aanestad", "Ruben Ostrava",
        "Ayumi Kanzaki", "Piers Oakhanger", "Noor al-Hadidi", "Wilhelmina Stroud", "Tobiasz Wierzba", "Estrela Monforte", "Håkon Lysefjord", "Marguerite Delacombe",
        "Kofi Asantewa", "Birgit Öhlund", "Dario Pellestrina", "Philippa Thornbury-Hargreaves", "Ilari Suvanto", "Zuzana Malinová", "Felix Achterberg", "Rosalind Penhallow",
    ];

    private static readonly string[] ClassNames =
    [
        "Agnes Winterbourne", "Bertold Kesselring", "Cordelia Ashgrove", "Dragan Vukotić", "Edith Larkspur", "Fausto Bellandi", "Greta Holmqvist", "Horace Pemberley",
        "Inés Villalobos", "Joachim Rautenberg", "Kirsti Hautamäki", "Leopold Farthing", "Mathilde Corbeau", "Nikolaos Vrettos", "Olwen Prydderch", "Percival Dunstable",
    ];

    private static readonly string[] MoreClassNames =
    [
        "Quentin Marlowe", "Ragnhild Tveit", "Silvester Okonjo", "Theodora Lindqvist", "Umberto Falconi", "Valborg Sandell", "Wendelin Ackermann", "Xenia Dimitrova",
    ];

    public static Contact Contact(ContactRole role, string id = "ada", params string[] groups) =>
        new(id, "Ada Merriweather", role, groups.Length > 0 ? groups : ["squad"], [], DateTimeZone.Utc, new LocalTime(6, 30), Enum.GetValues<IsoDayOfWeek>().Where(day => day != IsoDayOfWeek.None).ToHashSet());

    public static Contact Oneself(string person) => Contact(ContactRole.Self) with { Groups = [], People = [person] };

    public static Person Person(string id, string name, Group? group = null) => new(id, name, (group ?? Squad).Id, 2001, null, DateTimeZone.Utc);

    public static BriefSubject Subject(string id, string name, params AlertNews[] alerts) => new(Person(id, name), Squad, QuietDays(id, 60), alerts, []);

    public static AlertNews LoadRatio(string person, Severity severity = Severity.Warning, AlertState state = AlertState.Unacknowledged, bool isNew = true) =>
        News(person, "load_ratio", null, severity, state, "load of the last 7 days is 1.94 times the usual week since 27 February", isNew);

    public static AlertNews StimulusGap(string person, Severity severity = Severity.Notice, AlertState state = AlertState.Unacknowledged, bool isNew = false) =>
        News(person, "stimulus_gap", BodyRegion.Legs, severity, state, "no heavy or fast leg work for 11 days, since 17 February; usual gap 4 days", isNew);

    public static AlertNews Silence(string person, AlertState state = AlertState.Unacknowledged) =>
        News(person, "silence", null, Severity.Notice, state, "nothing recorded for 6 days, since 22 February; usual gap up to 3 days", isNew: false);

    public static AlertNews News(string person, string rule, BodyRegion? region, Severity severity, AlertState state, string text, bool isNew) =>
        new(new Alert(new FindingKey(person, rule, region), new LocalDate(2026, 2, 27), Yesterday, state, severity, text), isNew, ReturnedSince: false, Corrected: false);

    public static AlertNews Over(AlertNews news, bool corrected = false) =>
        news with { Alert = news.Alert with { State = AlertState.Returned }, IsNew = false, ReturnedSince = true, Corrected = corrected };

    /// <summary>Days up to yesterday, every one known: three training days and a rest day in turn, a heavy leg day every fourth.</summary>
    public static IReadOnlyList<Day> QuietDays(string person, int count) => Trends(
        person,
        count,
        back => back % 4 == 3 ? 0 : 80,
        back => back % 4 == 1);

    /// <param name="load">Load of the day so many days before yesterday; null unknown.</param>
    /// <param name="heavy">Heavy or fast leg work on that day.</param>
    public static IReadOnlyList<Day> Trends(string person, int count, Func<int, double?> load, Func<int, bool?> heavy) =>
        [.. Enumerable.Range(0, count).Reverse().Select(back => DayOf(person, count, back, load, heavy))];

    public static Brief SquadBrief() => BriefBuilder.Build(
        Contact(ContactRole.Coach, "ada", "squad"),
        Today,
        [.. SquadNames.Select(SquadSubject)],
        [
            new BriefLine("pod-17_2026-02-28.fit", "nobody is named as its owner"),
            new BriefLine("session 28 feb.csv", "line 12, column 3 (distance): not a number"),
        ]);

    public static Brief ClassBrief() => BriefBuilder.Build(
        Contact(ContactRole.Clinician, "noel", "class") with { Name = "Noel Harcastle" },
        Today,
        [.. ClassNames.Select(ClassSubject)],
        []);

    /// <summary>The class on a Monday on which all of them are planned, with every form or those given.</summary>
    public static Brief EveryForm(params BriefForm[] forms)
    {
        var monday = Today.PlusDays(1);
        var planned = new PlanEntry(PlanWord.Class, monday, monday, new LocalTime(10, 0), new LocalTime(11, 0), true, null);
        return BriefBuilder.Build(
            Contact(ContactRole.FrontDesk, "desk", "class") with { Name = "Front desk", Forms = forms.Length > 0 ? forms : Enum.GetValues<BriefForm>() },
            monday,
            [.. ClassNames.Concat(MoreClassNames).Select(ClassSubject).Select(subject => subject with { Planned = [planned] })],
            []);
    }

    /// <summary>A class of 24 of whom 14 are to be called.</summary>
    public static Brief BusyDesk(params BriefForm[] forms)
    {
        var monday = Today.PlusDays(1);
        var planned = new PlanEntry(PlanWord.Class, monday, monday, new LocalTime(10, 0), new LocalTime(11, 0), true, null);
        return BriefBuilder.Build(
            Contact(ContactRole.FrontDesk, "desk", "squad") with { Name = "Front desk", Forms = forms },
            monday,
            [
                .. SquadNames.Select((name, place) => place < 14 ? Subject($"r{place:00}", name, StimulusGap($"r{place:00}"), place % 2 == 0 ? Silence($"r{place:00}") : LoadRatio($"r{place:00}")) : Subject($"r{place:00}", name))
                    .Select(subject => subject with { Planned = [planned] }),
            ],
            []);
    }

    private static BriefSubject SquadSubject(string name, int place)
    {
        var id = $"r{place:00}";
        double Load(int back) => (back + place) % 7 is 0 or 4 ? 0 : 55 + ((back * 37 + place * 11) % 70);
        bool? Heavy(int back) => (back * 3 + place) % 11 is 0 or 4 or 7;
        return place switch
        {
            3 => new(Person(id, name), Squad, Trends(id, 90, back => Load(back) * (back < 7 ? 2.1 : 1), Heavy), [LoadRatio(id)], []),
            7 => new(Person(id, name), Squad, Trends(id, 90, back => Load(back), back => back >= 11 && Heavy(back) == true), [StimulusGap(id)], []),
            11 => new(Person(id, name), Squad, Trends(id, 90, back => back < 6 ? null : Load(back), back => back < 6 ? null : Heavy(back)), [Silence(id)], []),
            14 => new(Person(id, name), Squad, Trends(id, 90, back => Load(back) * (back < 7 ? 1.9 : 1), back => back >= 14 && Heavy(back) == true),
                [LoadRatio(id, isNew: false), StimulusGap(id, Severity.Warning, isNew: true)], []),
            17 => new(Person(id, name), Squad, Trends(id, 90, back => Load(back), Heavy), [Over(LoadRatio(id))], []),
            19 => new(Person(id, name), Squad, Trends(id, 90, back => Load(back), _ => null), [], ["heart rate alone cannot show heavy or fast work; a set log or a power meter would"]),
            20 => new(Person(id, name), Squad, Trends(id, 90, back => back is 2 or 5 ? null : Load(back), Heavy), [Over(StimulusGap(id), corrected: true)],
                ["heart rate usable in 12 % of the time on 26 Feb: no heart-rate load"]),
            22 => new(Person(id, name), Squad, [], [], []),
            _ => new(Person(id, name), Squad, Trends(id, 90, back => Load(back), Heavy), [], []),
        };
    }

    private static BriefSubject ClassSubject(string name, int place)
    {
        var id = $"c{place:00}";
        double Load(int back) => (back + place) % 4 == 0 ? 1400 + ((back * 97 + place * 53) % 900) : 0;
        bool? Heavy(int back) => (back + place) % 4 == 0 && (back + place) % 3 != 0;
        return place switch
        {
            4 => new(Person(id, name, Class), Class, Trends(id, 200, back => Load(back), back => back >= 22 && Heavy(back) == true),
                [News(id, "stimulus_gap", BodyRegion.Legs, Severity.Warning, AlertState.Unacknowledged, "no heavy or fast leg work for 22 days, since 6 February; usual gap 5 days", true)], []),
            9 => new(Person(id, name, Class), Class, Trends(id, 200, back => back < 15 ? null : Load(back), back => back < 15 ? null : Heavy(back)), [Silence(id)], []),
            12 => new(Person(id, name, Class), Class, Trends(id, 200, back => Load(back), back => back >= 11 && Heavy(back) == true),
                [StimulusGap(id, state: AlertState.Acknowledged)], []),
            _ => new(Person(id, name, Class), Class, Trends(id, 200, back => Load(back), Heavy), [], []),
        };
    }

    private static Day DayOf(string person, int count, int back, Func<int, double?> load, Func<int, bool?> heavy)
    {
        double? Week(int from, int days)
        {
            var known = Enumerable.Range(from, days).Where(at => at < count).Select(load).Where(value => value is not null).ToList();
            return known.Count < days * 5 / 7.0 ? null : known.Sum() * 7 / known.Count;
        }

        var acute = Week(back, 7);
        var before = Week(back + 7, 21);
        return new Day
        {
            Person = person,
            Date = Yesterday.PlusDays(-back),
            State = load(back) switch { null => DayState.Unknown, 0 => DayState.Rest, _ => DayState.Recorded },
            Load = load(back),
            Acute = acute,
            ChronicBefore = before,
            Coverage7 = Enumerable.Range(back, 7).Count(at => at < count && load(at) is not null) / 7.0,
            RatioUncoupled = before is > 0 ? acute / before : null,
            Regions = new Dictionary<BodyRegion, RegionDay> { [BodyRegion.Legs] = Legs(count, back, heavy) },
        };
    }

    private static RegionDay Legs(int count, int back, Func<int, bool?> heavy)
    {
        var past = Enumerable.Range(back, Math.Max(0, count - back)).ToList();
        var known = past.Where(at => heavy(at) is not null).ToList();
        var last = past.Where(at => heavy(at) == true).Select(at => (int?)at).FirstOrDefault() ?? (known.Count > 0 ? known[^1] : null);
        var month = past.Take(28).Where(at => heavy(at) is not null).ToList();
        return new RegionDay(heavy(back), null, month.Count == 0 ? null : month.Count(at => heavy(at) == true), last - back, known.Count(at => at < last), null);
    }
}
