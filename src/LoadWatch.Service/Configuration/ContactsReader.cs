using LoadWatch.Notices;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads the contacts of <c>loadwatch.json</c>.</summary>
internal static class ContactsReader
{
    /// <param name="people">Null where the roster could not be read: then nothing is said about ids of people.</param>
    public static List<Contact> Read(
        LoadWatchFile file, Dictionary<string, Group> groups, Dictionary<string, Person>? people, DateTimeZone zone, FaultList faults)
    {
        var contacts = new List<Contact>();
        foreach (var (entry, i) in file.Contacts.Select((entry, i) => (entry, i)))
        {
            faults.CheckWords(entry.Groups, groups.Keys, $"$.contacts[{i}].groups", "a group");
            if (people is not null)
            {
                faults.CheckWords(entry.People, people.Keys, $"$.contacts[{i}].people", "in the roster", StringComparer.OrdinalIgnoreCase);
            }

            if (entry.BriefDays.Count == 0)
            {
                faults.Add($"$.contacts[{i}].brief_days", "names no weekday");
            }

            if (contacts.Exists(contact => string.Equals(contact.Id, entry.Id, StringComparison.OrdinalIgnoreCase)))
            {
                faults.Add($"$.contacts[{i}].id", $"the contact \"{entry.Id}\" stands above already");
            }

            contacts.Add(new Contact(
                entry.Id,
                entry.Name.Length > 0 ? entry.Name : entry.Id,
                entry.Role,
                entry.Groups.Count > 0 ? entry.Groups : [.. groups.Keys],
                entry.People,
                faults.Zone(entry.TimeZone, $"$.contacts[{i}].time_zone") ?? zone,
                HourAndMinute.Pattern.Parse(entry.BriefAt).Value,
                entry.BriefDays.ToHashSet())
            {
                Forms = entry.Forms.Count > 0 ? [.. entry.Forms.Distinct().Order()] : BriefForms.Usual(entry.Role, entry.BriefDays.Distinct().Count()),
                Mail = entry.Mail.Length > 0 ? entry.Mail : null,
                Names = entry.Names,
            });
        }

        return contacts;
    }
}
