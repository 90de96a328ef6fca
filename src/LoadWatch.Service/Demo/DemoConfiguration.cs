using System.Globalization;
using System.Text;
using LoadWatch.People;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Demo;

/// <summary>The files beside the inbox: configuration, roster, reference values, devices that are handed out.</summary>
internal static class DemoConfiguration
{
    private const string Settings = """
        {
          // The demo's configuration. Everybody in it is invented. Paths are relative to this file.
          "data": "data",                     // archive of originals and database
          "pages": "pages",                   // one page per contact
          "notices": "notices",               // one file of notices per month
          "time_zone": "Europe/Helsinki",     // of everybody who names none

          "inboxes": [
            // A sub-folder named after a person holds that person's recordings, other folders tables and recordings of pods that are
            // handed out (devices.csv); "leave" keeps the files where they are.
            { "name": "inbox", "path": "inbox", "take": "leave" }
          ],

          "groups": [
            { "id": "boat", "name": "Rowing squad" },
            // The clinic writes sets down and records no heart rate; rules that compare weeks or days in a row are off there.
            { "id": "class", "name": "Strength class", "kind": "clinic", "load_quantity": "sets" },
            { "id": "masters", "name": "Masters" }
          ],

          // Who is told, about whom, and at what local time.
          "contacts": [
            { "id": "coach", "name": "Sorja Hallakoski", "role": "coach", "groups": ["boat"], "people": [], "brief_at": "06:30" },
            { "id": "physio", "name": "Tyyne Varpusalo", "role": "physiotherapist", "groups": ["class"], "people": [], "brief_at": "07:15" },
            { "id": "clinic", "name": "Aamu Lehtovirta", "role": "clinician", "groups": ["class"], "people": [], "brief_at": "07:00" },
            { "id": "henri", "name": "Henri Loivarinne", "role": "self", "groups": ["masters"], "people": ["henri"], "brief_at": "06:00" }
          ]
        }

        """;

    public static IEnumerable<DemoFile> Files(IReadOnlyList<DemoPerson> people, LocalDate until)
    {
        var written = DemoPerson.Zone.AtStartOfDay(until.PlusDays(-DemoTimeline.Days)).ToInstant();
        yield return new DemoFile("loadwatch.json", Encoding.UTF8.GetBytes(Settings.ReplaceLineEndings("\n")), written);
        yield return new DemoFile("roster.csv", DemoTable.Bytes("person,name,group,birth_year,sex,time_zone,aliases,heart_rate_valid", people.Select(Roster)), written);
        yield return new DemoFile(
            "anchors.csv", DemoTable.Bytes("person,date,anchor,value,unit,source,exercise,machine", people.SelectMany(person => person.Anchors).Select(Anchor)), written);
        yield return new DemoFile("devices.csv", DemoTable.Bytes("serial,person,from,to,session", Devices(people, until)), written);
    }

    private static IEnumerable<string> Devices(IReadOnlyList<DemoPerson> people, LocalDate until) =>
        people.Any(person => DemoPods.Of(person.Part.Id, until) is not null) ? DemoPods.Assignments(until) : [];

    private static string Roster(DemoPerson demo)
    {
        var person = demo.Person;
        var sex = person.Sex == Sex.Female ? "f" : "m";
        return string.Create(CultureInfo.InvariantCulture, $"{person.Id},{person.Name},{person.Group},{person.BirthYear},{sex},,{string.Join(';', person.Aliases)},{(person.HeartRateInvalid.IsEmpty ? "" : "no")}");
    }

    private static string Anchor(Anchor anchor)
    {
        var info = AnchorKinds.Of(anchor.Kind);
        var date = anchor.Date is { } known ? LocalDatePattern.Iso.Format(known) : "";
        return string.Create(CultureInfo.InvariantCulture, $"{anchor.Person},{date},{info.Name},{anchor.Value},{info.Unit},measured,{anchor.Exercise},{anchor.Machine}");
    }
}
