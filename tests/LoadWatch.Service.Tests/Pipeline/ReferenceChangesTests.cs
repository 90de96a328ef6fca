using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>
/// I-15: a reference value changes inside the windows that rules read. Numbers by hand from Banister's impulse for men, minutes x f x 0.64 exp(1.92 f) with f the share of the
/// reserve: at 160 bpm and 60 at rest a minute counts 2.885 times one at 120 bpm with a maximum of 200, and 3.350 times with 170.
/// </summary>
public sealed class ReferenceChangesTests
{
    private static readonly LocalDate First = new(2026, 1, 5);
    private static readonly Person Anna = new("anna", "Anna", "squad", null, Sex.Male, DateTimeZone.Utc);
    private static readonly Group Squad = new("squad", "Squad", QuantityNames.BanisterTrimp, new RuleLimits { LoadRatio = new() { Raise = 1.8, Return = 1.6, OnDays = 1 } });
    private static readonly HashSet<string> RulesOfLoad = [.. RuleBook.OfLoad.Select(rule => rule.Name)];

    [Theory]
    [InlineData(190, 150, 60, 60)]
    [InlineData(170, 205, 60, 60)]
    [InlineData(190, 190, 60, 40)]
    [InlineData(190, 180, 45, 62)]
    public void AChangedValueAloneMovesNoRatioAndRaisesNothing(double max, double maxNow, double rest, double restNow)
    {
        var anchors = Book(Max(max), Rest(rest), Max(maxNow, 60), Rest(restNow, 60));

        var series = Series(Steady(100), anchors);

        Assert.All(series.Days.Skip(28), day => Assert.Equal(1, day.RatioUncoupled!.Value, 7));
        Assert.All(series.Days.Skip(28), day => Assert.Equal(1, day.RatioEwma!.Value, 7));
        Assert.DoesNotContain(series.Findings, OfLoad);
    }

    [Fact]
    public void WithoutOneSetOfValuesForTheWindowItWouldRaise()
    {
        var anchors = Book(Max(190), Rest(60), Max(150, 60));

        Assert.Contains(Series(Steady(100), anchors, isChangeSeen: false).Findings, finding => finding is { Rule: "load_ratio", Severity: Severity.Warning });
    }

    [Fact]
    public void SeveralChangesInsideOneWindowMoveNothingEither()
    {
        var anchors = Book(Max(190), Rest(60), Rest(50, 50), Max(178, 61), Rest(57, 66), Max(190, 70));

        var series = Series(Steady(100), anchors);

        Assert.All(series.Days.Skip(28), day => Assert.Equal(1, day.RatioUncoupled!.Value, 7));
        Assert.DoesNotContain(series.Findings, OfLoad);
    }

    [Fact]
    public void ATrueJumpTogetherWithAChangeRaisesAndShowsBothValues()
    {
        var anchors = Book(Max(190), Rest(60), Max(185, 60));

        var series = Series([.. Steady(60), .. Rides(60, 67, minutes: 150, bpm: 140)], anchors);

        var found = On(series, "load_ratio", 66);
        Assert.Equal(Severity.Warning, found.Severity);
        Assert.Contains(found.Evidence.Inputs, item => item is { Name: "heart_rate_max_before", Value: 190, Unit: "bpm", Note: "up to 2026-03-05" });
        Assert.Contains(found.Evidence.Inputs, item => item is { Name: "heart_rate_max", Value: 185 });
    }

    /// <summary>35 of 60 minutes: 1.683 times the usual week by 200, 1.954 by 170; the limit is 1.8.</summary>
    [Fact]
    public void WhatOnlyTheChangeMakesBreakIsANoteAndNoAlert()
    {
        var series = Series([.. Rides(0, 60, 60, 120), .. Rides(60, 75, 35, 160)], Book(Max(200), Rest(60), Max(170, 60)));

        var notes = series.Findings.Where(finding => finding.Rule == "load_ratio").ToList();
        Assert.NotEmpty(notes);
        Assert.All(notes, note => Assert.Equal(Severity.Note, note.Severity));
        var note = On(series, "load_ratio", 66);
        Assert.Equal(1.954, note.Value, 3);
        Assert.EndsWith("Reference value changed on 6 March: maximal heart rate 200 to 170 bpm; by the value before, the limit is not passed, so no alert.", note.Text, StringComparison.Ordinal);
    }

    /// <summary>The same two blocks, the value known from the beginning: then the week is as far above the usual as it is.</summary>
    [Fact]
    public void AValueThatIsCorrectedFromTheBeginningIsNoChange()
    {
        var series = Series([.. Rides(0, 60, 60, 120), .. Rides(60, 75, 35, 160)], Book(Max(170), Rest(60)));

        Assert.Equal(Severity.Warning, On(series, "load_ratio", 66).Severity);
    }

    /// <summary>Dated back, the dates between are computed by it, and the window is read by it and by the one before.</summary>
    [Fact]
    public void AValueThatIsDatedBackCountsFromThatDateOn()
    {
        Ride[] rides = [.. Rides(0, 60, 60, 120), .. Rides(60, 75, 35, 160)];
        var (late, early) = (Series(rides, Book(Max(200), Rest(60), Max(170, 60))), Series(rides, Book(Max(200), Rest(60), Max(170, 40))));

        Assert.Equal(late.Days.Take(40).Select(day => day.Load), early.Days.Take(40).Select(day => day.Load));
        Assert.All(Enumerable.Range(40, 20), day => Assert.True(early.Days[day].Load > late.Days[day].Load));
        Assert.Equal(late.Days[66].RatioUncoupled, early.Days[66].RatioUncoupled);
        Assert.Contains("changed on 14 February", On(early, "load_ratio", 66).Text, StringComparison.Ordinal);
    }

    /// <summary>33 of 60 minutes: 1.842 on the seventh day by 170. On the eighth, with one such day among the 21: 1.7715 by it and 1.5434 by 200; it returns below 1.6.</summary>
    [Fact]
    public void WhatStoodBeforeTheChangeIsNotOverByItAlone()
    {
        var series = Series([.. Rides(0, 60, 60, 120), .. Rides(60, 80, 33, 160)], Book(Max(170), Rest(60), Max(200, 67)));

        Assert.Equal(Severity.Warning, On(series, "load_ratio", 66).Severity);
        Assert.Equal(1.5434, series.Days[67].RatioUncoupled!.Value, 4);
        var kept = On(series, "load_ratio", 67);
        Assert.Equal((Severity.Warning, First.PlusDays(66)), (kept.Severity, kept.Since));
        Assert.Equal(1.7715, kept.Value, 4);
        Assert.Contains("this is by the value before, by the new one it would be over", kept.Text, StringComparison.Ordinal);
        Assert.DoesNotContain(series.Findings, finding => finding.Rule == "load_ratio" && finding.Date >= First.PlusDays(70)); // 1.842 / (1 + 4 x 0.842 / 21) is below 1.6.
    }

    /// <summary>It stands by the new value alone; that value would have passed no limit, so nothing is raised either.</summary>
    [Fact]
    public void WhatHoldsByTheFormerValueAloneIsNotRaised()
    {
        var series = Series([.. Rides(0, 60, 60, 120), .. Rides(60, 80, 33, 160)], Book(Max(170), Rest(60), Max(200, 64)));

        Assert.DoesNotContain(series.Findings, finding => finding.Rule == "load_ratio");
    }

    [Fact]
    public void TheFirstValueEverMakesEarlierSessionsKnownAndSpeaksAlone()
    {
        var series = Series([.. Steady(60), .. Rides(60, 67, minutes: 150, bpm: 140)], Book(Max(190), Rest(60, 60)));

        Assert.Null(series.Days[59].Load);
        Assert.Null(series.Days[59].RatioUncoupled);
        Assert.NotNull(series.Days[60].RatioUncoupled);
        Assert.Equal(Severity.Warning, On(series, "load_ratio", 66).Severity);
    }

    /// <summary>What a table states does not hang on reference values of ours.</summary>
    [Fact]
    public void SessionsWithoutAHistogramStayAsTheyWereStated()
    {
        var stated = Enumerable.Range(0, 100).Select(day => Session(new Ride(day, 60, 140)) with { Quantities = [new Quantity(QuantityNames.BanisterTrimp, 60 + (day % 9), "AU", Estimated: false)] }).ToList();
        var anchors = Book(Max(190), Rest(60), Max(160, 60));

        var (changed, unchanged) = (Of(stated, anchors, [], Squad), Of(stated, Book(Max(190), Rest(60)), [], Squad));

        Assert.Equal(unchanged.Days.Select(day => (day.Load, day.RatioUncoupled, day.Monotony)), changed.Days.Select(day => (day.Load, day.RatioUncoupled, day.Monotony)));
    }

    /// <summary>Every second session is only rated, in step with its minutes: converted by a line of the new value, it stays in step with the others.</summary>
    [Fact]
    public void ConvertedSessionsAreConvertedByALineOfTheNewValue()
    {
        var group = Squad with { LoadFallbacks = [QuantityNames.FosterLoad] };
        Ride[] rides = [.. Enumerable.Range(0, 160).Select(day => new Ride(day, 50 + (day * 7 % 23), 140) { IsRated = true, IsRecorded = day % 2 == 0 })];

        var (changed, unchanged) = (Series(rides, Book(Max(190), Rest(60), Max(165, 130)), group), Series(rides, Book(Max(165), Rest(60)), group));

        Assert.NotEqual(unchanged.Days[129].Load, changed.Days[129].Load);
        for (var day = 130; day < 160; day++)
        {
            Assert.Equal(unchanged.Days[day].Load!.Value, changed.Days[day].Load!.Value, 3);
            Assert.Equal(unchanged.Days[day].RatioUncoupled!.Value, changed.Days[day].RatioUncoupled!.Value, 5);
        }
    }

    [Fact]
    public void WhereHeartRateIsNotValidItsValuesChangeNothing()
    {
        var person = Anna with { HeartRateInvalid = DatePeriods.Since(First.PlusDays(40)) };
        var group = Squad with { LoadFallbacks = [QuantityNames.FosterLoad] };
        Ride[] rides = [.. Enumerable.Range(0, 100).Select(day => new Ride(day, 50 + (day * 7 % 23), 140) { IsRated = true })];

        var (changed, unchanged) = (Series(rides, Book(Max(190), Rest(60), Max(165, 60)), group, person), Series(rides, Book(Max(190), Rest(60)), group, person));

        Assert.NotNull(unchanged.Days[90].Load);
        Assert.Equal(unchanged.Days.Select(day => day.RatioUncoupled), changed.Days.Select(day => day.RatioUncoupled));
    }

    /// <summary>It stood as a note by the new value; when the change leaves the window it must pass the limit again.</summary>
    [Fact]
    public void ANoteDoesNotBecomeAnAlertWhenTheChangeLeavesTheWindow()
    {
        var hard = Squad with { Limits = new RuleLimits { LoadRatio = Squad.Limits.LoadRatio with { Return = 0.9 } } };
        var series = Series([.. Rides(0, 60, 60, 120), .. Rides(60, 75, 35, 160), .. Rides(75, 160, 35, 160)], Book(Max(200), Rest(60), Max(170, 60)), hard);

        Assert.Equal(Severity.Note, On(series, "load_ratio", 60 + ReferencePeriods.WindowDays - 1).Severity);
        Assert.DoesNotContain(series.Findings, finding => finding.Rule == "load_ratio" && finding.Date >= First.PlusDays(60 + ReferencePeriods.WindowDays));
    }

    private static bool OfLoad(Finding finding) => RulesOfLoad.Contains(finding.Rule);

    private static Finding On(PersonSeries series, string rule, int day) =>
        Assert.Single(series.Findings, finding => finding.Rule == rule && finding.Date == First.PlusDays(day));

    private static IEnumerable<Ride> Steady(int days) => Rides(0, days, 60, 140);

    private static IEnumerable<Ride> Rides(int from, int to, double minutes, int bpm) => Enumerable.Range(from, to - from).Select(day => new Ride(day, minutes, bpm));

    private static Anchor Max(double bpm, int? day = null) => new("anna", day is { } from ? First.PlusDays(from) : null, AnchorKind.HeartRateMax, bpm, AnchorSource.Measured);

    private static Anchor Rest(double bpm, int? day = null) => Max(bpm, day) with { Kind = AnchorKind.HeartRateRest };

    private static AnchorBook Book(params Anchor[] anchors) => new(anchors);

    private static PersonSeries Series(IEnumerable<Ride> rides, AnchorBook anchors, Group? group = null, Person? person = null, bool isChangeSeen = true)
    {
        var all = rides.ToList();
        var sessions = all.ConvertAll(ride => ride.IsRecorded ? RandomReferences.WithLoads(Session(ride), ride.HeartRate, person ?? Anna, anchors) : Session(ride));
        var histograms = all.Where(ride => ride.IsRecorded).ToDictionary(
            ride => Session(ride).Key, IReadOnlyDictionary<Channel, Histogram> (ride) => new Dictionary<Channel, Histogram> { [Channel.HeartRate] = ride.HeartRate }, StringComparer.Ordinal);
        return Of(sessions, anchors, histograms, group ?? Squad, person ?? Anna, isChangeSeen);
    }

    private static PersonSeries Of(
        List<JoinedActivity> sessions, AnchorBook anchors, Dictionary<string, IReadOnlyDictionary<Channel, Histogram>> histograms, Group group, Person? person = null, bool isChangeSeen = true)
    {
        var periods = ReferencePeriods.Of(person ?? Anna, group, anchors);
        var changes = new ReferenceChanges(periods, () => new RestatedSessions(person ?? Anna, anchors, new ComputationSettings(), periods.Quantities, histograms));
        return PersonSeries.Of(person ?? Anna, group, sessions, [], PersonPlan.None, sessions[^1].Date, isChangeSeen ? changes : null);
    }

    private static JoinedActivity Session(Ride ride) => new()
    {
        Key = $"ride-{ride.Day:000}",
        Date = First.PlusDays(ride.Day),
        Sport = new Sport("cycling"),
        Sources = ["watch"],
        Quantities = ride.IsRated ? [new Quantity(QuantityNames.FosterLoad, ride.Minutes * 5, "AU", Estimated: false)] : [],
    };

    private sealed record Ride(int Day, double Minutes, int Bpm)
    {
        public bool IsRated { get; init; }

        public bool IsRecorded { get; init; } = true;

        public Histogram HeartRate
        {
            get
            {
                var histogram = new Histogram();
                histogram.Add(Bpm, (long)(Minutes * 60_000));
                return histogram;
            }
        }
    }
}
