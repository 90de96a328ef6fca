using System.Diagnostics;
using System.Text;

namespace LoadWatch.Chaos.Processes;

/// <summary>How a process ended.</summary>
/// <param name="Code">Exit code; 128 and the signal's number where a signal ended it.</param>
public sealed record Ended(int Code, string Output, string Errors)
{
    public const int Killed = 128 + 9;

    public string Said => Output + Errors;
}

/// <summary>A running process whose output is kept.</summary>
public sealed class Child : IDisposable
{
    /// <summary>No healthy process here takes as long, not even on a busy machine.</summary>
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(180);

    private readonly Process process;
    private readonly StringBuilder output = new();
    private readonly StringBuilder errors = new();

    private Child(Process process) => this.process = process;

    public int Id => process.Id;

    /// <summary>What it has written until now.</summary>
    public string SaidSoFar
    {
        get
        {
            lock (output)
            {
                return output.ToString();
            }
        }
    }

    public static Child Start(IEnumerable<string> words, string folder, params IEnumerable<(string Name, string Value)> environment)
    {
        var line = words.ToList();
        var start = new ProcessStartInfo(line[0], line.Skip(1))
        {
            UseShellExecute = false,
            WorkingDirectory = folder,
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
        };
        start.Environment["DOTNET_TieredPGO"] = "0";
        start.Environment["DOTNET_EnableDiagnostics"] = "0";
        foreach (var (name, value) in environment)
        {
            start.Environment[name] = value;
        }

        var child = new Child(Process.Start(start)!);
        child.Listen();
        return child;
    }

    /// <summary>SIGKILL, as a power cut to the process.</summary>
    public void Kill()
    {
        process.Kill();
        process.WaitForExit();
    }

    /// <summary>Sends a signal by its name, as TERM, STOP or CONT.</summary>
    public void Signal(string name)
    {
        using var kill = Process.Start("kill", ["-s", name, Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]);
        kill.WaitForExit();
    }

    /// <summary>As <see cref="Signal"/>, to the process that runs under a tracer: its first child.</summary>
    public void SignalTraced(string name)
    {
        var traced = File.ReadAllText($"/proc/{Id}/task/{Id}/children").Split(' ')[0];
        using var kill = Process.Start("kill", ["-s", name, traced]);
        kill.WaitForExit();
    }

    /// <summary>False when it has not ended by itself in that time.</summary>
    public bool EndsWithin(TimeSpan time) => process.WaitForExit(time);

    /// <exception cref="ChaosFailureException">It does not end; it is killed then.</exception>
    public Ended WaitForEnd()
    {
        using (this)
        {
            if (!process.WaitForExit(Patience))
            {
                throw new ChaosFailureException($"a process has not ended within {Patience.TotalSeconds} s: {output}{errors}");
            }

            process.WaitForExit();
            return new Ended(process.ExitCode, output.ToString(), errors.ToString());
        }
    }

    public void Dispose()
    {
        try
        {
            process.Kill(entireProcessTree: true);
            process.WaitForExit();
        }
        catch (InvalidOperationException)
        {
            // Ended and disposed before.
        }

        process.Dispose();
    }

    private void Listen()
    {
        process.OutputDataReceived += (_, line) => Append(output, line.Data);
        process.ErrorDataReceived += (_, line) => Append(errors, line.Data);
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        process.StandardInput.Close();
    }

    private static void Append(StringBuilder text, string? line)
    {
        if (line is not null)
        {
            lock (text)
            {
                text.Append(line).Append('\n');
            }
        }
    }
}
