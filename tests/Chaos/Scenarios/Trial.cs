using System.Collections.Concurrent;
using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>What one run of a scenario has at hand, and what it counts.</summary>
/// <param name="seed">Of everything that is random.</param>
/// <param name="isLong">The long column: more kills, lasting faults.</param>
public sealed class Trial(Binary binary, int seed, bool isLong)
{
    private readonly ConcurrentDictionary<string, long> figures = new(StringComparer.Ordinal);
    private int provoked;

    /// <summary>Machines that run this have two processors or more.</summary>
    public static ParallelOptions TwoAtOnce { get; } = new() { MaxDegreeOfParallelism = 2 };

    public int Seed => seed;

    public bool IsLong => isLong;

    /// <summary>How often the service was disturbed and found to be right: n of the bound 3/n.</summary>
    public int Provoked => Volatile.Read(ref provoked);

    /// <summary>More numbers for the table, by their words.</summary>
    public IReadOnlyDictionary<string, long> Figures => figures;

    /// <summary>A place of its own, with nothing in it; the caller disposes it.</summary>
    public Place NewPlace(Clock clock, PlaceOptions? options = null) => Place.Make(binary, clock, options);

    /// <summary>A place that took the files of before in on the morning before.</summary>
    public Place Prepared(Nights nights, Clock clock, PlaceOptions? options = null)
    {
        var place = NewPlace(clock, options);
        place.Prepare(nights);
        return place;
    }

    /// <summary>What the nights come to when nothing disturbs; checked against their truth.</summary>
    /// <param name="prepared">Stays as it is.</param>
    public static Digest Undisturbed(Place prepared, Nights nights)
    {
        ArgumentNullException.ThrowIfNull(prepared);
        ArgumentNullException.ThrowIfNull(nights);
        using var place = prepared.Copy();
        place.Fill(nights.Tonight);
        var said = place.SweepWell().Errors;
        return said.Contains("Not delivered", StringComparison.Ordinal) ? throw new ChaosFailureException($"undisturbed, and yet: {said}") : Sound(place, nights.Truth);
    }

    /// <summary>Sweeps once more and compares; what was disturbed must by then be as if nothing had been.</summary>
    public static void MustConverge(Place place, Digest undisturbed)
    {
        ArgumentNullException.ThrowIfNull(place);
        place.SweepWell();
        Digest.Of(place).MustEqual(undisturbed);
        Leftovers.MustBeNone(place);
    }

    /// <summary>The digest of a place that agrees with the truth and left nothing behind.</summary>
    public static Digest Sound(Place place, Truth truth)
    {
        var digest = Digest.Of(place);
        TruthCheck.MustHold(place, truth);
        Leftovers.MustBeNone(place);
        return digest;
    }

    /// <summary>Puts before a failure at which disturbance it came.</summary>
    public static void Named(string disturbance, Action check) =>
        Named(disturbance, () =>
        {
            check();
            return true;
        });

    /// <inheritdoc cref="Named(string, Action)"/>
    public static T Named<T>(string disturbance, Func<T> check)
    {
        ArgumentNullException.ThrowIfNull(check);
        try
        {
            return check();
        }
        catch (ChaosFailureException failure)
        {
            throw new ChaosFailureException($"{disturbance}: {failure.Message}");
        }
    }

    public static void MustBe(long wanted, long seen, string what)
    {
        if (wanted != seen)
        {
            throw new ChaosFailureException($"{seen} {what}, not {wanted}");
        }
    }

    /// <exception cref="ChaosFailureException">Somebody who looks for the words does not find them.</exception>
    public static void MustSay(string said, string wanted)
    {
        ArgumentNullException.ThrowIfNull(said);
        if (!said.Contains(wanted, StringComparison.Ordinal))
        {
            throw new ChaosFailureException($"\"{wanted}\" is not said, but: {said}");
        }
    }

    /// <summary>Counts one disturbance that was survived.</summary>
    public void Survived() => Interlocked.Increment(ref provoked);

    public void Figure(string what, long add) => figures.AddOrUpdate(what, add, (_, sum) => sum + add);
}
