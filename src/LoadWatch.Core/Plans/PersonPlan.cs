using NodaTime;

namespace LoadWatch.Plans;

/// <summary>Everything that plan, day tables and answers say about one person, asked for by date. Pure.</summary>
public sealed class PersonPlan
{
    /// <summary>Length of the return phase, days. A choice.</summary>
    public const int ReturnDays = 14;

    /// <summary>An absence of this length or longer is a break that one returns from, days. A choice.</summary>
    public const int BreakDays = 7;

    /// <summary>No line of a plan is read further than this many days from its first date on.</summary>
    public const int LongestDays = 400;

    private static readonly PlanWord[] PhaseWords =
        [PlanWord.Camp, PlanWord.Travel, PlanWord.LightWeek, PlanWord.OffSeason, PlanWord.Returning, PlanWord.ProgrammeStart];

    private ILookup<LocalDate, PlanEntry>? byDate;
    private IReadOnlyList<LocalDate>? ends;

    public static PersonPlan None { get; } = new() { Entries = [] };

    /// <summary>Lines of the plan of the person or the person's group, matches by answer among them.</summary>
    public required IReadOnlyList<PlanEntry> Entries { get; init; }

    /// <summary>By answer, command or day table; an open one already closed where the return was told.</summary>
    public IReadOnlyList<Absence> Absences { get; init; } = [];

    /// <summary>Dates on which the person trains again, as told.</summary>
    public IReadOnlyList<LocalDate> Returns { get; init; } = [];

    /// <summary>Dates of stated rest with who stated it (<c>answers</c>, <c>days</c>); rest of the plan is among the entries.</summary>
    public IReadOnlyDictionary<LocalDate, string> Rests { get; init; } = new Dictionary<LocalDate, string>();

    /// <summary>Dates on which the person was there (true) or was missed (false), by day table.</summary>
    public IReadOnlyDictionary<LocalDate, bool> Attendance { get; init; } = new Dictionary<LocalDate, bool>();

    /// <summary>Lines of the plan that cover the date.</summary>
    public IEnumerable<PlanEntry> EntriesOn(LocalDate date) => (byDate ??= Spread())[date];

    /// <summary>What holds on a date. Uses nothing dated later, but for the end of an absence that had begun.</summary>
    public DayPlan On(LocalDate date)
    {
        if (Entries.Count == 0 && Absences.Count == 0 && Returns.Count == 0 && Rests.Count == 0)
        {
            return DayPlan.None;
        }

        var entries = EntriesOn(date).ToList();
        IReadOnlyList<PlanWord> phases = [.. PhaseWords.Where(word => entries.Exists(entry => entry.Word == word))];
        var absence = Absences.Where(absence => absence.Covers(date)).MaxBy(absence => absence.From)?.Word;
        var rest = entries.Exists(entry => entry.Word == PlanWord.Rest) ? "plan" : Rests.GetValueOrDefault(date);
        return new DayPlan(
            absence,
            absence is null ? ReturnDay(date, entries) : null,
            entries.Exists(entry => entry.Word == PlanWord.Match),
            rest,
            absence is null && rest is null ? entries.Count(entry => entry.RecordingExpected) : 0,
            phases.Count == 0 ? DayPlan.None.Phases : phases);
    }

    /// <summary>Counted from the latest of what says that the person is back: the end of a break, a return as told, a planned return.</summary>
    private int? ReturnDay(LocalDate date, List<PlanEntry> entries)
    {
        var firsts = (ends ??= [.. EndsOfBreaks()])
            .Concat(Returns)
            .Concat(entries.Where(entry => entry.Word == PlanWord.Returning).Select(entry => entry.From))
            .Where(first => first <= date)
            .ToList();
        var day = firsts.Count == 0 ? int.MaxValue : Period.DaysBetween(firsts.Max(), date) + 1;
        return day <= ReturnDays ? day : null;
    }

    /// <summary>The first date after each break. Ill and then injured is one break: absences that adjoin or overlap are measured together.</summary>
    private IEnumerable<LocalDate> EndsOfBreaks()
    {
        LocalDate? from = null;
        LocalDate until = default;
        foreach (var absence in Absences.Where(absence => absence.Until is not null).OrderBy(absence => absence.From))
        {
            if (from is { } began && absence.From > until.PlusDays(1))
            {
                if (IsBreak(began, until))
                {
                    yield return until.PlusDays(1);
                }

                from = null;
            }

            until = from is null ? absence.Until!.Value : LocalDate.Max(until, absence.Until!.Value);
            from ??= absence.From;
        }

        if (from is { } last && IsBreak(last, until))
        {
            yield return until.PlusDays(1);
        }
    }

    private static bool IsBreak(LocalDate from, LocalDate until) => Period.DaysBetween(from, until) + 1 >= BreakDays;

    private ILookup<LocalDate, PlanEntry> Spread() => Entries
        .SelectMany(entry => Enumerable.Range(0, Math.Clamp(Period.DaysBetween(entry.From, entry.Until) + 1, 1, LongestDays)).Select(day => (Date: entry.From.PlusDays(day), entry)))
        .ToLookup(item => item.Date, item => item.entry);
}
