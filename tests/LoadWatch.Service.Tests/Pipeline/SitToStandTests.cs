using LoadWatch.Findings;
using LoadWatch.Service.Explain;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>The power of chair stands, from a table of tests and anchors to the finding and to what is explained.</summary>
public sealed class SitToStandTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>By hand: 0.9 x 9.81 x (0.825 - 0.43) m / (0.5 x 3.2 s) = 2.180 W/kg, of 70 kg 152.6 W (Alcazar et al. 2018).</summary>
    [Fact]
    public void ItStandsInTheFindingAndIsExplained()
    {
        Sweep("anna,,body_mass,70,kg,,\nanna,,height,1.65,m,,\n", 16);

        Assert.EndsWith("above the published cut-off of 15 s. Sit-to-stand power 2.2 W/kg, 153 W.", Found().Text);
        Assert.Contains("sit-to-stand power = 152.576 W, 2.18 W/kg", Explained());
        Assert.Contains("body mass 70 kg, height 1.65 m, seat 0.43 m", Explained());
        Assert.Contains("Alcazar et al. 2018", Explained());
    }

    [Fact]
    public void ATestWithinItsCutOffIsExplainedToo()
    {
        Sweep("anna,,body_mass,70,kg,,\nanna,,height,1.65,m,,\n", 12);

        Assert.Contains("sit-to-stand power = 203.435 W, 2.906 W/kg", Explained());
    }

    [Fact]
    public void WhatIsMissingIsSaidAndAHeightThatComesLaterCounts()
    {
        Sweep("anna,,body_mass,70,kg,,\n", 16);
        Assert.EndsWith("above the published cut-off of 15 s.", Found().Text);
        Assert.Contains("sit-to-stand power = unknown, unknown: body height is not known", Explained());

        Sweep("anna,,body_mass,70,kg,,\nanna,,height,1.65,m,,\n", 16);

        Assert.EndsWith("Sit-to-stand power 2.2 W/kg, 153 W.", Found().Text);
    }

    private void Sweep(string anchors, int seconds)
    {
        folder.Write("anchors.csv", $"{WorkingFolder.Anchors.TrimEnd()}\n{anchors}");
        folder.Put("anna/ride.fit", Some.Fit(Nights.Date(4)));
        folder.PutTable("tests.csv", 0, "date,person,test,value,unit,chair_height_m", $"{Nights.Day(2)},anna,chair_stands_5,{seconds},s,0.43");
        folder.Sweep();
    }

    private Finding Found() => folder.Read((_, session) => session.Findings.OfPerson("anna", Nights.Date(2), Nights.Date(2))).Single(one => one.Rule == FunctionTestRule.RuleName);

    private string Explained() => folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "anna", Nights.Date(2)))!;
}
