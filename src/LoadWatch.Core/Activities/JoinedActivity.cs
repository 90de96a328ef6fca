using LoadWatch.Loads;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>What counts of one session: the recording that won, with the table rows that join it, or rows that stand for a session alone.</summary>
public sealed record JoinedActivity
{
    /// <summary>Key of the winning recording; for rows alone <c>rows/date/layout/order</c>.</summary>
    public required string Key { get; init; }

    /// <summary>The local date that it counts for.</summary>
    public required LocalDate Date { get; init; }

    /// <summary>Null where only rows without a time tell of it.</summary>
    public Instant? Start { get; init; }

    public required Sport Sport { get; init; }

    /// <summary>The devices and layouts that tell of it (I-6), sorted.</summary>
    public required IReadOnlyList<string> Sources { get; init; }

    /// <summary>Sorted by name.</summary>
    public IReadOnlyList<Quantity> Quantities { get; init; } = [];

    /// <summary>Layout of the table by name of the quantities that it states; what is computed is not in it.</summary>
    public IReadOnlyDictionary<string, string> StatedBy { get; init; } = new Dictionary<string, string>();

    /// <summary>Legs first.</summary>
    public IReadOnlyList<RegionStimulus> Stimulus { get; init; } = [];

    /// <summary>The sets of the tables that tell of a region, as they were read; empty where no table's sets count.</summary>
    public IReadOnlyList<ReadSet> Sets { get; init; } = [];

    /// <summary>Share of the sampled time with a usable reading, 0 to 1, by channel; empty without a recording.</summary>
    public IReadOnlyDictionary<Channel, double> UsableShare { get; init; } = new Dictionary<Channel, double>();

    public IReadOnlyList<string> Remarks { get; init; } = [];

    /// <summary>The tables whose rows are in it, by layout, sorted; empty for a recording alone.</summary>
    public IReadOnlyList<string> Tables { get; init; } = [];

    /// <summary>False for rows that may belong to one of several recordings of the date: their work is sure, their load is already counted.</summary>
    public bool AddsLoad { get; init; } = true;

    /// <summary>The value of a quantity, or null.</summary>
    public double? this[string quantity] => Quantities.FirstOrDefault(one => one.Name == quantity)?.Value;
}
