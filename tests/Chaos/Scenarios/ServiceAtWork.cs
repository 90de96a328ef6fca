using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>The service at work in a place, followed by what it logs to the terminal.</summary>
internal sealed class ServiceAtWork : IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(150);
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(50);

    private readonly Child child;
    private int heard;

    private ServiceAtWork(Child child) => this.child = child;

    public Child Process => child;

    /// <param name="under">A program with its options that runs the service, or nothing.</param>
    public static ServiceAtWork Start(Place place, IEnumerable<string> under, params IEnumerable<(string Name, string Value)> environment) =>
        new(place.StartUnder(under, ["run"], environment));

    /// <summary>Waits until it has said this behind everything waited for before.</summary>
    /// <exception cref="ChaosFailureException">It does not come, or the service has ended.</exception>
    public void MustSay(string words)
    {
        var until = DateTime.UtcNow + Patience;
        while (child.SaidSoFar.IndexOf(words, heard, StringComparison.Ordinal) is var at)
        {
            if (at >= 0)
            {
                heard = at + words.Length;
                return;
            }

            if (DateTime.UtcNow > until || child.EndsWithin(Pause))
            {
                throw new ChaosFailureException($"\"{words}\" is not said, but: {child.SaidSoFar[heard..]}");
            }
        }
    }

    /// <summary>How often it has said this so far.</summary>
    public int Count(string words) => child.SaidSoFar.Split(words).Length - 1;

    /// <summary>Tells it to stop; it must end with 0.</summary>
    public Ended Stop()
    {
        child.Signal("TERM");
        return Place.MustEndWell(child.WaitForEnd());
    }

    public void Dispose() => child.Dispose();
}
