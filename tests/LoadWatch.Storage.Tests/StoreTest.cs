namespace LoadWatch.Storage.Tests;

/// <summary>A data folder that the tests of one class use one after another.</summary>
public sealed class SharedFolder : IDisposable
{
    private readonly TemporaryFolder temporary = new();

    public SharedFolder() => Data = DataFolder.Open(temporary.At("data"));

    public DataFolder Data { get; }

    public void Dispose() => temporary.Dispose();
}

/// <summary>A real database, new for each test.</summary>
public abstract class StoreTest : IClassFixture<SharedFolder>, IDisposable
{
    protected StoreTest(SharedFolder shared)
    {
        Folder = shared.Data;
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
        foreach (var file in Directory.GetFiles(Folder.Root, "loadwatch.db*"))
        {
            File.Delete(file);
        }

        GC.SuppressFinalize(this);
    }
}
