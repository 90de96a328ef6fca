using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime.Text;

namespace LoadWatch.Activities;

/// <summary>Makes one activity of everything that tells of a session.</summary>
internal static class JoinedSession
{
    private static bool IsOfSets(string quantity) =>
        quantity is QuantityNames.Sets or QuantityNames.Repetitions or QuantityNames.Kilograms
        || quantity.StartsWith(QuantityNames.OneRepetitionMaxOf, StringComparison.Ordinal);

    public static (JoinedActivity Activity, JoinQuestion? Question) Of(SessionParts session, Person person, ComputationSettings settings)
    {
        var (recording, stated, sport) = (session.Recording, session.Stated, session.Sport);
        var date = recording?.LocalStart.Date ?? session.Maker.Date;
        var log = Log(session);
        var content = stated.FirstOrDefault(one => one.Content is not null)?.Content;
        var quantities = Quantities(recording, stated, log);
        var (regions, isRegionAsked) = JoinedStimulus.Of(recording, log is null ? null : WithOtherRegions(log, stated), content, sport, settings);
        var activity = new JoinedActivity
        {
            Key = recording?.Winner.Key ?? KeyOfRows(session.Maker),
            Date = date,
            Start = recording?.Winner.Start ?? (session.Start is { } start ? PersonDay.Local(date + start, person).InZoneLeniently(person.Zone).ToInstant() : null),
            Sport = sport,
            Sources = Sorted([.. recording?.Sources ?? [], .. stated.Select(one => one.Source)]),
            Quantities = quantities.Quantities,
            StatedBy = quantities.StatedBy,
            Stimulus = regions,
            Sets = log is null ? [] : SetsOf(log, stated),
            UsableShare = recording?.Values.UsableShare ?? new Dictionary<Channel, double>(),
            Remarks = [.. Remarks(recording, regions), .. log?.Sets!.Remarks ?? [], .. quantities.Remarks, .. NotCounted(session, log)],
            Tables = Sorted(stated.Select(one => one.Layout)),
            AddsLoad = session.AddsLoad,
        };
        return (activity, isRegionAsked ? new JoinQuestion(date, JoinWording.WhichRegions(content!.Value, date)) : null);
    }

    /// <summary>
    /// The set log that counts: of several the one of the best grade, the first by layout among equals; none where the recording's own sets are graded as
    /// well.
    /// </summary>
    private static StatedSession? Log(SessionParts session)
    {
        var best = session.Stated.Where(one => one.Sets is not null).MinBy(one => StatedSets.GradeOf(one.Sets!.Stimulus));
        return best is not null && session.Recording?.Values is { } values && HasSets(values)
            && StatedSets.GradeOf(values.Stimulus) <= StatedSets.GradeOf(best.Sets!.Stimulus)
                ? null
                : best;
    }

    /// <summary>Regions that only another log of the session tells of come from that one: what one sheet leaves out was done all the same.</summary>
    private static IReadOnlyList<RegionStimulus> WithOtherRegions(StatedSession log, IReadOnlyList<StatedSession> stated) =>
        [.. Ranked(log, stated).SelectMany(sets => sets.Stimulus).DistinctBy(region => region.Region)];

    /// <summary>Of each log those that tell of a region that no better one tells of.</summary>
    private static IReadOnlyList<ReadSet> SetsOf(StatedSession log, IReadOnlyList<StatedSession> stated)
    {
        var told = new HashSet<BodyRegion>();
        var sets = new List<ReadSet>();
        foreach (var one in Ranked(log, stated))
        {
            sets.AddRange(one.Read.Where(set => set.Regions.Any(region => !told.Contains(region))));
            told.UnionWith(one.Stimulus.Select(region => region.Region));
        }

        return sets;
    }

    /// <summary>The log that counts first, then by grade.</summary>
    private static IEnumerable<StatedSets> Ranked(StatedSession log, IReadOnlyList<StatedSession> stated) => stated
        .Where(one => one.Sets is not null)
        .OrderBy(one => one != log)
        .ThenBy(one => StatedSets.GradeOf(one.Sets!.Stimulus))
        .Select(one => one.Sets!);

    private static bool HasSets(ActivityValues values) => values.Quantities.Any(quantity => quantity.Name == QuantityNames.Sets);

    private static QuantityFill Quantities(RecordedActivity? recording, IReadOnlyList<StatedSession> stated, StatedSession? log)
    {
        var fill = new QuantityFill();
        fill.Add((recording?.Values.Quantities ?? []).Where(one => log is null || !IsOfSets(one.Name)), "the recording");
        fill.Add(log?.Sets!.Totals ?? [], log?.Layout ?? "");
        foreach (var one in stated)
        {
            fill.AddStated(one.Quantities, one.Layout);
        }

        var (rating, minutes) = (fill[QuantityNames.Rating], fill[QuantityNames.Minutes]);
        if (FosterLoad.Of(rating?.Value, minutes?.Value) is { } load)
        {
            fill.Add([new Quantity(QuantityNames.FosterLoad, load, "AU", rating!.Estimated || minutes!.Estimated)], QuantityNames.Rating);
        }

        return fill;
    }

    /// <summary>The question for the regions of its sport is settled where something else tells them.</summary>
    private static IEnumerable<string> Remarks(RecordedActivity? recording, IReadOnlyList<RegionStimulus> regions)
    {
        if (recording is null)
        {
            return [];
        }

        var question = SportRegions.Question(recording.Winner.Sport);
        return recording.Values.Remarks.Where(remark => remark != question || !regions.Any(region => region.SeesHardWork));
    }

    private static IEnumerable<string> NotCounted(SessionParts session, StatedSession? log)
    {
        var others = session.Stated.Where(one => one.Sets is not null && one != log).Select(one => JoinWording.SetsBeside(one, log?.Layout));
        return session.AddsLoad ? others : others.Append(JoinWording.LoadIsCountedElsewhere);
    }

    private static string KeyOfRows(StatedSession maker) => $"rows/{LocalDatePattern.Iso.Format(maker.Date)}/{maker.Layout}/{maker.Mark}";

    private static IReadOnlyList<string> Sorted(IEnumerable<string> words) => [.. words.Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];
}
