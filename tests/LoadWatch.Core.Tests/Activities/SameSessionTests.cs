using CsCheck;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

public class SameSessionTests
{
    [Theory]
    [InlineData(0, 1)]
    [InlineData(2000, 1)]
    [InlineData(-2000, 1)]
    [InlineData(2001, 2)]
    public void StartsWithinTwoSecondsAreOneSession(int milliseconds, int activities) =>
        Assert.Equal(activities, SameSession.Choose([Summary("a"), Summary("b", milliseconds: milliseconds)]).Count);

    [Fact]
    public void TheRicherRecordingWins()
    {
        var poor = Summary("a", channels: 1, samples: 9000);
        var rich = Summary("b", channels: 3, samples: 10);

        var group = Assert.Single(SameSession.Choose([poor, rich]));

        Assert.Equal(rich, group.Winner);
        Assert.Equal([poor], group.Superseded);
    }

    [Fact]
    public void BetweenEquallyRichOnesSamplesThenStartThenShaDecide()
    {
        Assert.Equal("b", Winner(Summary("a", samples: 10), Summary("b", samples: 11)));
        Assert.Equal("b", Winner(Summary("a", milliseconds: 1), Summary("b")));
        Assert.Equal("a", Winner(Summary("b"), Summary("a")));
    }

    [Fact]
    public void PartsOfOneFileCompeteOnlyIfStartAndSamplesAreEqual()
    {
        Assert.Equal(2, SameSession.Choose([Summary("a", part: 1, digest: 1), Summary("a", part: 2, digest: 2)]).Count);
        Assert.Equal(2, SameSession.Choose([Summary("a", part: 1), Summary("a", part: 2, milliseconds: 1)]).Count);
        Assert.Single(SameSession.Choose([Summary("a", part: 1), Summary("a", part: 2)]));
    }

    [Fact]
    public void NoRecordingsNoActivities() => Assert.Empty(SameSession.Choose([]));

    /// <summary>I-5: the order in which recordings came does not matter, and none is lost or doubled.</summary>
    [Fact]
    public void ShufflingChangesNothing() =>
        Gen.Select(Recordings, Gen.Int).Sample((recordings, seed) =>
        {
            var shuffled = recordings.OrderBy(one => unchecked((one.GetHashCode() * 31) + seed)).ToList();
            var (first, second) = (SameSession.Choose(recordings), SameSession.Choose(shuffled));
            return Words(first) == Words(second)
                && first.Sum(group => 1 + group.Superseded.Count) == recordings.Count
                && first.SelectMany(group => group.Superseded.Append(group.Winner)).Distinct().Count() == recordings.Count;
        });

    private static readonly Gen<List<RecordingSummary>> Recordings =
        Gen.Select(Gen.Int[0, 3], Gen.Int[0, 8], Gen.Int[1, 2], Gen.Int[0, 2], Gen.Int[0, 1])
            .Select((sha, half, channels, samples, digest) =>
                Summary($"{sha}", milliseconds: half * 1000, channels: channels, samples: samples, digest: digest))
            .List[0, 12]
            .Select(list => list.Select((one, index) => one with { Part = index + 1 }).ToList());

    private static string Words(IEnumerable<SessionGroup> groups) => string.Join(
        '\n', groups.Select(group => $"{group.Winner.Key}: {string.Join(' ', group.Superseded.Select(one => one.Key))}"));

    private static string Winner(params RecordingSummary[] recordings) => Assert.Single(SameSession.Choose(recordings)).Winner.Sha;

    private static RecordingSummary Summary(
        string sha, int part = 1, int milliseconds = 0, int channels = 2, int samples = 10, long digest = 0) => new(
        sha, part, "p1", Given.Start + Duration.FromMilliseconds(milliseconds), Offset.Zero, Sport.Generic, 60, 60, "unnamed device",
        channels, samples, 0, digest);
}
