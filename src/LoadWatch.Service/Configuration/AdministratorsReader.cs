using LoadWatch.Delivery.Mail;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads the administrators of <c>loadwatch.json</c>.</summary>
internal static class AdministratorsReader
{
    public static List<Administrator> Read(LoadWatchFile file, DateTimeZone zone, FaultList faults)
    {
        var administrators = new List<Administrator>();
        foreach (var (entry, i) in file.Administrators.Select((entry, i) => (entry, i)))
        {
            Check(file, entry, i, faults);
            administrators.Add(new Administrator(
                entry.Id,
                faults.Zone(entry.TimeZone, $"$.administrators[{i}].time_zone") ?? zone,
                HourAndMinute.Pattern.Parse(entry.ReportAt).Value)
            {
                Mail = entry.Mail.Length > 0 ? entry.Mail : null,
            });
        }

        return administrators;
    }

    private static void Check(LoadWatchFile file, AdministratorEntry entry, int i, FaultList faults)
    {
        var above = file.Contacts.Select(contact => contact.Id).Concat(file.Administrators.Take(i).Select(administrator => administrator.Id));
        if (above.Contains(entry.Id, StringComparer.OrdinalIgnoreCase))
        {
            faults.Add($"$.administrators[{i}].id", $"\"{entry.Id}\" stands above already, as a contact or an administrator");
        }

        if (entry.Mail.Length > 0 && MailAddresses.FaultOf(entry.Mail) is { } reason)
        {
            faults.Add($"$.administrators[{i}].mail", $"\"{entry.Mail}\" {reason}");
        }

        if (entry.Mail.Length > 0 && file.Mail.Host.Length == 0)
        {
            faults.Add("$.mail.host", "an administrator has a mail address, so the server that takes mail must be named");
        }
    }
}
