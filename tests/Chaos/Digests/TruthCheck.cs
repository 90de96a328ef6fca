using System.Text.Json;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Digests;

/// <summary>What the service exports against what the writer of the files knows: every session once, whose, how long, how hard; every content in its state.</summary>
public sealed class TruthCheck(Place place, Truth truth)
{
    private const double Tolerance = 1e-6;

    private readonly List<string> faults = [];

    /// <exception cref="ChaosFailureException">Something is lost, doubled or different.</exception>
    public static void MustHold(Place place, Truth truth) => new TruthCheck(place, truth).MustHold();

    private void MustHold()
    {
        var activities = Export("activities");
        CheckSessions(activities.FindAll(activity => activity.GetProperty("elapsed_s").ValueKind == JsonValueKind.Number));
        CheckLifted(activities);
        CheckStates(Export("arrivals"));
        CheckAlerts(Export("alerts"));
        if (faults.Count > 0)
        {
            throw new ChaosFailureException($"{faults.Count} times not what happened: {string.Join("; ", faults.Take(5))}");
        }
    }

    private List<JsonElement> Export(string table) =>
    [
        .. Place.MustEndWell(place.Command("export", table)).Output.Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(line => JsonDocument.Parse(line).RootElement),
    ];

    private void CheckSessions(List<JsonElement> recorded)
    {
        foreach (var session in truth.Sessions)
        {
            var same = recorded.FindAll(activity => Is(activity, session));
            Expect(same.Count == 1, $"{session.Person} at {session.Local} counts {same.Count} times");
            same.ForEach(activity => CheckSession(activity, session));
        }

        Expect(recorded.Count == truth.Sessions.Count, $"{recorded.Count} recorded sessions, {truth.Sessions.Count} happened");
    }

    private static bool Is(JsonElement activity, TrueSession session) =>
        activity.GetProperty("person").GetString() == session.Person
        && NodaTime.Text.OffsetDateTimePattern.Rfc3339.Parse(activity.GetProperty("start").GetString()!).Value.ToInstant() == session.Start;

    private void CheckSession(JsonElement activity, TrueSession session)
    {
        var zones = activity.GetProperty("time_in_zone_s").GetProperty("heart_rate").EnumerateArray().Select(seconds => seconds.GetDouble()).ToList();
        var wanted = session.ZoneSeconds;
        var who = $"{session.Person} at {session.Local}";
        Expect(activity.GetProperty("date").GetString() == NodaTime.Text.LocalDatePattern.Iso.Format(session.Date), $"{who} has another date");
        Expect(Math.Abs(activity.GetProperty("elapsed_s").GetDouble() - session.Seconds) < Tolerance, $"{who} took {activity.GetProperty("elapsed_s")} s, not {session.Seconds}");
        Expect(
            zones.Count == wanted.Count && zones.Zip(wanted).All(pair => Math.Abs(pair.First - pair.Second) < Tolerance),
            $"{who} has zones {string.Join('/', zones)} s, not {string.Join('/', wanted)}");
    }

    private void CheckLifted(List<JsonElement> activities)
    {
        var sums = activities
            .SelectMany(activity => activity.GetProperty("quantities").EnumerateArray().Where(quantity => quantity.GetProperty("name").GetString() == "kilograms")
                .Select(quantity => (Person: activity.GetProperty("person").GetString()!, Date: activity.GetProperty("date").GetString()!, Value: quantity.GetProperty("value").GetDouble())))
            .GroupBy(quantity => (quantity.Person, quantity.Date), quantity => quantity.Value)
            .ToDictionary(same => same.Key, same => same.Sum());
        foreach (var (person, date, kilograms) in truth.Lifted)
        {
            var sum = sums.GetValueOrDefault((person, NodaTime.Text.LocalDatePattern.Iso.Format(date)));
            Expect(Math.Abs(sum - kilograms) < Tolerance, $"{person} lifted {sum} kg on {date}, not {kilograms}");
        }

        Expect(sums.Count == truth.Lifted.Count, $"{sums.Count} dates of lifting, {truth.Lifted.Count} happened");
    }

    private void CheckStates(List<JsonElement> arrivals)
    {
        var states = arrivals.ToDictionary(arrival => arrival.GetProperty("sha256").GetString()!, arrival => arrival.GetProperty("state").GetString()!, StringComparer.Ordinal);
        foreach (var (sha, state) in truth.States)
        {
            Expect(states.GetValueOrDefault(sha) == state, $"the content {sha[..12]} is {states.GetValueOrDefault(sha) ?? "unknown"}, not {state}");
        }

        Expect(!states.ContainsValue("waiting"), "something is still waiting");
    }

    private void CheckAlerts(List<JsonElement> alerts)
    {
        foreach (var (rule, person) in truth.Alerts)
        {
            var count = alerts.Count(alert => alert.GetProperty("rule").GetString() == rule && alert.GetProperty("person").GetString() == person);
            Expect(count == 1, $"{rule} of {person} stands {count} times");
        }
    }

    private void Expect(bool holds, string fault)
    {
        if (!holds)
        {
            faults.Add(fault);
        }
    }
}
