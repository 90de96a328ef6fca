using LoadWatch.Storage.Audits;
using LoadWatch.Storage.Decisions;

namespace LoadWatch.Storage.Tests.Configurations;

public sealed class ConfigurationTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void AConfigurationThatComesBackIsTheLatestAgain()
    {
        Assert.Null(Store.Read(session => session.Configurations.LatestHash()));
        foreach (var hash in (string[])["one", "two", "two", "one"])
        {
            Store.Write(session => session.Configurations.Remember(hash, $"text of {hash}"));
        }

        Assert.Equal("one", Store.Read(session => session.Configurations.LatestHash()));
        Assert.Equal("text of two", Store.Read(session => session.Configurations.Text("two")));
        Assert.Null(Store.Read(session => session.Configurations.Text("three")));
    }

    [Fact]
    public void DerivedRowsKnowTheirConfiguration()
    {
        Assert.Null(Store.Read(session => session.Derived.ConfigHash()));

        Store.Write(session => session.Derived.SetConfigHash("one"));
        Store.Write(session => session.Derived.SetConfigHash("two"));

        Assert.Equal("two", Store.Read(session => session.Derived.ConfigHash()));
    }

    [Fact]
    public void EmptyingDeletesWhatIsDerivedAndKeepsWhatIsTrue()
    {
        AddRecording(1);
        Store.Write(session =>
        {
            session.Activities.Put(Some.Activity(1));
            session.Days.Replace("anna", Some.Date, [Some.Day(Some.Date)]);
            session.Findings.Replace("anna", Some.Date, [Some.Finding(Some.Date)]);
            session.People.MarkDirty("anna", Some.Date);
            session.Derived.SetConfigHash("one");
            session.Alerts.Put(Some.Alert());
            session.Alerts.Changes.Append(Some.Change(Some.Alert(), 1));
            session.Decisions.Add(new Decision(DecisionKind.Assign, Some.Sha(1), "anna", Some.Moment, By: null, Note: null));
            session.Notices.Add(Some.Notice("coach", Some.Date), 1, []);
            session.Evaluations.Add("anna", Some.Date, "one");
            session.Configurations.Remember("one", "text");
        });

        Store.Write(session => session.Derived.Empty());

        Store.Read(session =>
        {
            Assert.Empty(session.Recordings.All());
            Assert.Empty(session.Activities.All());
            Assert.Empty(session.Days.OfPerson("anna"));
            Assert.Empty(session.Findings.OfPerson("anna"));
            Assert.Empty(session.People.All());
            Assert.Null(session.Derived.ConfigHash());
            Assert.Single(session.Arrivals.All());
            Assert.Single(session.Alerts.All());
            Assert.Single(session.Alerts.Changes.Since(0));
            Assert.Single(session.Decisions.All());
            Assert.True(session.Notices.Exists("coach|brief|2026-03-01"));
            Assert.Equal(Some.Date, session.Evaluations.LastDate("anna"));
            Assert.Equal("one", session.Configurations.LatestHash());
            return true;
        });
    }

    [Fact]
    public void TheAuditKeepsItsOrder()
    {
        Store.Write(session => session.Audits.Add("rebuilt", "all", Some.Moment));
        Store.Write(session => session.Audits.Add("erased", "anna", Some.Moment));

        Assert.Equal(
            [new AuditEntry(1, Some.Moment, "rebuilt", "all"), new AuditEntry(2, Some.Moment, "erased", "anna")],
            Store.Read(session => session.Audits.All()));
    }
}
