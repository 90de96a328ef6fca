using System.Globalization;
using System.Text;
using LoadWatch.Activities;
using LoadWatch.Service.Export;
using LoadWatch.Stimulus;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;

namespace LoadWatch.Service.Explain;

/// <summary>A session in short, as its day shows it: quantities, what it asked of each region, what was not seen, its recordings.</summary>
internal static class SessionText
{
    /// <param name="recorded">Null for rows alone.</param>
    public static void Append(StringBuilder text, StoreSession session, JoinedActivity activity, StoredActivity? recorded)
    {
        text.AppendLine(CultureInfo.InvariantCulture, $"session {Start(recorded)} {Rest(activity)}");
        if (recorded is not null)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    id {activity.Key}");
        }

        foreach (var quantity in activity.Quantities)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {QuantityText.Of(quantity)}");
        }

        AppendStimulus(text, activity);
        foreach (var remark in activity.Remarks)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {OneLine.Of(remark)}");
        }

        AppendRecordings(text, session, recorded);
    }

    /// <summary>When it began by its own clock; rows alone may not say.</summary>
    public static string Start(StoredActivity? recorded) =>
        recorded is { Session: { } told } ? Words.Start(told.Start.WithOffset(told.LocalOffset)) : "without a recording";

    /// <summary>Sport and sources.</summary>
    public static string Rest(JoinedActivity activity) =>
        $"{OneLine.Of(activity.Sport.ToString())}, by {OneLine.Of(string.Join(" and ", activity.Sources))}{(activity.AddsLoad ? "" : ", its load not added")}";

    /// <summary>A line a region, and what was not seen of it below, where that is wanted.</summary>
    public static void AppendStimulus(StringBuilder text, JoinedActivity activity, bool withNotSeen = true)
    {
        foreach (var stimulus in activity.Stimulus)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"    {BodyRegions.Word(stimulus.Region)} from {stimulus.Channel}, grade {stimulus.Grade}: {HardWork(stimulus)}, seconds of the slow class {OfBand(stimulus.SlowSeconds)}, medium {OfBand(stimulus.MediumSeconds)}, largest {OfBand(stimulus.LargeSeconds)}");
            foreach (var missing in withNotSeen ? stimulus.NotSeen : [])
            {
                text.AppendLine(CultureInfo.InvariantCulture, $"        not seen: {OneLine.Of(missing)}");
            }
        }
    }

    /// <summary>Cuts and coverage of each channel, and what each recording gave.</summary>
    public static void AppendRecordings(StringBuilder text, StoreSession session, StoredActivity? recorded)
    {
        if (recorded is null)
        {
            return;
        }

        CutText.Append(text, recorded.Values, recorded.Session.LocalOffset, "    ");
        foreach (var contribution in recorded.Merge.Contributions)
        {
            var (sha, part) = RecordingKey.Parse(contribution.Key);
            text.AppendLine(CultureInfo.InvariantCulture, $"    recording {part} of {ContributionText.FileOf(session, sha)}: {ContributionText.Of(session, recorded.Merge, contribution)}");
        }
    }

    /// <summary>Sets have repetitions, and bouts where one of them was held; every other channel has bouts alone.</summary>
    private static string HardWork(RegionStimulus stimulus)
    {
        var (bouts, repetitions) = ($"hard bouts {OfBand(stimulus.HardBouts)}", $"hard repetitions {OfBand(stimulus.HardRepetitions)}");
        return stimulus.Channel != StimulusChannels.Sets ? bouts
            : stimulus.HardBouts is null ? repetitions
            : $"{bouts}, {repetitions}";
    }

    private static string OfBand(Band? band) => band is { } known
        ? string.Create(CultureInfo.InvariantCulture, $"{known.Mid:0.#} ({known.Low:0.#} to {known.High:0.#})")
        : "unknown";
}
