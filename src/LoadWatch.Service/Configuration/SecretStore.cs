using System.Runtime.Versioning;

namespace LoadWatch.Service.Configuration;

/// <summary>Fetches a secret from its file, from systemd or from the Windows Credential Manager. It is in no message and no record (I-12).</summary>
/// <param name="resolve">Makes a path of the configuration absolute.</param>
/// <param name="word">What it is: <c>password</c>.</param>
internal sealed class SecretStore(Func<string, string> resolve, string word)
{
    private const UnixFileMode Others = UnixFileMode.OtherRead | UnixFileMode.OtherWrite | UnixFileMode.OtherExecute;

    /// <param name="place">The key of the configuration that names it.</param>
    public StoredSecret FromFile(string place, string file) => FromFile(place, resolve(file), file, mayBeShared: false);

    /// <summary>The service's credentials are for the service alone, so a command started by hand does without: it can check, but not send.</summary>
    public StoredSecret FromCredential(string place, string name)
    {
        if (name != Path.GetFileName(name) || name is "." or "..")
        {
            return new StoredSecret(place) { Fault = $"\"{name}\" is not the name of a credential" };
        }

        if (OperatingSystem.IsWindows())
        {
            return FromWindows(place, name);
        }

        return Environment.GetEnvironmentVariable("CREDENTIALS_DIRECTORY") is { Length: > 0 } folder
            ? FromFile(place, Path.Combine(folder, name), name, mayBeShared: true)
            : new StoredSecret(place) { Missing = $"the credential {name} is given by systemd to the service only" };
    }

    [SupportedOSPlatform("windows")]
    private StoredSecret FromWindows(string place, string name) => WindowsCredential.Read(name) is { } secret
        ? Checked(place, secret, name)
        : new StoredSecret(place) { Missing = $"the credential {name} is not in the Windows Credential Manager of the account that runs this" };

    private StoredSecret FromFile(string place, string path, string shown, bool mayBeShared)
    {
        try
        {
            if (!OperatingSystem.IsWindows() && !mayBeShared && (File.GetUnixFileMode(path) & Others) != UnixFileMode.None)
            {
                return new StoredSecret(place) { Fault = $"\"{shown}\" can be read by everybody on this machine: chmod 600 it" };
            }

            // An editor's line end at the end of the file is not part of the secret.
            return Checked(place, File.ReadAllText(path).TrimEnd('\r', '\n'), shown);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return new StoredSecret(place) { Fault = $"\"{shown}\" cannot be read: {(e is FileNotFoundException ? "it is not there" : e.GetType().Name)}" };
        }
    }

    private StoredSecret Checked(string place, string secret, string shown) => secret.Length > 0 && !secret.Any(char.IsControl)
        ? new StoredSecret(place) { Value = secret }
        : new StoredSecret(place) { Fault = $"\"{shown}\" does not hold one line with the {word}" };
}

/// <summary>What came of fetching it; all three null where none is needed.</summary>
/// <param name="Place">The key of the configuration that is concerned.</param>
internal sealed record StoredSecret(string Place)
{
    public string? Value { get; init; }

    /// <summary>What is wrong with the configuration.</summary>
    public string? Fault { get; init; }

    /// <summary>Why there is none, though nothing is wrong with the configuration.</summary>
    public string? Missing { get; init; }

    public override string ToString() => Place;
}
