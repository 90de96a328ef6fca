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
