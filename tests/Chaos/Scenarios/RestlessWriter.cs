using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Renames, cuts, overwrites and removes files of an inbox without a pause, until it is disposed.</summary>
internal sealed class RestlessWriter : IDisposable
{
    private readonly Place place;
    private readonly IReadOnlyList<byte[]> contents;
    private readonly Thread thread;
    private volatile bool ends;
    private int changes;

    public RestlessWriter(Place place, IReadOnlyList<byte[]> contents)
    {
        (this.place, this.contents) = (place, contents);
        thread = new Thread(Work);
        thread.Start();
    }

    public int Changes => Volatile.Read(ref changes);

    public void Dispose()
    {
        ends = true;
        thread.Join();
    }

    private void Work()
    {
        for (var turn = 0; !ends; turn++)
        {
            var (at, ride) = (turn % contents.Count, contents[turn % contents.Count]);
            var path = place.Put($"anna/{at}.fit", ride);
            switch (turn / contents.Count % 4)
            {
                case 0:
                    File.Move(path, path + ".moved.fit", overwrite: true);
                    File.Move(path + ".moved.fit", path, overwrite: true);
                    break;
                case 1:
                    Cut(path, ride.Length / 2);
                    break;
                case 2:
                    place.Put($"anna/{at}.fit", contents[(at + 1) % contents.Count]);
                    break;
                default:
                    File.Delete(path);
                    break;
            }

            Interlocked.Increment(ref changes);
        }
    }

    private static void Cut(string path, long length)
    {
        using var file = new FileStream(path, FileMode.Open, FileAccess.Write, FileShare.ReadWrite);
        file.SetLength(length);
    }
}
