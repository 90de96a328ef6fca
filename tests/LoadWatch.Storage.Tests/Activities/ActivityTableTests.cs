using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.Quality;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Storage.Tests.Activities;

public sealed class ActivityTableTests : StoreTest
{
    public ActivityTableTests(SharedFolder shared)
        : base(shared)
    {
        AddRecording(1);
        AddRecording(2);
    }

    [Fact]
    public void AnActivityIsReadAsItWasWritten()
    {
        var written = Full();
        Store.Write(session => session.Activities.Put(written));

        var read = Assert.Single(Store.Read(session => session.Activities.OfPerson("anna")));

        Assert.Equal(written.Winner, read.Winner);
        Assert.Equal(written.RecordingKeys, read.RecordingKeys);
        Assert.Equal(written.Merge.Frame, read.Merge.Frame);
        Assert.All(written.Merge.Contributions.Zip(read.Merge.Contributions), pair => Assert.True(pair.First.IsAs(pair.Second)));
        Assert.Equal(142.5, read.Values.HeartRateMeanBpm);
        Assert.Equal(181, read.Values.HeartRateMaxBpm);
        Assert.Null(read.Values.PowerMeanWatts);
        Assert.Equal(0.1 + 0.2, read.Values.PowerMaxWatts);
        Assert.Equal(written.Values.UsableShare, read.Values.UsableShare);
        Assert.Equal(written.Values.Cuts, read.Values.Cuts);
        Assert.Equal(written.Values.Remarks, read.Values.Remarks);
        Assert.Equal(written.Values.Quantities, read.Values.Quantities);
        Assert.Empty(read.Values.Histograms);
    }

    [Fact]
    public void TimesInZoneAreReadAsTheyWereWritten()
    {
        Store.Write(session => session.Activities.Put(Full()));

        var zone = Assert.Single(Assert.Single(Store.Read(session => session.Activities.All())).Values.TimesInZone);

        Assert.Equal((Channel.HeartRate, "ventilatory thresholds", true), (zone.Channel, zone.Basis, zone.Estimated));
        Assert.Equal([140.5, 168], zone.Bounds);
        Assert.Equal([600, 300.001, 0], zone.Seconds);
    }

    [Fact]
    public void StimulusIsReadAsItWasWrittenLegsFirst()
    {
        var written = Full().Values.Stimulus;
        Store.Write(session => session.Activities.Put(Full()));

        var read = Assert.Single(Store.Read(session => session.Activities.OfPerson("anna"))).Values.Stimulus;

        IReadOnlyList<string> none = [];
        Assert.Equal(written.Select(one => one with { NotSeen = none }), read.Select(one => one with { NotSeen = none }));
        Assert.Equal(["maximal power"], read[0].NotSeen);
        Assert.Empty(read[1].NotSeen);
    }

    [Fact]
    public void HistogramsAreReadByChannel()
    {
        Store.Write(session => session.Activities.Put(Full()));

        var read = Store.Read(session => session.Activities.Histogram(Full().Key, Channel.HeartRate));

        Assert.Equal([new(120, 1000), new(121, 300)], read!.Bins);
        Assert.Null(Store.Read(session => session.Activities.Histogram(Full().Key, Channel.Power)));
    }

    [Fact]
    public void AnActivityPutAgainReplacesAllOfTheFirst()
    {
        Store.Write(session => session.Activities.Put(Full()));

        Store.Write(session => session.Activities.Put(Some.Activity(1)));

        var read = Assert.Single(Store.Read(session => session.Activities.OfPerson("anna")));
        Assert.Equal([Some.Recording(1).Key], read.RecordingKeys);
        Assert.Empty(read.Values.Quantities);
        Assert.Empty(read.Values.Stimulus);
        Assert.Null(read.Values.HeartRateMeanBpm);
        Assert.Null(Store.Read(session => session.Activities.Histogram(Full().Key, Channel.HeartRate)));
    }

    [Fact]
    public void HowActivitiesWereMadeIsReadByTheStartOfTheirWinners()
    {
        Store.Write(session =>
        {
            session.Activities.Put(Full());
            session.Activities.Put(Some.Activity(2));
        });

        var (from, to) = (Some.Recording(1).Start, Some.Recording(2).Start);
        var read = Store.Read(session => session.Activities.Merges("anna", from, to));

        Assert.Equal([Full().Key, Some.Activity(2).Key], read.Select(merge => merge.Winner.Key));
        Assert.Equal([Full().Merge.Frame, SessionFrame.Of(Some.Recording(2))], read.Select(merge => merge.Frame));
        Assert.Single(Store.Read(session => session.Activities.Merges("anna", to, to)));
        Assert.Empty(Store.Read(session => session.Activities.Merges("bo", from, to)));
    }

    [Fact]
    public void ARemovedActivityLeavesNothing()
    {
        Store.Write(session => session.Activities.Put(Full()));

        Store.Write(session => session.Activities.Remove(Full().Key));

        Assert.Empty(Store.Read(session => session.Activities.All()));
        Assert.Null(Store.Read(session => session.Activities.Histogram(Full().Key, Channel.HeartRate)));
    }

    [Fact]
    public void TheDateOfAnActivityIsLocalAndBothEndsOfARangeCount()
    {
        // 20:00 UTC at +05:30 is 01:30 on the next day.
        Store.Write(session =>
        {
            session.Arrivals.AddWaiting(Some.Sha(3), null, Some.Sha(3), 4);
            var late = Some.Recording(3) with { Start = Instant.FromUtc(2026, 3, 1, 20, 0) };
            session.Recordings.Add(late);
            session.Activities.Put(new StoredActivity(late, new ActivityValues()));
            session.Activities.Put(Some.Activity(1));
        });

        Assert.Equal([Some.Recording(1).Key, Some.Recording(3).Key], KeysFrom(Some.Date, Some.Date.PlusDays(1)));
        Assert.Equal([Some.Recording(1).Key], KeysFrom(null, Some.Date));
        Assert.Equal([Some.Recording(3).Key], KeysFrom(Some.Date.PlusDays(1), null));
        Assert.Empty(KeysFrom(Some.Date.PlusDays(2), null));
    }

    private List<string> KeysFrom(LocalDate? from, LocalDate? to) =>
        [.. Store.Read(session => session.Activities.OfPerson("anna", from, to)).Select(activity => activity.Key)];

    private static StoredActivity Full()
    {
        var histogram = new Histogram();
        histogram.Add(120, 1000);
        histogram.Add(121, 300);
        var values = new ActivityValues
        {
            HeartRateMeanBpm = 142.5,
            HeartRateMaxBpm = 181,
            PowerMaxWatts = 0.1 + 0.2,
            UsableShare = new Dictionary<Channel, double> { [Channel.Power] = 0, [Channel.HeartRate] = 0.98 },
            Histograms = new Dictionary<Channel, Histogram> { [Channel.HeartRate] = histogram },
            TimesInZone = [new TimeInZone(Channel.HeartRate, "ventilatory thresholds", [140.5, 168], [600, 300.001, 0], Estimated: true)],
            Quantities = [Some.Quantity(QuantityNames.BanisterTrimp, 81.25), new Quantity(QuantityNames.Minutes, 60, "min", Estimated: false)],
            Stimulus =
            [
                new RegionStimulus(
                    BodyRegion.Legs,
                    Grade.A,
                    "power",
                    HardBouts: new Band(1, 2, 3),
                    HardRepetitions: new Band(4, 5, 6),
                    HardSets: 7,
                    SlowSeconds: new Band(8, 9, 10),
                    MediumSeconds: new Band(11, 12, 13),
                    LargeSeconds: new Band(14, 15, 16.5),
                    NotSeen: ["maximal power"]),
                new RegionStimulus(BodyRegion.Trunk, Grade.E, "heart_rate", null, null, null, null, null, null, []),
            ],
            Cuts =
            [
                new Cut(null, CutReason.Undated, Stretch.Always, 3, 0, 0.01),
                new Cut(Channel.HeartRate, CutReason.LockedToCadence, new Stretch(1_773_133_200_000, 1_773_133_260_001), 61, 60_000, 1 / 3.0),
            ],
            Remarks = ["heart rate usable in 12 % of the time: no heart-rate load"],
        };
        var merge = new StoredMerge(
            Some.Recording(1),
            new SessionFrame(Some.Recording(1).Start - Duration.FromMilliseconds(1), 3700.5, null, new Sport("cycling"), 4, null),
            [
                new Contribution(Some.Recording(1).Key, ContributionRole.Wins, [new Gift(Channel.HeartRate, null, [new Stretch(null, 5), new Stretch(7, null)])]),
                new Contribution(Some.Recording(2).Key, ContributionRole.Gives, [Gift.Of(WholeGift.Sets)]),
            ]);
        return new StoredActivity(merge, values);
    }
}
