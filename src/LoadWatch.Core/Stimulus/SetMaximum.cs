using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>The one-repetition maximum that a set is read against.</summary>
/// <param name="Kilograms">Above 0.</param>
/// <param name="IsOfMachine">False where the set was on a machine without a maximum of its own and that of the exercise alone stands in: friction,
/// levers and the path differ, so it counts as estimated.</param>
/// <param name="IsFresh">Measured within <see cref="FreshDays"/> days before, on this machine.</param>
/// <param name="RelativeError">Share of the maximum.</param>
internal sealed record SetMaximum(double Kilograms, bool IsOfMachine, bool IsFresh, double RelativeError)
{
    /// <summary>A maximum measured this long ago still counts as measured for grade A, days. A choice.</summary>
    public const int FreshDays = 56;

    /// <summary>Null where none is anchored for the exercise, on this machine or without one.</summary>
    public static SetMaximum? Of(StrengthSet set, LocalDate date, string person, AnchorBook anchors)
    {
        if (anchors.On(date, person, AnchorKind.OneRepetitionMax, set.Exercise, set.Machine) is not { Value: > 0 } anchor)
        {
            return null;
        }

        var ofMachine = ExerciseWord.Canonical(anchor.Machine) == ExerciseWord.Canonical(set.Machine);
        var measured = ofMachine && anchor.Source == AnchorSource.Measured;
        return new SetMaximum(
            anchor.Value,
            ofMachine,
            measured && anchor.Date >= date.PlusDays(-FreshDays),
            CapacityError.OfOneRepetitionMax(anchor.Source, ofMachine));
    }
}
