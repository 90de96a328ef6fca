using System.Text.RegularExpressions;

namespace LoadWatch.Chaos.Processes;

/// <summary>One system call as strace saw it; file numbers are followed by their paths.</summary>
/// <param name="Begun">Place in the order in which calls began; a call that another thread cut in two keeps its beginning's.</param>
/// <param name="Over">Place in the order in which they came back; never for one that did not.</param>
public sealed record TracedCall(string Thread, string Name, string Text, int Begun, int Over)
{
    public bool IsInjected => Text.Contains("(INJECTED)", StringComparison.Ordinal);

    public bool Succeeded => Over != int.MaxValue && !Failed;

    public bool Failed => Text.Contains(") = -1 ", StringComparison.Ordinal) || Text.Contains("= ? ", StringComparison.Ordinal);

    public bool Names(string path) => Text.Contains(path, StringComparison.Ordinal);
}

/// <summary>Runs a program under strace, which may make one call fail or kill the process at it.</summary>
/// <param name="log">Where strace writes.</param>
/// <param name="opens">Whether opens are told too: at its start the runtime opens hundreds of files.</param>
public sealed partial class Tracer(string log, bool opens = false)
{
    /// <summary>What changes files or makes them durable. The runtime writes files by pwrite64; write is for terminals and pipes.</summary>
    private const string Changes = "pwrite64,fsync,fdatasync,syncfs,ftruncate,rename,renameat,renameat2,unlink,unlinkat,mkdir";

    /// <param name="injection">As <c>fsync:error=EIO:when=3</c> or <c>fsync:signal=KILL:when=3</c>, or null to look on.</param>
    public IEnumerable<string> Words(string? injection) =>
    [
        // Where the kernel stops the program at chosen calls only, it takes no signal there, and strace says nothing of that.
        "strace", "-f", .. injection?.Contains("signal=", StringComparison.Ordinal) == true ? Array.Empty<string>() : ["--seccomp-bpf"], "-y", "-s", "300", "-e", $"trace={(opens ? "openat," : "")}{Changes}", .. injection is null ? [] : new[] { "-e", $"inject={injection}" }, "-o", log,
    ];

    /// <summary>The calls in the order in which they began.</summary>
    public IReadOnlyList<TracedCall> Read()
    {
        var calls = new List<TracedCall>();
        var cut = new Dictionary<string, int>(StringComparer.Ordinal);
        foreach (var (line, at) in File.ReadLines(log).Select((line, at) => (line, at)))
        {
            if (Begins().Match(line) is { Success: true } begins)
            {
                var isCut = line.EndsWith("<unfinished ...>", StringComparison.Ordinal);
                calls.Add(new TracedCall(begins.Groups["thread"].Value, begins.Groups["name"].Value, line, at, isCut ? int.MaxValue : at));
                if (isCut)
                {
                    cut[begins.Groups["thread"].Value] = calls.Count - 1;
                }
            }
            else if (Resumes().Match(line) is { Success: true } resumes && cut.Remove(resumes.Groups["thread"].Value, out var index))
            {
                calls[index] = calls[index] with { Text = calls[index].Text + resumes.Groups["rest"].Value, Over = at };
            }
        }

        return calls;
    }

    [GeneratedRegex("^(?<thread>[0-9]+) +(?<name>[a-z0-9_]+)\\(", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 1000)]
    private static partial Regex Begins();

    [GeneratedRegex("^(?<thread>[0-9]+) +<\\.\\.\\. [a-z0-9_]+ resumed>(?<rest>.*)$", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 1000)]
    private static partial Regex Resumes();
}
