using LoadWatch.Storage.Services;
using NodaTime;

namespace LoadWatch.Storage.Tests.Services;

public sealed class ServiceTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void ATroubleStandsFromItsBeginningToItsEnd()
    {
        var trouble = new StandingTrouble("inbox-main", Some.Moment, "The inbox is away.");
        Store.Write(session => session.Troubles.Begin(trouble));
        Assert.Equal([trouble], Store.Read(session => session.Troubles.All()));
        Store.Write(session => session.Troubles.End("inbox-main"));
        Assert.Empty(Store.Read(session => session.Troubles.All()));
    }

    [Fact]
    public void TheLastMomentIsKept()
    {
        Assert.Null(Store.Read(session => session.Moments.Of("sweep")));
        Store.Write(session => session.Moments.Put("sweep", Some.Moment));
        Store.Write(session => session.Moments.Put("sweep", Some.Moment - Duration.FromDays(1)));
        Assert.Equal(Some.Moment - Duration.FromDays(1), Store.Read(session => session.Moments.Of("sweep")));
    }
}
