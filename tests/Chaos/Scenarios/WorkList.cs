namespace LoadWatch.Chaos.Scenarios;

/// <summary>Work that is found out once and shared among threads.</summary>
internal sealed class WorkList<T>(Func<IEnumerable<T>> find)
    where T : class
{
    private readonly Lazy<Queue<T>> left = new(() => new Queue<T>(find()));

    /// <summary>Works at what is left; after a failure nobody begins anything more.</summary>
    public void Each(Action<T> work)
    {
        try
        {
            while (Next() is { } one)
            {
                work(one);
            }
        }
        catch
        {
            lock (left)
            {
                left.Value.Clear();
            }

            throw;
        }
    }

    /// <summary>Null when nothing is left.</summary>
    private T? Next()
    {
        lock (left)
        {
            return left.Value.TryDequeue(out var next) ? next : null;
        }
    }
}
