using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Pipeline;

/// <summary>The mail addresses of contacts and administrators as configured now, by id; of whoever has none, nothing.</summary>
public static class Mailboxes
{
    public static ILookup<string, string> Of(WorkingConfiguration configuration) => configuration.Contacts
        .Select(contact => (contact.Id, contact.Mail))
        .Concat(configuration.Administrators.Select(administrator => (administrator.Id, administrator.Mail)))
        .Where(pair => pair.Mail is not null)
        .ToLookup(pair => pair.Id, pair => pair.Mail!, StringComparer.Ordinal);
}
