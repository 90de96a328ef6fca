using System.Diagnostics;
using System.Text;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>The executable as a child process.</summary>
internal sealed class Loadwatch : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);

    private readonly Process process;
    private readonly StringBuilder output = new();
    private readonly StringBuilder errors = new();

    private bool disposed;

    private Loadwatch(Process process) => this.process = process;

    /// <summary>The words that start it: what <c>LOADWATCH_PUBLISHED</c> names, which is compiled ahead and starts sooner, else what was built beside the tests.</summary>
    public static string[] Program { get; } = Environment.GetEnvironmentVariable("LOADWATCH_PUBLISHED") is { Length: > 0 } published
        ? [Path.GetFullPath(published)]
        : ["dotnet", Path.Combine(AppContext.BaseDirectory, "loadwatch.dll")];

    public int Id => process.Id;

    /// <summary>Runs to the end.</summary>
    public static Ended Run(params string[] words) => Start(words).WaitForEnd();

    /// <summary>Runs to the end, or to one of the places where the process kills itself.</summary>
    public static Ended RunAndKillAt(string point, params string[] words) => Start(words, environment: ("LOADWATCH_KILL_AT", point)).WaitForEnd();

    public static Ended RunWithInput(string input, params string[] words) => Start(words, input).WaitForEnd();

    public static Ended RunUnder(string[] tracer, params string[] words) => Start(words, tracer: tracer).WaitForEnd();

    /// <param name="tracer">A program with its options that runs the executable, or null.</param>
    public static Loadwatch Start(string[] words, string? input = null, (string Name, string Value)? environment = null, string[]? tracer = null)
    {
        string[] line = [.. tracer ?? [], .. Program, .. words];
        var start = new ProcessStartInfo(line[0], line[1..])
        {
            UseShellExecute = false,
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
        };
        start.Environment["DOTNET_TieredPGO"] = "0";
        if (environment is { } set)
        {
            start.Environment[set.Name] = set.Value;
        }

        var child = new Loadwatch(Process.Start(start)!);
        child.Listen(input);
        return child;
    }

    public void Kill()
    {
        process.Kill();
        process.WaitForExit();
    }

    /// <summary>False when it has not ended by itself in that time.</summary>
    public bool EndsWithin(TimeSpan time) => process.WaitForExit(time);

    /// <exception cref="TimeoutException">It does not end; it is killed then.</exception>
    public Ended WaitForEnd()
    {
        using (this)
        {
            if (!process.WaitForExit(Patience))
            {
                throw new TimeoutException($"loadwatch has not ended: {output}{errors}");
            }

            process.WaitForExit();
            return new Ended(process.ExitCode, output.ToString(), errors.ToString());
        }
    }

    public void Dispose()
    {
        if (disposed)
        {
            return;
        }

        disposed = true;
        if (!process.HasExited)
        {
            process.Kill(entireProcessTree: true);
            process.WaitForExit();
        }

        process.Dispose();
    }

    private void Listen(string? input)
    {
        process.OutputDataReceived += (_, line) => Append(output, line.Data);
        process.ErrorDataReceived += (_, line) => Append(errors, line.Data);
        process.BeginOutputReadLine();
        process.BeginErrorReadLine();
        if (input is not null)
        {
            process.StandardInput.Write(input);
        }

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

/// <param name="Code">Exit code.</param>
internal sealed record Ended(int Code, string Output, string Errors);
