using System.ComponentModel.DataAnnotations;
using System.Diagnostics.CodeAnalysis;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>What the rows of a CSV are.</summary>
public enum CsvKind
{
    /// <summary>A time series: one row per moment of one session.</summary>
    Samples,

    /// <summary>A table with a row per person and session, or drill of one.</summary>
    Sessions,

    /// <summary>A table with a row per set of strength work.</summary>
    Sets,

    /// <summary>A table with a row per function test or reference value.</summary>
    Tests,

    /// <summary>A table with a row per person and date: rest, illness, attendance.</summary>
    Days,

    /// <summary>A table with a row per planned session or phase.</summary>
    Plan,

    /// <summary>A table with a row per answer of staff.</summary>
    Answers,
}

/// <summary>
/// Describes one kind of CSV file, so that nothing about it is guessed. A file has a layout when the line of its names holds every one of
/// <see cref="Header"/>, the time column, the columns of start, date, person and quality that the layout names, and at least one channel
/// column; of a table the date or time column and at least one column of <see cref="Fields"/> or <see cref="Wide"/>, if any is named there.
/// Names are compared exactly, without the blanks around them.
/// </summary>
public sealed record CsvLayout
{
    /// <summary>The layout's name, shown as the source of what it read. No default.</summary>
    public string Name { get; init; } = "";

    /// <summary>What the rows are. Default <c>samples</c>.</summary>
    public CsvKind Kind { get; init; } = CsvKind.Samples;

    /// <summary>
    /// The signature: column names that must all be present. Of several layouts that fit, the one with the longest signature wins. No
    /// default.
    /// </summary>
    public IReadOnlyList<string> Header { get; init; } = [];

    /// <summary>The character between two fields. Default a comma. A first line <c>sep=;</c> in the file goes before it.</summary>
    public char Delimiter { get; init; } = ',';

    /// <summary>The decimal mark of numbers, <c>.</c> or <c>,</c>. Default a full stop. Thousands marks are never read.</summary>
    [SuppressMessage("Naming", "CA1720:Identifier contains type name", Justification = "The word of the configuration key")]
    public char Decimal { get; init; } = '.';

    /// <summary>
    /// <c>auto</c>, <c>utf-8</c>, <c>utf-16</c> (little endian) or <c>windows-1252</c>. Default <c>auto</c>: UTF-8 where the bytes are
    /// valid
    /// UTF-8, else Windows-1252. A byte order mark in the file goes before it.
    /// </summary>
    public string Encoding { get; init; } = CsvText.Auto;

    /// <summary>
    /// Lines at the start of the file that are passed over before the line of the column names, empty ones and <c>sep=;</c> counted, 0 to 200.
    /// Default 0.
    /// </summary>
    [Range(0, 200)]
    public int LinesAbove { get; init; }

    /// <summary>Lines below that of the column names that are passed over, such as one of units, 0 to 200. Default 0.</summary>
    [Range(0, 200)]
    public int LinesBelow { get; init; }

    /// <summary>Where the time of a row stands. No default. Of a table: where the date stands in a moment.</summary>
    public CsvTimeColumn Time { get; init; } = new();

    /// <summary>The columns that hold readings. One that is not in <see cref="Header"/> may be absent from a file. No default.</summary>
    public IReadOnlyList<CsvChannelColumn> Columns { get; init; } = [];

    /// <summary>
    /// The sport of every file, in the words of the FIT profile (<c>cycling</c>). Default null: see <see cref="SportColumn"/>.
    /// </summary>
    public string? Sport { get; init; }

    /// <summary>
    /// The column whose first filled cell names the sport; may be absent from a file. Default null; without either the sport is
    /// <c>generic</c>.
    /// </summary>
    public string? SportColumn { get; init; }

    /// <summary>
    /// The column of the person. Of samples it tells the people or devices of one file apart, as the file writes them: each gets recordings of its
    /// own, and a row without one cannot be used; rows of one person more than 60 min apart are two recordings. Of a table it may be absent from
    /// a file: then the rows are about the owner of the file. Default null: one file is one recording, or a table about its owner.
    /// </summary>
    public string? PersonColumn { get; init; }

    /// <summary>Of samples: which rows were received too badly to give a position. Default null: every reading counts.</summary>
    public CsvQuality? Quality { get; init; }

    /// <summary>Of plan and answers: the column that names a group instead of a person; may be absent from a file. Default null.</summary>
    public string? GroupColumn { get; init; }

    /// <summary>Of a table: the column of the date. Default null: see <see cref="Time"/>.</summary>
    public string? DateColumn { get; init; }

    /// <summary>
    /// How the date is written: <c>iso8601</c> (<c>2026-03-31</c>) or a NodaTime pattern of a full date (<c>dd.MM.yyyy</c>). Default
    /// <c>iso8601</c>.
    /// </summary>
    public string DateFormat { get; init; } = CsvTimeColumn.Iso8601;

    /// <summary>Of a table: what its columns hold. One that is not in <see cref="Header"/> may be absent from a file. Default none.</summary>
    public IReadOnlyList<CsvField> Fields { get; init; } = [];

    /// <summary>
    /// Of a table: fields that are the same in every row, each with its value as our own formats write it (<c>"sport": "soccer"</c>). Default
    /// none.
    /// </summary>
    public IReadOnlyDictionary<string, string> Constants { get; init; } = new Dictionary<string, string>();

    /// <summary>
    /// Of a table whose line holds several rows side by side: an entry for each. One whose own cells are all empty makes no row. Default none: a
    /// line is a row.
    /// </summary>
    public IReadOnlyList<CsvWideEntry> Wide { get; init; } = [];

    /// <summary>
    /// Of a table: whether it is told by its <c>file</c> name, so that a later file of the same name is its next version, or by its
    /// <c>folder</c>, where files of changing names are versions of one table. Default <c>file</c>.
    /// </summary>
    public TableNaming Table { get; init; } = TableNaming.File;

    /// <summary>
    /// Of a table: whether a version speaks for the <c>dates</c> from its first row's on, so that older rows stay, or for <c>everything</c>, so
    /// that a row that is gone is retracted. Default null: <c>dates</c> for sessions, sets and days, <c>everything</c> for tests, plan and
    /// answers.
    /// </summary>
    public TableCover? Covers { get; init; }

    /// <summary>Why this layout cannot be used, one sentence each; empty when it can.</summary>
    public IReadOnlyList<string> Validate() => CsvLayoutCheck.Reasons(this);
}

/// <summary>Where the time of a row stands and how it is written.</summary>
public sealed record CsvTimeColumn
{
    public const string Iso8601 = "iso8601";
    public const string UnixSeconds = "unix_s";
    public const string UnixMilliseconds = "unix_ms";
    public const string SecondsFromStart = "seconds_from_start";

    /// <summary>The column's name. No default.</summary>
    public string Column { get; init; } = "";

    /// <summary>
    /// <c>iso8601</c>, <c>unix_s</c>, <c>unix_ms</c>, <c>seconds_from_start</c>, or a NodaTime pattern that holds a full date and time
    /// (<c>dd.MM.yyyy HH:mm:ss</c>). Default <c>iso8601</c>.
    /// </summary>
    public string Format { get; init; } = Iso8601;

    /// <summary>
    /// The IANA zone of local times (<c>Europe/Helsinki</c>). Default null: UTC. An offset written in the cell goes before it.
    /// </summary>
    public string? Zone { get; init; }

    /// <summary>
    /// For <c>seconds_from_start</c>: the column that holds the start of the session; the first filled cell counts. Default null.
    /// </summary>
    public string? StartColumn { get; init; }

    /// <summary>How the start is written: any format but <c>seconds_from_start</c>. Default <c>iso8601</c>.</summary>
    public string StartFormat { get; init; } = Iso8601;

    /// <summary>
    /// For times of day: the column that holds the local date; <see cref="Format"/> is then a pattern of a time of day, or <c>iso8601</c>
    /// (<c>HH:mm:ss</c> with or without a fraction). Under an empty cell the date goes on, past midnight to the next day. Default null.
    /// </summary>
    public string? DateColumn { get; init; }

    /// <summary>How the date is written: <c>iso8601</c> or a NodaTime pattern of a date (<c>dd.MM.yyyy</c>). Default <c>iso8601</c>.</summary>
    public string DateFormat { get; init; } = Iso8601;
}

/// <summary>A column that holds the readings of a channel.</summary>
public sealed record CsvChannelColumn
{
    /// <summary>The column's name. No default.</summary>
    public string Column { get; init; } = "";

    /// <summary>The channel. Default <c>heart_rate</c>.</summary>
    public Channel Channel { get; init; }

    /// <summary>
    /// The unit of the cells: <c>bpm</c>, <c>W</c>, <c>m/s</c> or <c>km/h</c>, <c>rpm</c>, <c>m</c> or <c>km</c>. No default.
    /// </summary>
    public string Unit { get; init; } = "";
}
