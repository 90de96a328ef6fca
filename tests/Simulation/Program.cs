using System.Globalization;
using LoadWatch.Findings;
using LoadWatch.Simulation.Counts;
using LoadWatch.Simulation.Nights;
using LoadWatch.Simulation.Worlds;

namespace LoadWatch.Simulation;

public static class Program
{
    public static int Main(string[] args)
    {
        if (args.Contains("--tune"))
        {
            Tune.Run(args[^1]);
            return 0;
        }

        var seed = int.Parse(args.SkipWhile(word => word != "--seed").Skip(1).FirstOrDefault() ?? "1", CultureInfo.InvariantCulture);
        foreach (var habits in new[] { Habits.Squad, Habits.Runners, Habits.Clinic })
        {
            var limits = new RuleLimits();
            if (habits == Habits.Clinic)
            {
                limits = limits with { Monotony = new() { Enabled = false }, HardDays = new() { Enabled = false } };
            }

            var maker = new WorldMaker(seed, habits, new Noise(), limits);
            var healthy = Season.Of(maker.Healthy(30, 100), habits.Sport);
            Console.WriteLine($"{habits.Name}: false per person and 100 days {Score.FalsePerPersonAnd100Days(healthy):0.00}, chatter {Score.Chatter(healthy)}, rows a day {Score.Rows(healthy).Average():0.00}");
            foreach (var rule in Score.FalseAlerts(healthy).GroupBy(alert => (alert.Key.Rule, alert.Key.Quantity)).OrderByDescending(rule => rule.Count()))
            {
                Console.WriteLine($"    {rule.Key.Rule} {rule.Key.Quantity} {rule.Count() / 30.0:0.00}");
            }

            var kinds = habits == Habits.Clinic
                ? [HappeningKind.NothingHeavy, HappeningKind.Fade]
                : new[] { HappeningKind.DoubleWeek, HappeningKind.DoubleSession, HappeningKind.NothingHeavy, HappeningKind.Fade };
            var episodes = Season.Of(maker.WithEpisodes(40, 100, kinds), habits.Sport);
            foreach (var found in Score.Episodes(episodes))
            {
                Console.WriteLine($"    {found.Kind}: {found.Times} of {found.Episodes}, median {found.MedianDays} days");
            }

            Console.WriteLine($"    chatter {Score.Chatter(episodes)}");
        }

        return 0;
    }
}
