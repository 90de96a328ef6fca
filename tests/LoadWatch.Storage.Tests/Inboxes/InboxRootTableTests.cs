using LoadWatch.Storage.Inboxes;

namespace LoadWatch.Storage.Tests.Inboxes;

public sealed class InboxRootTableTests(SharedFolder shared) : StoreTest(shared)
{
    [Fact]
    public void TheLastFolderOfAnInboxIsKept()
    {
        Assert.Null(Store.Read(session => session.InboxRoots.Of("inbox")));
        Store.Write(session => session.InboxRoots.Put("inbox", new InboxRoot("/srv/inbox", "8.1:42", HeldEntries: false, HeldFiles: false)));
        Store.Write(session => session.InboxRoots.Put("inbox", new InboxRoot("/srv/inbox", "8.1:43", HeldEntries: true, HeldFiles: false)));
        Assert.Equal(new InboxRoot("/srv/inbox", "8.1:43", true, false), Store.Read(session => session.InboxRoots.Of("inbox")));
        Store.Write(session => session.InboxRoots.Put("inbox", new InboxRoot("/srv/inbox", "8.1:43", HeldEntries: true, HeldFiles: true)));
        Assert.True(Store.Read(session => session.InboxRoots.Of("inbox"))!.HeldFiles);
    }
}
