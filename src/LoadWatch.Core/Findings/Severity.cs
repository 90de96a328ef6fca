namespace LoadWatch.Findings;

/// <summary>How much a finding asks for. Training findings carry these only; critical is kept for the service itself.</summary>
public enum Severity
{
    /// <summary>Only a changed reference value makes the limit break: told, and no alert (I-15).</summary>
    Note,
    Notice,
    Warning,
}
