using LoadWatch.Service.Schedule;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Tests.Schedule;

/// <summary>A watcher of a folder that was made anew under its name hears nothing and says nothing: it has to be armed again.</summary>
public sealed class FolderEventsTests : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(30);

    private readonly DirectoryInfo root = Directory.CreateTempSubdirectory("loadwatch-events-");
    private readonly List<string> failed = [];
    private readonly FolderEvents events;

    public FolderEventsTests() => events = new FolderEvents(failed.Add);

    private string Inbox => Path.Combine(root.FullName, "inbox");

    public void Dispose()
    {
        events.Dispose();
        root.Delete(recursive: true);
    }

    [Fact]
    public void AFileThatComesStirsOnce()
    {
        Make();
        Follow();
        Assert.False(events.HaveStirred());
        File.WriteAllText(Path.Combine(Inbox, "ride.fit"), "x");
        Assert.True(SpinWait.SpinUntil(events.HaveStirred, Patience));
    }

    [Fact]
    public void AFolderMadeAnewIsListenedToAnew()
    {
        Make();
        Follow();
        Directory.Delete(Inbox);
        Make();
        Follow();
        SpinWait.SpinUntil(events.HaveStirred, TimeSpan.FromMilliseconds(500));
        File.WriteAllText(Path.Combine(Inbox, "ride.fit"), "x");
        Assert.True(SpinWait.SpinUntil(events.HaveStirred, Patience));
    }

    [Fact]
    public void AFolderThatIsGoneIsNotListenedTo()
    {
        events.Follow([new WatchedFolder(Inbox, "8.1:1")]);
        Assert.NotEmpty(failed);
        Assert.False(events.HaveStirred());
    }

    /// <summary>A flood of events is one flag: nothing piles up behind a slow reader.</summary>
    [Fact]
    public void ManyFilesAreOneStir()
    {
        Make();
        Follow();
        for (var i = 0; i < 2000; i++)
        {
            File.WriteAllText(Path.Combine(Inbox, $"{i}.fit"), "");
        }

        Assert.True(SpinWait.SpinUntil(events.HaveStirred, Patience));
    }

    private void Make() => Directory.CreateDirectory(Inbox);

    private void Follow() => events.Follow([new WatchedFolder(Inbox, SafeFile.FolderId(Inbox)!)]);
}
