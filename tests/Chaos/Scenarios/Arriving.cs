using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Faults of files on their way in: section A of the catalogue.</summary>
public static class Arriving
{
    private const int Names = 50;

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("same-bytes", "A5", "The same bytes under fifty names in two folders: one effect, fifty sightings.", SameBytes),
        new("growing-file", "A1", "A CSV that is taken while it grows and a FIT file that grows past its end: each counts once, as it is in the end.", Growing),
        new("changed-while-read", "A4 A8 A9", "Files renamed, cut and overwritten all the while that they are read: one effect of each content in the end.", ChangedWhileRead),
    ];

    private static void SameBytes(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        var ride = Files.Fit(nights.Session("anna", 0));
        foreach (var number in Enumerable.Range(0, Names))
        {
            nights.Add(number % 2 == 0 ? $"anna/copy {number}.fit" : $"anna/sub/copy {number}.fit", ride, Truth.Stored);
        }

        using var place = trial.Prepared(nights, Clock.Fixed);
        place.Fill(nights.Tonight);
        place.SweepWell();
        var sightings = Digests.StoreDump.Lines(place.DatabasePath).Count(line => line.StartsWith("sighting|", StringComparison.Ordinal) && line.Contains(Truth.Sha(ride), StringComparison.Ordinal));
        Trial.MustBe(Names, sightings, "sightings of the same bytes");
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static void Growing(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        var (csv, fit) = (Files.Csv(nights.Session("cara", 0)), Files.Fit(nights.Session("anna", 0)));
        using var place = trial.Prepared(nights, Clock.Fixed);
        foreach (var share in new[] { 0.3, 0.6, 0.9 })
        {
            // Old enough to be taken as they are; the cut FIT file is refused, the CSV counts as far as it goes.
            place.Put("cara/grows.csv", csv[..Array.LastIndexOf(csv, (byte)'\n', (int)(share * csv.Length))]);
            place.Put("anna/grows.fit", fit[..(int)(share * fit.Length)]);
            place.SweepWell();
        }

        place.Put("cara/grows.csv", nights.Add("cara/grows.csv", csv, Truth.Stored));
        place.Put("anna/grows.fit", nights.Add("anna/grows.fit", fit, Truth.Stored));
        place.SweepWell();
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    }

    private static void ChangedWhileRead(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        var rides = Enumerable.Range(0, 6).Select(ago => Files.Fit(nights.Session("anna", ago))).ToList();
        rides.ForEach(ride => nights.Truth.Must(Truth.Stored, ride));
        using var place = trial.Prepared(nights, Clock.Fixed);
        using (var writer = new RestlessWriter(place, rides))
        {
            for (var sweep = 0; sweep < (trial.IsLong ? 40 : 4); sweep++)
            {
                place.SweepWell();
                trial.Survived();
            }

            trial.Figure("changes", writer.Changes);
        }

        foreach (var (ride, at) in rides.Select((ride, at) => (ride, at)))
        {
            place.Put($"anna/{at}.fit", ride);
        }

        place.SweepWell();
        Trial.Sound(place, nights.Truth);
    }
}
