using System.Globalization;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads <c>anchors.csv</c>: person, date, anchor, value, unit, source, exercise, machine, sport. A blank date holds from the beginning, a blank source is measured.</summary>
public static class AnchorsReader
{
    private static readonly string[] Required = ["person", "anchor", "value", "unit"];
    private static readonly string[] Optional = ["date", "source", "exercise", "machine", "sport"];

    /// <param name="people">The roster, by id.</param>
    /// <param name="exercises">Exercises whose body region is known.</param>
    /// <param name="sports">Sports whose body regions are known.</param>
    /// <exception cref="ConfigurationException">Names every fault.</exception>
    public static IReadOnlyList<Anchor> Read(
        string path, string name, IReadOnlyDictionary<string, Person> people, IReadOnlyCollection<string> exercises, IEnumerable<string> sports)
    {
        var families = sports.Select(Sport.Parse).Where(sport => !sport.IsOnFoot).Select(sport => sport.Family).Where(family => family != "running").Distinct(StringComparer.Ordinal).ToList();
        var table = TableFile.Read(path, name, Required, Optional);
        var faults = new List<ConfigurationFault>();
        var anchors = table.Rows.Select(row => ReadRow(row, people, exercises, families, faults)).OfType<Anchor>().ToList();
        return faults.Count == 0 ? anchors : throw new ConfigurationException(faults);
    }

    private static Anchor? ReadRow(
        TableRow row, IReadOnlyDictionary<string, Person> people, IReadOnlyCollection<string> exercises, IReadOnlyCollection<string> families, List<ConfigurationFault> faults)
    {
        var before = faults.Count;
        var person = PersonOf(row, people, faults);
        var kind = KindOf(row, faults);
        var date = DateOf(row, faults);
        var source = SourceOf(row, faults);
        if (kind is null || person is null || faults.Count > before)
        {
            return null;
        }

        var value = ValueOf(row, kind, faults);
        var exercise = ExerciseOf(row, kind, exercises, faults);
        var machine = MachineOf(row, kind, faults);
        var sport = SportOf(row, kind, families, faults);
        return faults.Count > before ? null : new Anchor(person.Id, date, kind.Kind, value, source, exercise, Machine: machine) { Sport = sport };
    }

    private static Person? PersonOf(TableRow row, IReadOnlyDictionary<string, Person> people, List<ConfigurationFault> faults)
    {
        var id = row["person"] ?? "";
        if (people.TryGetValue(id, out var person))
        {
            return person;
        }

        faults.Add(row.Fault($"person: \"{id}\" is not in the roster{Nearest.Hint(id, people.Keys)}"));
        return null;
    }

    private static AnchorKindInfo? KindOf(TableRow row, List<ConfigurationFault> faults)
    {
        var word = row["anchor"] ?? "";
        var kind = AnchorKinds.All.FirstOrDefault(info => info.Name == word);
        if (kind is null)
        {
            faults.Add(row.Fault($"anchor: \"{word}\" is not an anchor{Nearest.Hint(word, AnchorKinds.All.Select(info => info.Name))}"));
        }

        return kind;
    }

    private static LocalDate? DateOf(TableRow row, List<ConfigurationFault> faults)
    {
        if (row["date"] is not { } text)
        {
            return null;
        }

        var parsed = LocalDatePattern.Iso.Parse(text);
        if (parsed.Success)
        {
            return parsed.Value;
        }

        faults.Add(row.Fault($"date: \"{text}\" is not a date such as 2026-03-31"));
        return null;
    }

    private static AnchorSource SourceOf(TableRow row, List<ConfigurationFault> faults)
    {
        var word = row["source"] ?? "measured";
        if (Enum.TryParse<AnchorSource>(word, ignoreCase: true, out var source) && !char.IsDigit(word[0]))
        {
            return source;
        }

        faults.Add(row.Fault($"source: \"{word}\" is not measured, observed or estimated{Nearest.Hint(word, ValueCheck.WordsOf(typeof(AnchorSource)))}"));
        return AnchorSource.Measured;
    }

    private static double ValueOf(TableRow row, AnchorKindInfo kind, List<ConfigurationFault> faults)
    {
        if (row["unit"] != kind.Unit)
        {
            faults.Add(row.Fault($"unit: \"{row["unit"]}\" is not the unit of {kind.Name}, which is {kind.Unit}"));
        }

        var text = row["value"] ?? "";
        if (!double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var value))
        {
            faults.Add(row.Fault($"value: \"{text}\" is not a number with a decimal point"));
        }
        else if (!(value >= kind.Lowest && value <= kind.Highest))
        {
            faults.Add(row.Fault(FormattableString.Invariant(
                $"value: {value} {kind.Unit} is outside {kind.Lowest} to {kind.Highest} for {kind.Name}")));
        }

        return value;
    }

    private static string? ExerciseOf(TableRow row, AnchorKindInfo kind, IReadOnlyCollection<string> exercises, List<ConfigurationFault> faults)
    {
        var exercise = ExerciseWord.Canonical(row["exercise"]);
        if (kind.Kind != AnchorKind.OneRepetitionMax && exercise is not null)
        {
            faults.Add(row.Fault($"exercise: only one_repetition_max has an exercise, not {kind.Name}"));
        }
        else if (kind.Kind == AnchorKind.OneRepetitionMax && (exercise is null || !exercises.Contains(exercise)))
        {
            faults.Add(row.Fault(
                $"exercise: \"{exercise}\" is not an exercise with a known body region{Nearest.Hint(exercise ?? "", exercises)}"));
        }

        return exercise;
    }

    private static string? MachineOf(TableRow row, AnchorKindInfo kind, List<ConfigurationFault> faults)
    {
        var machine = row["machine"];
        if (kind.Kind != AnchorKind.OneRepetitionMax && machine is not null)
        {
            faults.Add(row.Fault($"machine: only one_repetition_max has a machine, not {kind.Name}"));
        }

        return machine;
    }

    /// <summary>The family's word: <c>rowing</c> is also the machine's.</summary>
    private static string? SportOf(TableRow row, AnchorKindInfo kind, IReadOnlyCollection<string> families, List<ConfigurationFault> faults)
    {
        if (row["sport"]?.ToLowerInvariant() is not { } word)
        {
            return null;
        }

        if (!AnchorKinds.IsOfSport(kind.Kind))
        {
            faults.Add(row.Fault($"sport: only critical_power, w_prime and power_max are of a sport, not {kind.Name}"));
        }
        else if (!families.Contains(word))
        {
            faults.Add(row.Fault($"sport: \"{word}\" is not a sport in which power is read, such as cycling or rowing{Nearest.Hint(word, families)}"));
        }

        return word;
    }
}
