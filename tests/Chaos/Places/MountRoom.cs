using System.Globalization;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Places;

/// <summary>A mount namespace of its own, kept open by a sleeping process: what is mounted in it is seen nowhere else and ends with it.</summary>
public sealed class MountRoom : IDisposable
{
    private const string KeptForSeconds = "900";
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);

    private readonly Child keeper = Child.Start(["unshare", "-m", "sleep", KeptForSeconds], "/");

    public MountRoom()
    {
        // Before the keeper has left the machine's own namespace nothing may be mounted.
        if (!SpinWait.SpinUntil(() => NamespaceOf("self") != NamespaceOf(Id) && NamespaceOf(Id) is not null, Patience))
        {
            keeper.Dispose();
            throw new ChaosFailureException("a mount namespace was not to be had");
        }
    }

    /// <summary>Run a program in the room.</summary>
    public IReadOnlyList<string> Words => ["nsenter", "-t", Id, "-m", "--"];

    private string Id => keeper.Id.ToString(CultureInfo.InvariantCulture);

    /// <summary>A path of the room as it is seen from outside.</summary>
    public string Outside(string path) => $"/proc/{Id}/root{path}";

    public void Mount(params IEnumerable<string> words) => Do(["mount", .. words]);

    /// <summary>As the kernel does it to a share that is lost: at once, whoever still uses it.</summary>
    public void Unmount(string path) => Do("umount", "-l", path);

    /// <exception cref="ChaosFailureException">The program fails.</exception>
    public void Do(params IEnumerable<string> words)
    {
        var line = words.ToList();
        if (!Tool.Run(Words[0], [.. Words.Skip(1), .. line]))
        {
            throw new ChaosFailureException($"{string.Join(' ', line)} fails");
        }
    }

    public void Dispose() => keeper.Dispose();

    private static string? NamespaceOf(string process)
    {
        try
        {
            return new FileInfo($"/proc/{process}/ns/mnt").LinkTarget;
        }
        catch (IOException)
        {
            return null;
        }
    }
}
