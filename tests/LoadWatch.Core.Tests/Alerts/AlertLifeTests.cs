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
        [(AlertState.Unacknowledged, AlertSignal.ChangeLimits)] = new(AlertState.Returned, AlertChangeReason.LimitsChanged),
        [(AlertState.Unacknowledged, AlertSignal.SeverityRise)] = new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose),
        [(AlertState.Unacknowledged, AlertSignal.SeverityFall)] = new(AlertState.Unacknowledged, AlertChangeReason.SeverityFell),
        [(AlertState.Unacknowledged, AlertSignal.Suppress)] = Suppressed(AlertState.Unacknowledged),
        [(AlertState.Unacknowledged, AlertSignal.Mute)] = Suppressed(AlertState.Normal),
        [(AlertState.Unacknowledged, AlertSignal.TakeOut)] = OutOfService,
        [(AlertState.Acknowledged, AlertSignal.Return)] = new(AlertState.Normal, AlertChangeReason.ReturnedToNormal),
        [(AlertState.Acknowledged, AlertSignal.Correct)] = new(AlertState.Normal, AlertChangeReason.Corrected),
        [(AlertState.Acknowledged, AlertSignal.ChangeLimits)] = new(AlertState.Normal, AlertChangeReason.LimitsChanged),
        [(AlertState.Acknowledged, AlertSignal.SeverityRise)] = new(AlertState.Unacknowledged, AlertChangeReason.SeverityRose),
        [(AlertState.Acknowledged, AlertSignal.SeverityFall)] = new(AlertState.Acknowledged, AlertChangeReason.SeverityFell),
        [(AlertState.Acknowledged, AlertSignal.Suppress)] = Suppressed(AlertState.Acknowledged),
        [(AlertState.Acknowledged, AlertSignal.Mute)] = Suppressed(AlertState.Normal),
        [(AlertState.Acknowledged, AlertSignal.TakeOut)] = OutOfService,
        [(AlertState.Returned, AlertSignal.Raise)] = new(AlertState.Unacknowledged, AlertChangeReason.RaisedAgain),
        [(AlertState.Returned, AlertSignal.Acknowledge)] = new(AlertState.Normal, AlertChangeReason.Acknowledged),
        [(AlertState.Returned, AlertSignal.TakeOut)] = OutOfService,
    };

    private static AlertStep OutOfService => new(AlertState.Normal, AlertChangeReason.RuleSwitchedOff) { Watch = AlertWatch.OutOfService };

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

    /// <summary>What is suppressed is not suppressed again; it resumes; what people say of it changes no more than it says; all else is as if it were watched.</summary>
    [Fact]
    public void BesideASuppressionTheTableIsTheSameButForThese()
    {
        foreach (var state in Enum.GetValues<AlertState>())
        {
            foreach (var signal in Enum.GetValues<AlertSignal>())
            {
                var watched = AlertLife.Next(state, signal);
                AlertStep? expected = (AlertLife.IsActive(state), signal) switch
                {
                    (true, AlertSignal.Suppress) => null,
                    (true, AlertSignal.Resume) => new AlertStep(state, AlertChangeReason.WatchedAgain),
                    (true, AlertSignal.Acknowledge or AlertSignal.SeverityRise or AlertSignal.SeverityFall) when watched is { } step => step with { Watch = AlertWatch.SuppressedByDesign },
                    _ => watched,
                };
                Assert.Equal((state, signal, expected), (state, signal, AlertLife.Next(state, AlertWatch.SuppressedByDesign, signal)));
            }
        }
    }

    /// <summary>
    /// OPC 10000-9 (OPC UA Part 9), Table B.1, whole. Confirming is no part of this life: the test keeps it beside, by that standard's rule that an acknowledgement
    /// waits to be confirmed, and counts Retain by its rule: active, or not acknowledged, or not confirmed.
    /// </summary>
    [Fact]
    public void FollowsThePublishedSequence()
    {
        (int Event, AlertSignal? Signal, bool Active, bool Acked, bool Confirmed, bool Retain)[] rows =
        [
            (0, null, false, true, true, false),
            (1, AlertSignal.Raise, true, false, true, true),
            (2, AlertSignal.Acknowledge, true, true, false, true),
            (3, AlertSignal.Return, false, true, false, true),
            (4, null, false, true, true, false),
            (5, AlertSignal.Raise, true, false, true, true),
            (6, AlertSignal.Return, false, false, true, true),
            (7, AlertSignal.Acknowledge, false, true, false, true),
            (8, null, false, true, true, false),
        ];
        var (state, confirmed) = (AlertState.Normal, true);
        foreach (var row in rows)
        {
            if (row.Signal is { } signal)
            {
                state = AlertLife.Next(state, signal)!.Value.To;
                confirmed = signal == AlertSignal.Acknowledge ? false : confirmed;
            }
            else
            {
                confirmed = true;
            }

            var (active, acked) = (AlertLife.IsActive(state), AlertLife.IsAcknowledged(state));
            Assert.Equal(row, (row.Event, row.Signal, active, acked, confirmed, active || !acked || !confirmed));
        }
    }

    [Fact]
    public void OnlyWhatChangesTheStateTheSeverityOrTheWatchIsAStep()
    {
        var still = Steps.Where(step => step.Key.From == step.Value.To && step.Value.Watch == AlertWatch.Watched).Select(step => step.Value.Reason);

        Assert.All(still, reason => Assert.Contains(reason, new[] { AlertChangeReason.SeverityRose, AlertChangeReason.SeverityFell }));
    }

    /// <summary>Whoever is told that something is over reads why; each reason belongs to one signal, but for the two ways of a suppression.</summary>
    [Fact]
    public void EveryReasonTellsItsSignal()
    {
        var signals = Steps.ToLookup(step => step.Value.Reason, step => step.Key.Signal);

        Assert.All(signals, reason => Assert.Equal(
            reason.Key == AlertChangeReason.SuppressedByPlan ? [AlertSignal.Suppress, AlertSignal.Mute] : reason.Take(1), reason.Distinct()));
    }

    private static AlertStep Suppressed(AlertState to) => new(to, AlertChangeReason.SuppressedByPlan) { Watch = AlertWatch.SuppressedByDesign };
}
