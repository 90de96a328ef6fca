namespace LoadWatch.Alerts;

/// <summary>Whether an alert is watched, after IEC 62682 / ISA-18.2; shelving, which people do, stands beside it.</summary>
public enum AlertWatch
{
    Watched,

    /// <summary>Plan or answers turn its rule off for a while: it is not told, and goes on or ends when they no longer do.</summary>
    SuppressedByDesign,

    /// <summary>Its rule is switched off by the limits in force.</summary>
    OutOfService,
}
