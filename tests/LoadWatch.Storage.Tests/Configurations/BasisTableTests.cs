using LoadWatch.Storage.Configurations;

namespace LoadWatch.Storage.Tests.Configurations;

public sealed class BasisTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void PartsStandInPlaceOfThoseBefore()
    {
        Assert.Empty(Store.Read(session => session.Basis.All()));
        Store.Write(session => session.Basis.Replace([new("bo", "anchors", "one"), new("", "formulas", "4")]));
        Assert.Equal([new("", "formulas", "4"), new("bo", "anchors", "one")], Store.Read(session => session.Basis.All()));
        Store.Write(session => session.Basis.Replace([new("", "formulas", "5")]));
        Assert.Equal([new("", "formulas", "5")], Store.Read(session => session.Basis.All()));
    }

    [Fact]
    public void ARebuildIsUnderWayUntilItIsSaidToBeOver()
    {
        Assert.Equal(RebuildState.None, Store.Read(session => session.Derived.Rebuild()));
        Store.Write(session => session.Derived.SetRebuild(RebuildState.OverRows));
        Assert.Equal(RebuildState.OverRows, Store.Read(session => session.Derived.Rebuild()));
        Store.Write(session => session.Derived.SetRebuild(RebuildState.None));
        Assert.Equal(RebuildState.None, Store.Read(session => session.Derived.Rebuild()));
    }
}
