using System.Globalization;
using System.Text.RegularExpressions;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads <c>roster.csv</c>: person, name, group, birth_year, sex, time_zone, aliases, heart_rate_valid.</summary>
public static partial class RosterReader
{
    private static readonly string[] Required = ["person", "name", "group"];
    private static readonly string[] Optional = ["birth_year", "sex", "time_zone", "aliases", "heart_rate_valid"];

    /// <param name="groups">Ids of the groups that exist.</param>
    /// <param name="zone">Zone of people whose row names none.</param>
    /// <exception cref="ConfigurationException">Names every fault.</exception>
    public static IReadOnlyList<Person> Read(string path, string name, IReadOnlyCollection<string> groups, DateTimeZone zone)
    {
        var table = TableFile.Read(path, name, Required, Optional);
        var faults = new List<ConfigurationFault>();
        var people = table.Rows.Select(row => ReadRow(row, groups, zone, faults)).ToList();
        faults.AddRange(table.Rows.Where(row => row["person"] is not null)
            .GroupBy(row => row["person"], StringComparer.OrdinalIgnoreCase)
            .SelectMany(same => same.Skip(1))
            .Select(row => row.Fault($"\"{row["person"]}\" stands above already")));
        faults.AddRange(AliasFaults(table.Rows.Zip(people).ToList()));
        return faults.Count == 0 ? people : throw new ConfigurationException(faults.OrderBy(fault => fault.Line).ToList());
    }

    private static Person ReadRow(TableRow row, IReadOnlyCollection<string> groups, DateTimeZone zone, List<ConfigurationFault> faults)
    {
        var id = row["person"] ?? "";
        if (!IdPattern().IsMatch(id))
        {
            faults.Add(row.Fault($"person: \"{id}\" may hold letters, digits, - _ and . only, 60 at most, since it names a folder"));
        }
        else if (NotAFolderPattern().IsMatch(id))
        {
            faults.Add(row.Fault($"person: \"{id}\" cannot name a folder on Windows"));
        }

        var group = row["group"] ?? "";
        if (!groups.Contains(group))
        {
            faults.Add(row.Fault($"group: \"{group}\" is not a group of loadwatch.json{Nearest.Hint(group, groups)}"));
        }

        return new Person(id, row["name"] ?? id, group, BirthYear(row, faults), SexOf(row, faults), ZoneOf(row, zone, faults))
        {
            Aliases = Aliases(row),
            HeartRateInvalid = HeartRateCell.Read(row, faults),
        };
    }

    private static IReadOnlyList<string> Aliases(TableRow row) =>
        [.. (row["aliases"] ?? "").Split([';', '|'], StringSplitOptions.RemoveEmptyEntries | StringSplitOptions.TrimEntries).Distinct(StringComparer.OrdinalIgnoreCase)];

    /// <summary>An alias that another one has too, as id or alias, would tell nobody.</summary>
    private static IEnumerable<ConfigurationFault> AliasFaults(List<(TableRow Row, Person Person)> rows)
    {
        var taken = new Dictionary<string, string>(StringComparer.OrdinalIgnoreCase);
        foreach (var (_, person) in rows)
        {
            taken.TryAdd(person.Id, person.Id);
        }

        foreach (var (row, person) in rows)
        {
            foreach (var alias in person.Aliases.Where(alias => !taken.TryAdd(alias, person.Id) && !string.Equals(taken[alias], person.Id, StringComparison.OrdinalIgnoreCase)))
            {
                yield return row.Fault($"aliases: \"{alias}\" already means {taken[alias]}");
            }
        }
    }

    private static int? BirthYear(TableRow row, List<ConfigurationFault> faults)
    {
        if (row["birth_year"] is not { } text)
        {
            return null;
        }

        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var year) && year is >= 1900 and <= 2100)
        {
            return year;
        }

        faults.Add(row.Fault($"birth_year: \"{text}\" is not a year from 1900 to 2100"));
        return null;
    }

    private static Sex? SexOf(TableRow row, List<ConfigurationFault> faults)
    {
        switch (row["sex"]?.ToUpperInvariant())
        {
            case null:
                return null;
            case "F":
                return Sex.Female;
            case "M":
                return Sex.Male;
            default:
                faults.Add(row.Fault($"sex: \"{row["sex"]}\" is neither f nor m nor blank"));
                return null;
        }
    }

    private static DateTimeZone ZoneOf(TableRow row, DateTimeZone zone, List<ConfigurationFault> faults)
    {
        if (row["time_zone"] is not { } id)
        {
            return zone;
        }

        if (DateTimeZoneProviders.Tzdb.GetZoneOrNull(id) is { } found)
        {
            return found;
        }

        faults.Add(row.Fault($"time_zone: \"{id}\" is not an IANA time zone{Nearest.Hint(id, DateTimeZoneProviders.Tzdb.Ids)}"));
        return zone;
    }

    [GeneratedRegex(@"^[\p{L}\p{N}_-][\p{L}\p{N}_.-]{0,59}$", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 1000)]
    private static partial Regex IdPattern();

    /// <summary>Names of devices, with or without an ending, and names that end in a full stop, which Windows drops.</summary>
    [GeneratedRegex(
        @"^(con|prn|aux|nul|com[0-9]|lpt[0-9])(\.|$)|\.$", RegexOptions.ExplicitCapture | RegexOptions.IgnoreCase | RegexOptions.CultureInvariant, matchTimeoutMilliseconds: 1000)]
    private static partial Regex NotAFolderPattern();
}
