namespace LoadWatch.Service.Pipeline;

/// <summary>Lets the source work on the next element while the current one is used.</summary>
public static class AheadOfUse
{
    /// <summary>
    /// The elements in their order, made one ahead on another thread; so one more than is used is held at any time. What the source throws is thrown where its
    /// element would come. One that is not wanted any more is waited for and dropped.
    /// </summary>
    public static IEnumerable<T> OneAhead<T>(this IEnumerable<T> source)
    {
        using var steps = source.GetEnumerator();
        var next = Step(steps);
        try
        {
            while (next.GetAwaiter().GetResult() is { IsThere: true } step)
            {
                next = Step(steps);
                yield return step.Element!;
            }
        }
        finally
        {
            // It must have come to rest before it is disposed of.
            ((IAsyncResult)next).AsyncWaitHandle.WaitOne();
        }
    }

    private static Task<(bool IsThere, T? Element)> Step<T>(IEnumerator<T> steps) =>
        Task.Run(() => steps.MoveNext() ? (true, steps.Current) : (false, default(T)));
}
