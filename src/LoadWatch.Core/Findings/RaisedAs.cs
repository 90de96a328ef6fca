namespace LoadWatch.Findings;

/// <summary>As what a rule with one level raises its findings.</summary>
public enum RaisedAs
{
    Notice,
    Warning,
}
