using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Everything odd that a folder may hold, all at once beside good files: section A of the catalogue.</summary>
public static class OddFiles
{
    /// <summary>Of two contents of a table the one seen later holds.</summary>
    private const string AnHourLater = "2026-06-15T10:00:00Z";

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new(
            "odd-files",
            "A2 A3 A6 A7 A9 A11 A12 A24 A25 A26 A27 A28",
            "One inbox with names of every kind, links, pipes, sockets, devices, empty files, times of 1970 and 2099, copies that stopped, names of unfinished copies and the same session three times: each good file once, the others named in one line or passed over.",
            Run),
    ];

    private static void Run(Trial trial)
    {
        var nights = new Nights(Clock.Fixed, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Fixed);
        using var odd = new OddInbox(place, nights);
        odd.AddNames();
        odd.AddTimes();
        odd.AddSameSession();
        odd.AddEmpty();
        odd.AddNoFiles();
        odd.AddUnfinished();
        var ended = place.SweepWell();
        MustBePlain(ended.Said);
        Trial.MustSay(ended.Errors, "unreadable name");
        Trial.MustSay(ended.Output, "1 still settling");
        Trial.MustBe(1, ended.Errors.Split('\n', StringSplitOptions.RemoveEmptyEntries).Length, "lines of trouble");
        odd.Finish();
        MustBePlain(Place.MustEndWell(place.Command("sweep", "--as-of", AnHourLater)).Said);
        odd.RemoveWhatWasPassedOver();
        Trial.Sound(place, nights.Truth);
        trial.Figure("odd files", odd.Count);
        trial.Survived();
    }

    /// <summary>Whatever a file is called, it must not steer the terminal or begin a line.</summary>
    private static void MustBePlain(string said)
    {
        if (said.Any(character => (char.IsControl(character) && character != '\n') || character is >= '\u202A' and <= '\u202E' or >= '\u2066' and <= '\u2069'))
        {
            throw new ChaosFailureException($"a name steers the terminal: {said}");
        }
    }
}
