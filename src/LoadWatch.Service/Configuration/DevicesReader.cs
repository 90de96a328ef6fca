using System.Globalization;
using LoadWatch.People;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads <c>devices.csv</c>: serial, person, from, to, session. Blank dates are open ends, a blank session is every one of the date.</summary>
public static class DevicesReader
{
    private static readonly string[] Required = ["serial", "person"];
    private static readonly string[] Optional = ["from", "to", "session"];

    /// <param name="people">The roster, by id.</param>
    /// <exception cref="ConfigurationException">Names every fault; where two rows hand one device to two people at once, both lines.</exception>
    public static DeviceBook Read(string path, string name, IReadOnlyDictionary<string, Person> people)
    {
        var table = TableFile.Read(path, name, Required, Optional);
        var faults = new List<ConfigurationFault>();
        var assignments = table.Rows.Select(row => (row, Read: ReadRow(row, people, faults))).Where(item => item.Read is not null).ToList();
        foreach (var ((row, second), i) in assignments.Select((item, i) => (item, i)))
        {
            faults.AddRange(assignments.Take(i)
                .Where(above => above.Read!.Overlaps(second!))
                .Select(above => row.Fault($"serial: \"{second!.Serial}\" is handed out at the same time in line {above.Read!.Line}")));
        }

        return faults.Count == 0
            ? new DeviceBook(assignments.Select(item => item.Read!))
            : throw new ConfigurationException([.. faults.OrderBy(fault => fault.Line)]);
    }

    private static DeviceAssignment? ReadRow(TableRow row, IReadOnlyDictionary<string, Person> people, List<ConfigurationFault> faults)
    {
        var before = faults.Count;
        var serial = row["serial"] ?? "";
        if (serial.Length == 0)
        {
            faults.Add(row.Fault("serial: is blank"));
        }

        var id = row["person"] ?? "";
        if (!people.TryGetValue(id, out var person))
        {
            faults.Add(row.Fault($"person: \"{id}\" is not in the roster{Nearest.Hint(id, people.Keys)}"));
        }

        var (from, to) = (DateOf(row, "from", faults), DateOf(row, "to", faults));
        if (to < from)
        {
            faults.Add(row.Fault("to: lies before from"));
        }

        var session = SessionOf(row, faults);
        return faults.Count > before ? null : new DeviceAssignment(serial, person!.Id, from, to, session, row.Line);
    }

    private static LocalDate? DateOf(TableRow row, string column, List<ConfigurationFault> faults)
    {
        if (row[column] is not { } text)
        {
            return null;
        }

        var parsed = LocalDatePattern.Iso.Parse(text);
        if (parsed.Success)
        {
            return parsed.Value;
        }

        faults.Add(row.Fault($"{column}: \"{text}\" is not a date such as 2026-03-31"));
        return null;
    }

    private static int? SessionOf(TableRow row, List<ConfigurationFault> faults)
    {
        if (row["session"] is not { } text)
        {
            return null;
        }

        if (int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var session) && session is >= 1 and <= 20)
        {
            return session;
        }

        faults.Add(row.Fault($"session: \"{text}\" is not the number of a session of the date, 1 to 20"));
        return null;
    }
}
