using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Service.Configuration;

/// <summary>How notices are posted to chat or ticket systems. The secret stands in a file of its own, never here.</summary>
public sealed record WebhookEntry
{
    /// <summary>File that holds the secret that signs, and nothing else, readable by nobody but its owner.</summary>
    public string SecretFile { get; init; } = "";

    /// <summary>Name of a credential that holds the secret, instead of the file: of systemd, or of the Windows Credential Manager.</summary>
    public string SecretCredential { get; init; } = "";

    /// <summary>Seconds that one notice may take.</summary>
    [Range(5, 120)]
    public int TimeoutSeconds { get; init; } = 30;
}
