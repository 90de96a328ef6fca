using CsCheck;
using LoadWatch.Alerts;
using LoadWatch.Storage.Files;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Storage.Tests.Alerts;

/// <summary>
/// The life of one alert in a real store against a model that knows only facts. Any steps in any order, each of them cut off before its commit at times and done again,
/// the store closed and opened at times.
/// </summary>
public sealed class AlertModelTests : IDisposable
{
    private readonly TemporaryFolder folder = new();

    [Fact]
    public void TheStoreHoldsWhatTheModelSaysAfterEveryStepWhateverIsCutOff() => LifeModel.AnyStep.List[1, 60].Sample(
        steps =>
        {
            var model = new LifeModel(Some.Date);
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

    private sealed class StoredLife : IDisposable
    {
        private readonly DataFolder place;
        private Store store;
        private LocalDate date = Some.Date;

        public StoredLife(string parent)
        {
            place = DataFolder.Open(Path.Combine(parent, Guid.NewGuid().ToString("N")));
            store = Store.Open(place);
        }

        public LifeView Seen => store.Read(session => LifeView.Of(session.Alerts.All("anna"), id => session.Alerts.Changes.Of(id)[^1].Reason));

        public void Take(LifeStep step)
        {
            date = step.IsNight ? date.PlusDays(1) : date;
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
            if (step.IsNight)
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

        private void Do(StoreSession session, LifeStep step)
        {
            var result = step.Do(session.Alerts.Open("anna"), date, id => session.Alerts.Changes.NextSequence(id) - 1);
            foreach (var alert in result.Alerts)
            {
                session.Alerts.Put(alert);
            }

            foreach (var change in result.Changes)
            {
                session.Alerts.Changes.Append(change);
            }
        }
    }

    private sealed class CutOffException : Exception;
}
