using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Configuration and roster changed badly or at a bad moment: section G of the catalogue. All mistakes one by one are proved in process; a running service and its configuration in the long morning.</summary>
public static class Edits
{
    private const int Configuration = 78;
    private const string MailSecret = "mail.secret";

    /// <summary>Text that is there, text in its place, and what must be said.</summary>
    private static readonly (string Old, string New, string Said)[] Mistakes =
    [
        ("\"scan_seconds\"", "\"scan_second\"", "scan_seconds"),
        ("\"scan_seconds\": 5", "\"scan_seconds\": \"5 s\"", "loadwatch.json"),
        ("\"time_zone\"", "\t\"time_zone\" \"x\",\n\"time_zone\"", "loadwatch.json"),
        ("\"take\": \"leave\"", "\"take\": \"tkae\"", "leave"),
        ("}\n}", "}", "loadwatch.json"),
    ];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("faulty-configuration", "G94 G97", "Misspelt keys, wrong words and units, a torn file, none at all, a roster that is not there, a password's file that is missing or open to all: 78 with file, line and a way out, and nothing is touched.", Faulty),
        new("roster-changed", "G96", "Killed before, between and behind the steps of a night, and a person moves to another group, another is renamed before it goes on: each list by the roster of its own moment, nothing of the moved one to the former coach.", RosterChanged),
    ];

    private static void Faulty(Trial trial)
    {
        using var place = trial.NewPlace(Clock.Fixed);
        var good = File.ReadAllText(place.ConfigPath);
        foreach (var (old, changed, said) in Mistakes)
        {
            File.WriteAllText(place.ConfigPath, good.Replace(old, changed, StringComparison.Ordinal));
            MustBeRefused(trial, place, said);
        }

        File.Delete(place.ConfigPath);
        MustBeRefused(trial, place, "loadwatch.json");
        File.WriteAllText(place.ConfigPath, good);
        File.Delete(place.At("roster.csv"));
        MustBeRefused(trial, place, "roster.csv");
        File.WriteAllText(place.At("roster.csv"), Cast.Roster);
        const string login = ",\n\"mail\": { \"host\": \"localhost\", \"port\": 25, \"security\": \"none\", \"from\": \"brief@example.org\", \"user\": \"x\", \"password_file\": \"" + MailSecret + "\" }\n}";
        File.WriteAllText(place.ConfigPath, good.TrimEnd()[..^1] + login);
        MustBeRefused(trial, place, MailSecret);
        File.WriteAllText(place.At(MailSecret), "canary-of-the-password\n");
        Tool.Run("chmod", "644", place.At(MailSecret));
        MustBeRefused(trial, place, "chmod 600");
    }

    private static void MustBeRefused(Trial trial, Place place, string said)
    {
        foreach (var words in new[] { "check", "run" })
        {
            var ended = place.Command(words);
            Trial.MustBe(Configuration, ended.Code, $"as the exit code of {words} ({ended.Said})");
            Trial.MustSay(ended.Errors + ended.Output, said);
            Trial.MustBe(0, ended.Said.Contains("canary", StringComparison.Ordinal) ? 1 : 0, "passwords shown");
        }

        Trial.MustBe(0, Directory.Exists(place.Data) ? 1 : 0, "data folders made by a faulty configuration");
        trial.Survived();
    }

    private static void RosterChanged(Trial trial) => Parallel.ForEach(new[] { "waiting:1", "settled:1", "evaluated:1" }, Trial.TwoAtOnce, killedAt =>
    {
        using var server = new ScriptedServer();
        var nights = Nights.OneFile(Clock.Machine, trial.Seed);
        using var place = trial.NewPlace(Clock.Machine, new PlaceOptions(Mail: server.Section, Contacts: 2));
        File.WriteAllText(place.ConfigPath, TwoGroups(File.ReadAllText(place.ConfigPath)));
        place.Prepare(nights);
        place.Fill(nights.Tonight);
        Trial.MustBe(Ended.Killed, place.Sweep(("LOADWATCH_KILL_AT", killedAt)).Code, "as the exit code of a killed process");
        var decided = killedAt.StartsWith("evaluated", StringComparison.Ordinal);
        File.WriteAllText(place.At("roster.csv"), Cast.Roster
            .Replace("dan,Dan Dubois,squad", "dan,Dan Dubois,others", StringComparison.Ordinal)
            .Replace("Anna Ahola", "Anna Aalto", StringComparison.Ordinal));
        place.SweepWell();
        Trial.MustBe(2, server.Received.SelectMany(mail => mail.Recipients).Distinct(StringComparer.Ordinal).Count(), "contacts who were told");
        Trial.MustBe(server.Received.Count, server.Received.DistinctBy(mail => mail.MessageId, StringComparer.Ordinal).Count(), "different mails");
        Trial.MustBe(decided ? 1 : 0, Mails(server, 0).Count(mail => mail.Contains("Dan", StringComparison.Ordinal)), $"mails about the one who moved to the former coach, killed at {killedAt}");
        Trial.Sound(place, nights.Truth);
        trial.Survived();
    });

    private static IEnumerable<string> Mails(ScriptedServer server, int contact) =>
        server.Received.Where(mail => mail.Recipients.Contains(PlaceOptions.Address(contact), StringComparer.Ordinal)).Select(mail => mail.Content);

    private static string TwoGroups(string configuration) => configuration
        .Replace("{ \"id\": \"squad\", \"name\": \"Squad\" }", "{ \"id\": \"squad\", \"name\": \"Squad\" }, { \"id\": \"others\", \"name\": \"Others\" }", StringComparison.Ordinal)
        .Replace("\"name\": \"Staff 1\", \"groups\": [\"squad\"]", "\"name\": \"Staff 1\", \"groups\": [\"others\"]", StringComparison.Ordinal)
        .Replace("\"brief_at\": \"05:00\",", "\"brief_at\": \"05:00\", \"names\": \"full\",", StringComparison.Ordinal);
}
