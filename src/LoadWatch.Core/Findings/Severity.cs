namespace LoadWatch.Findings;

/// <summary>How much a finding asks for. Training findings carry these only; critical is kept for the service itself.</summary>
public enum Severity
{
    /// <summary>It would hold if plan or answers did not turn the rule off on the date (<see cref="PlanMutes"/>): shown as not watched, never an alert.</summary>
    Suppressed,

    /// <summary>Only a changed reference value makes the limit break: told, and no alert (I-15).</summary>
    Note,
    Notice,
    Warning,
}

/// <summary>As what a rule raises, as a severity.</summary>
internal static class RaisedAsWords
{
    public static Severity Severity(this RaisedAs level) => level == RaisedAs.Warning ? Findings.Severity.Warning : Findings.Severity.Notice;
}
