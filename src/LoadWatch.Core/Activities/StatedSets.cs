using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What the working sets of one logged session come to.</summary>
/// <param name="Count">Working sets, 1 or more.</param>
/// <param name="Stimulus">Legs first.</param>
/// <param name="Totals">Sets, repetitions, kilograms.</param>
/// <param name="Remarks">In plain words.</param>
/// <param name="Read">How each was read.</param>
internal sealed record StatedSets(
    int Count, IReadOnlyList<RegionStimulus> Stimulus, IReadOnlyList<Quantity> Totals, IReadOnlyList<string> Remarks, IReadOnlyList<ReadSet> Read)
{
    public static StatedSets Of(IReadOnlyList<StrengthSet> work, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var stimulus = SessionOfSets.Of(work, date, person, anchors, settings);
        var (totals, remark) = SetTotals.Of(work, settings.Equations.OneRepetitionMaxByRepetitions);
        return new StatedSets(work.Count, stimulus.Regions, totals, remark is null ? stimulus.Remarks : [.. stimulus.Remarks, remark], stimulus.Sets);
    }

    /// <summary>The poorest grade of the regions; E where nothing could be read.</summary>
    public static Grade GradeOf(IEnumerable<RegionStimulus> stimulus) =>
        stimulus.Select(region => region.Grade).DefaultIfEmpty(Grade.E).Max();
}
