using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Matches close together. Takes every day in order. What is told are the matches as they last lay too close.</summary>
/// <param name="before">The run on the day before the first date.</param>
internal sealed class MatchDensity(HardDaysLimits limits, RunState<MatchCount>? before)
{
    private readonly FindingRun<MatchCount> run = new(limits.OnDays, limits.OffDays, before);
    private readonly Queue<LocalDate> matches = [];

    /// <summary>Null where there are not too many.</summary>
    public MatchCount? Standing => run.Since is null ? null : run.Reading;

    public RunState<MatchCount>? State => run.State;

    /// <summary>A day before the first date.</summary>
    public void Learn(Day day)
    {
        if (day.Plan is { IsMatch: true, Absence: null } && day.State != DayState.Rest)
        {
            matches.Enqueue(day.Date);
        }

        while (matches.TryPeek(out var oldest) && oldest <= day.Date.PlusDays(-limits.MatchDays))
        {
            matches.Dequeue();
        }
    }

    public void Pass(Day day)
    {
        Learn(day);
        if (day.State != DayState.Unknown)
        {
            var many = matches.Count >= limits.Matches;
            var told = many || Standing is null ? new MatchCount(day.Date, matches.Count, matches.LastOrDefault()) : Standing;
            run.Read(day.Date, told, many, matches.Count > Math.Min(limits.MatchesReturn, limits.Matches - 1));
        }
    }
}

/// <summary>Matches within the days up to a date.</summary>
/// <param name="LastMatch">Of no meaning where there is none.</param>
internal sealed record MatchCount(LocalDate Date, int Matches, LocalDate LastMatch);
