using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

/// <summary>The delays that rules share, read off the load ratio: r raises, h holds only, - neither, ? cannot be read; S where it stands, s where it is suppressed.</summary>
public class FindingRunTests
{
    [Theory]
    [InlineData(1, 1, "r-r-r-", "S.S.S.")]
    [InlineData(1, 2, "r-r-r--", "SSSSSS.")]
    [InlineData(2, 1, "r-r-rr-", ".....S.")]
    [InlineData(2, 2, "rr-h-?-", ".SSSSS.")]
    [InlineData(3, 1, "rr?rh-", "...SS.")]
    [InlineData(2, 1, "hhrrhh-", "...SSS.")]
    [InlineData(1, 3, "r--?-r", "SSSS.S")]
    public void DelaysCountReadableDatesInARow(int on, int off, string dates, string expected) => Assert.Equal(expected, Stands(on, off, dates));

    /// <summary>A capital letter: in an absence; D is - in one.</summary>
    [Theory]
    [InlineData("rrRRrr", ".Sss.S")]
    [InlineData("rRrr", ".s.S")]
    [InlineData("rrRDRR-", ".Ss..s.")]
    public void WhatStandsGoesOnUnheardAndBeginsAnewWhenItIsWatchedAgain(string dates, string expected) => Assert.Equal(expected, Stands(on: 2, off: 1, dates));

    [Fact]
    public void AnotherPlannedStateBeginsOnItsOwnDate()
    {
        var away = DayPlan.None with { Absence = AbsenceWord.Away };
        Day[] days = [Ratio(0, 2) with { Plan = away }, Ratio(1, 2) with { Plan = away }, Ratio(2, 2) with { Plan = DayPlan.None with { ReturnDay = 1 } }];

        Assert.Equal(
            ["Not watched: away since 5 January.", "Not watched: away since 5 January.", "Not watched: returning since 7 January."],
            new LoadRatioRule().Suppressed(days).Select(finding => finding.Text[finding.Text.IndexOf("Not", StringComparison.Ordinal)..]));
    }

    /// <summary>Each date taken up from what was kept of the one before (I-5).</summary>
    private static string Stands(int on, int off, string dates)
    {
        var limits = Stated with { LoadRatio = Stated.LoadRatio with { OnDays = on, OffDays = off } };
        var (carried, stands) = (Carried.Nothing, "");
        Day[] days = [.. dates.Select((word, day) => Ratio(day, Value(word)) with { Plan = DayPlan.None with { Absence = char.IsUpper(word) ? AbsenceWord.Away : null } })];
        for (var day = 0; day < days.Length; day++)
        {
            var memory = new RuleMemory(carried);
            var found = new LoadRatioRule().Evaluate(new RuleSubject(Anna, days[..(day + 1)], limits) { From = On(day), Memory = memory }).ToList();
            stands += found.Count == 0 ? '.' : found[0].Severity == Severity.Suppressed ? 's' : 'S';
            carried = Carried.Read(Carried.Write(Carried.Nothing with { Runs = memory.On(On(day)) }));
        }

        return stands;
    }

    private static double? Value(char word) => char.ToLowerInvariant(word) switch
    {
        'r' => 1.9,
        'h' => 1.7,
        '?' => null,
        _ => 1.0,
    };
}
