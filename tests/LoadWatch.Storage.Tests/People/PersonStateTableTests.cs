using LoadWatch.Storage.People;

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
            [new DirtyPerson("anna", Some.Date.PlusDays(1)), new DirtyPerson("bo", Some.Date)],
            Store.Read(session => session.People.Dirty()));
    }

    [Fact]
    public void AComputedPersonIsNotDirtyUntilMarkedAgain()
    {
        Assert.Null(Store.Read(session => session.People.ComputedTo("anna")));
        Mark("anna", 1);
        Assert.Null(Store.Read(session => session.People.ComputedTo("anna")));

        Store.Write(session => session.People.Computed("anna", Some.Date.PlusDays(9), session.People.Marks()["anna"]));
        Assert.Empty(Store.Read(session => session.People.Dirty()));

        Mark("anna", 5);
        Assert.Equal([new DirtyPerson("anna", Some.Date.PlusDays(5))], Store.Read(session => session.People.Dirty()));
        Assert.Equal(Some.Date.PlusDays(9), Store.Read(session => session.People.ComputedTo("anna")));
    }

    [Fact]
    public void WhoIsMarkedWhileTheDaysAreComputedStaysDirty()
    {
        Mark("anna", 5);
        var marks = Store.Read(session => session.People.Marks());
        Mark("anna", 7);

        Store.Write(session => session.People.Computed("anna", Some.Date.PlusDays(9), marks["anna"]));

        Assert.Equal([new DirtyPerson("anna", Some.Date.PlusDays(5))], Store.Read(session => session.People.Dirty()));
    }

    private void Mark(string person, int offset) => Store.Write(session => session.People.MarkDirty(person, Some.Date.PlusDays(offset)));
}
