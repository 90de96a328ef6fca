using LoadWatch.Anchors;
using LoadWatch.Capacity;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Storage.Tests.Anchors;

public sealed class ObservedAnchorTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly LocalDate June = new(2026, 6, 1);

    private static readonly ObservedAnchor Power =
        new("anna", AnchorKind.CriticalPower, June, 250.123456, 5.5, new LocalDate(2026, 5, 20), "work on time") { Sport = "cycling" };

    private static readonly ObservedAnchor Press =
        new("anna", AnchorKind.OneRepetitionMax, June.PlusMonths(1), 120, 12, new LocalDate(2026, 6, 20), "sets") { Exercise = "leg_press", Machine = "press_2" };

    [Fact]
    public void TheyAreReadAsTheyWereWritten()
    {
        Store.Write(session => session.ObservedAnchors.Replace("anna", June, [Power, Press]));

        Assert.Equal([Power, Press], Of("anna"));
        Assert.Empty(Of("bo"));
    }

    [Fact]
    public void OfMaximalPowersOnlyThoseAreReadThatCanStillCount()
    {
        ObservedAnchor[] months = [.. Enumerable.Range(0, 24).Select(ago => Shown(June.PlusMonths(-ago))).Reverse()];
        Store.Write(session => session.ObservedAnchors.Replace("anna", June.PlusYears(-3), [Power with { From = June.PlusYears(-3) }, .. months]));

        Assert.Equal(25, Of("anna").Count);
        var read = Store.Read(session => session.ObservedAnchors.OfPerson("anna", June));

        Assert.Equal(AnchorKind.CriticalPower, read[0].Kind);
        Assert.Equal(months.Where(one => one.ShownOn >= June.PlusDays(-183)), read.Skip(1));
    }

    [Fact]
    public void ThoseOfEarlierMonthsStay()
    {
        Store.Write(session => session.ObservedAnchors.Replace("anna", June, [Power, Press]));
        Store.Write(session => session.ObservedAnchors.Replace("anna", June.PlusMonths(1), []));

        Assert.Equal([Power], Of("anna"));
    }

    [Fact]
    public void TheyGoWithThePersonAndWithAllThatIsDerived()
    {
        Store.Write(session => session.ObservedAnchors.Replace("anna", June, [Power]));
        Store.Write(session => session.Derived.ForgetPerson("anna"));
        Assert.Empty(Of("anna"));

        Store.Write(session => session.ObservedAnchors.Replace("anna", June, [Power]));
        Store.Write(session => session.Derived.Empty());
        Assert.Empty(Of("anna"));
    }

    [Fact]
    public void WhatASessionShowedAtBestIsReadByPersonAndDate()
    {
        AddRecording(1);
        var activity = Some.Activity(1);
        BestMeans means = new([412.5, 0.1 + 0.2]);
        Store.Write(session => session.Activities.Put(activity with { Values = activity.Values with { BestMeans = new Dictionary<Channel, BestMeans> { [Channel.Power] = means } } }));

        var bests = Assert.Single(Store.Read(session => session.Activities.Bests("anna", activity.Date, activity.Date)));

        Assert.Equal((activity.Key, activity.Date, activity.Session.Sport), (bests.Key, bests.Date, bests.Sport));
        Assert.Equal(means.Values, bests.Means[Channel.Power].Values);
        Assert.Empty(Store.Read(session => session.Activities.Bests("anna", activity.Date.PlusDays(1), activity.Date.PlusDays(9))));
    }

    [Fact]
    public void DamagedBytesAreNoBestMeans()
    {
        Assert.Throws<InvalidDataException>(() => BestMeansCodec.Read([1, 2, 3]));
        Assert.Throws<InvalidDataException>(() => BestMeansCodec.Read([0, 0, 0, 0, 0, 0, 0xF0, 0x7F]));
    }

    /// <summary>On the last day before the month from which it holds.</summary>
    private static ObservedAnchor Shown(LocalDate month) => new("anna", AnchorKind.PowerMax, month, 900, 45, month.PlusDays(-1), "one second") { Sport = "cycling" };

    private IReadOnlyList<ObservedAnchor> Of(string person) => Store.Read(session => session.ObservedAnchors.OfPerson(person));
}
