using LoadWatch.Decoding.Fit;
using LoadWatch.Loads;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>A session and a finding are explained whole: inputs, reference values, formulas, what lies between, evidence and assumption apart, what was not seen (I-8).</summary>
public sealed class ExplainSessionTests : IDisposable
{
    private static readonly LocalTime Noon = new(12, 0);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>By hand: heart rate 120 between 55 and 185 bpm is half of the reserve; 2 min x 0.5 x 0.64 exp(1.92 x 0.5) = 1.671; 120 is 64.9 % of 185: the second zone of Edwards, below the first of Stagno.</summary>
    [Fact]
    public void AnImpulseIsShownWithItsFormulaItsSourceAndWhatLiesBetween()
    {
        Ride("bo", Some.Yesterday, second => 120, second => 200);

        var told = AtNoon("bo");

        Assert.Equal(
            """
                banister_trimp = 1.671 AU
                    formula  sum over the readings of minutes x a exp(b x), x = (heart rate - resting) / (maximal - resting), held within 0 and 1
                    source   Morton, Fitz-Clarke and Banister 1990, J Appl Physiol 69:1171-1177; factors from secondary pages that agree
                    a = 0.64, b = 1.92 (the pair of the sex); reserve from 55 to 185 bpm
                    2 min with heart rate, mean fraction of the reserve 0.5; 0 min outside the reserve, held at its ends

            """,
            Between(told, "    banister_trimp", "    distance"),
            ignoreLineEndingDifferences: true);
        Assert.Contains("0 min x 0 + 0 min x 1 + 2 min x 2 + 0 min x 3 + 0 min x 4 + 0 min x 5", Between(told, "    edwards_load", "    minutes"), StringComparison.Ordinal);
        Assert.Contains("2 min x 0 + 0 min x 1.25", Between(told, "    stagno_load", "    work"), StringComparison.Ordinal);
        Assert.Contains("counts in the series of banister_trimp with 1.671 AU", told, StringComparison.Ordinal);
        Assert.Contains("power by percent of critical power, W: 0 min below 162.5, 2 min from 162.5, 0 min from 212.5", told, StringComparison.Ordinal);
    }

    [Fact]
    public void MeasuredAndAssumedStandApart()
    {
        Ride("bo", Some.Yesterday, second => 120, second => 200);

        var told = AtNoon("bo");

        Assert.Contains("measured, or stated as such: heart rate, power, distance, heart_rate_rest, heart_rate_max, critical_power, w_prime\n", told.ReplaceLineEndings("\n"), StringComparison.Ordinal);
        Assert.Contains("assumed: critical_power is within 2 % (an assumption for measured values)", told, StringComparison.Ordinal);
        Assert.Contains("assumed: w_prime is within 30 % (an assumption, whoever measured it)", told, StringComparison.Ordinal);
        Assert.Contains("critical_power = 250 W, measured, undated, holds from the beginning", Between(told, "  reference values", "  quantities"), StringComparison.Ordinal);
        Assert.Contains("bouts and the largest class: no power_max dated within 183 days before", told[told.IndexOf("  not seen", StringComparison.Ordinal)..], StringComparison.Ordinal);
    }

    [Fact]
    public void AMaximumThatIsNotReadStandsApartWithTheReason()
    {
        Ride("bo", Some.Yesterday, second => 120, second => 200);

        Assert.Contains("not read for the stimulus (undated): power_max = 1100 W, measured", Between(AtNoon("bo"), "  reference values", "  quantities"), StringComparison.Ordinal);
    }

    [Fact]
    public void BodyMassBearsOnARideWithPower()
    {
        folder.Write("anchors.csv", $"{WorkingFolder.Anchors.TrimEnd()}\nbo,2026-05-01,body_mass,75,kg,,\n");
        Ride("bo", Some.Yesterday, second => 120, second => 200);

        Assert.Contains("body_mass = 75 kg, measured", Between(AtNoon("bo"), "  reference values", "  quantities"), StringComparison.Ordinal);
    }

    /// <summary>The spans that the estimator reads, at 59 and from 60 full years on.</summary>
    [Theory]
    [InlineData(1967, "class shares 10 points and critical drive 0.05 either way")]
    [InlineData(1966, "class shares 15 points and critical drive 0.075 from 60 years on either way")]
    public void TheAssumedBandIsThatOfTheAge(int birthYear, string told)
    {
        folder.Write("roster.csv", WorkingFolder.Roster.Replace("1991", $"{birthYear}", StringComparison.Ordinal));
        Ride("bo", Some.Yesterday, second => 120, second => 200);

        Assert.Contains(told, AtNoon("bo"), StringComparison.Ordinal);
    }

    /// <summary>By hand: 208 - 0.7 x 68 years = 160.4 bpm.</summary>
    [Fact]
    public void AMaximumByAgeNamesItsLine()
    {
        Ride("cara", Some.Yesterday, second => 100, second => 90);

        var told = AtNoon("cara");

        Assert.Contains("heart_rate_max = 160.4 bpm, estimated from 68 years by the line of Tanaka, Monahan and Seals 2001", told, StringComparison.Ordinal);
        Assert.Contains("banister_trimp = ", told, StringComparison.Ordinal);
        Assert.Contains("AU (estimated)", told, StringComparison.Ordinal);
    }

    [Fact]
    public void ASessionIsFoundByItsIdAndByATimeAtWhichItRuns()
    {
        folder.Put("bo/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        var id = folder.Read((_, session) => session.Activities.OfPerson("bo")[0].Key);

        var byId = Explained((workplace, session) => SessionExplanation.Of(workplace.Configuration, new Archive(workplace.Folder), session, id));

        Assert.Equal(byId, AtNoon("bo"));
        Assert.Equal(byId, At("bo", new LocalTime(12, 1)));
        Assert.Null(At("bo", new LocalTime(11, 59)));
        Assert.Null(At("bo", new LocalTime(12, 3)));
        Assert.Null(Explained((workplace, session) => SessionExplanation.Of(workplace.Configuration, new Archive(workplace.Folder), session, id + "9")));
        Assert.Contains($"    id {id}", Explained((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "bo", Some.Yesterday)), StringComparison.Ordinal);
    }

    /// <summary>By hand: rides of 1 to 10 in which 10 bpm stand for 10 W; the line through work and training impulse takes the eleventh, which has no heart rate.</summary>
    [Fact]
    public void AConvertedLoadShowsItsLine()
    {
        folder.Write("loadwatch.json", File.ReadAllText(folder.ConfigPath).Replace("\"name\": \"Squad\" }", "\"name\": \"Squad\", \"load_fallbacks\": [\"work\"] }", StringComparison.Ordinal));
        foreach (var ride in Enumerable.Range(1, 10))
        {
            Put("bo", new LocalDate(2026, 5, 1 + (2 * ride)), _ => 100 + (5 * ride), _ => 100 + (10 * ride));
        }

        Put("bo", Some.Yesterday, _ => 0, _ => 150);
        folder.Sweep();

        var told = AtNoon("bo");

        Assert.Matches(@"counts in the series of banister_trimp with [0-9.]+ AU, converted from work\n", told.ReplaceLineEndings("\n"));
        Assert.Contains("x 18: least squares through 10 own sessions that have both, 2025-06-01 to 2026-05-31; standard error", told, StringComparison.Ordinal);
    }

    [Fact]
    public void ARatingThatStandsInWithoutALineIsNotCalledConverted()
    {
        folder.Edit("roster.csv", "time_zone", "time_zone,heart_rate_valid");
        folder.Edit("roster.csv", "1996,f,UTC", "1996,f,UTC,");
        folder.Edit("roster.csv", "1991,m,UTC", "1991,m,UTC,no");
        folder.Edit("roster.csv", "1958,f,UTC", "1958,f,UTC,");
        folder.Put("bo/ride.fit", Some.Fit(Some.Yesterday));
        folder.PutTable("sessions.csv", 0, "date,person,session,sport,minutes,rating", $"{Some.Yesterday:uuuu-MM-dd},bo,1,cycling,,6");
        folder.Sweep();

        var told = AtNoon("bo");

        Assert.Contains("counts in the series of banister_trimp with 12 AU, foster_load as it stands, in its own unit", told, StringComparison.Ordinal);
        Assert.DoesNotContain("converted from", told, StringComparison.Ordinal);
    }

    [Fact]
    public void EveryQuantityHasAFormulaAndASource()
    {
        var equations = new LoadWatch.Activities.EquationChoices();
        Assert.All(
            [.. QuantityNames.AllWith([5.5], [0.8]), QuantityNames.SpeedTop, QuantityNames.SpeedTopShare, QuantityNames.PowerTop, QuantityNames.OneRepetitionMaxOf + "squat"],
            name => Assert.True(QuantityFormula.Of(name, equations, ageYears: 70) is { Formula.Length: > 10, Source.Length: > 10 }, name));
        Assert.Null(QuantityFormula.Of("jumps", equations, ageYears: 70));
    }

    [Theory]
    [InlineData(LoadWatch.Loads.StepCadenceLine.Rounded, 70, "100", "130")]
    [InlineData(LoadWatch.Loads.StepCadenceLine.ByAge, 70, "103.1", "142.9")]
    [InlineData(LoadWatch.Loads.StepCadenceLine.ByAge, null, "100", "130")]
    public void MinutesOfEffortSayFromHowManyStepsTheyCount(LoadWatch.Loads.StepCadenceLine line, int? ageYears, string moderate, string vigorous)
    {
        var equations = new LoadWatch.Activities.EquationChoices { StepCadence = line };

        Assert.Contains($"minutes of 3 METs and more: on foot from {moderate} steps", QuantityFormula.Of(QuantityNames.MinutesModerate, equations, ageYears)!.Formula, StringComparison.Ordinal);
        Assert.Contains($"minutes of 6 METs and more: on foot from {vigorous} steps", QuantityFormula.Of(QuantityNames.MinutesVigorous, equations, ageYears)!.Formula, StringComparison.Ordinal);
    }

    [Fact]
    public void AFindingIsToldWithItsEvidenceAndNoneWithWhyThereIsNone()
    {
        folder.Put("bo/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();

        var none = Explained((workplace, session) => FindingExplanation.Of(workplace.Configuration, session, "bo", "load_ratio", null))!;

        Assert.Contains("Bo Björk, 2026-06-14, rule load_ratio: no finding", none, StringComparison.Ordinal);
        Assert.Contains("no limit passed, or too little is known for it", none, StringComparison.Ordinal);
        Assert.Contains("nothing is computed for 2026-06-01", Explained((workplace, session) => FindingExplanation.Of(workplace.Configuration, session, "bo", "load_ratio", new LocalDate(2026, 6, 1))), StringComparison.Ordinal);
    }

    [Fact]
    public void AStateThatTurnsARuleOffIsWhyThereIsNoFinding()
    {
        folder.Put("answers.csv", Some.Text("date,person,group,answer,until,rule,file,by,note\n2026-06-12,bo,,away,,,,,\n"));
        folder.Put("bo/ride.fit", Some.Fit(new LocalDate(2026, 6, 11)));
        folder.Sweep();

        Assert.Contains("not watched (away since 12 June): load ratio", Explained((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "bo", Some.Yesterday)), StringComparison.Ordinal);
        Assert.Contains("not watched (away since 12 June): load ratio", Explained((workplace, session) => FindingExplanation.Of(workplace.Configuration, session, "bo", "load_ratio", Some.Yesterday)), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("\"nobody\" is not in the roster", "nobody", "--time", "12:00")]
    [InlineData("\"hr_max\" is no kind of reference value", "bo", "--anchor", "hr_max")]
    [InlineData("\"load_rati\" is no rule; did you mean \"load_ratio\"?", "bo", "--rule", "load_rati")]
    [InlineData("bo has no session that runs at 05:00", "bo", "--time", "05:00")]
    [InlineData("\"5 pm\" is not a time of day such as 18:30", "bo", "--time", "5 pm")]
    [InlineData("--time, --rule and --anchor ask for different things: give one of them", "bo", "--time", "05:00", "--rule", "load_ratio")]
    public void WhatCannotBeExplainedIsRefusedWithTheReason(string reason, params string[] words)
    {
        folder.Sweep();

        var ended = Loadwatch.Run(["explain", .. words, "--config", folder.ConfigPath]);

        Assert.Equal(ExitCode.Usage, ended.Code);
        Assert.Contains(reason, ended.Errors, StringComparison.Ordinal);
    }

    private void Ride(string person, LocalDate date, Func<int, int> heartRate, Func<int, int> power)
    {
        Put(person, date, heartRate, power);
        folder.Sweep();
    }

    /// <summary>Two minutes from noon on; heart rate 0 is no reading.</summary>
    private void Put(string person, LocalDate date, Func<int, int> heartRate, Func<int, int> power)
    {
        var ride = Some.Ride(date);
        folder.Put($"{person}/{date:uuuu-MM-dd}.fit", FitEncoder.Encode(ride with
        {
            Samples = [.. ride.Samples.Select((sample, second) => sample with { HeartRate = heartRate(second), Power = power(second) })],
        }));
    }

    private string AtNoon(string person) => At(person, Noon)!;

    private string? At(string person, LocalTime time) => Explained((workplace, session) => SessionExplanation.Of(workplace.Configuration, new Archive(workplace.Folder), session, person, Some.Yesterday, time));

    private string? Explained(Func<Workplace, StoreSession, string?> explain) => folder.Read(explain);

    private static string Between(string told, string from, string to)
    {
        var start = told.IndexOf(from, StringComparison.Ordinal);
        return told[start..told.IndexOf(to, start, StringComparison.Ordinal)];
    }
}
