using LoadWatch.Decoding.Fit;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>A reference value is explained with its source, its date, its error, what else there is, and what rests on it.</summary>
public sealed class ExplainAnchorTests : IDisposable
{
    private const string Tested = """
        person,date,anchor,value,unit,source,exercise
        bo,2026-01-10,critical_power,250,W,,
        bo,2026-06-20,critical_power,260,W,,
        bo,2026-03-01,critical_power,300,W,estimated,

        """;

    private readonly WorkingFolder folder = new(anchors: Tested);

    public void Dispose() => folder.Dispose();

    [Fact]
    public void TheOneThatHoldsStandsFirstAndTheOthersSayWhyTheyDoNot()
    {
        Assert.Equal(
            """
            Bo Björk, critical_power (critical power) on 2026-06-14
                holds: critical_power = 250 W, measured, holds from 2026-01-10; taken to be within 2 % (an assumption for measured values)
                not yet: critical_power = 260 W, measured, holds from 2026-06-20; taken to be within 2 % (an assumption for measured values)
                not used: critical_power = 300 W, estimated, holds from 2026-03-01; taken to be within 20 % (an assumption for estimated values)
                no session of the 12 months before 2026-06-01 may tell it: wanted is power with unbroken stretches of 2 minutes and more, not on foot and of no motor
                plausible from 20 to 600 W; a measured value goes before one from own sessions, that before one by an equation
                rests on it: zones of power, stimulus by power

            """,
            Explained("bo", "critical_power", Some.Yesterday),
            ignoreLineEndingDifferences: true);
    }

    /// <summary>By hand: 208 - 0.7 x 35 = 183.5.</summary>
    [Fact]
    public void WithoutOneTheLineByAgeIsNamed()
    {
        Assert.Contains("none is stated; holds: heart_rate_max = 183.5 bpm, estimated from 35 years by the line of Tanaka", Explained("bo", "heart_rate_max", Some.Yesterday), StringComparison.Ordinal);
        Assert.Contains("none holds", Explained("bo", "speed_max", Some.Yesterday), StringComparison.Ordinal);
    }

    /// <summary>By hand: a best of 1 s of 400 W, shown on 30 May, holds from June on.</summary>
    [Fact]
    public void OneOfOwnSessionsTellsItsErrorAndWhatItRestsOn()
    {
        var ride = Some.Ride(new LocalDate(2026, 5, 30));
        folder.Put("bo/sprint.fit", FitEncoder.Encode(ride with { Samples = [.. ride.Samples.Select((sample, second) => sample with { Power = second is >= 60 and < 62 ? 400 : 150 })] }));
        folder.Sweep();

        var told = Explained("bo", "power_max", Some.Yesterday);

        Assert.Contains("not read for the stimulus (below 2.5 times critical_power, so it is not from a sprint): power_max cycling = 400 W, observed, holds from 2026-06-01, last shown on 2026-05-30; taken to be within 10 % (an assumption for observed values)", told, StringComparison.Ordinal);
        Assert.Contains("from own sessions of the 12 months before 2026-06-01: 400 W within 20 W, last shown on 2026-05-30: highest mean power of 1 s in the 6 months before", told, StringComparison.Ordinal);
    }

    /// <summary>
    /// By hand: W = 18 kJ + 250 W t at 120, 300 and 720 s; whole watts leave nothing over, so every regression finds the same and errors are the least ones: 2 % of 250 W, 10 % of 18 kJ.
    /// </summary>
    [Theory]
    [InlineData("critical_power")]
    [InlineData("w_prime")]
    public void TheBestsAndAllRegressionsStandBesideEachOther(string kind)
    {
        folder.Fill(AllOutRides.Season());
        folder.Sweep();

        var told = Explained("anna", kind, AllOutRides.Last);

        Assert.Contains("    the 12 months before 2026-06-01, cycling: 3 bests that may have been all out, from 3 sessions", told, StringComparison.Ordinal);
        Assert.Matches("        120 s at 400 W on 2026-05-06, session [0-9a-f]{12}\r?\n        300 s at 310 W on 2026-05-13, session [0-9a-f]{12}\r?\n        720 s at 275 W on 2026-05-20", told);
        Assert.Contains("        work on time, W = W' + CP t: 250 W (standard error 0 W), W' 18000 J (standard error 0 J), R2 1", told, StringComparison.Ordinal);
        Assert.Contains("        power on the inverse of time, P = CP + W' / t: 250 W (standard error 0 W), W' 18000 J", told, StringComparison.Ordinal);
        Assert.Contains("        least squares in time, t = W' / (P - CP): 250 W (standard error 0 W), W' 18000 J", told, StringComparison.Ordinal);
        Assert.Contains("        three parameters, least squares in time, t = W' / (P - CP) + k: none, the third parameter degenerates with these bests", told, StringComparison.Ordinal);
        Assert.Contains("        taken: work on time, as the bests are chosen on its upper edge (a choice); 250 W within 5 W, W' 18000 J within 1800 J: its standard errors, but 2 and 10 % at least", told, StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutAValueTheReasonStands()
    {
        folder.Fill(AllOutRides.Season().Skip(1));
        folder.Sweep();

        Assert.Contains(
            "    the 12 months before 2026-06-01, cycling: no value; bests that may have been all out: ", Explained("anna", "critical_power", AllOutRides.Last), StringComparison.Ordinal);
        Assert.Contains(
            "    no session of the 12 months before 2026-06-01 may tell it: wanted is speed on foot", Explained("anna", "d_prime", AllOutRides.Last), StringComparison.Ordinal);
    }

    /// <summary>The value of June goes on in August: the bests of its 12 months are the same, and those of the next but one summer are gone.</summary>
    [Fact]
    public void AValueThatGoesOnTellsTheBestsOfItsMonthAndThoseOfTheDate()
    {
        folder.Fill(AllOutRides.Season());
        folder.Sweep();

        var (august, later) = (Explained("anna", "critical_power", new LocalDate(2026, 8, 10)), Explained("anna", "critical_power", new LocalDate(2027, 8, 10)));

        Assert.Contains("    the 12 months before 2026-06-01, cycling: 3 bests", august, StringComparison.Ordinal);
        Assert.Contains("    the 12 months before 2026-08-01, cycling: the same bests", august, StringComparison.Ordinal);
        Assert.Contains("    the 12 months before 2027-08-01, cycling: no session that shows it", later, StringComparison.Ordinal);
        const string Old = "; what showed it is more than 12 months old: sessions since have shown no value beyond its error, or none at all";
        Assert.DoesNotContain(Old, august, StringComparison.Ordinal);
        Assert.Contains(Old, later, StringComparison.Ordinal);
        Assert.Contains("        so the value of 2026-06-01 goes on: another has to lie beyond its error", later, StringComparison.Ordinal);
    }

    /// <summary>Measured two years ago against seen last month: the estimator reads the second, 183 days being the bound.</summary>
    [Fact]
    public void AMaximumTooOldForTheStimulusDoesNotHold()
    {
        folder.Write("anchors.csv", Tested + "bo,2024-06-01,power_max,1000,W,,\nbo,2026-05-01,power_max,900,W,observed,\n");

        var told = Explained("bo", "power_max", Some.Yesterday);

        Assert.Contains("    holds: power_max = 900 W, observed", told, StringComparison.Ordinal);
        Assert.Contains("    not read for the stimulus (older than 183 days): power_max = 1000 W, measured", told, StringComparison.Ordinal);
    }

    /// <summary>What <c>SetMaximum</c> takes: 2 % measured on the machine, else 10 %.</summary>
    [Fact]
    public void AOneRepetitionMaximumTellsTheErrorThatSetsAreReadWith()
    {
        folder.Write("anchors.csv", Tested + "bo,2026-05-01,one_repetition_max,100,kg,estimated,squat\nbo,2026-05-01,one_repetition_max,80,kg,,bench_press\n");

        var told = Explained("bo", "one_repetition_max", Some.Yesterday);

        Assert.Contains("100 kg, estimated, holds from 2026-05-01; taken to be within 10 % (an assumption for estimated values)", told, StringComparison.Ordinal);
        Assert.Contains("within 2 % (an assumption for measured values), 10 % of a set on a machine", told, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("body_mass", "minutes of moderate and vigorous effort on a bicycle by power; sit-to-stand power in W")]
    [InlineData("height", "sit-to-stand power")]
    public void MassAndHeightSayWhatRestsOnThem(string kind, string rests) =>
        Assert.Contains($"rests on it: {rests}", Explained("bo", kind, Some.Yesterday), StringComparison.Ordinal);

    [Fact]
    public void NobodyAndNothingIsExplainedOfUnknownWords()
    {
        Assert.Null(folder.Read((workplace, session) => AnchorExplanation.Of(workplace.Configuration, session, "nobody", "critical_power", Some.Yesterday)));
        Assert.Null(folder.Read((workplace, session) => AnchorExplanation.Of(workplace.Configuration, session, "bo", "hr_max", Some.Yesterday)));
    }

    private string Explained(string person, string kind, LocalDate date)
    {
        if (!Directory.Exists(folder.Data))
        {
            folder.Sweep();
        }

        return folder.Read((workplace, session) => AnchorExplanation.Of(workplace.Configuration, session, person, kind, date))!;
    }
}
