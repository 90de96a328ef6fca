using LoadWatch.Anchors;
using LoadWatch.Decoding.Fit;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Explain;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Reference values from own sessions, from the files to what is computed by them.</summary>
public sealed class ObservedAnchorsTests : IDisposable
{
    private static readonly LocalDate June = new(2026, 6, 1);

    private static readonly LocalDate Shown = AllOutRides.Last;

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>By hand: W = 18 kJ + 250 W t at 120, 300 and 720 s, each within a ride of 25 minutes.</summary>
    [Fact]
    public void EffortsOfAMonthGiveTheNextMonthsCapacity()
    {
        folder.Fill(AllOutRides.Season());
        folder.Sweep();

        var observed = Observed();
        Assert.Equal([AnchorKind.CriticalPower, AnchorKind.WPrime, AnchorKind.PowerMax], observed.Select(one => one.Kind).Order());
        Assert.All(observed, one => Assert.Equal((June, "cycling"), (one.From, one.Sport)));
        Assert.Equal((250, 18_000, 400), (Value(observed, AnchorKind.CriticalPower), Value(observed, AnchorKind.WPrime), Value(observed, AnchorKind.PowerMax)));
        Assert.Equal([false, false, false, true], Rides().Select(HasPowerZones));
        Assert.Contains("from own sessions critical_power cycling = 250 W (within 5) from 2026-06-01 on, used: work on time, 3 bests of 120 to 720 s from 3 sessions", Explained(Shown));
    }

    [Fact]
    public void ARebuildGivesTheSameRows()
    {
        folder.Fill(AllOutRides.Season());
        folder.Sweep();
        var (before, observed) = (folder.Everything(), Observed());

        folder.Rebuild();

        Assert.Equal(before, folder.Everything());
        Assert.Equal(observed, Observed());
        Assert.Equal(0, folder.Sweep().Recomputed);
    }

    [Fact]
    public void NeitherOrderNorNightsMatter()
    {
        folder.Fill(AllOutRides.Season());
        folder.Sweep();
        using var other = new WorkingFolder();
        foreach (var (file, night) in AllOutRides.Season().Reverse().Select((file, night) => (file, night)))
        {
            other.Fill([file]);
            other.Sweep(WorkingFolder.Now - Duration.FromDays(4 - night));
        }

        other.Sweep();

        Assert.Equal(Observed(), Observed(other));
        Assert.Equal(folder.Export("activities"), other.Export("activities"));
        Assert.Equal(folder.Export("days"), other.Export("days"));
    }

    [Fact]
    public void WhatOneImportTellsIsKnownBeforeItsSessionsAreComputed()
    {
        folder.Fill(AllOutRides.Season());

        Assert.Equal(0, folder.Sweep().Recomputed);
        Assert.Equal([false, false, false, true], Rides().Select(HasPowerZones));
    }

    /// <summary>
    /// Two groups of rides whose months lie all over the year, some with a copy that another watch cut short: what the first group tells is wrong by the second, and what a group of
    /// three tells is never looked at ahead.
    /// </summary>
    [Fact]
    public void AnImportOutOfOrderGivesWhatSmallOnesGive()
    {
        IReadOnlyList<(string Path, byte[] Bytes)> files = [.. Enumerable.Range(0, 80).SelectMany(Scattered)];
        folder.Fill(files);
        var asked = folder.Sweep().Recomputed;
        using var other = new WorkingFolder();
        foreach (var three in files.Chunk(3))
        {
            other.Fill(three);
            other.Sweep();
        }

        Assert.True(asked > 0, "some were computed by what the second group changed");
        Assert.True(Observed().Count >= 6, $"{Observed().Count} values");
        Assert.Equal(Observed(other), Observed());
        Assert.Equal(other.Export("activities"), folder.Export("activities"));
        Assert.Equal(other.Export("days"), folder.Export("days"));
        Assert.Equal(0, folder.Sweep().Recomputed);
    }

    /// <summary>A ride of one of twelve months, better and better by its number; names lead from one end of the year to the other and back.</summary>
    private static IEnumerable<(string Path, byte[] Bytes)> Scattered(int number)
    {
        var date = new LocalDate(2025, 6, 3).PlusMonths(number * 5 % 12).PlusDays(number / 4);
        int[] seconds = [120, 300, 720];
        yield return ($"anna/{number:00}.fit", AllOutRides.Ride(date, seconds[number % 3], number));
        if (number % 8 == 0)
        {
            yield return ($"anna/{number:00} short.fit", AllOutRides.Ride(date, seconds[number % 3], number, length: 1400));
        }
    }

    /// <summary>The ride of June is computed again when the last of the efforts of May comes late.</summary>
    [Fact]
    public void ALateFileChangesWhatComesBehindItsMonth()
    {
        folder.Fill(AllOutRides.Season().Skip(1));
        folder.Sweep();
        Assert.DoesNotContain(true, Rides().Select(HasPowerZones));

        folder.Fill(AllOutRides.Season().Take(1));
        folder.Sweep();

        Assert.Equal([false, false, false, true], Rides().Select(HasPowerZones));
    }

    [Fact]
    public void AMeasuredValueWinsAndTheContradictionIsShown()
    {
        folder.Write("anchors.csv", $"{WorkingFolder.Anchors.TrimEnd()}\nanna,2026-05-30,critical_power,300,W,,\n");
        folder.Fill(AllOutRides.Season());
        folder.Sweep();

        Assert.Equal(250, Value(Observed(), AnchorKind.CriticalPower));
        Assert.Equal(255, Assert.Single(Rides()[^1].Values.TimesInZone, zone => zone.Channel == Channel.Power).Bounds[1]);
        const string Sentence = "critical power (cycling): 300 W measured on 30 May 2026, own sessions up to 20 May 2026 show 250 W (within 5 W): the measured one is used; measure again?";
        Assert.Contains(Sentence[1..], folder.Brief());
        Assert.Contains(Sentence, Explained(Shown));
        Assert.Contains("on, not used, one is measured: work on time", Explained(Shown));
    }

    [Fact]
    public void AHighestHeartRateOfTwoSessionsReplacesThatOfAge()
    {
        folder.Write("anchors.csv", "person,date,anchor,value,unit,source,exercise\nanna,,heart_rate_rest,50,bpm,,\n");
        folder.Fill([Heart(4, 170), Heart(11, 188), Heart(18, 189), ("anna/june.fit", Some.Fit(Shown))]);
        folder.Sweep();
        var lower = Trimp();

        folder.Fill([Heart(25, 192), Heart(26, 192)]);
        folder.Sweep();

        // Born in 1996 she is 30: 208 - 0.7 x 30 = 187, and only what is above 190 says more.
        Assert.Equal(202, Value(Observed(), AnchorKind.HeartRateMax));
        Assert.True(Trimp() < lower, $"{Trimp()} and {lower}");
    }

    /// <summary>Within the two minutes heart rate rises by one in ten seconds: the best 15 s are 5 at 10 and 10 at 11 above its beginning, 10.67.</summary>
    private static (string Path, byte[] Bytes) Heart(int day, int beginning) => ($"anna/may{day}.fit", Some.Fit(new LocalDate(2026, 5, day), heartRate: beginning));

    private double Trimp() => folder.Activities("anna")[^1].Value("banister_trimp")!.Value;

    private static double Value(IReadOnlyList<ObservedAnchor> observed, AnchorKind kind) => Math.Round(observed.Single(one => one.Kind == kind).Value, 3);

    private IReadOnlyList<ObservedAnchor> Observed(WorkingFolder? of = null) => (of ?? folder).Read((_, session) => session.ObservedAnchors.OfPerson("anna"));

    private IReadOnlyList<StoredActivity> Rides() => folder.Read((_, session) => session.Activities.OfPerson("anna"));

    private static bool HasPowerZones(StoredActivity activity) => activity.Values.TimesInZone.Any(zone => zone.Channel == Channel.Power);

    private string Explained(LocalDate date) => folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "anna", date))!;
}
