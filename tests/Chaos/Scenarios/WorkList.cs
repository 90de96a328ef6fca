namespace LoadWatch.Chaos.Scenarios;

/// <summary>Work that is found out once and shared among threads.</summary>
internal sealed class WorkList<T>(Func<IEnumerable<T>> find)
    where T : class
{
    private readonly Lazy<Queue<T>> left = new(() => new Queue<T>(find()));

    /// <summary>Null when nothing is left.</summary>
    public T? Next()
    {
        lock (left)
        {
            return left.Value.TryDequeue(out var next) ? next : null;
        }
    }
}
