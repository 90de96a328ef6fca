using System.Runtime.ExceptionServices;

namespace LoadWatch.Service.Pipeline;

/// <summary>What one of several parallel steps came to: an outcome, or the error that is thrown when all are done.</summary>
internal sealed class Attempt<T>
    where T : class
{
    private ExceptionDispatchInfo? error;

    /// <summary>Null where it failed.</summary>
    public T? Outcome { get; private init; }

    public static Attempt<T> Of(Func<T> step)
    {
        try
        {
            return new Attempt<T> { Outcome = step() };
        }
        catch (Exception e)
        {
            return new Attempt<T> { error = ExceptionDispatchInfo.Capture(e) };
        }
    }

    public void Throw() => error!.Throw();
}
