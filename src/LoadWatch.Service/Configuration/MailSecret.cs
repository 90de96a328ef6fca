using System.Runtime.Versioning;

namespace LoadWatch.Service.Configuration;

/// <summary>Fetches the mail password from its file, from systemd or from the Windows Credential Manager. It is in no message and no record (I-12).</summary>
/// <param name="resolve">Makes a path of the configuration absolute.</param>
internal sealed class MailSecret(Func<string, string> resolve)
{
    private const UnixFileMode Others = UnixFileMode.OtherRead | UnixFileMode.OtherWrite | UnixFileMode.OtherExecute;

    public MailPassword Read(MailEntry entry) => entry switch
    {
        { User: "", PasswordFile: "", PasswordCredential: "" } => new MailPassword("$.mail.user"),
        { User: "" } => new MailPassword("$.mail.user") { Fault = "a password is named, but no user" },
        { PasswordFile: "", PasswordCredential: "" } =>
            new MailPassword("$.mail.user") { Fault = "the user needs a password: name password_file or password_credential" },
        { PasswordFile.Length: > 0, PasswordCredential.Length: > 0 } =>
            new MailPassword("$.mail.password_file") { Fault = "password_file and password_credential are both named; one is enough" },
        { PasswordFile.Length: > 0 } => FromFile("$.mail.password_file", resolve(entry.PasswordFile), entry.PasswordFile, mayBeShared: false),
        _ => FromCredential(entry.PasswordCredential),
    };

    /// <summary>The service's credentials are for the service alone, so a command started by hand does without: it can check, but not send.</summary>
    private static MailPassword FromCredential(string name)
    {
        const string place = "$.mail.password_credential";
        if (name != Path.GetFileName(name) || name is "." or "..")
        {
            return new MailPassword(place) { Fault = $"\"{name}\" is not the name of a credential" };
        }

        if (OperatingSystem.IsWindows())
        {
            return FromWindows(place, name);
        }

        return Environment.GetEnvironmentVariable("CREDENTIALS_DIRECTORY") is { Length: > 0 } folder
            ? FromFile(place, Path.Combine(folder, name), name, mayBeShared: true)
            : new MailPassword(place) { Missing = $"the credential {name} is given by systemd to the service only" };
    }

    [SupportedOSPlatform("windows")]
    private static MailPassword FromWindows(string place, string name) => WindowsCredential.Read(name) is { } password
        ? Checked(place, password, name)
        : new MailPassword(place) { Missing = $"the credential {name} is not in the Windows Credential Manager of the account that runs this" };

    private static MailPassword FromFile(string place, string path, string shown, bool mayBeShared)
    {
        try
        {
            if (!OperatingSystem.IsWindows() && !mayBeShared && (File.GetUnixFileMode(path) & Others) != UnixFileMode.None)
            {
                return new MailPassword(place) { Fault = $"\"{shown}\" can be read by everybody on this machine: chmod 600 it" };
            }

            // An editor's line end at the end of the file is not part of the password.
            return Checked(place, File.ReadAllText(path).TrimEnd('\r', '\n'), shown);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return new MailPassword(place) { Fault = $"\"{shown}\" cannot be read: {(e is FileNotFoundException ? "it is not there" : e.GetType().Name)}" };
        }
    }

    private static MailPassword Checked(string place, string password, string shown) => password.Length > 0 && !password.Any(char.IsControl)
        ? new MailPassword(place) { Password = password }
        : new MailPassword(place) { Fault = $"\"{shown}\" does not hold one line with the password" };
}

/// <summary>What came of fetching it; all three null where none is needed.</summary>
/// <param name="Place">The key of the configuration that is concerned.</param>
internal sealed record MailPassword(string Place)
{
    public string? Password { get; init; }

    /// <summary>What is wrong with the configuration.</summary>
    public string? Fault { get; init; }

    /// <summary>Why there is none, though nothing is wrong with the configuration.</summary>
    public string? Missing { get; init; }

    public override string ToString() => Place;
}
