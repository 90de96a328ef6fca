using CsCheck;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Storage.Files;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Storage.Tests.Alerts;

/// <summary>
/// The life of one alert in a real store against a model that knows only facts: does it hold, was it seen, until when is it shelved, is its rule watched. Any steps in any
/// order, each of them cut off before its commit at times and done again, the store closed and opened at times.
/// </summary>
public sealed class AlertModelTests : IDisposable
{
    private static readonly FindingKey Key = new("anna", "stimulus_gap", BodyRegion.Legs);

    private static readonly Gen<Step> AnyStep = Gen.Select(Gen.Enum<StepKind>(), Gen.Bool, Gen.Int[0, 3], Gen.Bool, Gen.Bool, (kind, warning, days, crash, reopen) => new Step(kind, warning, days, crash, reopen && crash));

    private readonly TemporaryFolder folder = new();

    [Fact]
    public void TheStoreHoldsWhatTheModelSaysAfterEveryStepWhateverIsCutOff() => AnyStep.List[1, 60].Sample(
        steps =>
        {
            var model = new Model();
            using var life = new StoredLife(folder.Path);
            foreach (var step in steps)
            {
                model.Take(step);
                life.Take(step);
                Assert.Equal(model.Seen, life.Seen);
            }

            life.AssertHistory();
        },
        iter: 30,
        threads: 1);

    public void Dispose() => folder.Dispose();

    public enum StepKind
    {
        NightWithFinding,
        NightWithout,
        NightCorrected,
        NightSuppressed,
        NightMuted,
        NightRuleOff,
        NightOtherLimits,
        Acknowledge,
        Shelve,
        Unshelve,
    }

    /// <param name="Days">Of a shelving, beyond the day.</param>
    /// <param name="Crash">The first try ends before its commit.</param>
    /// <param name="Reopen">The store is closed and opened in between.</param>
    public sealed record Step(StepKind Kind, bool Warning, int Days, bool Crash, bool Reopen);

    /// <summary>What can be seen of the alert.</summary>
    public sealed record View(bool Active, bool Acknowledged, AlertWatch Watch, LocalDate? ShelvedUntil, bool? Warning);

    private sealed class Model
    {
        private LocalDate date = Some.Date;
        private bool active;
        private bool acked = true;
        private bool suppressed;
        private bool outOfService;
        private bool warning;
        private bool known;
        private LocalDate? shelved;

        public View Seen => new(active, acked, outOfService ? AlertWatch.OutOfService : suppressed ? AlertWatch.SuppressedByDesign : AlertWatch.Watched, shelved, known ? warning : null);

        public void Take(Step step)
        {
            switch (step.Kind)
            {
                case StepKind.NightWithFinding:
                    Night();
                    var rises = active && step.Warning && !warning;
                    shelved = active && (date >= shelved || rises) ? null : shelved;
                    acked = active && acked && !rises;
                    (active, known, warning, suppressed, outOfService) = (true, true, step.Warning, false, false);
                    break;
                case StepKind.NightSuppressed:
                    Night();
                    suppressed = active || suppressed;
                    break;
                case StepKind.NightMuted:
                    Night();
                    (suppressed, acked) = (active || suppressed, active || acked);
                    End();
                    break;
                case StepKind.NightRuleOff:
                    Night();
                    outOfService = active || !acked || outOfService;
                    (suppressed, acked) = (suppressed && !outOfService, true);
                    End();
                    break;
                case StepKind.NightWithout or StepKind.NightCorrected or StepKind.NightOtherLimits:
                    Night();

                    // What stood suppressed was seen to end by nobody, and asks nobody to have seen it.
                    acked = acked || (active && suppressed);
                    End();
                    break;
                case StepKind.Acknowledge:
                    acked = true;
                    break;
                case StepKind.Shelve when active:
                    shelved = date.PlusDays(step.Days);
                    break;
                case StepKind.Unshelve:
                    shelved = null;
                    break;
                default:
                    break;
            }
        }

        private void Night() => date = date.PlusDays(1);

        private void End()
        {
            (active, shelved) = (false, null);
        }
    }

    private sealed class StoredLife : IDisposable
    {
        private static readonly RuleLimits Usual = new();

        private readonly DataFolder place;
        private Store store;
        private LocalDate date = Some.Date;

        public StoredLife(string parent)
        {
            place = DataFolder.Open(Path.Combine(parent, Guid.NewGuid().ToString("N")));
            store = Store.Open(place);
        }

        /// <summary>The newest alert: an earlier one is over for good once another was raised.</summary>
        public View Seen => store.Read(session => session.Alerts.All("anna").MaxBy(alert => alert.Raised)) is { } alert
            ? new View(AlertLife.IsActive(alert.State), AlertLife.IsAcknowledged(alert.State), alert.Watch, alert.ShelvedUntil, alert.Severity == Severity.Warning)
            : new View(false, true, AlertWatch.Watched, null, null);

        public void Take(Step step)
        {
            date = step.Kind < StepKind.Acknowledge ? date.PlusDays(1) : date;
            if (step.Crash)
            {
                Assert.Throws<CutOffException>(() => store.Write(session =>
                {
                    Do(session, step);
                    throw new CutOffException();
                }));
            }

            if (step.Reopen)
            {
                store.Dispose();
                store = Store.Open(place);
            }

            store.Write(session => Do(session, step));
            if (step.Kind < StepKind.Acknowledge)
            {
                var before = Changes();
                store.Write(session => Do(session, step));
                Assert.Equal(before, Changes());
            }
        }

        /// <summary>Each alert's changes are numbered without a gap, and each begins where the one before it ended.</summary>
        public void AssertHistory() => store.Read(session =>
        {
            foreach (var alert in session.Alerts.All())
            {
                var changes = session.Alerts.Changes.Of(alert.Id);
                Assert.Equal(Enumerable.Range(1, changes.Count), changes.Select(change => change.Sequence));
                Assert.Equal(changes.Select(change => change.To), changes.Skip(1).Select(change => change.From).Append(alert.State));
                Assert.Equal(AlertState.Normal, changes[0].From);
            }

            return 0;
        });

        public void Dispose() => store.Dispose();

        private int Changes() => store.Read(session => session.Alerts.Changes.Since(0).Count);

        private void Do(StoreSession session, Step step)
        {
            int Last(string id) => session.Alerts.Changes.NextSequence(id) - 1;
            var open = session.Alerts.Open("anna");
            var result = step.Kind switch
            {
                StepKind.Acknowledge => All(open, alert => AlertReview.Acknowledge(alert, date, Last)),
                StepKind.Shelve => All(open, alert => AlertReview.Shelve(alert, date.PlusDays(step.Days), date, Last)),
                StepKind.Unshelve => All(open, alert => AlertReview.Unshelve(alert, date, Last)),
                _ => AlertReview.Review("anna", date, open, Last, Findings(step), (_, _) => step.Kind == StepKind.NightWithout, Watching(step.Kind)),
            };
            foreach (var alert in result.Alerts)
            {
                session.Alerts.Put(alert);
            }

            foreach (var change in result.Changes)
            {
                session.Alerts.Changes.Append(change);
            }
        }

        private static AlertReviewResult All(IReadOnlyList<Alert> alerts, Func<Alert, AlertReviewResult> act)
        {
            var results = alerts.Select(act).ToList();
            return new([.. results.SelectMany(result => result.Alerts)], [.. results.SelectMany(result => result.Changes)]);
        }

        private List<Finding> Findings(Step step) => step.Kind switch
        {
            StepKind.NightWithFinding => [Finding(step.Warning ? Severity.Warning : Severity.Notice)],
            StepKind.NightSuppressed => [Finding(Severity.Suppressed)],
            _ => [],
        };

        private Finding Finding(Severity severity) =>
            new("anna", date, Key.Rule, Key.Region, severity, date, 10, 10, "days", "no heavy leg work", Some.Evidence);

        private static Watching Watching(StepKind kind) => kind switch
        {
            StepKind.NightMuted or StepKind.NightSuppressed => new(Usual, DayPlan.None with { Absence = AbsenceWord.Away }),
            StepKind.NightRuleOff => new(Usual with { StimulusGap = new() { Enabled = false } }, DayPlan.None),
            StepKind.NightOtherLimits => new(Usual with { StimulusGap = new() { NoticeDays = 9 } }, DayPlan.None),
            _ => new(Usual, DayPlan.None),
        };
    }

    private sealed class CutOffException : Exception;
}
