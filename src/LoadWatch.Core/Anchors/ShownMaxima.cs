using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>The one-repetition maxima that sets let expect (<see cref="OneRepetitionMaxEstimate"/>).</summary>
public static class ShownMaxima
{
    /// <summary>Of rows of set logs.</summary>
    /// <param name="person">Whose they are.</param>
    /// <param name="equation">As quantities are estimated by.</param>
    public static IEnumerable<ShownMaximum> Of(IEnumerable<(LocalDate Date, SetRow Row)> rows, Person person, OneRepetitionMaxEquation equation) => rows
        .Select(row => (row.Date, Set: SetRows.Set(row.Row, row.Date, person)))
        .Select(row => (row.Date, row.Set.Machine, Exercise: ExerciseWord.Canonical(row.Set.Exercise), Kilograms: OneRepetitionMaxEstimate.KilogramsOf(row.Set, equation)))
        .Where(row => row.Exercise is not null && row.Kilograms is not null)
        .Select(row => new ShownMaximum(row.Date, row.Exercise!, ExerciseWord.Canonical(row.Machine), row.Kilograms!.Value));

    /// <summary>Of recorded sets, which are on no machine; of exercises that are known.</summary>
    /// <param name="exercises">In canonical form.</param>
    public static IEnumerable<ShownMaximum> Of(LocalDate date, IEnumerable<Quantity> quantities, IEnumerable<string> exercises) =>
        from quantity in quantities
        from exercise in exercises.Where(exercise => OneRepetitionMaxEstimate.NameOf(exercise, machine: null) == quantity.Name).Order(StringComparer.Ordinal).Take(1)
        select new ShownMaximum(date, exercise, null, quantity.Value);
}
