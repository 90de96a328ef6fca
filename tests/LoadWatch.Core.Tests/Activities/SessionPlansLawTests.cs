using CsCheck;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>I-5 and I-9 over random recordings of a day, on a grid of ten minutes.</summary>
public class SessionPlansLawTests
{
    private static readonly Channel[] Known = [Channel.HeartRate, Channel.Power, Channel.Speed];

    private static readonly Gen<Worn> Recording =
        Gen.Select(Gen.Int[0, 20], Gen.Int[0, 8], Gen.Int[1, 7], Gen.Int[0, 2]).Select((from, length, channels, sets) =>
            Worn.Of("?", from * 10, (from + length) * 10, Known.Where((_, bit) => (channels & (1 << bit)) != 0), sets: sets));

    /// <summary>Each a file of its own but for the last two, which share one.</summary>
    private static readonly Gen<Worn[]> Recordings = Recording.Array[0, 7].Select(worn => worn
        .Select((one, at) => one with { Summary = one.Summary with { Sha = $"f{Math.Min(at, 5)}", Part = at + 1 }, Recording = one.Recording with { Part = at + 1 } })
        .ToArray());

    private static readonly Gen<(string, string)[]> Replaced = Gen.Select(Gen.Int[0, 5], Gen.Int[0, 5])
        .Where((file, by) => file != by)
        .Select((file, by) => ($"f{file}", $"f{by}"))
        .Array[0, 2];

    [Fact]
    public void EveryRecordingIsInExactlyOneActivity() => Gen.Select(Recordings, Replaced).Sample((worn, replaced) =>
        Worn.Plans(worn, replaced).SelectMany(plan => plan.Contributions).Select(one => one.Key).Order(StringComparer.Ordinal)
            .SequenceEqual(worn.Select(one => one.Key).Order(StringComparer.Ordinal), StringComparer.Ordinal));

    [Fact]
    public void TheOrderOfArrivalDoesNotMatter() => Gen.Select(Recordings, Replaced, Gen.Int).Sample((worn, replaced, seed) =>
        Text(Worn.Plans(worn, replaced)) == Text(Worn.Plans(worn.OrderBy(one => unchecked((one.Summary.Part * 7919) ^ seed)), replaced)));

    [Fact]
    public void ActivitiesAreThoseOfTheDefinition() => Gen.Select(Recordings, Replaced).Sample((worn, replaced) =>
        Worn.Plans(worn, replaced).Select(Members).Order(StringComparer.Ordinal)
            .SequenceEqual(Defined([.. worn.Select(one => one.Summary)], replaced).Order(StringComparer.Ordinal), StringComparer.Ordinal));

    [Fact]
    public void AnUnrelatedRecordingChangesNoOtherActivity() => Gen.Select(Recordings, Replaced).Sample((worn, replaced) =>
        Text(Worn.Plans(worn, replaced)) == Text(Worn.Plans([.. worn, Worn.Of("far", 2000, 2060, Known), Worn.Of("near", 281, 300, Known)], replaced)
            .Where(plan => plan.Winner.Sha is not ("far" or "near"))));

    /// <summary>Sessions of one file may overlap by the word of their device, so those are left out.</summary>
    [Fact]
    public void NoActivityCountsAMinuteThatAnotherCounts() => Gen.Select(Recordings, Replaced).Sample((worn, replaced) =>
    {
        var ofOwnFiles = worn.DistinctBy(one => one.Summary.Sha).ToArray();
        var plans = Worn.Plans(ofOwnFiles, replaced);
        return Known.All(channel => plans.Sum(plan => Worn.Minutes(plan, channel, ofOwnFiles)) <= Covered(ofOwnFiles, channel) + 1e-9)
            && plans.Sum(plan => plan.Frame.ElapsedSeconds ?? 0) <= (Covered(ofOwnFiles, null) * 60) + 1e-6;
    });

    /// <summary>Where nothing but copies of one hour overlaps, every minute of every channel counts once.</summary>
    [Fact]
    public void NestedRecordingsLoseNothing() => Recording.Array[1, 4].Sample(found =>
    {
        var worn = found.Select((one, at) => Worn.Of($"f{at}", -at * 10, 100 + (at * 10), one.Recording.Samples.Channels)).ToArray();
        var plan = Assert.Single(Worn.Plans(worn));
        return Known.All(channel => Math.Abs(Worn.Minutes(plan, channel, worn) - Covered(worn, channel)) < 1e-9);
    });

    [Fact]
    public void NeighboursAreWholeComponents() => Recordings.Where(worn => worn.Length > 0).Sample(worn =>
    {
        var all = worn.Select(one => one.Summary).ToList();
        var around = SessionNeighbours.Around(all[0].Start, all[0].End, (from, to) => all.Where(one => one.Start >= from && one.Start <= to));
        return around.Contains(all[0]) && !all.Except(around).Any(one => around.Any(other => SessionOverlap.Touch(one, other)));
    });

    /// <summary>Written anew from the sentence: the richest takes what is of its session, and so on.</summary>
    private static IEnumerable<string> Defined(List<RecordingSummary> left, (string File, string By)[] replaced)
    {
        while (left.Count > 0)
        {
            var winner = left[0];
            foreach (var one in left)
            {
                winner = IsRicher(one, winner, replaced) ? one : winner;
            }

            var members = left.FindAll(one => one == winner || IsSame(one, winner));
            yield return string.Join(' ', members.Select(one => one.Key).Order(StringComparer.Ordinal));
            left = left.FindAll(one => !members.Contains(one));
        }
    }

    private static bool IsRicher(RecordingSummary one, RecordingSummary than, (string File, string By)[] replaced)
    {
        (bool, int, int, int, long) Rank(RecordingSummary of) => (
            replaced.All(pair => pair.File != of.Sha),
            of.Channels.All.Count,
            of.Channels.All.Count(channel => channel.IsUsable),
            of.Samples + of.Sets,
            -of.Start.ToUnixTimeMilliseconds());
        return Rank(one).CompareTo(Rank(than)) is var order && order != 0 ? order > 0 : string.CompareOrdinal(one.Key, than.Key) < 0;
    }

    private static bool IsSame(RecordingSummary one, RecordingSummary other)
    {
        if (one.Sha == other.Sha)
        {
            return one.Start == other.Start && one.SamplesDigest == other.SamplesDigest;
        }

        var cells = Cells(one).Intersect(Cells(other)).Count();
        var shorter = Math.Min(Cells(one).Count, Cells(other).Count);
        return one.Start == other.Start || (shorter == 0 ? IsInside(one, other) || IsInside(other, one) : cells * 2 >= shorter);
    }

    private static bool IsInside(RecordingSummary point, RecordingSummary other) =>
        Cells(point).Count == 0 && Cells(other).Contains((int)((point.Start - Given.Start).TotalMinutes / 10));

    /// <summary>The numbers of the ten minutes during which it ran.</summary>
    private static List<int> Cells(RecordingSummary one) =>
        [.. Enumerable.Range(0, 40).Where(cell => one.Start <= Worn.At(cell * 10) && one.End >= Worn.At((cell + 1) * 10))];

    private static string Members(SessionPlan plan) => string.Join(' ', plan.Contributions.Select(one => one.Key).Order(StringComparer.Ordinal));

    /// <summary>Minutes in which any recording ran, or had readings of the channel.</summary>
    private static double Covered(Worn[] worn, Channel? channel) => Enumerable.Range(-10, 60)
        .Count(cell => worn.Any(one => (channel is not { } wanted || one.Summary.Channels[wanted] is not null)
            && one.Summary.Start <= Worn.At(cell * 10) && one.Summary.End >= Worn.At((cell + 1) * 10))) * 10;

    private static string Text(IEnumerable<SessionPlan> plans) => string.Join('\n', plans.Select(Worn.Text));
}
