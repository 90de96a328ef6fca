using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>SIGKILL at any moment of sweeps and of the running service, start-up and mail included; several on the way of one store before it is compared.</summary>
public static class RandomKills
{
    private const int Short = 45;
    private const int Long = 5000;
    private const int MostOfOneStore = 5;
    private const int Workers = 2;

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("random-kills", "D61 F86", "Killed at random moments of whole sweeps and of the service; then a sweep ends where an undisturbed one does, with at most one more copy of a mail for each kill.", trial => Kill(trial, trial.IsLong ? Long : Short)),
    ];

    public static Scenario Of(int kills) => All[0] with { Run = trial => Kill(trial, kills) };

    private static void Kill(Trial trial, int kills) => Parallel.For(0, Workers, Trial.TwoAtOnce, worker =>
    {
        var random = new Random(trial.Seed + worker);
        using var server = new ScriptedServer();
        var nights = Nights.Full(Clock.Machine, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Machine, new PlaceOptions(Mail: server.Section));
        var mails = new MailCheck(server);
        var undisturbed = mails.Undisturbed(() => Trial.Undisturbed(prepared, nights));
        prepared.Fill(nights.Tonight);
        var whole = Duration(prepared);
        for (var killed = 0; killed < kills / Workers;)
        {
            server.Forget();
            using var place = prepared.Copy();
            var here = Disturb(place, random, whole, Math.Min(MostOfOneStore, (kills / Workers) - killed));
            killed += here;
            Trial.Named($"after {here} kills", () => Trial.MustConverge(place, undisturbed));
            trial.Figure("further copies of a mail", mails.MustHold(atMost: here));
            trial.Figure("stores", 1);
            for (var i = 0; i < here; i++)
            {
                trial.Survived();
            }
        }
    });

    /// <returns>How often it was killed; less than asked when the work was done before.</returns>
    private static int Disturb(Place place, Random random, TimeSpan whole, int most)
    {
        for (var kill = 0; kill < most; kill++)
        {
            var isService = random.Next(2) == 0;
            using var child = isService ? place.Start(["run"]) : place.StartSweep();
            var moment = whole * (random.NextDouble() * (isService ? 1.5 : 1.1));
            if (child.EndsWithin(moment))
            {
                return kill;
            }

            child.Kill();
        }

        return most;
    }

    /// <summary>Of one undisturbed sweep, on this machine as busy as it is.</summary>
    private static TimeSpan Duration(Place prepared)
    {
        using var place = prepared.Copy();
        var started = System.Diagnostics.Stopwatch.GetTimestamp();
        place.SweepWell();
        return System.Diagnostics.Stopwatch.GetElapsedTime(started);
    }
}
