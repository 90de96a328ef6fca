using LoadWatch.Storage.Recordings;

namespace LoadWatch.Storage.Tests;

/// <summary>A real database in a folder of its own.</summary>
public abstract class StoreTest : IDisposable
{
    private readonly TemporaryFolder temporary = new();

    protected StoreTest()
    {
        Folder = DataFolder.Open(temporary.At("data"));
        Store = Store.Open(Folder);
    }

    protected DataFolder Folder { get; }

    protected Store Store { get; }

    /// <summary>Stores the arrival and the recording of a number.</summary>
    protected void AddRecording(int number) => Store.Write(session =>
    {
        session.Arrivals.AddWaiting(Some.Sha(number), null, Some.Sha(number), 100);
        session.Recordings.Add(Some.Recording(number));
    });

    public void Dispose()
    {
        Store.Dispose();
        temporary.Dispose();
        GC.SuppressFinalize(this);
    }
}
