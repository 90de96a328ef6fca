using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>What a recording gives to its activity, in words: which of its readings count, and why others do not.</summary>
public static class ContributionText
{
    /// <summary><c>gives power and heart rate after 40 min</c>; minutes from the start of the activity.</summary>
    public static string Of(StoreSession session, StoredMerge merge, Contribution contribution) => contribution.Role switch
    {
        ContributionRole.Wins when contribution.Gifts is null => "wins, all of it counts",
        ContributionRole.Wins => $"wins{Gifts(contribution, merge.Frame.Start, ", gives ")}",
        ContributionRole.Gives => Gifts(contribution, merge.Frame.Start, "gives "),
        ContributionRole.Superseded => $"superseded by {FileOf(session, merge.Winner.Sha)}: {Because(session, merge, contribution)}",
        ContributionRole.Replaced => $"replaced under its name by {Replacement(session, contribution)}",
        _ => "gives nothing: its original in the archive is missing or damaged",
    };

    /// <summary>The ordinally smallest name (I-5) with the first digits of the content.</summary>
    public static string FileOf(StoreSession session, string sha) =>
        session.Sightings.Of(sha) is [var first, ..] ? $"{OneLine.Of(first.Path)} ({sha[..12]})" : sha[..12];

    private static string Replacement(StoreSession session, Contribution contribution) =>
        string.Join(", ", (session.Sightings.Replaced(RecordingKey.Parse(contribution.Key).Sha) ?? []).Select(sha => FileOf(session, sha)));

    private static string Because(StoreSession session, StoredMerge merge, Contribution contribution)
    {
        var (sha, part) = RecordingKey.Parse(contribution.Key);
        var own = session.Recordings.OfArrival(sha).First(recording => recording.Part == part);
        var common = SessionOverlap.Common(own, merge.Winner);
        return common == Duration.Zero
            ? "they start together"
            : $"they overlap {Minutes(common)} of {Minutes(Duration.Min(SessionOverlap.Length(own), SessionOverlap.Length(merge.Winner)))} min";
    }

    private static string Gifts(Contribution contribution, Instant start, string before) =>
        contribution.Gifts is { Count: > 0 } gifts ? before + string.Join(", ", gifts.Select(gift => GiftText(gift, start))) : "";

    private static string GiftText(Gift gift, Instant start) => gift.Whole switch
    {
        WholeGift.Sets => "its sets",
        WholeGift.StatedDistance => "the distance it states",
        WholeGift.Sport => "its sport",
        _ => $"{ChannelWords.Of(gift.Channel!.Value)}{string.Join(" and", gift.Stretches.Select(stretch => When(stretch, start.ToUnixTimeMilliseconds())))}",
    };

    private static string When(Stretch stretch, long start) => (stretch.From - start, stretch.To - start) switch
    {
        (null, null) => "",
        ({ } from, null) => $" after {Minutes(Duration.FromMilliseconds(from))} min",
        (null, { } to) => $" until {Minutes(Duration.FromMilliseconds(to))} min",
        ({ } from, { } to) => $" from {Minutes(Duration.FromMilliseconds(from))} to {Minutes(Duration.FromMilliseconds(to))} min",
    };

    private static string Minutes(Duration time) => time.TotalMinutes.ToString("0.#", CultureInfo.InvariantCulture);
}
