using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Finds the columns of readings by their names, and their units by name, line of units or range.</summary>
internal static class ChannelDraft
{
    private static readonly Dictionary<Channel, (string[] Units, double Highest)> Known = new()
    {
        // The highest: above it no reading of the first unit lies; it must then be another.
        [Channel.HeartRate] = (["bpm"], 250),
        [Channel.Power] = (["W"], 3000),
        [Channel.Speed] = (["m/s", "km/h"], 45),
        [Channel.Cadence] = (["rpm"], 300),
        [Channel.Distance] = (["m", "km"], 1_000_000),
        [Channel.Altitude] = (["m"], 9000),
    };

    public static IReadOnlyList<CsvChannelColumn> Of(IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var found = new List<CsvChannelColumn>();
        foreach (var (channel, words) in TradeWords.Channels)
        {
            var fitting = columns.Where(column => column.IsNumber && column.Words.Says(words)).OrderBy(column => column.Words.Says(TradeWords.Summaries)).ToList();
            if (fitting is not [var taken, ..])
            {
                continue;
            }

            if (fitting.Count > 1)
            {
                notes.Doubt("columns", $"several may be {Word(channel)}: {DraftNotes.Quoted(fitting.Select(column => column.Name))}; taken: {DraftNotes.Quoted(taken.Name)}");
            }

            if (Unit(channel, taken, notes) is { } unit)
            {
                found.Add(new CsvChannelColumn { Column = taken.Name, Channel = channel, Unit = unit });
            }
        }

        return found;
    }

    public static string Word(Channel channel) => Tables.Words<Channel>.Of(channel);

    /// <returns>Null where the unit is one that nothing reads.</returns>
    private static string? Unit(Channel channel, ColumnStudy column, DraftNotes notes)
    {
        var (units, highest) = Known[channel];
        var range = $"{DraftNotes.Quoted(column.Name)}, {DraftNotes.Number(column.Numbers.Lowest)} to {DraftNotes.Number(column.Numbers.Highest)}";
        var stated = column.Unit == UnitWords.PerMinute ? units[0] : column.Unit;
        switch (stated)
        {
            case not null when units.Contains(stated):
                notes.Found.Add($"{Word(channel)}: {range} {stated}");
                return stated;
            case not null:
                notes.Doubt("columns", $"{range}, seems to be {Word(channel)} in {stated}: only {string.Join(" or ", units)} is read, so it is left out");
                return null;
            case null when units.Length == 1:
                Judge(channel, column, highest, range, units[0], notes);
                return units[0];
            default:
                return Between(channel, column, highest, range, units, notes);
        }
    }

    private static void Judge(Channel channel, ColumnStudy column, double highest, string range, string unit, DraftNotes notes)
    {
        if (column.Numbers.Highest > highest)
        {
            notes.Doubt("columns", $"{range}, is taken for {Word(channel)} in {unit}, but goes beyond {DraftNotes.Number(highest)} {unit}: is it another thing, or another unit?");
        }
        else
        {
            notes.Found.Add($"{Word(channel)}: {range}, taken as {unit}");
        }
    }

    private static string Between(Channel channel, ColumnStudy column, double highest, string range, string[] units, DraftNotes notes)
    {
        if (channel == Channel.Speed && column.Numbers.Highest > highest)
        {
            notes.Found.Add($"{Word(channel)}: {range}, km/h: nothing moves so fast in m/s");
            return units[1];
        }

        notes.Doubt("columns", $"{range}, is {Word(channel)} in {string.Join(" or ", units)}?{Hint(channel, column.Numbers.Highest)}");
        return LayoutDraft.Open;
    }

    /// <summary>What the range would mean in each unit.</summary>
    private static string Hint(Channel channel, double highest) => channel == Channel.Speed
        ? $" The highest would be {DraftNotes.Number(highest * 3.6)} km/h if it is in m/s, and {DraftNotes.Number(highest / 3.6)} m/s if it is in km/h"
        : "";
}
