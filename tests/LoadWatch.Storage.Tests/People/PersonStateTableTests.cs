using LoadWatch.Storage.People;
using NodaTime;

namespace LoadWatch.Storage.Tests.People;

public sealed class PersonStateTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void TheEarliestDateAskedForStays()
    {
        Mark("bo", 0);
        Mark("anna", 3);
        Mark("anna", 1);
        Mark("anna", 2);

        Assert.Equal(
            [("anna", Some.Date.PlusDays(1)), ("bo", Some.Date)],
            Dirty());
    }

    [Fact]
    public void AComputedPersonIsNotDirtyUntilMarkedAgain()
    {
        Assert.Null(Store.Read(session => session.People.ComputedTo("anna")));
        Mark("anna", 1);
        Assert.Null(Store.Read(session => session.People.ComputedTo("anna")));

        Store.Write(session => session.People.Computed("anna", Some.Date.PlusDays(9), session.People.Behind(Some.Date)[0].Marks));
        Assert.Empty(Dirty());

        Mark("anna", 5);
        Assert.Equal([("anna", Some.Date.PlusDays(5))], Dirty());
        Assert.Equal(Some.Date.PlusDays(9), Store.Read(session => session.People.ComputedTo("anna")));
    }

    [Fact]
    public void WhoIsMarkedWhileTheDaysAreComputedStaysDirty()
    {
        Mark("anna", 5);
        var marks = Store.Read(session => session.People.Behind(Some.Date))[0].Marks;
        Mark("anna", 7);

        Store.Write(session => session.People.Computed("anna", Some.Date.PlusDays(9), marks));

        Assert.Equal([("anna", Some.Date.PlusDays(5))], Dirty());
    }

    [Fact]
    public void WhoIsAskedForOrComputedNotFarEnoughIsBehind()
    {
        Store.Write(session => session.People.Computed("bo", Some.Date.PlusDays(8), marks: 0));
        Store.Write(session => session.People.Computed("cara", Some.Date.PlusDays(9), marks: 0));
        Mark("anna", 2);

        Assert.Equal(
            [new PersonBehind("anna", Some.Date.PlusDays(2), null, 1), new PersonBehind("bo", null, Some.Date.PlusDays(8), 0)],
            Store.Read(session => session.People.Behind(Some.Date.PlusDays(9))));
    }

    private List<(string Person, LocalDate From)> Dirty() =>
        [.. Store.Read(session => session.People.Behind(LocalDate.MinIsoValue)).Select(person => (person.Person, person.DirtyFrom!.Value))];

    private void Mark(string person, int offset) => Store.Write(session => session.People.MarkDirty(person, Some.Date.PlusDays(offset)));
}
