using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Archives;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>What lies between a session's readings or sets and its stimulus, as <c>explain</c> shows it; every number by hand from the formulas beside it.</summary>
public sealed class ExplainStimulusTests : IDisposable
{
    private const string Header = "date,person,exercise,machine,set,repetitions,kilograms,reserve,hardness,seconds,load,hold,fast";

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>
    /// 60 s at 350 W spend 6 kJ of 20. The drive is 0.65 + 0.35 x 100 / (850 b), 0.70 from b = 0.8235 on: 36 s in, where 3.6 kJ are spent; 24 s are left.
    /// </summary>
    [Fact]
    public void ARideShowsItsCapacitiesWhatWasLeftAndHowLongItWasHard()
    {
        Anchors("bo,2026-05-01,power_max,1100,W,,");
        Put("bo", sample => sample with { Power = sample.Second < 60 ? 350 : 100 });

        var told = Told("bo");

        Assert.Contains(
            """
                    critical_power 250 W (low reading 255, high 245); w_prime 20000 J (low reading 26000, high 14000); power_max 1100 W (low reading 1122, high 1078)
                    least left of w_prime: 14000 J, 70 % (middle reading)
                    60 s at a drive of 0.65 or more, 24 s at 0.70 or more (middle reading)

            """,
            told,
            StringComparison.Ordinal);
        Assert.Contains("assumed: the relative drive at critical power is 0.65\n", told, StringComparison.Ordinal);
        Assert.Contains("assumed: what can be given above critical power falls in proportion to what is left of W'\n", told, StringComparison.Ordinal);
        Assert.Contains("assumed: work is hard from a relative drive of 0.70 on\n", told, StringComparison.Ordinal);
        Assert.Contains("assumed: one pool of motor units stands for all muscles that the work goes through", told, StringComparison.Ordinal);
        Assert.DoesNotContain("within a set", told, StringComparison.Ordinal);
        Assert.DoesNotContain("hard repetitions unknown", told, StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutATrueMaximumItSaysWhatIsNotKnown()
    {
        Put("bo", sample => sample with { Power = 260 });

        var told = Told("bo");

        Assert.Contains("2 min at a drive of 0.65 or more, how long at 0.70 or more is not known (middle reading)", told, StringComparison.Ordinal);
        Assert.Contains("assumed: without a true maximum every moment above critical power is read as at it, a lower bound", told, StringComparison.Ordinal);
        Assert.DoesNotContain("least left", told, StringComparison.Ordinal);
    }

    /// <summary>5 m/s for 60 s of critical 4 m/s leave 140 m of 200.</summary>
    [Fact]
    public void ARunShowsTheSame()
    {
        Anchors("bo,2026-05-01,critical_speed,4,m/s,,", "bo,2026-05-01,d_prime,200,m,,", "bo,2026-05-01,speed_max,8,m/s,,");
        Put("bo", sample => sample with { Speed = sample.Second < 60 ? 5 : 2 }, "running");

        var told = Told("bo");

        Assert.Contains("critical_speed 4 m/s (low reading 4.08, high 3.92); d_prime 200 m (low reading 260, high 140); speed_max 8 m/s (low reading 8.16, high 7.84)", told, StringComparison.Ordinal);
        Assert.Contains("least left of d_prime: 140 m, 70 % (middle reading)", told, StringComparison.Ordinal);
        Assert.Contains("assumed: D' comes back as W' does, critical speed standing for 250 W", told, StringComparison.Ordinal);
    }

    /// <summary>85 % of the reserve from 50 to 190 bpm are 169 bpm; 162 bpm are 80 %.</summary>
    [Theory]
    [InlineData("", "x2 = 0.85 of the reserve from 50 to 190 bpm, 169 bpm (a choice, as no heart_rate_vt2 within the reserve holds), within 20 %")]
    [InlineData("anna,,heart_rate_vt2,162,bpm,,", "x2 = 0.8 of the reserve from 50 to 190 bpm, 162 bpm (heart_rate_vt2), within 2 %")]
    public void HeartRateShowsTheThresholdThatItIsReadBy(string anchor, string shown)
    {
        Anchors(anchor);
        Put("anna", sample => sample with { HeartRate = 140 });

        var told = Told("anna");

        Assert.Contains("second threshold at " + shown, told, StringComparison.Ordinal);
        Assert.Contains("assumed: the relative drive at the second threshold is 0.65, in proportion below it", told, StringComparison.Ordinal);
        Assert.DoesNotContain("work is hard from", told, StringComparison.Ordinal);
    }

    /// <summary>Where power fails, heart rate tells, by its own threshold.</summary>
    [Fact]
    public void HeartRateThatTellsAloneSaysByWhat()
    {
        Put("bo", sample => sample with { HeartRate = 140, Power = sample.Second < 90 ? 200 : null });

        Assert.Contains("heart rate where it tells alone: second threshold at x2 = 0.85 of the reserve from 55 to 185 bpm", Told("bo"), StringComparison.Ordinal);
    }

    /// <summary>
    /// Load and maximum: L = 0.8, the eighth of ten 0.8 x 9 / (2 + 0.8 x 7) = 0.947. Chart: ten are 0.75, the eighth 0.75 x 9 / (2 + 0.75 x 7) = 0.931; by 10 % less, 0.682,
    /// the first is below 0.70. Fast: three times 0.5, in the low reading 0.49. A hold: 0.8 by 20 % less is 0.667.
    /// </summary>
    [Fact]
    public void EverySetShowsItsRuleAndWhatItCameTo()
    {
        Anchors("bo,2026-05-01,one_repetition_max,100,kg,,leg_press", "bo,2026-05-01,one_repetition_max,60,kg,,bench_press");
        Log(
            "bo,leg_press,,1,8,80,2,,,,,",
            "bo,leg_press,,2,8,80,2,,,,,",
            "bo,leg_press,,3,5,50,,,,,,yes",
            "bo,squat,,4,8,50,2,,,,,",
            "bo,jump,,5,10,,,,,body_weight,,yes",
            "bo,wall_sit,,6,,,,8,30,body_weight,yes,",
            "bo,squat,,7,20,30,,,,,,");

        var told = Told("bo");

        Assert.Contains(
            """
                    1 set of jump (legs): 10 repetitions (body weight), declared fast
                        by the declaration that it was fast; drive 0.7; hard repetitions 10 (0 to 10), grade D
                    2 sets of leg_press (legs): 8 x 80 kg, 2 in reserve
                        by load and maximum, L = 80 kg / 100 kg = 0.8 within 2 %, 10 repetitions to failure; drive 0.8 at the first and 0.947 at the last repetition; hard repetitions 8 (8 to 8), grade A
                    1 set of leg_press (legs): 5 x 50 kg, declared fast
                        by load and maximum as a fast set, L = 50 kg / 100 kg = 0.5 within 2 %, counted 3 times; drive 1; hard repetitions 5 (0 to 5), grade C
                    1 set of squat (legs): 8 x 50 kg, 2 in reserve
                        by repetitions to failure, L = 0.75 within 10 %, 10 repetitions to failure; drive 0.75 at the first and 0.931 at the last repetition; hard repetitions 8 (7 to 8), grade B
                    1 set of squat (legs): 20 x 30 kg
                        not read: no one_repetition_max, or repetitions in reserve up to 12 in all
                    1 set of wall_sit (legs): held for 30 s (body weight), hardness 8
                        by the rating of a hold, hardness / 10 = 0.8 within 20 %, its last 3 s; drive 0.8; hard bouts 1 (0 to 1), grade D

            """,
            told,
            StringComparison.Ordinal);
        Assert.All(
            ["formula  load and maximum: ", "formula  repetitions to failure: ", "formula  fast: drive = 3 x L", "formula  fast as declared", "formula  hold: "],
            formula => Assert.Contains(formula, told, StringComparison.Ordinal));
        Assert.Contains("assumed: within a set the capacity falls evenly", told, StringComparison.Ordinal);
        Assert.DoesNotContain("bench_press", told, StringComparison.Ordinal);
    }

    [Fact]
    public void OnlyTheRulesThatWereUsedAreShown()
    {
        Log("bo,wall_sit,,1,,,,8,30,body_weight,yes,");

        var told = Told("bo");

        Assert.Contains("formula  hold: ", told, StringComparison.Ordinal);
        Assert.DoesNotContain("formula  load and maximum", told, StringComparison.Ordinal);
        Assert.DoesNotContain("within a set", told, StringComparison.Ordinal);
    }

    [Fact]
    public void WhatIsNotSeenNamesItsRegionWhereOthersWereSeen()
    {
        Log("bo,squat,,1,8,50,2,,,,,", "bo,bench_press,,2,20,30,,,,,,");

        Assert.Contains("    arms: 1 set of bench_press: no one_repetition_max", Told("bo"), StringComparison.Ordinal);
    }

    [Fact]
    public void SetsOfARecordingAreReadFromTheArchiveAgainAndAMissingOriginalIsTold()
    {
        var start = (Some.Yesterday + new LocalTime(12, 0)).InUtc().ToInstant();
        var lifting = Some.Ride(Some.Yesterday) with
        {
            Sport = new Sport("training", "strength_training"),
            Sets = [.. Enumerable.Range(0, 2).Select(set => new StrengthSet(start + Duration.FromSeconds(40 * set), 30, Active: true, "squat", 5, 100))],
        };
        Anchors("bo,2026-05-01,one_repetition_max,125,kg,,squat");
        folder.Put("bo/lifting.fit", FitEncoder.Encode(lifting));
        folder.Sweep();

        var told = Told("bo");
        foreach (var original in WorkingFolder.Files(Path.Combine(folder.Data, "archive")))
        {
            File.Delete(original);
        }

        Assert.Contains("2 sets of squat (legs): 5 x 100 kg\n", told, StringComparison.Ordinal);
        Assert.Contains("by load and maximum, L = 100 kg / 125 kg = 0.8 within 2 %, reserve unknown, so a lower bound; drive 0.8; hard repetitions 5 (5 to 5), grade B", told, StringComparison.Ordinal);
        Assert.DoesNotContain("is not shown", told, StringComparison.Ordinal);
        Assert.Contains("what lies between is not shown: an original in the archive is missing or damaged", Told("bo"), StringComparison.Ordinal);
    }

    private void Anchors(params string[] lines) =>
        folder.Write("anchors.csv", $"{WorkingFolder.Anchors.Replace("bo,,power_max,1100,W,,\n", "", StringComparison.Ordinal).TrimEnd()}\n{string.Join('\n', lines)}\n");

    /// <summary>Two minutes from noon on.</summary>
    private void Put(string person, Func<Reading, Reading> read, string sport = "cycling")
    {
        var ride = Some.Ride(Some.Yesterday);
        folder.Put($"{person}/session.fit", FitEncoder.Encode(ride with
        {
            Sport = new Sport(sport),
            Samples = [.. ride.Samples.Select((sample, second) => read(new Reading(second)).At(sample.Time))],
        }));
        folder.Sweep();
    }

    private void Log(params string[] rows)
    {
        folder.PutTable("sets.csv", 0, [Header, .. rows.Select(row => $"{Nights.Day(0)},{row}")]);
        folder.Sweep();
    }

    private string Told(string person) => folder.Read((workplace, session) =>
        SessionExplanation.Of(workplace.Configuration, new Archive(workplace.Folder), session, person, Some.Yesterday, new LocalTime(12, 0)))!.ReplaceLineEndings("\n");

    private sealed record Reading(int Second, int? HeartRate = null, int? Power = null, double? Speed = null)
    {
        public FitSample At(Instant time) => new(time, HeartRate: HeartRate, Power: Power, Speed: Speed);
    }
}
