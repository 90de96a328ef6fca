namespace LoadWatch.Service.Configuration;

/// <summary>Fetches the mail password, where a user is named.</summary>
/// <param name="resolve">Makes a path of the configuration absolute.</param>
internal sealed class MailSecret(Func<string, string> resolve)
{
    private readonly SecretStore store = new(resolve, "password");

    public StoredSecret Read(MailEntry entry) => entry switch
    {
        { User: "", PasswordFile: "", PasswordCredential: "" } => new StoredSecret("$.mail.user"),
        { User: "" } => new StoredSecret("$.mail.user") { Fault = "a password is named, but no user" },
        { PasswordFile: "", PasswordCredential: "" } =>
            new StoredSecret("$.mail.user") { Fault = "the user needs a password: name password_file or password_credential" },
        { PasswordFile.Length: > 0, PasswordCredential.Length: > 0 } =>
            new StoredSecret("$.mail.password_file") { Fault = "password_file and password_credential are both named; one is enough" },
        { PasswordFile.Length: > 0 } => store.FromFile("$.mail.password_file", entry.PasswordFile),
        _ => store.FromCredential("$.mail.password_credential", entry.PasswordCredential),
    };
}
