
namespace LoadWatch.Service.Configuration;

/// <summary>The configuration cannot be used. Every fault found, each with file, line and what would be right.</summary>
public sealed class ConfigurationException(IReadOnlyList<ConfigurationFault> faults)
    : Exception(string.Join(Environment.NewLine, faults))
{
    public ConfigurationException(string file, string reason)
        : this([new ConfigurationFault(file, null, reason)])
    {
    }

    public IReadOnlyList<ConfigurationFault> Faults { get; } = faults;
}

/// <param name="Line">From 1, or null where the whole file is meant.</param>
public sealed record ConfigurationFault(string File, long? Line, string Reason)
{
    /// <summary><c>roster.csv:3: "juniors" is not a group; did you mean "junior"?</c></summary>
    public override string ToString() => OneLine.Of(Line is { } line ? $"{File}:{line}: {Reason}" : $"{File}: {Reason}");
}
