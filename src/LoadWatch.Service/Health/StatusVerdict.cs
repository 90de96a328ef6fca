using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>What <c>loadwatch status</c> says, by the exit codes that monitoring programs know.</summary>
/// <param name="Sentence">One sentence, to stand first.</param>
public sealed record StatusVerdict(int Code, string Sentence, IReadOnlyList<Trouble> Troubles)
{
    public const int Fine = 0;
    public const int Warning = 1;
    public const int Critical = 2;
    public const int Unknown = 3;

    private static readonly Duration SweepMayTake = Duration.FromMinutes(10);
    private static readonly Duration SignMayTake = Duration.FromMinutes(5);

    public string Word => Code switch
    {
        Fine => "OK",
        Warning => "WARNING",
        Critical => "CRITICAL",
        _ => "UNKNOWN",
    };

    /// <param name="status">Null where nothing was ever written.</param>
    /// <param name="more">What the asker found out besides.</param>
    /// <param name="maxAge">How long ago the last good sweep may be; null: the scan interval and ten minutes.</param>
    public static StatusVerdict Of(ServiceStatus? status, IReadOnlyList<Trouble> more, Instant now, Duration? maxAge)
    {
        if (status is null)
        {
            return new StatusVerdict(
                more.Any(trouble => trouble.Critical) ? Critical : Unknown,
                more.FirstOrDefault()?.Sentence ?? "No sweep yet: nothing is known (loadwatch run, or loadwatch sweep).",
                more);
        }

        List<Trouble> troubles = [.. Silent(status, now, maxAge ?? Duration.FromSeconds(status.ScanSeconds) + SweepMayTake), .. more, .. status.Troubles];
        return troubles.OrderByDescending(trouble => trouble.Critical).ToList() switch
        {
            [] => new StatusVerdict(Fine, $"All is well; the last sweep ended {status.LastDone}.", troubles),
            [{ Critical: var critical } first, .. var others] => new StatusVerdict(
                critical ? Critical : Warning, others.Count == 0 ? first.Sentence : $"{first.Sentence} And {others.Count} more.", troubles),
        };
    }

    private static IEnumerable<Trouble> Silent(ServiceStatus status, Instant now, Duration maxAge)
    {
        if (status.Started is not null && ServiceTroubles.Age(status.Written, now) > SignMayTake)
        {
            yield return new Trouble("not-running", true, $"The service does not run, or hangs: its last sign is of {status.Written}.");
        }

        var age = ServiceTroubles.Age(status.LastDone, now);
        if (age > maxAge || (age is null && ServiceTroubles.Age(status.Started ?? status.Written, now) > maxAge))
        {
            yield return IsGettingOn(status, now) ? UnderWay(status) : new Trouble("no-sweep", true, status.LastDone is { } last ? $"No sweep has ended well since {last}." : "No sweep has ended well yet.");
        }
    }

    /// <summary>A large import takes its time, and commits what it has at every group of files.</summary>
    private static bool IsGettingOn(ServiceStatus status, Instant now) =>
        status is { Started: not null, Sweep: { Result: "running", FailingSince: null } } && ServiceTroubles.Age(status.LastCommit, now) <= SweepMayTake;

    private static Trouble UnderWay(ServiceStatus status) => new("sweep-under-way", false, status.LastDone is { } last
        ? $"A sweep has been under way since {status.Sweep!.Started} and gets on; the last one ended {last}."
        : $"The first sweep has been under way since {status.Sweep!.Started} and gets on: {status.Through ?? 0} arrivals are in, {status.Waiting ?? 0} wait.");
}
