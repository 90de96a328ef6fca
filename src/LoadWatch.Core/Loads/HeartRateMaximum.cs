using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>A person's maximal heart rate on a date.</summary>
/// <param name="Bpm">Above 0.</param>
/// <param name="Estimated">True when it comes from an equation.</param>
public sealed record HeartRateMaximum(double Bpm, bool Estimated)
{
    /// <summary>The anchored maximum, else one by age (<see cref="AnchorBook.HeartRateMaxEquation"/>), else null.</summary>
    public static HeartRateMaximum? On(LocalDate date, Person person, AnchorBook anchors)
    {
        if (anchors.On(date, person.Id, AnchorKind.HeartRateMax) is { } anchor)
        {
            return new HeartRateMaximum(anchor.Value, anchor.Source == AnchorSource.Estimated);
        }

        return person.AgeOn(date) is { } age && anchors.HeartRateMaxEquation.BpmAt(age, person.Sex) is { } bpm ? new HeartRateMaximum(bpm, Estimated: true) : null;
    }
}
