using System.Globalization;

namespace LoadWatch.Chaos;

/// <summary>The words of the command line: options may stand anywhere, the rest is read in order.</summary>
internal sealed class Words(string[] args)
{
    private static readonly string[] WithValue = ["--seed", "--binary"];

    private readonly Queue<string> rest = new(args.Where((word, at) => !word.StartsWith("--", StringComparison.Ordinal) && (at == 0 || !WithValue.Contains(args[at - 1], StringComparer.Ordinal))));

    public string? Next() => rest.TryDequeue(out var word) ? word : null;

    public IReadOnlyList<string> Rest() => [.. rest];

    public bool Has(string option) => args.Contains(option, StringComparer.Ordinal);

    public string? Value(string option) => Array.IndexOf(args, option) is >= 0 and var at && at + 1 < args.Length ? args[at + 1] : null;

    public int? Number(string option) => Value(option) is { } text ? int.Parse(text, CultureInfo.InvariantCulture) : null;
}
