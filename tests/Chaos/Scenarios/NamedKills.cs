using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>I-4 at the places that the source names: killed at the n-th passing of each, for every n until one run passes untouched.</summary>
public static class NamedKills
{
    private const string Variable = "LOADWATCH_KILL_AT";

    /// <summary>Passed by a sweep, in the order of its work.</summary>
    public static IReadOnlyList<string> OfSweep { get; } =
        ["staged", "placed", "archived", "waiting", "decoded", "aside", "settled", "rows", "evaluated", "delivered", "replaced"];

    /// <summary>Passed by a rebuild.</summary>
    public static IReadOnlyList<string> OfRebuild { get; } = ["asked", "decoded", "rows"];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("kill-points", "D61", "Killed at every passing of every named place of a sweep; the next sweep ends where an undisturbed one does.", Sweeps),
        new("kill-points-rebuild", "D61", "Killed at every passing of the named places of a rebuild; the next sweep ends with the same rows.", Rebuilds),
    ];

    private static void Sweeps(Trial trial)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var prepared = trial.Prepared(nights, Clock.Fixed, new PlaceOptions(Take: "move"));
        var undisturbed = Trial.Undisturbed(prepared, nights);
        prepared.Fill(nights.Tonight);
        EachPassing(trial, OfSweep, prepared, place => place.SweepWords, place =>
        {
            Trial.MustConverge(place, undisturbed);
            MustBeEmpty(place);
        });
    }

    private static void Rebuilds(Trial trial)
    {
        var nights = Nights.Full(Clock.Fixed, trial.Seed);
        using var done = trial.Prepared(nights, Clock.Fixed);
        done.Fill(nights.Tonight);
        done.SweepWell();
        var undisturbed = Trial.Sound(done, nights.Truth);
        EachPassing(trial, OfRebuild, done, _ => ["rebuild"], place => Trial.MustConverge(place, undisturbed));
    }

    private static void EachPassing(Trial trial, IEnumerable<string> points, Place from, Func<Place, IEnumerable<string>> words, Action<Place> check) =>
        Parallel.ForEach(points, Trial.TwoAtOnce, point =>
        {
            var passing = 0;
            while (IsKilled(from, $"{point}:{++passing}", words, check))
            {
                trial.Survived();
                trial.Figure("kills", 1);
            }

            if (passing == 1)
            {
                throw new ChaosFailureException($"nothing passes the place \"{point}\"");
            }
        });

    /// <returns>False when the run went past that passing's number unharmed.</returns>
    private static bool IsKilled(Place from, string at, Func<Place, IEnumerable<string>> words, Action<Place> check)
    {
        using var place = from.Copy();
        var ended = place.Start(words(place), (Variable, at)).WaitForEnd();
        if (ended.Code == 0)
        {
            return false;
        }

        if (ended.Code != Ended.Killed)
        {
            throw new ChaosFailureException($"{at}: ended with {ended.Code}: {ended.Said}");
        }

        Trial.Named(at, () => check(place));
        return true;
    }

    private static void MustBeEmpty(Place place)
    {
        if (Directory.EnumerateFiles(place.Inbox, "*", SearchOption.AllDirectories).ToList() is { Count: > 0 } left)
        {
            throw new ChaosFailureException($"an inbox that empties itself still holds {string.Join(", ", left)}");
        }
    }
}
