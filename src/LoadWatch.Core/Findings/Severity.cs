namespace LoadWatch.Findings;

/// <summary>How much a finding asks for. Training findings carry these two only; critical is kept for the service itself.</summary>
public enum Severity
{
    Notice,
    Warning,
}
