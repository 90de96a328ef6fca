using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Recordings;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

/// <summary>
/// Invented riders over a year, by a number: four rides a week, of which every seventh holds an effort as hard as can be (form of the day +-1.5 %), every third one of 80 to 97 %
/// of that, the rest none; for two blocks of 8 weeks nobody goes to a limit. Heart rate falls by 6 bpm with 10 % of effort and scatters by 2.5 bpm. The numbers of the world are from memory.
/// </summary>
public class CriticalSeasonsTests
{
    private const int Riders = 100;
    private const int Length = 365;
    private static readonly int[] Durations = [120, 180, 240, 300, 480, 600, 720, 900, 1200];

    /// <summary>One alert a person and 1000 days: a tenth of what staff live with (`tests/README.md`, simulation).</summary>
    [Fact]
    public void RidersWhoKeepTheirPowerAreSeldomTold()
    {
        var alerts = Enumerable.Range(0, Riders).Sum(seed => Begun(seed, _ => 1).Count);

        TestContext.Current.SendDiagnosticMessage("false alerts of {0} riders in a year: {1}", Riders, alerts);
        Assert.InRange(alerts, 0, Riders * Length / 1000);
    }

    /// <summary>A tenth and a bit is lost between the days 180 and 200, while efforts go on.</summary>
    [Fact]
    public void MostOfThoseWhoLoseItAreTold()
    {
        var found = Enumerable.Range(0, Riders).Count(seed => Begun(seed, day => 1 - (0.12 * Math.Clamp((day - 180) / 20.0, 0, 1)), restless: true).Exists(date => date >= On(180)));

        TestContext.Current.SendDiagnosticMessage("found of {0} riders: {1}", Riders, found);
        Assert.InRange(found, Riders / 2, Riders);
    }

    /// <summary>First dates of the alerts.</summary>
    private static List<NodaTime.LocalDate> Begun(int seed, Func<int, double> power, bool restless = false)
    {
        var chance = new Random(seed);
        var easy = restless ? [] : new[] { chance.Next(0, Length), chance.Next(0, Length) };
        var rides = Enumerable.Range(0, Length).Where(day => day % 7 is 1 or 3 or 5 or 6).Select(day => Ride(chance, day, power(day), easy.Any(first => day >= first && day < first + 56))).ToList();
        var days = Enumerable.Range(0, Length).Select(day => new Day { Person = "anna", Date = On(day), State = day % 7 is 1 or 3 or 5 or 6 ? DayState.Recorded : DayState.Rest }).ToList();
        return
        [
            .. new FallingCapacityRule().Evaluate(new RuleSubject(Anna, days, new RuleLimits())
            {
                Activities = [.. rides.Select(ride => new JoinedActivity { Key = ride.Key, Date = ride.Date, Sport = ride.Sport, Sources = ["watch"] })],
                BestMeans = rides.ToDictionary(ride => ride.Key, ride => ride.Means, StringComparer.Ordinal),
            }).Select(finding => finding.Since).Distinct(),
        ];
    }

    private static SessionBests Ride(Random chance, int day, double power, bool easy)
    {
        var (kind, seconds) = (chance.NextDouble(), Durations[chance.Next(Durations.Length)]);
        var share = kind < 1 / 7.0 && !easy ? 1 + (0.015 * Scatter(chance)) : kind < 1 / 2.0 ? 0.8 + (0.17 * chance.NextDouble()) : 0.6;
        share = easy ? Math.Min(share, 0.92) : share;
        var watts = ((250 * power) + (18_000.0 / seconds)) * share;
        var bpm = 185 - (60 * (1 - share)) + (2.5 * Scatter(chance));
        var means = new Dictionary<Channel, BestMeans>
        {
            [Channel.Power] = new(BestMeans.Durations.Select(duration => duration <= seconds ? watts : 120 + ((watts - 120) * seconds / duration))),
            [Channel.HeartRate] = new(BestMeans.Durations.Select(duration => bpm - (6 * Math.Log(duration / 300.0) / Math.Log(720.0 / 300)))),
        };
        return new SessionBests(string.Create(CultureInfo.InvariantCulture, $"{day:000}"), On(day), new Sport("cycling"), means);
    }

    /// <summary>Of a normal distribution with a standard deviation of 1 (Box and Muller 1958).</summary>
    private static double Scatter(Random chance) => Math.Sqrt(-2 * Math.Log(1 - chance.NextDouble())) * Math.Cos(2 * Math.PI * chance.NextDouble());
}
