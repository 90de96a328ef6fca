using System.Security.Cryptography;
using System.Text;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Export;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;
using LoadWatch.Storage.Recordings;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A temporary working folder as a user has it: configuration, roster, anchors, an inbox. Gone with the test.</summary>
internal sealed class WorkingFolder : IDisposable
{
    /// <summary>The morning at which every test sweeps, an hour after the brief was due.</summary>
    public static readonly Instant Now = Instant.FromUtc(2026, 6, 15, 6, 0);

    public const string NowText = "2026-06-15T06:00:00Z";

    /// <summary>Long before <see cref="Now"/> by the settle time.</summary>
    private static readonly Duration Settled = Duration.FromHours(1);

    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-e2e-");

    public WorkingFolder(string take = "leave", string intake = "", string roster = Roster, string anchors = Anchors)
    {
        Write("loadwatch.json", Configuration(take, intake));
        Write("roster.csv", roster);
        Write("anchors.csv", anchors);
        Directory.CreateDirectory(Inbox);
    }

    public const string Roster = """
        person,name,group,birth_year,sex,time_zone
        anna,Anna Ahola,squad,1996,f,UTC
        bo,Bo Björk,squad,1991,m,UTC
        cara,Cara Costa,squad,1958,f,UTC

        """;

    public const string Anchors = SquadAnchors.Text;

    public string Root => root.FullName;

    public string ConfigPath => Path.Combine(Root, "loadwatch.json");

    public string Inbox => Path.Combine(Root, "inbox");

    public string Data => Path.Combine(Root, "data");

    public string NoticeText => string.Concat(Files(Path.Combine(Root, "notices")).Select(File.ReadAllText));

    private static string Configuration(string take, string intake) => $$"""
        {
          "time_zone": "UTC",
          "inboxes": [{ "name": "inbox", "path": "inbox", "take": "{{take}}" }],
          "groups": [{ "id": "squad", "name": "Squad" }],
          "contacts": [{ "id": "staff", "name": "Staff", "groups": ["squad"], "brief_at": "05:00" }],
          "intake": { {{intake}} },
          "limits": { "silence": { "extra_days": 2 } }
        }

        """;

    public static IReadOnlyList<string> Files(string folder) => Directory.Exists(folder)
        ? [.. Directory.EnumerateFiles(folder, "*", SearchOption.AllDirectories).Order(StringComparer.Ordinal)]
        : [];

    /// <summary>Puts every file into the inbox.</summary>
    public void Fill(IEnumerable<(string Path, byte[] Bytes)> files)
    {
        foreach (var (path, bytes) in files)
        {
            Put(path, bytes);
        }
    }

    public void Write(string name, string text) => File.WriteAllText(Path.Combine(Root, name), text);

    /// <summary>Puts a file into the inbox, its time an hour before <see cref="Now"/> unless an age is given.</summary>
    /// <returns>The full path.</returns>
    public string Put(string path, byte[] bytes, Duration? age = null)
    {
        var full = Path.Combine(Inbox, path);
        Directory.CreateDirectory(Path.GetDirectoryName(full)!);
        File.WriteAllBytes(full, bytes);
        File.SetLastWriteTimeUtc(full, (Now - (age ?? Settled)).ToDateTimeUtc());
        return full;
    }

    /// <summary>One sweep in this process; a probe is only asked where an earlier process died.</summary>
    public SweepReport Sweep(Instant? now = null, IDecodeProbe? probe = null, TimeSpan? recomputesFor = null) =>
        Work(now, probe, sweep => sweep.Run(), recomputesFor);

    public SweepReport Rebuild(Instant? now = null) => Work(now, null, sweep => sweep.Rebuild(CancellationToken.None));

    /// <summary>A rebuild that is told to stop when so many originals are through.</summary>
    public void Rebuild(int cancelAfter, Action<int, int> seen)
    {
        using var cancel = new CancellationTokenSource();
        Work(null, null, sweep => sweep.Rebuild(cancel.Token, (done, all) =>
        {
            seen(done, all);
            if (done == cancelAfter)
            {
                cancel.Cancel();
            }
        }));
    }

    /// <summary>Decides whose a content is, as the command does.</summary>
    public void Assign(byte[] bytes, string person, Instant? now = null)
    {
        using var workplace = Workplace.OpenToDecide(ConfigPath);
        using var said = new StringWriter();
        var code = AssignCommand.Run(workplace, Sha(bytes), person, new Circumstances(now ?? Now), said, said);
        Xunit.Assert.True(code == ExitCode.Ok, said.ToString());
    }

    /// <summary>Writes into the store, as intake does.</summary>
    public T Write<T>(Func<Workplace, StoreSession, T> write)
    {
        using var workplace = Workplace.OpenToDecide(ConfigPath);
        return workplace.Store.Write(session => write(workplace, session));
    }

    /// <summary>All five tables as text.</summary>
    public string Export() => string.Join('\n', Exporter.Tables.Select(table => $"{table}\n{Export(table)}"));

    public string Export(string table) => Read((workplace, session) =>
    {
        using var text = new StringWriter();
        new Exporter(workplace.Configuration, session, null, null, null).Write(table, text);
        return text.ToString();
    });

    public IReadOnlyList<Arrival> Arrivals() => Read((_, session) => session.Arrivals.All());

    /// <summary>The arrival of a content.</summary>
    public Arrival? Arrival(byte[] bytes) => Read((_, session) => session.Arrivals.Get(Sha(bytes)));

    public static string Sha(byte[] bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));

    public T Read<T>(Func<Workplace, StoreSession, T> read)
    {
        using var workplace = Workplace.OpenToRead(ConfigPath);
        return workplace.Store.Read(session => read(workplace, session));
    }

    /// <summary>Everything in the archive by path, with the hash of what it holds.</summary>
    public IReadOnlyList<string> ArchiveHashes() => [.. Files(Path.Combine(Data, "archive")).Select(path => Sha(File.ReadAllBytes(path))).Order(StringComparer.Ordinal)];

    public IReadOnlyList<string> ArchiveNames() => [.. Files(Path.Combine(Data, "archive")).Select(path => Path.GetFileName(path)).Order(StringComparer.Ordinal)];

    /// <summary>The distinct hashes of the files in the inbox.</summary>
    public IReadOnlyList<string> InboxHashes() => [.. Files(Inbox).Select(path => Sha(File.ReadAllBytes(path))).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];

    /// <summary>The number of the process that holds the lock of the data folder, or null.</summary>
    public string? LockHolder()
    {
        if (SafeFile.Open(Path.Combine(Data, "loadwatch.lock")) is not OpenedFile opened)
        {
            return null;
        }

        using var reader = new StreamReader(opened.Stream);
        return reader.ReadToEnd();
    }

    /// <summary>Export, archive, notices and pages of everything as one text, to be compared.</summary>
    public string Everything()
    {
        var text = new StringBuilder(Export());
        text.AppendJoin('\n', ArchiveNames()).Append('\n').Append(NoticeText);
        foreach (var page in Files(Path.Combine(Root, "pages")))
        {
            text.Append(Path.GetFileName(page)).Append(File.ReadAllText(page));
        }

        return text.ToString();
    }

    public void Dispose() => root.Delete(recursive: true);

    private SweepReport Work(Instant? now, IDecodeProbe? probe, Func<Sweep, SweepReport> work, TimeSpan? recomputesFor = null)
    {
        var configuration = ConfigurationReader.Read(ConfigPath);
        var folder = DataFolder.Open(configuration.DataFolder);
        using var alone = InstanceLock.Take(folder);
        using var store = Store.Open(folder);
        var report = work(new Sweep(configuration, folder, store, now ?? Now, probe ?? new NoProbe()) { RecomputesFor = recomputesFor ?? TimeSpan.MaxValue });
        store.Settle();
        return report;
    }

    private sealed class NoProbe : IDecodeProbe
    {
        public bool Survives(IReadOnlyList<string> paths, long bytes) =>
            throw new InvalidOperationException($"nothing was waiting, yet {paths[0]} is probed");
    }
}
