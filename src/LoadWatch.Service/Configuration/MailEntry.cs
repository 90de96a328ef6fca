using System.ComponentModel.DataAnnotations;
using LoadWatch.Delivery.Mail;

namespace LoadWatch.Service.Configuration;

/// <summary>The server that takes mail. The password stands in a file of its own, never here.</summary>
public sealed record MailEntry
{
    /// <summary>Name of the server; blank sends no mail.</summary>
    public string Host { get; init; } = "";

    /// <summary>Port of the server.</summary>
    [Range(1, 65535)]
    public int Port { get; init; } = 587;

    /// <summary><c>starttls</c> (port 587), <c>tls</c> (port 465), or <c>none</c> for a server on this machine.</summary>
    public MailSecurity Security { get; init; } = MailSecurity.Starttls;

    /// <summary>Who the mail is from: an address, with or without a name.</summary>
    public string From { get; init; } = "";

    /// <summary>Login; blank for a server that wants none.</summary>
    public string User { get; init; } = "";

    /// <summary>File that holds the password and nothing else, readable by nobody but its owner.</summary>
    public string PasswordFile { get; init; } = "";

    /// <summary>Name of a credential that holds the password, instead of the file: of systemd, or of the Windows Credential Manager.</summary>
    public string PasswordCredential { get; init; } = "";

    /// <summary>PEM file of the authority that signed the server's certificate; blank for those that this machine trusts.</summary>
    public string CertificateAuthorityFile { get; init; } = "";

    /// <summary>Seconds that one message may take.</summary>
    [Range(5, 120)]
    public int TimeoutSeconds { get; init; } = 30;
}
