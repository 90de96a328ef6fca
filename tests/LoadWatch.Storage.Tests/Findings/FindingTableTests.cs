using LoadWatch.Findings;
using LoadWatch.Stimulus;

namespace LoadWatch.Storage.Tests.Findings;

public sealed class FindingTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly Evidence None = new("", "", []);

    [Fact]
    public void AFindingIsReadAsItWasWrittenWithItsEvidence()
    {
        var ofLegs = Some.Finding(Some.Date);
        Finding[] written = [ofLegs, ofLegs with { Rule = "load_ratio", Region = null, Severity = Severity.Notice }];
        Store.Write(session => session.Findings.Replace("anna", Some.Date, written));

        var read = Store.Read(session => session.Findings.OfPerson("anna"));

        Assert.Equal([written[1] with { Evidence = None }, written[0] with { Evidence = None }], read.Select(one => one with { Evidence = None }));
        Assert.All(read, one => Assert.Equal((Some.Evidence.Formula, Some.Evidence.Source), (one.Evidence.Formula, one.Evidence.Source)));
        Assert.All(read, one => Assert.Equal(Some.Evidence.Inputs, one.Evidence.Inputs));
    }

    [Fact]
    public void FindingsFromADateOnAreReplaced()
    {
        Store.Write(session => session.Findings.Replace("anna", Some.Date, [Some.Finding(Some.Date), Some.Finding(Some.Date.PlusDays(1))]));

        Store.Write(session => session.Findings.Replace("anna", Some.Date.PlusDays(1), []));

        Assert.Equal(Some.Date, Assert.Single(Store.Read(session => session.Findings.OfPerson("anna"))).Date);
    }

    [Fact]
    public void AFindingHoldsOnItsDateForItsPersonRuleAndRegionOnly()
    {
        Store.Write(session => session.Findings.Replace("anna", Some.Date, [Some.Finding(Some.Date)]));
        var key = Some.Finding(Some.Date).Key;

        Store.Read(session =>
        {
            Assert.True(session.Findings.Held(key, Some.Date));
            Assert.False(session.Findings.Held(key, Some.Date.PlusDays(1)));
            Assert.False(session.Findings.Held(key with { Region = BodyRegion.Arms }, Some.Date));
            Assert.False(session.Findings.Held(key with { Region = null }, Some.Date));
            Assert.False(session.Findings.Held(key with { Person = "bo" }, Some.Date));
            return true;
        });
    }

    [Fact]
    public void ANoteDoesNotHold()
    {
        Store.Write(session => session.Findings.Replace("anna", Some.Date, [Some.Finding(Some.Date) with { Severity = Severity.Note }]));

        Assert.False(Store.Read(session => session.Findings.Held(Some.Finding(Some.Date).Key, Some.Date)));
        Assert.Equal(Severity.Note, Assert.Single(Store.Read(session => session.Findings.OfPerson("anna"))).Severity);
    }

    [Fact]
    public void AFindingOfSomebodyElseIsRefused() =>
        Assert.Throws<ArgumentException>(() => Store.Write(session => session.Findings.Replace("bo", Some.Date, [Some.Finding(Some.Date)])));

    [Fact]
    public void ADateIsEvaluatedOnceUnderOneConfiguration()
    {
        Assert.Null(Store.Read(session => session.Evaluations.LastDate("anna")));

        Assert.True(Store.Write(session => session.Evaluations.Add("anna", Some.Date, "one")));
        Assert.False(Store.Write(session => session.Evaluations.Add("anna", Some.Date, "two")));
        Assert.True(Store.Write(session => session.Evaluations.Add("anna", Some.Date.PlusDays(-1), "one")));

        Assert.Equal(Some.Date, Store.Read(session => session.Evaluations.LastDate("anna")));
        Assert.Null(Store.Read(session => session.Evaluations.LastDate("bo")));
    }
}
