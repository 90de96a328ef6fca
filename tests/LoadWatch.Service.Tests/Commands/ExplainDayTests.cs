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
}
