using System.Globalization;
using LoadWatch.Decoding.Fit;
using LoadWatch.Service.Explain;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>A person's day is explained with what the limits left open on its morning.</summary>
public sealed class ExplainDayTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>Every day 1.671 AU (worked out in <see cref="ExplainSessionTests"/>): equal weeks raise nothing, so the largest day is the bound, rounded down.</summary>
    [Fact]
    public void TheMorningOfADayTellsWhatTheLimitsLeftOpenAndThatOfTheNextWhatTheyLeaveOpen()
    {
        for (var back = 0; back < 40; back++)
        {
            folder.Put($"bo/{back}.fit", FitEncoder.Encode(Some.Ride(Some.Yesterday.PlusDays(-back)) with
            {
                Samples = [.. Some.Ride(Some.Yesterday.PlusDays(-back)).Samples.Select(sample => sample with { HeartRate = 120, Power = 200 })],
            }));
        }

        folder.Sweep();
        var told = folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "bo", date: null))!;

        foreach (var date in new[] { "2026-06-14", "2026-06-15" })
        {
            Assert.Contains(
                $"the morning of {date}: inside the limits today: up to 1 AU, the largest day of the last 30: a figure to plan with, not a target and not a debt; largest day of the 30 before 1.671 on ",
                told,
                StringComparison.Ordinal);
        }
    }

    /// <summary>
    /// By hand, of equal days of 1.671 AU: a week 11.7, so acute, chronic and the averages are that of one day and the ratios 1; the day before yesterday has no file, which the next
    /// one makes rest: the week loses one day, E7 0.25 x 1.671 of it and gets three quarters of the rest, 1.671 - 0.75 x 0.418 = 1.358.
    /// </summary>
    [Fact]
    public void TrendsStandBesideTheLoadsThatTheyAreComputedFrom()
    {
        for (var back = 0; back < 40; back++)
        {
            if (back != 1)
            {
                folder.Put($"bo/{back}.fit", FitEncoder.Encode(Some.Ride(Some.Yesterday.PlusDays(-back)) with
                {
                    Samples = [.. Some.Ride(Some.Yesterday.PlusDays(-back)).Samples.Select(sample => sample with { HeartRate = 120, Power = 200 })],
                }));
            }
        }

        folder.Sweep();
        var told = folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "bo", Some.Yesterday))!;

        Assert.Contains("the 7 days to 2026-06-14: 1.671, 1.671, 1.671, 1.671, 1.671, 0, 1.671", told, StringComparison.Ordinal);
        Assert.Contains("the weeks before: W1 to 2026-06-07 11.7, W2 to 2026-05-31 11.7, W3 to 2026-05-24 11.7", told, StringComparison.Ordinal);
        Assert.Contains("ratio, coupled = acute / chronic (Lolli et al. 2019, Br J Sports Med 53:921-922) = 0.889", told, StringComparison.Ordinal);
        Assert.Contains("ratio, uncoupled = acute / mean week of days 8 to 28 back (Windt and Gabbett 2018, Br J Sports Med 53:988-990) = 0.857", told, StringComparison.Ordinal);
        Assert.Contains("lambda = 2 / (7 + 1) = 0.25, a day = 1.358", told, StringComparison.Ordinal);
        Assert.Contains("both start with the first known load, that of 2026-05-06", told, StringComparison.Ordinal);
    }

    /// <summary>By the maximum of yesterday the whole week is read (I-15), so the daily loads add up to the acute one.</summary>
    [Fact]
    public void TheLoadsOfTheWeekAreThoseByTheReferenceValuesOfTheDate()
    {
        for (var back = 0; back < 10; back++)
        {
            folder.Put($"anna/{back}.fit", Some.Fit(Some.Yesterday.PlusDays(-back)));
        }

        folder.Write("anchors.csv", $"{WorkingFolder.Anchors.TrimEnd()}\nanna,2026-06-14,heart_rate_max,210,bpm,,\n");
        folder.Sweep();
        var told = folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "anna", Some.Yesterday))!;

        var week = Numbers(told, "the 7 days to 2026-06-14: ");
        Assert.All(week, load => Assert.Equal(week[^1], load));
        Assert.Equal(Numbers(told, "acute = sum of the known loads of 7 days x 7 / known days = ")[0], week.Sum(), 0.01);
        Assert.Contains("for every session of the windows of this date: heart_rate_max = 210 bpm, measured, holds from 2026-06-14", told, StringComparison.Ordinal);
        var finding = folder.Read((workplace, session) => FindingExplanation.Of(workplace.Configuration, session, "anna", "load_ratio", Some.Yesterday))!;
        Assert.Contains("for every session of the windows of this date: heart_rate_max = 210 bpm, measured, holds from 2026-06-14", finding, StringComparison.Ordinal);
        Assert.NotEqual(Numbers(folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "anna", Some.Yesterday.PlusDays(-1)))!, "the 7 days to 2026-06-13: ")[^1], week[^1]);
    }

    [Fact]
    public void TheMorningOfADayWithTooLittleBehindItHasNoFigure()
    {
        folder.Put("bo/ride.fit", Some.Fit(Some.Yesterday.PlusDays(-1)));
        folder.Put("bo/other.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();

        var told = folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "bo", Some.Yesterday))!;

        Assert.Contains("the morning of 2026-06-14: no figure for today: ", told, StringComparison.Ordinal);
        Assert.DoesNotContain("a figure to plan with", told, StringComparison.Ordinal);
    }

    private static double[] Numbers(string told, string behind)
    {
        var from = told.IndexOf(behind, StringComparison.Ordinal) + behind.Length;
        return [.. told[from..told.IndexOf('\n', from)].Split(", ").Select(one => double.Parse(one, CultureInfo.InvariantCulture))];
    }
}
