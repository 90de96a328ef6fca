using LoadWatch.Loads;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>One session as the rows of one table tell it, before it is known which recording tells of it too.</summary>
internal sealed record StatedSession
{
    public required string Layout { get; init; }

    public required LocalDate Date { get; init; }

    /// <summary>Its number, else its start, else 1: tells it from the others of its table and date.</summary>
    public required string Mark { get; init; }

    /// <summary>The how-manieth session of the date, from 1.</summary>
    public int? Order { get; init; }

    /// <summary>Local.</summary>
    public LocalTime? Start { get; init; }

    public Sport? Sport { get; init; }

    /// <summary>Minutes and rating among them; not the totals of sets.</summary>
    public IReadOnlyList<Quantity> Quantities { get; init; } = [];

    public DeclaredContent? Content { get; init; }

    /// <summary>Of a set log; null for every other table.</summary>
    public StatedSets? Sets { get; init; }

    public string Source => $"layout {Layout}";

    /// <summary>Null where it does not tell of minutes.</summary>
    public double? Minutes => Quantities.FirstOrDefault(one => one.Name == QuantityNames.Minutes)?.Value;

    /// <summary>Whether it tells enough to count without a recording: sets, content, or any figure but a rating.</summary>
    public bool StandsAlone => Sets is not null || Content is not null || Quantities.Any(one => one.Name != QuantityNames.Rating);

    /// <summary>A row of a list of names that nobody filled in.</summary>
    public bool IsBlank => !StandsAlone && Quantities.Count == 0;
}
