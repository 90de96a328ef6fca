using LoadWatch.Days;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Days;

/// <summary>A row of <c>day</c>.</summary>
internal sealed class DayRow
{
    private const string NoPlan = "{}";
    private const string NoSessions = "[]";

    public string Person { get; init; } = "";

    public LocalDate Date { get; init; }

    public string State { get; init; } = "";

    public string? StateSource { get; init; }

    public double? Load { get; init; }

    public double? LoadError { get; init; }

    public double? Acute { get; init; }

    public double? Chronic { get; init; }

    public double? ChronicBefore { get; init; }

    public double? RatioCoupled { get; init; }

    public double? RatioUncoupled { get; init; }

    public double? RatioEwma { get; init; }

    public double? EwmaAcute { get; init; }

    public double? EwmaChronic { get; init; }

    public double? WeeklyChange { get; init; }

    public double? WeeklyChangeOrdinary { get; init; }

    public double? UsualWeek { get; init; }

    public double? LargestSession30 { get; init; }

    public double? LongestRunMetres30 { get; init; }

    public double? Monotony { get; init; }

    public double? Strain { get; init; }

    public double? ChronicMedian { get; init; }

    public double Coverage7 { get; init; }

    public double Coverage28 { get; init; }

    public int? DaysSinceFirstCovered { get; init; }

    public int? DaysSinceRecorded { get; init; }

    public string Plan { get; init; } = "";

    public string Regions { get; init; } = "";

    /// <summary>Empty where not read.</summary>
    public string Sessions { get; init; } = "";

    /// <summary>Empty where not read.</summary>
    public string Carried { get; init; } = "";

    public static DayRow From(Day day) => new()
    {
        Person = day.Person,
        Date = day.Date,
        State = Words<DayState>.Of(day.State),
        StateSource = day.StateSource,
        Load = day.Load,
        LoadError = day.LoadError,
        Acute = day.Acute,
        Chronic = day.Chronic,
        ChronicBefore = day.ChronicBefore,
        RatioCoupled = day.RatioCoupled,
        RatioUncoupled = day.RatioUncoupled,
        RatioEwma = day.RatioEwma,
        EwmaAcute = day.EwmaAcute,
        EwmaChronic = day.EwmaChronic,
        WeeklyChange = day.WeeklyChange,
        WeeklyChangeOrdinary = day.WeeklyChangeOrdinary,
        UsualWeek = day.UsualWeek,
        LargestSession30 = day.LargestSession30,
        LongestRunMetres30 = day.LongestRunMetres30,
        Monotony = day.Monotony,
        Strain = day.Strain,
        ChronicMedian = day.ChronicMedian,
        Coverage7 = day.Coverage7,
        Coverage28 = day.Coverage28,
        DaysSinceFirstCovered = day.DaysSinceFirstCovered,
        DaysSinceRecorded = day.DaysSinceRecorded,
        Plan = day.Plan == DayPlan.None ? NoPlan : JsonText.Write(day.Plan),
        Regions = JsonText.WriteSorted(day.Regions),
        Sessions = day.Sessions.Count == 0 ? NoSessions : JsonText.Write(day.Sessions),
        Carried = LoadWatch.Days.Carried.Write(day.Carried),
    };

    public Day ToDay() => new()
    {
        Person = Person,
        Date = Date,
        State = Words<DayState>.Parse(State),
        StateSource = StateSource,
        Load = Load,
        LoadError = LoadError,
        Acute = Acute,
        Chronic = Chronic,
        ChronicBefore = ChronicBefore,
        RatioCoupled = RatioCoupled,
        RatioUncoupled = RatioUncoupled,
        RatioEwma = RatioEwma,
        EwmaAcute = EwmaAcute,
        EwmaChronic = EwmaChronic,
        WeeklyChange = WeeklyChange,
        WeeklyChangeOrdinary = WeeklyChangeOrdinary,
        UsualWeek = UsualWeek,
        LargestSession30 = LargestSession30,
        LongestRunMetres30 = LongestRunMetres30,
        Monotony = Monotony,
        Strain = Strain,
        ChronicMedian = ChronicMedian,
        Coverage7 = Coverage7,
        Coverage28 = Coverage28,
        DaysSinceFirstCovered = DaysSinceFirstCovered,
        DaysSinceRecorded = DaysSinceRecorded,
        Plan = Plan == NoPlan ? DayPlan.None : JsonText.Read<DayPlan>(Plan),
        Regions = JsonText.Read<Dictionary<BodyRegion, RegionDay>>(Regions),
        Sessions = Sessions is "" or NoSessions ? Array.Empty<DaySession>() : JsonText.Read<List<DaySession>>(Sessions),
        Carried = Carried.Length == 0 ? LoadWatch.Days.Carried.Nothing : LoadWatch.Days.Carried.Read(Carried),
    };
}
