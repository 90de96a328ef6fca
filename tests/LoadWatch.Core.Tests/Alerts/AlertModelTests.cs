using CsCheck;
using LoadWatch.Alerts;
using NodaTime;

namespace LoadWatch.Tests.Alerts;

/// <summary>The life of one alert in memory against a model that knows only facts, over many histories; in a real store, over fewer, in the tests of storage.</summary>
public class AlertModelTests
{
    [Fact]
    public void TheTableHoldsWhatTheModelSaysAfterEveryStep() => LifeModel.AnyStep.List[1, 60].Sample(
        steps =>
        {
            var model = new LifeModel(new LocalDate(2026, 3, 1));
            var life = new Life(new LocalDate(2026, 3, 1));
            foreach (var step in steps)
            {
                model.Take(step);
                life.Take(step);
                Assert.Equal(model.Seen, life.Seen);
            }
        },
        iter: 20_000);

    private sealed class Life(LocalDate first)
    {
        private readonly Dictionary<string, Alert> alerts = new(StringComparer.Ordinal);
        private readonly Dictionary<string, List<AlertChange>> changes = new(StringComparer.Ordinal);
        private LocalDate date = first;

        public LifeView Seen => LifeView.Of(alerts.Values, id => changes[id][^1].Reason);

        /// <summary>A step that is cut off leaves nothing; a night that is judged twice changes nothing.</summary>
        public void Take(LifeStep step)
        {
            date = step.IsNight ? date.PlusDays(1) : date;
            if (step.Crash)
            {
                Do(step);
            }

            Keep(Do(step));
            if (step.IsNight)
            {
                Assert.Empty(Do(step).Changes);
            }
        }

        private AlertReviewResult Do(LifeStep step) =>
            step.Do([.. alerts.Values.Where(alert => alert.State != AlertState.Normal)], date, id => changes.GetValueOrDefault(id)?.Count ?? 0);

        private void Keep(AlertReviewResult result)
        {
            foreach (var alert in result.Alerts)
            {
                alerts[alert.Id] = alert;
            }

            foreach (var change in result.Changes)
            {
                if (!changes.TryGetValue(change.AlertId, out var before))
                {
                    changes[change.AlertId] = before = [];
                }

                Assert.Equal((before.Count + 1, before.Count == 0 ? AlertState.Normal : before[^1].To), (change.Sequence, change.From));
                before.Add(change);
            }
        }
    }
}
