using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Decoding.Csv;

/// <summary>A column of a table and what its cells say.</summary>
public sealed record CsvField
{
    /// <summary>The column's name. No default.</summary>
    public string Column { get; init; } = "";

    /// <summary>What the cells say: a field of the kind (<c>repetitions</c>), or <c>quantity</c> for a named number of a session. No default.</summary>
    public string Field { get; init; } = "";

    /// <summary>The name of the quantity (<c>distance_above_5_5_m_s</c>) where <see cref="Field"/> is <c>quantity</c>. Default null.</summary>
    public string? Quantity { get; init; }

    /// <summary>The unit of the cells. Default null: the unit of the field, where it has one of its own.</summary>
    public string? Unit { get; init; }

    /// <summary>
    /// How a time of day or a date is written, as a NodaTime pattern. Default null: <c>HH:mm</c> with or without seconds, and the layout's
    /// <c>date_format</c>.
    /// </summary>
    public string? Format { get; init; }

    /// <summary>
    /// The table's own words, each with what it stands for as our own formats write it (<c>"Spiel": "match"</c>, <c>"-": ""</c> for unknown).
    /// Upper and lower case are the same. Default none.
    /// </summary>
    public IReadOnlyDictionary<string, string> Words { get; init; } = new Dictionary<string, string>();
}

/// <summary>One of several rows that stand side by side in a line: what is the same for all of them in this place, and its own columns.</summary>
public sealed record CsvWideEntry
{
    /// <summary>The person. Default null: see <c>person_column</c>.</summary>
    public string? Person { get; init; }

    /// <summary>The how-manieth session of the date, 1 to 50. Default null.</summary>
    [Range(1, 50)]
    public int? Order { get; init; }

    /// <summary>The how-manieth set, 1 to 1000. Default null.</summary>
    [Range(1, 1000)]
    public int? Set { get; init; }

    /// <summary>The exercise. Default null.</summary>
    public string? Exercise { get; init; }

    /// <summary>The machine. Default null.</summary>
    public string? Machine { get; init; }

    /// <summary>The drill. Default null.</summary>
    public string? Drill { get; init; }

    /// <summary>The function test or reference value. Default null.</summary>
    public string? Test { get; init; }

    /// <summary>The unit of the test's value. Default null.</summary>
    public string? Unit { get; init; }

    /// <summary>The hand of a test, <c>left</c> or <c>right</c>. Default null.</summary>
    public string? Hand { get; init; }

    /// <summary>Any other field that is the same in this place. Default none.</summary>
    public IReadOnlyDictionary<string, string> Constants { get; init; } = new Dictionary<string, string>();

    /// <summary>The columns of this place. No default.</summary>
    public IReadOnlyList<CsvField> Fields { get; init; } = [];
}

/// <summary>What tells that a file is a later version of a table.</summary>
public enum TableNaming
{
    /// <summary>Its name.</summary>
    File,

    /// <summary>The folder that it lies in.</summary>
    Folder,
}

/// <summary>What a version of a table speaks for.</summary>
public enum TableCover
{
    /// <summary>The dates from its first row's on.</summary>
    Dates,

    /// <summary>All dates.</summary>
    Everything,
}
