using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Commands;

/// <summary>The configuration with its opened store. With the lock it may take in and evaluate, without it only read.</summary>
public sealed class Workplace : IDisposable
{
    private readonly string configPath;
    private readonly InstanceLock? instance;
    private readonly KnownFiles known = new();
    private Sweep? last;

    private Workplace(string configPath, WorkingConfiguration configuration, DataFolder folder, InstanceLock? instance, Store store)
    {
        this.configPath = Path.GetFullPath(configPath);
        Configuration = configuration;
        Folder = folder;
        this.instance = instance;
        Store = store;
    }

    /// <summary>The last good configuration.</summary>
    public WorkingConfiguration Configuration { get; private set; }

    public DataFolder Folder { get; }

    public Store Store { get; }

    public InboxLooks Looks { get; } = new();

    /// <exception cref="ConfigurationException">The configuration is wrong.</exception>
    /// <exception cref="InstanceRunningException">Another process takes in files of the same data folder.</exception>
    public static Workplace OpenToWork(string configPath)
    {
        var configuration = ConfigurationReader.Read(configPath);
        RemoteData.Refuse(configuration, FileSystems.NetworkOf);
        var folder = DataFolder.Open(configuration.DataFolder);
        var taken = InstanceLock.Take(folder);
        try
        {
            return new Workplace(configPath, configuration, folder, taken, Store.Open(folder));
        }
        catch
        {
            taken.Dispose();
            throw;
        }
    }

    /// <inheritdoc cref="OpenToWork"/>
    public static Workplace OpenToRead(string configPath)
    {
        var configuration = ConfigurationReader.Read(configPath);
        RemoteData.Refuse(configuration, FileSystems.NetworkOf);
        var folder = DataFolder.Open(configuration.DataFolder);
        return new Workplace(configPath, configuration, folder, null, Store.Open(folder));
    }

    /// <summary>To look only, beside a running service: creates and upgrades nothing.</summary>
    /// <exception cref="ConfigurationException">The configuration is wrong.</exception>
    /// <exception cref="DatabaseRefusedException">There is no database of this version yet.</exception>
    public static Workplace OpenToLook(string configPath)
    {
        var configuration = ConfigurationReader.Read(configPath);
        var folder = DataFolder.At(configuration.DataFolder);
        return new Workplace(configPath, configuration, folder, null, Store.OpenToRead(folder));
    }

    /// <summary>
    /// For decisions of staff: without the lock, since they must be possible while the service holds it. Each is one short transaction, and the database
    /// lets a second writer wait for the first.
    /// </summary>
    /// <inheritdoc cref="OpenToWork"/>
    public static Workplace OpenToDecide(string configPath) => OpenToRead(configPath);

    /// <summary>To be called when a command's work is done: see <see cref="Store.Settle"/>.</summary>
    /// <returns>The exit code that was given.</returns>
    public int Settled(int code)
    {
        Store.Settle();
        return code;
    }

    /// <summary>Takes over a new configuration; its data folder stays the one that is open.</summary>
    public WorkingConfiguration Adopt(WorkingConfiguration configuration) => Configuration = configuration;

    /// <summary>The next sweep. After one that did not get as far as the pages, also in an earlier process, it writes them all anew.</summary>
    public Sweep NewSweep(Instant now)
    {
        var sweep = new Sweep(Configuration, Folder, Store, now, new ChildProcessProbe(configPath), known)
        {
            PagesAreCurrent = last is { PagesAreWritten: true },
            Looks = Looks,
        };
        last = sweep;
        return sweep;
    }

    /// <summary>A sweep whose rows go into another store, over the same archive.</summary>
    public Sweep NewSweepOn(Store store, Instant now) => new(Configuration, Folder, store, now, new ChildProcessProbe(configPath));

    public void Dispose()
    {
        Store.Dispose();
        instance?.Dispose();
    }
}
