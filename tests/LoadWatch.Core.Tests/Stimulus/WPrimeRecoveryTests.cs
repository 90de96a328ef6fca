using System.Globalization;

namespace LoadWatch.Stimulus;

/// <summary>
/// Which published form of the recovery of W' is built in, and why. The measure was chosen before the comparison: the root of the mean squared difference to the
/// published recoveries, in percentage points, each mean of a group counting once.
/// </summary>
public class WPrimeRecoveryTests
{
    private const string Heading = "| form | its constants come from | error, points | error without those | mean difference | lasts with rests of 173, 95, 20 W, s |";

    [Fact]
    public void TheFormNearestToWhatWasSeenIsBuiltIn()
    {
        Assert.Equal(WPrimeForm.Fitted, WPrimeForm.All.MinBy(form => Error(form, RecoveryObservation.All)));
        Assert.All(
            RecoveryObservation.All,
            observed => Assert.Equal(100 * BuiltIn(observed), observed.RestWatts < observed.CriticalWatts ? Percent(WPrimeForm.Fitted, observed) : 0, 0.01));
    }

    /// <summary>Its own rows do not decide: without those of Caen 2019 it is still the nearest.</summary>
    [Fact]
    public void ItIsTheNearestWithoutTheRowsThatItWasFittedTo()
    {
        var others = RecoveryObservation.All.Where(observed => observed.Study != "Caen 2019").ToList();

        Assert.Equal(WPrimeForm.Fitted, WPrimeForm.All.MinBy(form => Error(form, others)));
    }

    /// <summary>Ferguson et al. 2010: 37, 65, 86 % after 2, 6, 15 min at 20 W. No form comes nearer than some points.</summary>
    [Fact]
    public void NoFormIsNearerThanTenPoints() => Assert.All(WPrimeForm.All, form => Assert.InRange(Error(form, RecoveryObservation.All), 10, 30));

    /// <summary>The table in <c>tests/README.md</c> is the one computed here. <c>LOADWATCH_WRITE_TABLES=1</c> writes it there.</summary>
    [Fact]
    public void TheTableOfTheDocsIsThisOne()
    {
        var readme = Path.Combine(Root(AppContext.BaseDirectory), "tests", "README.md");
        var text = File.ReadAllText(readme).ReplaceLineEndings("\n");
        var from = text.IndexOf(Heading, StringComparison.Ordinal);
        Assert.True(from >= 0, "tests/README.md has no table of the forms");
        var wanted = text[..from] + Table() + text[(text.IndexOf("\n\n", from, StringComparison.Ordinal) + 1)..];
        if (Environment.GetEnvironmentVariable("LOADWATCH_WRITE_TABLES") is { Length: > 0 })
        {
            File.WriteAllText(readme, wanted);
            text = wanted;
        }

        Assert.Equal(wanted, text);
    }

    private static string Table() =>
        $"{Heading}\n| --- | --- | --- | --- | --- | --- |\n{string.Concat(WPrimeForm.All.Select(Line))}"
        + $"| observed | | | | | {string.Join(", ", IntermittentWork.Observed.Select(one => Number(one.Seconds, "0")))} |\n";

    private static string Line(WPrimeForm form)
    {
        var others = RecoveryObservation.All.Where(observed => observed.Study != form.FittedTo).ToList();
        var lasts = IntermittentWork.Observed.Select(one => IntermittentWork.Lasts(form, one.RestWatts)?.ToString(CultureInfo.InvariantCulture) ?? "no end");
        var mean = RecoveryObservation.All.Average(observed => observed.Miss(form));
        return $"| {form.Name} | {form.FittedTo} | {Number(Error(form, RecoveryObservation.All), "0.0")} | {Number(Error(form, others), "0.0")} | "
            + $"{Number(mean, "+0.0;-0.0")} | {string.Join(", ", lasts)} |\n";
    }

    private static double Error(WPrimeForm form, IReadOnlyList<RecoveryObservation> observations) =>
        Math.Sqrt(observations.Average(observed => Math.Pow(observed.Miss(form), 2)));

    private static double Percent(WPrimeForm form, RecoveryObservation observed) => observed.Miss(form) + observed.Percent;

    /// <summary>What the balance itself gives back of W' spent in one second.</summary>
    private static double BuiltIn(RecoveryObservation observed)
    {
        var balance = new WPrimeBalance(observed.CriticalWatts, observed.WPrimeJoules);
        balance.Advance(0, observed.CriticalWatts + observed.WPrimeJoules, 1);
        balance.Advance(1000, observed.RestWatts, observed.Seconds);
        balance.Advance(1000 + (long)(observed.Seconds * 1000), 0, 0);
        return balance.Left / observed.WPrimeJoules;
    }

    private static string Number(double value, string format) => value.ToString(format, CultureInfo.InvariantCulture);

    private static string Root(string folder) =>
        File.Exists(Path.Combine(folder, "LoadWatch.sln")) ? folder : Root(Path.GetDirectoryName(folder.TrimEnd(Path.DirectorySeparatorChar))!);
}
