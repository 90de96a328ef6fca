// The life of an alert as a state table on two axes, active and acknowledged, after IEC 62682 and ANSI/ISA-18.2; checked against
// OPC 10000-9, Table B.1.
//                                active  acknowledged
//   Normal                       no      yes
//   Unacknowledged               yes     no
//   Acknowledged                 yes     yes
//   Returned                     no      no
// Departures, a choice: there is no confirming besides acknowledging; a rise in severity asks to be acknowledged again, since less was seen.
// Shelving stands beside the two axes (AlertReview): it changes no state, only whether the alert is told.
namespace LoadWatch.Alerts;

/// <summary>Where an alert goes, and why. Pure.</summary>
public static class AlertLife
{
    /// <summary>What the signal does in the state, or null where it changes nothing.</summary>
    public static AlertStep? Next(AlertState state, AlertSignal signal) => (state, signal) switch
    {
        (AlertState.Normal, AlertSignal.Raise) => new(AlertState.Unacknowledged, AlertChangeReason.Raised),
        (AlertState.Returned, AlertSignal.Raise) => new(AlertState.Unacknowledged, AlertChangeReason.RaisedAgain),

        (AlertState.Unacknowledged, AlertSignal.SeverityRise) => new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose),
        (AlertState.Acknowledged, AlertSignal.SeverityRise) => new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose),
        (AlertState.Unacknowledged, AlertSignal.SeverityFall) => new(AlertState.Unacknowledged, AlertChangeReason.SeverityFell),
        (AlertState.Acknowledged, AlertSignal.SeverityFall) => new(AlertState.Acknowledged, AlertChangeReason.SeverityFell),

        (AlertState.Unacknowledged, AlertSignal.Acknowledge) => new(AlertState.Acknowledged, AlertChangeReason.Acknowledged),
        (AlertState.Returned, AlertSignal.Acknowledge) => new(AlertState.Normal, AlertChangeReason.Acknowledged),

        (AlertState.Unacknowledged, AlertSignal.Return) => new(AlertState.Returned, AlertChangeReason.ReturnedToNormal),
        (AlertState.Acknowledged, AlertSignal.Return) => new(AlertState.Normal, AlertChangeReason.ReturnedToNormal),
        (AlertState.Unacknowledged, AlertSignal.Correct) => new(AlertState.Returned, AlertChangeReason.Corrected),
        (AlertState.Acknowledged, AlertSignal.Correct) => new(AlertState.Normal, AlertChangeReason.Corrected),
        _ => null,
    };

    /// <summary>Whether the finding holds.</summary>
    public static bool IsActive(AlertState state) => state is AlertState.Unacknowledged or AlertState.Acknowledged;

    /// <summary>Whether nobody has to confirm having seen it.</summary>
    public static bool IsAcknowledged(AlertState state) => state is AlertState.Normal or AlertState.Acknowledged;
}

/// <summary>One step of an alert's life.</summary>
public readonly record struct AlertStep(AlertState To, AlertChangeReason Reason);
