using LoadWatch.Service.Arrivals;
using Inbox = LoadWatch.Service.Configuration.Inbox;
using TakeMode = LoadWatch.Service.Configuration.TakeMode;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Tests.Arrivals;

public sealed class KnownFilesTests : IDisposable
{
    private readonly WorkingFolder folder = new();
    private readonly KnownFiles known = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void WhatTheStoreSaysIsKnownAndAnyOtherStampIsNot()
    {
        var full = folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        var stamp = SafeFile.StampOf(full)!;
        var inbox = OfInbox();

        Assert.True(inbox.Has("anna/ride.fit", stamp));
        Assert.False(inbox.Has("anna/ride2.fit", stamp));
        Assert.False(inbox.Has("anna/ride.fit", stamp with { Size = stamp.Size + 1 }));
        Assert.False(inbox.Has("anna/ride.fit", stamp with { ModifiedUnixMs = stamp.ModifiedUnixMs + 1 }));
        Assert.False(inbox.Has("anna/ride.fit", stamp with { FileId = stamp.FileId + "0" }));
    }

    [Fact]
    public void AFileThatComesBackAsItWasBeforeIsLookedInto()
    {
        var inbox = OfInbox();
        var file = new FoundFile(new Inbox("inbox", folder.Inbox, TakeMode.Leave), "ride.fit", "");
        known.Add(file, new FileStamp(1, 2, "3"));
        known.Add(file, new FileStamp(4, 5, "6"));

        Assert.True(inbox.Has("ride.fit", new FileStamp(4, 5, "6")));
        Assert.False(inbox.Has("ride.fit", new FileStamp(1, 2, "3")));
        known.Forget("inbox", "ride.fit");
        Assert.False(inbox.Has("ride.fit", new FileStamp(4, 5, "6")));
    }

    [Theory]
    [InlineData("ride.fit", true)]
    [InlineData(".hidden.fit", false)]
    [InlineData("~$lock.csv", false)]
    [InlineData("ride.fit.PART", false)]
    [InlineData("ride.tmp", false)]
    [InlineData("tmp", true)]
    public void NamesOfCopiesUnderWayAreTold(string name, bool isFinished) => Assert.Equal(isFinished, InboxScan.IsFinished(name));

    [Fact]
    public void PathsBelowAnInboxAreThoseThatSightingsHave()
    {
        folder.Put("a/b/c d.fit", [1]);
        folder.Put("ä.fit", [1]);
        folder.Put(".hidden/x.fit", [1]);
        folder.Put(new string('n', 200) + ".fit", [1]);
        var seen = new List<(string Path, string Full)>();

        Assert.True(InboxScan.TryEach(new Inbox("inbox", folder.Inbox, TakeMode.Leave), (path, full) => seen.Add((path.ToString(), full.ToString()))));

        Assert.Equal(["a/b/c d.fit", new string('n', 200) + ".fit", "ä.fit"], seen.Select(one => one.Path).Order(StringComparer.Ordinal));
        Assert.All(seen, one => Assert.Equal(Path.GetFullPath(Path.Combine(folder.Inbox, one.Path)), one.Full));
        Assert.All(seen, one => Assert.Equal(SafeFile.StampOf(one.Full), SafeFile.StampOf(one.Full.AsSpan())));
        Assert.False(InboxScan.TryEach(new Inbox("gone", Path.Combine(folder.Root, "gone"), TakeMode.Leave), (_, _) => { }));
    }

    private KnownInbox OfInbox() => folder.Read((workplace, _) => known.Of("inbox", workplace.Store));
}
