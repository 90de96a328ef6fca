using NodaTime;

namespace LoadWatch.Simulation.Worlds;

/// <summary>What truly went on with a person.</summary>
public enum HappeningKind
{
    /// <summary>Each session of a week twice its size.</summary>
    DoubleWeek,

    /// <summary>One session twice the longest of the 30 days before.</summary>
    DoubleSession,

    /// <summary>14 days of training without heavy or fast leg work.</summary>
    NothingHeavy,

    /// <summary>Down to 40 % over four weeks, and staying there.</summary>
    Fade,

    /// <summary>Ill, and staff were told.</summary>
    Ill,

    /// <summary>On the road, as planned: less is done.</summary>
    Travel,

    /// <summary>Away, and nobody was told.</summary>
    AwayUntold,

    /// <summary>Never does anything fast.</summary>
    NeverFast,
}

/// <param name="From">First date.</param>
/// <param name="To">Last date.</param>
public sealed record Happening(HappeningKind Kind, LocalDate From, LocalDate To)
{
    /// <summary>What has to be found.</summary>
    public bool IsEpisode => Kind <= HappeningKind.Fade;

    public bool Covers(LocalDate date) => From <= date && date <= To;
}
