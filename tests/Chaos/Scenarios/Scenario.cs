namespace LoadWatch.Chaos.Scenarios;

/// <summary>What a scenario needs of the machine.</summary>
[Flags]
public enum Needs
{
    Nothing = 0,

    /// <summary>strace that may trace.</summary>
    Tracing = 1,

    /// <summary>unshare with a mount namespace: root.</summary>
    Mounting = 2,

    /// <summary>The library that lets a program see another time.</summary>
    Faking = 4,
}

/// <summary>One way to disturb the service.</summary>
/// <param name="Id">For the command line: lower-case words joined by hyphens.</param>
/// <param name="Faults">What it is about in the terms of the catalogue: a letter and number, as <c>A5</c> or <c>F86</c>.</param>
/// <param name="Sentence">What is done and what must come of it.</param>
/// <param name="Run">Does it, and throws <see cref="ChaosFailureException"/> where a promise does not hold.</param>
public sealed record Scenario(string Id, string Faults, string Sentence, Action<Trial> Run, Needs Needs = Needs.Nothing)
{
    /// <summary>What this machine lacks for it, or null.</summary>
    public string? Lacks =>
        Needs.HasFlag(Needs.Tracing) && !Processes.Tool.CanTrace ? "strace that may trace is not here"
        : Needs.HasFlag(Needs.Mounting) && !Processes.Tool.CanMount ? "a mount namespace of one's own is not to be had here"
        : Needs.HasFlag(Needs.Faking) && Processes.FakeTime.Library is null ? "libfaketime is not here"
        : !OperatingSystem.IsLinux() ? "this is not Linux"
        : null;
}
