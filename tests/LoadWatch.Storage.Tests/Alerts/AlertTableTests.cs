using Dapper;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Dialects;
using Microsoft.Data.Sqlite;

namespace LoadWatch.Storage.Tests.Alerts;

public sealed class AlertTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void AnAlertIsReadAsItWasWritten()
    {
        var ofRegion = Some.Alert() with { Key = new FindingKey("anna", "stimulus_gap", BodyRegion.Legs) };
        Store.Write(session =>
        {
            session.Alerts.Put(ofRegion);
            session.Alerts.Put(Some.Alert());
        });

        Assert.Equal([Some.Alert(), ofRegion], Store.Read(session => session.Alerts.All("anna")));
        Assert.Equal(ofRegion, Store.Read(session => session.Alerts.Get(ofRegion.Id)));
    }

    [Fact]
    public void AnAlertPutAgainReplacesTheFirst()
    {
        var changed = Some.Alert() with
        {
            State = AlertState.Acknowledged,
            Judged = Some.Date.PlusDays(9),
            Severity = Severity.Warning,
            Text = "higher",
            ShelvedUntil = Some.Date.PlusDays(20),
            StandsSince = Some.Date.PlusDays(8),
        };
        Store.Write(session => session.Alerts.Put(Some.Alert()));
        Store.Write(session => session.Alerts.Put(changed));

        Assert.Equal(changed, Assert.Single(Store.Read(session => session.Alerts.All())));
    }

    /// <summary>What was stored before alerts held the date: the last change that raised it, or the first date where no change is stored.</summary>
    [Fact]
    public void AnOlderStoreIsToldSinceWhenItsAlertsStand()
    {
        Store.Write(session =>
        {
            session.Alerts.Put(Some.Alert());
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1));
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 2) with { Date = Some.Date.PlusDays(90), Reason = AlertChangeReason.RaisedAgain });
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 3) with { Date = Some.Date.PlusDays(95), Reason = AlertChangeReason.Acknowledged });
            session.Alerts.Put(Some.Alert("bo") with { StandsSince = Some.Date.PlusDays(50) });
        });
        using var script = new StreamReader(typeof(Store).Assembly.GetManifestResourceStream(SqliteSchema.Scripts.Single(name => name.EndsWith("0015_alert_since.sql", StringComparison.Ordinal)))!);
        using (var connection = new SqliteConnection($"Data Source={Folder.DatabasePath};Pooling=False"))
        {
            connection.Open();
            connection.Execute(script.ReadToEnd().Split("\n;\n")[1]);
        }

        Assert.Equal([Some.Date.PlusDays(90), Some.Date], Store.Read(session => session.Alerts.All()).Select(alert => alert.StandsSince));
    }

    [Fact]
    public void OnlyAlertsThatAreNotNormalAreOpen()
    {
        Store.Write(session =>
        {
            session.Alerts.Put(Some.Alert() with { State = AlertState.Normal });
            session.Alerts.Put(Some.Alert() with { State = AlertState.Returned, Raised = Some.Date.PlusDays(5) });
            session.Alerts.Put(Some.Alert("bo"));
        });

        Assert.Equal(AlertState.Returned, Assert.Single(Store.Read(session => session.Alerts.Open("anna"))).State);
        Assert.Equal(3, Store.Read(session => session.Alerts.All()).Count);
    }

    [Fact]
    public void AChangeIsReadAsItWasWrittenWithItsEvidence()
    {
        var bare = Some.Change(Some.Alert(), 2) with { Evidence = null, Reason = AlertChangeReason.Corrected, From = AlertState.Returned };
        Store.Write(session =>
        {
            session.Alerts.Put(Some.Alert());
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1));
            session.Alerts.Changes.Append(bare);
        });

        var read = Store.Read(session => session.Alerts.Changes.Of(Some.Alert().Id));

        Assert.Equal(Some.Change(Some.Alert(), 1) with { Evidence = null }, read[0] with { Evidence = null });
        Assert.Equal(Some.Evidence.Inputs, read[0].Evidence!.Inputs);
        Assert.Equal(bare, read[1]);
    }

    [Fact]
    public void ChangesOfAnAlertAreNumberedFromOne()
    {
        Assert.Equal(1, Store.Read(session => session.Alerts.Changes.NextSequence(Some.Alert().Id)));
        Store.Write(session =>
        {
            session.Alerts.Put(Some.Alert());
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1));
        });

        Assert.Equal(2, Store.Read(session => session.Alerts.Changes.NextSequence(Some.Alert().Id)));
        Assert.Throws<SqliteException>(() => Store.Write(session => session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1))));
    }

    [Fact]
    public void ABriefSeesTheChangesOfAllAlertsBehindItsPosition()
    {
        Assert.Equal(0, Store.Read(session => session.Alerts.Changes.LastPosition()));
        Store.Write(session =>
        {
            session.Alerts.Put(Some.Alert("bo"));
            session.Alerts.Changes.Append(Some.Change(Some.Alert("bo"), 1));
        });
        var told = Store.Read(session => session.Alerts.Changes.LastPosition());
        Store.Write(session =>
        {
            session.Alerts.Put(Some.Alert());
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1));
            session.Alerts.Changes.Append(Some.Change(Some.Alert("bo"), 2));
        });

        var news = Store.Read(session => session.Alerts.Changes.Since(told));

        Assert.Equal([(Some.Alert().Id, 1), (Some.Alert("bo").Id, 2)], news.Select(change => (change.AlertId, change.Sequence)));
        Assert.Equal(3, Store.Read(session => session.Alerts.Changes.Since(0)).Count);
        Assert.Equal(3, Store.Read(session => session.Alerts.Changes.LastPosition()));
    }

    [Fact]
    public void AChangeOfNoAlertIsAnError() =>
        Assert.Throws<SqliteException>(() => Store.Write(session => session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1))));
}
