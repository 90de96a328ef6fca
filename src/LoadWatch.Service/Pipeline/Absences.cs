using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Absences of one person without overlap, from what staff decided and what day tables say.</summary>
public static class Absences
{
    /// <summary>
    /// An absence or return that begins within an open absence ends it the day before; a return ends one with a last date too, and an absence within such a one
    /// stands in its place for its own dates. Of two that begin on one date the one decided later holds.
    /// </summary>
    /// <param name="decisions">In force, in the order of their moments.</param>
    public static IReadOnlyList<Absence> Decided(IReadOnlyList<Decision> decisions)
    {
        var absences = new List<Absence>();
        foreach (var decision in decisions.Where(decision => decision.Kind is DecisionKind.Returning || WordOf(decision.Kind) is not null).OrderBy(decision => decision.From))
        {
            var from = decision.From!.Value;
            var own = WordOf(decision.Kind) is { } word ? new Absence(word, from, decision.Until) : null;
            absences = [.. absences.SelectMany(earlier => Left(earlier, from, own?.Until)), .. own is null ? [] : new[] { own }];
        }

        return [.. absences.OrderBy(absence => absence.From)];
    }

    /// <summary>Dates that day tables give to an absence and that no decided one covers; consecutive ones of one word are one absence.</summary>
    public static IReadOnlyList<Absence> Stated(IReadOnlyList<(LocalDate Date, DayWord Word)> days, IReadOnlyList<Absence> decided)
    {
        var absences = new List<Absence>();
        foreach (var (date, word) in days.Select(day => (day.Date, Word: WordOf(day.Word))).Where(day => day.Word is not null).DistinctBy(day => day.Date).OrderBy(day => day.Date))
        {
            if (decided.Any(absence => absence.Covers(date)))
            {
                continue;
            }

            if (absences is [.., var last] && last.Word == word && last.Until == date.PlusDays(-1))
            {
                absences[^1] = last with { Until = date };
            }
            else
            {
                absences.Add(new Absence(word!.Value, date, date));
            }
        }

        return absences;
    }

    /// <summary>What is left of an absence beside the dates that something else takes; of an open one nothing behind them.</summary>
    /// <param name="until">Last date taken; null: all from the first on.</param>
    private static IEnumerable<Absence> Left(Absence earlier, LocalDate from, LocalDate? until)
    {
        if (earlier.From < from)
        {
            yield return earlier with { Until = earlier.Until < from ? earlier.Until : from.PlusDays(-1) };
        }

        if (earlier.Until > until)
        {
            yield return earlier with { From = LocalDate.Max(earlier.From, until!.Value.PlusDays(1)) };
        }
    }

    private static AbsenceWord? WordOf(DecisionKind kind) => kind switch
    {
        DecisionKind.Ill => AbsenceWord.Ill,
        DecisionKind.Injured => AbsenceWord.Injured,
        DecisionKind.Away => AbsenceWord.Away,
        _ => null,
    };

    private static AbsenceWord? WordOf(DayWord word) => word switch
    {
        DayWord.Ill => AbsenceWord.Ill,
        DayWord.Injured => AbsenceWord.Injured,
        DayWord.Away => AbsenceWord.Away,
        _ => null,
    };
}
