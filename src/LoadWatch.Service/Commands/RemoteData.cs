using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Commands;

/// <summary>The database's log needs memory that all its users share: over a network two machines would damage it without noticing.</summary>
public static class RemoteData
{
    /// <param name="networkOf">Tells the network file system that a folder lies on; null for none.</param>
    /// <exception cref="ConfigurationException">The data folder lies on one, and the configuration does not allow it.</exception>
    public static void Refuse(WorkingConfiguration configuration, Func<string, string?> networkOf)
    {
        if (!configuration.AllowNetworkDataFolder && networkOf(Existing(configuration.DataFolder)) is { } network)
        {
            throw new ConfigurationException(
                "data",
                $"{configuration.DataFolder} lies on a network file system ({network}), which cannot keep a database whole: name a folder on a disk of this machine. "
                + "Where no other machine ever opens it, \"allow_network_data_folder\": true takes it all the same");
        }
    }

    private static string Existing(string path)
    {
        var at = path;
        while (!Directory.Exists(at) && Path.GetDirectoryName(at) is { } above)
        {
            at = above;
        }

        return at;
    }
}
