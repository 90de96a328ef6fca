using System.Diagnostics;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Storage;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Takes up arrivals that were waiting when the process ended (I-4): each is decoded once in a child process first, and only a child that dies or breaks
/// its limits counts as an attempt, one a sweep: a busy machine must not refuse a good file. Three of those refuse the arrival.
/// </summary>
public sealed class Recovery(Store store, Archive archive, ArchiveReader reader, Settlement settlement, IDecodeProbe probe)
{
    /// <summary>Why an arrival is refused whose original is not what it was.</summary>
    public const string Damaged = "its original in the archive is missing or damaged";

    /// <summary>Why an arrival is refused that no process but a child may touch again.</summary>
    public static string Poisonous => $"poisonous: decoding ended the process or broke its limits {ArrivalTable.MostAttempts} times";

    private const int ProbedTogether = 64;

    /// <summary>Whether a waiting arrival has ended a child before: then nothing waits for it (I-14).</summary>
    public static bool IsSuspect(Arrival arrival) => arrival.Attempts > 0;

    /// <summary>Whether the arrival was refused because it ends the process that decodes it: no process but a child may touch it again.</summary>
    public static bool IsPoisonous(Arrival arrival) => arrival.State == ArrivalState.Refused && arrival.Attempts >= ArrivalTable.MostAttempts;

    public void Run(CancellationToken cancel)
    {
        foreach (var group in store.Read(session => session.Arrivals.Waiting()).Chunk(ProbedTogether))
        {
            cancel.ThrowIfCancellationRequested();
            TakeUp(group);
        }
    }

    /// <summary>One child for the whole group is enough where it lives; only where it dies is each tried alone.</summary>
    private void TakeUp(Arrival[] group)
    {
        var unsuspected = group.Where(arrival => !IsSuspect(arrival)).ToList();
        var livedThrough = unsuspected.Count > 1 && Survives(unsuspected) ? unsuspected : [];
        Settle(livedThrough);
        group.Except(livedThrough).ToList().ForEach(TakeUp);
    }

    private bool Survives(List<Arrival> arrivals) =>
        probe.Survives(arrivals.ConvertAll(arrival => archive.PathOf(arrival.ObjectSha)), arrivals.Sum(arrival => arrival.Size));

    private void TakeUp(Arrival arrival)
    {
        if (Survives([arrival]))
        {
            Settle([arrival]);
        }
        else if (archive.Verify(arrival.ObjectSha))
        {
            store.Write(session => session.Arrivals.CountAttempt(arrival.Sha));
            if (arrival.Attempts + 1 >= ArrivalTable.MostAttempts)
            {
                Refuse(arrival, Poisonous);
            }
        }
        else
        {
            Refuse(arrival, Damaged);
        }
    }

    private void Settle(List<Arrival> arrivals)
    {
        try
        {
            foreach (var piece in arrivals.SelectMany(Contents).InPieces().OneAhead())
            {
                settlement.Begin(piece, force: false, gone: [], _ => { });
            }
        }
        finally
        {
            settlement.Finish();
        }
    }

    private IEnumerable<SeenContent> Contents(Arrival arrival)
    {
        var contents = reader.Sighted(arrival.ObjectSha);
        if (contents is null)
        {
            Refuse(arrival, Damaged);
        }

        return contents ?? [];
    }

    private void Refuse(Arrival arrival, string reason) =>
        settlement.Refuse(arrival.Sha, reason);
}

/// <summary>Tries whether decoding a file ends the process that does it.</summary>
public interface IDecodeProbe
{
    /// <param name="paths">Objects of the archive.</param>
    /// <param name="bytes">Their size together.</param>
    bool Survives(IReadOnlyList<string> paths, long bytes);
}

/// <summary>Runs <c>loadwatch inspect</c> on the file in a child process with a limit of time and memory.</summary>
/// <param name="configPath">The configuration whose CSV layouts count.</param>
public sealed class ChildProcessProbe(string configPath) : IDecodeProbe
{
    public bool Survives(IReadOnlyList<string> paths, long bytes)
    {
        using var child = Process.Start(StartInfo(paths, bytes))!;
        child.OutputDataReceived += (_, _) => { };
        child.ErrorDataReceived += (_, _) => { };
        child.BeginOutputReadLine();
        child.BeginErrorReadLine();
        var limit = TimeSpan.FromSeconds(30) + TimeSpan.FromSeconds(2 * bytes / (1024.0 * 1024.0));
        if (child.WaitForExit(limit))
        {
            // A configuration being edited at this moment says nothing about the file.
            return child.ExitCode is Commands.ExitCode.Ok or Commands.ExitCode.Configuration;
        }

        child.Kill(entireProcessTree: true);
        return false;
    }

    private ProcessStartInfo StartInfo(IReadOnlyList<string> paths, long bytes)
    {
        var program = Environment.ProcessPath ?? throw new InvalidOperationException("the path of this process is not known");
        var start = new ProcessStartInfo(program) { UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
        if (Path.GetFileNameWithoutExtension(program).Equals("dotnet", StringComparison.OrdinalIgnoreCase))
        {
            start.ArgumentList.Add(typeof(ChildProcessProbe).Assembly.Location);
        }

        foreach (var word in new[] { "inspect", "--json", "--config", configPath }.Concat(paths))
        {
            start.ArgumentList.Add(word);
        }

        var heapBytes = (128L * 1024 * 1024) + (8 * bytes);
        start.Environment["DOTNET_GCHeapHardLimit"] = heapBytes.ToString("X", System.Globalization.CultureInfo.InvariantCulture);
        return start;
    }
}
