// The life of an alert as a state table on two axes, after IEC 62682 and ANSI/ISA-18.2; checked against OPC 10000-9, Table B.1.
//                                active  acknowledged
//   Normal                       no      yes
//   Unacknowledged               yes     no
//   Acknowledged                 yes     yes
//   Returned                     no      no
// and beside it whether it is watched: Watched, SuppressedByDesign (plan or answers turn its rule off for a while), OutOfService (its rule is off). Shelving
// by a person is a date beside both (AlertReview): it changes neither, only whether the alert is told.
// Departures, a choice: there is no confirming besides acknowledging; a rise in severity asks to be acknowledged again, since less was seen; nobody has to
// acknowledge what is not watched any more, so out of service, or suppressed without anything that would hold, an alert is over.
namespace LoadWatch.Alerts;

/// <summary>Where an alert goes, and why. Pure.</summary>
public static class AlertLife
{
    /// <summary>What the signal does to an alert that is watched, or null where it changes nothing.</summary>
    public static AlertStep? Next(AlertState state, AlertSignal signal) => Next(state, AlertWatch.Watched, signal);

    /// <summary>What the signal does, or null where it changes nothing.</summary>
    public static AlertStep? Next(AlertState state, AlertWatch watch, AlertSignal signal) => state switch
    {
        AlertState.Normal => signal == AlertSignal.Raise ? new(AlertState.Unacknowledged, AlertChangeReason.Raised) : null,
        AlertState.Returned => OfReturned(signal),
        _ => OfWatch(state, watch, signal) ?? OfActive(state, watch, signal),
    };

    /// <summary>Whether the finding holds.</summary>
    public static bool IsActive(AlertState state) => state is AlertState.Unacknowledged or AlertState.Acknowledged;

    /// <summary>Whether nobody has to confirm having seen it.</summary>
    public static bool IsAcknowledged(AlertState state) => state is AlertState.Normal or AlertState.Acknowledged;

    private static AlertStep? OfReturned(AlertSignal signal) => signal switch
    {
        AlertSignal.Raise => new(AlertState.Unacknowledged, AlertChangeReason.RaisedAgain),
        AlertSignal.Acknowledge => new(AlertState.Normal, AlertChangeReason.Acknowledged),
        AlertSignal.TakeOut => new(AlertState.Normal, AlertChangeReason.RuleSwitchedOff) { Watch = AlertWatch.OutOfService },
        _ => null,
    };

    private static AlertStep? OfWatch(AlertState state, AlertWatch watch, AlertSignal signal) => (watch, signal) switch
    {
        (_, AlertSignal.TakeOut) => new(AlertState.Normal, AlertChangeReason.RuleSwitchedOff) { Watch = AlertWatch.OutOfService },
        (_, AlertSignal.Mute) => new(AlertState.Normal, AlertChangeReason.SuppressedByPlan) { Watch = AlertWatch.SuppressedByDesign },
        (AlertWatch.Watched, AlertSignal.Suppress) => new(state, AlertChangeReason.SuppressedByPlan) { Watch = AlertWatch.SuppressedByDesign },
        (AlertWatch.SuppressedByDesign, AlertSignal.Resume) => new(state, AlertChangeReason.WatchedAgain),
        _ => null,
    };

    private static AlertStep? OfActive(AlertState state, AlertWatch watch, AlertSignal signal) => (state, signal) switch
    {
        (_, AlertSignal.SeverityRise) => new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose) { Watch = watch },
        (_, AlertSignal.SeverityFall) => new(state, AlertChangeReason.SeverityFell) { Watch = watch },
        (AlertState.Unacknowledged, AlertSignal.Acknowledge) => new(AlertState.Acknowledged, AlertChangeReason.Acknowledged) { Watch = watch },
        (_, AlertSignal.Return) => new(Over(state), AlertChangeReason.ReturnedToNormal),
        (_, AlertSignal.Correct) => new(Over(state), AlertChangeReason.Corrected),
        (_, AlertSignal.ChangeLimits) => new(Over(state), AlertChangeReason.LimitsChanged),
        _ => null,
    };

    private static AlertState Over(AlertState active) => active == AlertState.Acknowledged ? AlertState.Normal : AlertState.Returned;
}

/// <summary>One step of an alert's life.</summary>
public readonly record struct AlertStep(AlertState To, AlertChangeReason Reason)
{
    public AlertWatch Watch { get; init; } = AlertWatch.Watched;
}
