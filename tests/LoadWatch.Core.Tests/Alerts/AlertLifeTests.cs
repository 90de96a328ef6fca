using LoadWatch.Alerts;

namespace LoadWatch.Tests.Alerts;

public class AlertLifeTests
{
    private static readonly Dictionary<(AlertState From, AlertSignal Signal), AlertStep> Steps = new()
    {
        [(AlertState.Normal, AlertSignal.Raise)] = new(AlertState.Unacknowledged, AlertChangeReason.Raised),
        [(AlertState.Unacknowledged, AlertSignal.Acknowledge)] = new(AlertState.Acknowledged, AlertChangeReason.Acknowledged),
        [(AlertState.Unacknowledged, AlertSignal.Return)] = new(AlertState.Returned, AlertChangeReason.ReturnedToNormal),
        [(AlertState.Unacknowledged, AlertSignal.Correct)] = new(AlertState.Returned, AlertChangeReason.Corrected),
        [(AlertState.Unacknowledged, AlertSignal.SeverityRise)] = new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose),
        [(AlertState.Unacknowledged, AlertSignal.SeverityFall)] = new(AlertState.Unacknowledged, AlertChangeReason.SeverityFell),
        [(AlertState.Acknowledged, AlertSignal.Return)] = new(AlertState.Normal, AlertChangeReason.ReturnedToNormal),
        [(AlertState.Acknowledged, AlertSignal.Correct)] = new(AlertState.Normal, AlertChangeReason.Corrected),
        [(AlertState.Acknowledged, AlertSignal.SeverityRise)] = new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose),
        [(AlertState.Acknowledged, AlertSignal.SeverityFall)] = new(AlertState.Acknowledged, AlertChangeReason.SeverityFell),
        [(AlertState.Returned, AlertSignal.Raise)] = new(AlertState.Unacknowledged, AlertChangeReason.RaisedAgain),
        [(AlertState.Returned, AlertSignal.Acknowledge)] = new(AlertState.Normal, AlertChangeReason.Acknowledged),
    };

    [Fact]
    public void TheTableIsThisAndNothingElse()
    {
        foreach (var state in Enum.GetValues<AlertState>())
        {
            foreach (var signal in Enum.GetValues<AlertSignal>())
            {
                AlertStep? expected = Steps.TryGetValue((state, signal), out var step) ? step : null;
                Assert.Equal((state, signal, expected), (state, signal, AlertLife.Next(state, signal)));
            }
        }
    }

    /// <summary>
    /// The columns Active and Acked of OPC 10000-9 (OPC UA Part 9), Table B.1, events 1 to 8. There is no confirming here, so events 4 and 8
    /// (confirmed) change nothing, and the column Retain, which also counts what is not yet confirmed, is compared where Confirmed is true.
    /// </summary>
    [Fact]
    public void FollowsThePublishedSequence()
    {
        (AlertSignal? Signal, bool Active, bool Acked, bool? Retain)[] rows =
        [
            (null, false, true, false),
            (AlertSignal.Raise, true, false, true),
            (AlertSignal.Acknowledge, true, true, null),
            (AlertSignal.Return, false, true, null),
            (null, false, true, false),
            (AlertSignal.Raise, true, false, true),
            (AlertSignal.Return, false, false, true),
            (AlertSignal.Acknowledge, false, true, null),
            (null, false, true, false),
        ];
        var state = AlertState.Normal;
        foreach (var (signal, active, acked, retain) in rows)
        {
            state = signal is { } known ? AlertLife.Next(state, known)!.Value.To : state;
            Assert.Equal((active, acked), (AlertLife.IsActive(state), AlertLife.IsAcknowledged(state)));
            Assert.Equal(retain ?? state != AlertState.Normal, AlertLife.IsActive(state) || !AlertLife.IsAcknowledged(state));
        }
    }

    [Fact]
    public void OnlyWhatChangesTheStateOrTheSeverityIsAStep()
    {
        var still = Steps.Where(step => step.Key.From == step.Value.To).Select(step => step.Value.Reason);

        Assert.All(still, reason => Assert.Contains(reason, new[] { AlertChangeReason.SeverityRose, AlertChangeReason.SeverityFell }));
    }
}
