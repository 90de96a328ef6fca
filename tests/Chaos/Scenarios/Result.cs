using System.Diagnostics;
using System.Globalization;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>What came of a scenario.</summary>
/// <param name="Failure">The promise that did not hold, or null.</param>
/// <param name="Skipped">What this machine lacks for it, or null.</param>
public sealed record Result(Scenario Scenario, Trial Trial, TimeSpan Took, string? Failure, string? Skipped)
{
    public static Result Of(Scenario scenario, Binary binary, int seed, bool isLong)
    {
        ArgumentNullException.ThrowIfNull(scenario);
        var trial = new Trial(binary, seed, isLong);
        if (scenario.Lacks is { } lacks)
        {
            return new Result(scenario, trial, TimeSpan.Zero, null, lacks);
        }

        var started = Stopwatch.GetTimestamp();
        var failure = Failing(() => scenario.Run(trial));
        return new Result(scenario, trial, Stopwatch.GetElapsedTime(started), failure, null);
    }

    /// <summary>One line of the table. Without a failure among n the true rate is below 3/n with 95 % confidence (the rule of three; Hanley and Lippman-Hand 1983, JAMA 249:1743).</summary>
    public string Row()
    {
        var outcome = Skipped ?? Failure?.Split('\n')[0] ?? "held";
        var bound = Failure is null && Trial.Provoked > 0 ? (300.0 / Trial.Provoked).ToString("0.0", CultureInfo.InvariantCulture) + " %" : "-";
        var figures = string.Join(", ", Trial.Figures.OrderBy(pair => pair.Key, StringComparer.Ordinal).Select(pair => $"{pair.Value} {pair.Key}"));
        return string.Create(CultureInfo.InvariantCulture, $"| {Scenario.Id} | {Scenario.Faults} | {Trial.Provoked} | {bound} | {figures} | {Took.TotalSeconds:0} s | {outcome} |");
    }

    private static string? Failing(Action run)
    {
        try
        {
            run();
            return null;
        }
        catch (AggregateException several)
        {
            return several.Flatten().InnerExceptions[0] is ChaosFailureException known ? known.Message : several.ToString();
        }
        catch (ChaosFailureException failure)
        {
            return failure.Message;
        }
    }
}
