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
    private const int MostAttempts = 3;

    /// <summary>Whether a waiting arrival has ended a child before: then nothing waits for it (I-14).</summary>
    public static bool IsSuspect(Arrival arrival) => arrival.Attempts > 0;

    /// <summary>Whether the arrival was refused because it ends the process that decodes it: no process but a child may touch it again.</summary>
    public static bool IsPoisonous(Arrival arrival) => arrival.State == ArrivalState.Refused && arrival.Attempts >= MostAttempts;

    public void Run(CancellationToken cancel)
    {
        foreach (var arrival in store.Read(session => session.Arrivals.Waiting()))
        {
            cancel.ThrowIfCancellationRequested();
            TakeUp(arrival);
        }
    }

    private void TakeUp(Arrival arrival)
    {
        if (!archive.Verify(arrival.ObjectSha))
        {
            Refuse(arrival, "its original in the archive is missing or damaged");
        }
        else if (probe.Survives(archive.PathOf(arrival.ObjectSha), arrival.Size))
        {
            foreach (var piece in reader.Sighted(arrival.ObjectSha).InPieces())
            {
                settlement.Settle(piece, force: false);
            }
        }
        else
        {
            store.Write(session => session.Arrivals.CountAttempt(arrival.Sha));
            if (arrival.Attempts + 1 >= MostAttempts)
            {
                Refuse(arrival, $"poisonous: decoding ended the process or broke its limits {MostAttempts} times");
            }
        }
    }

    private void Refuse(Arrival arrival, string reason) =>
        store.Write(session => session.Arrivals.Settle(arrival.Sha, ArrivalState.Refused, "unknown", reason, null));
}

/// <summary>Tries whether decoding a file ends the process that does it.</summary>
public interface IDecodeProbe
{
    /// <param name="path">An object of the archive.</param>
    /// <param name="bytes">Its size.</param>
    bool Survives(string path, long bytes);
}

/// <summary>Runs <c>loadwatch inspect</c> on the file in a child process with a limit of time and memory.</summary>
/// <param name="configPath">The configuration whose CSV layouts count.</param>
public sealed class ChildProcessProbe(string configPath) : IDecodeProbe
{
    public bool Survives(string path, long bytes)
    {
        using var child = Process.Start(StartInfo(path, bytes))!;
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

    private ProcessStartInfo StartInfo(string path, long bytes)
    {
        var program = Environment.ProcessPath ?? throw new InvalidOperationException("the path of this process is not known");
        var start = new ProcessStartInfo(program) { UseShellExecute = false, RedirectStandardOutput = true, RedirectStandardError = true };
        if (Path.GetFileNameWithoutExtension(program).Equals("dotnet", StringComparison.OrdinalIgnoreCase))
        {
            start.ArgumentList.Add(typeof(ChildProcessProbe).Assembly.Location);
        }

        foreach (var word in new[] { "inspect", "--json", "--config", configPath, path })
        {
            start.ArgumentList.Add(word);
        }

        var heapBytes = (128L * 1024 * 1024) + (8 * bytes);
        start.Environment["DOTNET_GCHeapHardLimit"] = heapBytes.ToString("X", System.Globalization.CultureInfo.InvariantCulture);
        return start;
    }
}
