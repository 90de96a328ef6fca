using LoadWatch.Delivery.Webhook;

namespace LoadWatch.Service.Configuration;

/// <summary>Checks the section <c>webhook</c> and the contacts' addresses, and fetches the secret.</summary>
/// <param name="resolve">Makes a path of the configuration absolute.</param>
/// <param name="fault">Notes a fault: place, reason.</param>
internal sealed class WebhookReader(Func<string, string> resolve, Action<string, string> fault)
{
    /// <summary>A secret that can be guessed signs nothing. A choice.</summary>
    private const int SecretLengthAtLeast = 32;

    /// <returns>Null when no contact has an address.</returns>
    public WebhookSettings? Read(LoadWatchFile file)
    {
        var addresses = Addresses(file);
        if (file.Contacts.All(contact => contact.Webhook.Length == 0))
        {
            return null;
        }

        var secret = Secret(file.Webhook);
        if (secret.Fault is { } reason)
        {
            fault(secret.Place, reason);
        }

        return new WebhookSettings
        {
            Addresses = addresses,
            Secret = secret.Value,
            SecretMissing = secret.Missing,
            Timeout = TimeSpan.FromSeconds(file.Webhook.TimeoutSeconds),
        };
    }

    private Dictionary<string, Uri> Addresses(LoadWatchFile file)
    {
        var addresses = new Dictionary<string, Uri>(StringComparer.Ordinal);
        foreach (var (entry, i) in file.Contacts.Select((entry, i) => (entry, i)).Where(item => item.entry.Webhook.Length > 0))
        {
            if (WebhookSettings.FaultOf(entry.Webhook) is { } reason)
            {
                fault($"$.contacts[{i}].webhook", reason);
            }
            else
            {
                addresses[entry.Id] = new Uri(entry.Webhook);
            }
        }

        return addresses;
    }

    private StoredSecret Secret(WebhookEntry entry) => (entry.SecretFile.Length, entry.SecretCredential.Length) switch
    {
        (0, 0) => new StoredSecret("$.webhook.secret_file")
        {
            Fault = "a contact has an address to post to, so the secret that signs must be named: secret_file or secret_credential",
        },
        ( > 0, > 0) => new StoredSecret("$.webhook.secret_file") { Fault = "secret_file and secret_credential are both named; one is enough" },
        ( > 0, _) => LongEnough(new SecretStore(resolve, "secret").FromFile("$.webhook.secret_file", entry.SecretFile), entry.SecretFile),
        _ => LongEnough(new SecretStore(resolve, "secret").FromCredential("$.webhook.secret_credential", entry.SecretCredential), entry.SecretCredential),
    };

    private static StoredSecret LongEnough(StoredSecret secret, string shown) => secret.Value is { Length: < SecretLengthAtLeast }
        ? new StoredSecret(secret.Place) { Fault = $"\"{shown}\" holds a secret that can be guessed: {SecretLengthAtLeast} characters at least" }
        : secret;
}
