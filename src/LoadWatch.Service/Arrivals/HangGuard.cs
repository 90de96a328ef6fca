using System.Collections.Concurrent;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Runs work on folders that may never answer, each on a thread of its own: a share that hangs holds up nobody else. Work that does not get on for the
/// patience is given up on, and not begun again under its name until it has returned.
/// </summary>
/// <param name="patience">How long a piece of work may go without telling that it got on.</param>
public sealed class HangGuard(TimeSpan patience)
{
    private static readonly TimeSpan Step = TimeSpan.FromMilliseconds(200);

    private readonly ConcurrentDictionary<string, Task> hanging = new(StringComparer.Ordinal);

    /// <summary>Runs one piece of work for each name, all at once.</summary>
    /// <param name="work">Is given its name, and what it calls whenever it got on.</param>
    /// <param name="advanced">Called, on the caller's thread, while any of the work gets on.</param>
    /// <returns>One answer a name, in their order; null for work that hangs.</returns>
    public IReadOnlyList<T?> Run<T>(IReadOnlyList<string> names, Func<string, Action, T> work, Action advanced)
        where T : class
    {
        var pieces = names.Select(name => IsHanging(name) ? null : Piece<T>.Begin(name, work)).ToList();
        return [.. pieces.Select((piece, i) => piece is null ? null : Await(piece, names[i], advanced))];
    }

    private bool IsHanging(string name)
    {
        if (hanging.TryGetValue(name, out var earlier) && !earlier.IsCompleted)
        {
            return true;
        }

        hanging.TryRemove(name, out _);
        return false;
    }

    private T? Await<T>(Piece<T> piece, string name, Action advanced)
        where T : class
    {
        var stoodStill = TimeSpan.Zero;
        for (var seen = piece.Progress; !piece.Ended(Step); seen = piece.Progress)
        {
            stoodStill = piece.Progress == seen ? stoodStill + Step : TimeSpan.Zero;
            if (stoodStill >= patience)
            {
                hanging[name] = piece.Task;
                return null;
            }

            if (stoodStill == TimeSpan.Zero)
            {
                advanced();
            }
        }

        return piece.Task.GetAwaiter().GetResult();
    }

    private sealed class Piece<T>
    {
        private readonly TaskCompletionSource<T> end = new();
        private long progress;

        public Task<T> Task => end.Task;

        public long Progress => Volatile.Read(ref progress);

        public static Piece<T> Begin(string name, Func<string, Action, T> work)
        {
            var piece = new Piece<T>();
            new Thread(() => piece.Run(name, work)) { IsBackground = true, Name = $"inbox {name}" }.Start();
            return piece;
        }

        public bool Ended(TimeSpan wait)
        {
            ((IAsyncResult)Task).AsyncWaitHandle.WaitOne(wait);
            return Task.IsCompleted;
        }

        private void Run(string name, Func<string, Action, T> work)
        {
            try
            {
                end.SetResult(work(name, () => Interlocked.Increment(ref progress)));
            }
            catch (Exception e)
            {
                end.SetException(e);
            }
        }
    }
}
