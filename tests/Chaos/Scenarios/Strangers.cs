using System.Text;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Names that mean harm and files of nobody: section B of the catalogue. All texts in all places are proved in process.</summary>
public static class Strangers
{
    private const string Roster = """
        person,name,group,birth_year,sex,time_zone
        anna,<script>alert(1)</script>,squad,1996,f,
        bo,"=HYPERLINK(""http://example.org"",""Bo"")",squad,1991,m,
        cara,Cara'); DROP TABLE activity;-- %s {0} ${jndi:ldap://x},squad,1958,f,
        dan,"<img src=x onerror=alert(2)> Bcc: all@example.org",squad,1988,m,

        """;

    private static readonly string[] NoAddresses = ["a@example.org> NOTIFY=NEVER", "a@example.org\\r\\nBcc: b@example.org", "a@example.org, b@example.org", "a@@example.org"];

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("hostile-names", "B44 B45 B46", "Markup, formulas, commands and headers as names of people: plain text on the page and in the mail, nowhere in the log; addresses that are more than one are refused at the start.", HostileNames),
        new("unknown-owner", "B47", "A file of nobody and one under two people's folders: held and not counted; assigned later, each counts once.", UnknownOwner),
    ];

    private static void HostileNames(Trial trial)
    {
        var nights = Nights.OneFile(Clock.Machine, trial.Seed);
        using var server = new ScriptedServer();
        using var place = trial.NewPlace(Clock.Machine, new PlaceOptions(Mail: server.Section, Contacts: 2));
        File.WriteAllText(place.At("roster.csv"), Roster);
        place.Prepare(nights);
        place.Fill(nights.Tonight);
        using (var service = ServiceAtWork.Start(place, []))
        {
            service.MustSay("Arrivals settled: 1 stored");
            service.Stop();
        }

        MustBeOneMailEach(server, contacts: 2);
        var shown = Texts(place, "pages");
        Trial.MustSay(shown, "&lt;");
        Trial.MustBe(0, new[] { "<script>alert", "<img src=x" }.Count(tag => shown.Contains(tag, StringComparison.Ordinal)), "names that became markup");
        Trial.MustBe(0, new[] { "alert(1)", "DROP TABLE", "HYPERLINK" }.Count(name => Texts(place, "data/log").Contains(name, StringComparison.Ordinal)), "names in the log");
        Trial.Sound(place, nights.Truth);
        trial.Survived();

        var good = File.ReadAllText(place.ConfigPath);
        foreach (var address in NoAddresses)
        {
            File.WriteAllText(place.ConfigPath, good.Replace(PlaceOptions.Address(0), address, StringComparison.Ordinal));
            Trial.Named(address, () => Trial.MustBe(78, place.Command("check").Code, "as the exit code of a faulty configuration"));
            trial.Survived();
        }
    }

    private static void MustBeOneMailEach(ScriptedServer server, int contacts)
    {
        Trial.MustBe(contacts, server.Received.Count, "mails");
        Trial.MustBe(contacts, server.Received.SelectMany(mail => mail.Recipients).Distinct(StringComparer.Ordinal).Count(), "recipients in all");
        var heads = server.Received.Select(mail => Encoding.Latin1.GetString(mail.Raw).Split("\r\n\r\n")[0]);
        Trial.MustBe(0, heads.Count(head => head.Contains("\nBcc:", StringComparison.OrdinalIgnoreCase) || head.Contains("all@example.org", StringComparison.Ordinal)), "mails with a header that a name brought");
    }

    private static void UnknownOwner(Trial trial)
    {
        var nights = new Nights(Clock.Machine, trial.Seed);
        using var place = trial.Prepared(nights, Clock.Machine);
        var (nobodys, twice) = (Files.Fit(nights.Session("anna", 0)), Files.Fit(nights.Session("bo", 0)));
        place.Put("nobody.fit", nobodys);
        place.Put("anna/both.fit", twice);
        place.Put("bo/both.fit", twice);
        Trial.MustSay(place.SweepWell().Output, "2 held (+2)");
        foreach (var (bytes, person) in new[] { (nobodys, "anna"), (twice, "bo") })
        {
            var file = Truth.Sha(nights.Truth.Must(Truth.Stored, bytes))[..12];
            Trial.MustSay(Place.MustEndWell(place.Command("assign", file, person)).Output, "is assigned");
            Trial.MustSay(Place.MustEndWell(place.Command("assign", file, person)).Output, "already");
            place.SweepWell();
            trial.Survived();
        }

        place.SweepWell();
        Trial.Sound(place, nights.Truth);
    }

    private static string Texts(Place place, string folder) => string.Concat(
        Directory.EnumerateFiles(place.At(folder), "*", SearchOption.AllDirectories).Order(StringComparer.Ordinal).Select(File.ReadAllText));
}
