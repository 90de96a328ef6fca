using System.Security.Cryptography;
using LoadWatch.Delivery.Mail;

namespace LoadWatch.Service.Configuration;

/// <summary>Checks the section <c>mail</c> and the contacts' addresses, and fetches the password.</summary>
/// <param name="resolve">Makes a path of the configuration absolute.</param>
/// <param name="fault">Notes a fault: place, reason.</param>
internal sealed class MailReader(Func<string, string> resolve, Action<string, string> fault)
{
    /// <returns>Null when mail is off.</returns>
    public MailSettings? Read(LoadWatchFile file)
    {
        CheckContacts(file);
        var entry = file.Mail;
        if (entry.Host.Length == 0)
        {
            return null;
        }

        Check(entry);
        var secret = new MailSecret(resolve).Read(entry);
        if (secret.Fault is { } reason)
        {
            fault(secret.Place, reason);
        }

        return new MailSettings
        {
            Host = entry.Host,
            Port = entry.Port,
            Security = entry.Security,
            From = entry.From,
            User = entry.User,
            Password = secret.Value,
            PasswordMissing = secret.Missing,
            CertificateAuthorityFile = entry.CertificateAuthorityFile.Length > 0 ? resolve(entry.CertificateAuthorityFile) : null,
            Timeout = TimeSpan.FromSeconds(entry.TimeoutSeconds),
        };
    }

    private void CheckContacts(LoadWatchFile file)
    {
        for (var i = 0; i < file.Contacts.Count; i++)
        {
            var address = file.Contacts[i].Mail;
            if (address.Length > 0 && MailAddresses.FaultOf(address) is { } reason)
            {
                fault($"$.contacts[{i}].mail", $"\"{address}\" {reason}");
            }
        }

        if (file.Mail.Host.Length == 0 && file.Contacts.Any(contact => contact.Mail.Length > 0))
        {
            fault("$.mail.host", "a contact has a mail address, so the server that takes mail must be named");
        }
    }

    private void Check(MailEntry entry)
    {
        if (Uri.CheckHostName(entry.Host) == UriHostNameType.Unknown)
        {
            fault("$.mail.host", $"\"{entry.Host}\" is not the name of a host");
        }

        if (MailAddresses.FaultOfMailbox(entry.From) is { } reason)
        {
            fault("$.mail.from", $"\"{entry.From}\" {reason}");
        }

        if (entry.Security == MailSecurity.None && !MailSettings.IsLoopback(entry.Host))
        {
            fault("$.mail.security", "\"none\" sends health data in clear text; only a server on this machine (localhost) may be spoken to like that");
        }

        if (entry.CertificateAuthorityFile.Length > 0)
        {
            CheckAuthority(entry.CertificateAuthorityFile);
        }
    }

    private void CheckAuthority(string path)
    {
        try
        {
            MailSettings.CheckAuthorityFile(resolve(path));
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException or CryptographicException)
        {
            fault("$.mail.certificate_authority_file", $"\"{path}\" is not a readable file with a certificate in PEM form");
        }
    }
}
