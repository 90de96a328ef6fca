using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>Matches close together. Takes every day in order.</summary>
internal sealed class MatchDensity(HardDaysLimits limits)
{
    private readonly FindingRun<MatchCount> run = new();
    private readonly Queue<LocalDate> matches = [];

    /// <summary>Null where there are not too many.</summary>
    public MatchCount? Standing => run.Since is null ? null : run.Reading;

    public void Pass(Day day)
    {
        if (day.Plan is { IsMatch: true, Absence: null } && day.State != DayState.Rest)
        {
            matches.Enqueue(day.Date);
        }

        while (matches.TryPeek(out var oldest) && oldest <= day.Date.PlusDays(-limits.MatchDays))
        {
            matches.Dequeue();
        }

        if (day.State != DayState.Unknown)
        {
            var many = matches.Count >= limits.Matches;
            run.Read(day.Date, new MatchCount(day.Date, matches.Count, matches.LastOrDefault()), many, many);
        }
    }
}

/// <summary>Matches within the days up to a date.</summary>
/// <param name="LastMatch">Of no meaning where there is none.</param>
internal sealed record MatchCount(LocalDate Date, int Matches, LocalDate LastMatch);
