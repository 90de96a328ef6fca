namespace LoadWatch.Rows;

/// <summary>What the rows of a table say. A table is read in place: a later version of it replaces, corrects and retracts its rows.</summary>
public enum RowKind
{
    /// <summary>A row per person and session, or drill of one: quantities, rating.</summary>
    Sessions,

    /// <summary>A row per set of strength work.</summary>
    Sets,

    /// <summary>A row per function test or reference value.</summary>
    Tests,

    /// <summary>A row per person and date: rest, illness, attendance.</summary>
    Days,

    /// <summary>A row per planned session or phase of a group or person.</summary>
    Plan,

    /// <summary>A row per answer of staff.</summary>
    Answers,
}
