using NodaTime;

namespace LoadWatch.People;

/// <summary>Who had a device, for a while or for one session of a date.</summary>
/// <param name="Serial">As the device states it, without regard to case.</param>
/// <param name="Person">Id of the roster.</param>
/// <param name="From">First date; null: from the beginning.</param>
/// <param name="To">Last date, inclusive; null: still.</param>
/// <param name="Session">The how-manieth session of each date, from 1; null: all of them.</param>
/// <param name="Line">Where it stands in its file, from 1.</param>
public sealed record DeviceAssignment(string Serial, string Person, LocalDate? From, LocalDate? To, int? Session, long Line)
{
    public bool Covers(LocalDate date) => !(date < From) && !(date > To);

    /// <summary>Whether some session of some date would be both people's.</summary>
    public bool Overlaps(DeviceAssignment other) =>
        string.Equals(Serial, other.Serial, StringComparison.OrdinalIgnoreCase)
        && !(other.To < From) && !(other.From > To)
        && (Session is null || other.Session is null || Session == other.Session);
}

/// <summary>Devices that are handed out: whose a serial number is on a date.</summary>
public sealed class DeviceBook(IEnumerable<DeviceAssignment> assignments)
{
    private readonly ILookup<string, DeviceAssignment> bySerial = assignments.ToLookup(one => one.Serial, StringComparer.OrdinalIgnoreCase);

    /// <summary>Every assignment, in the order of its file.</summary>
    public IReadOnlyList<DeviceAssignment> All { get; } = [.. assignments];

    public static DeviceBook Empty { get; } = new([]);

    /// <summary>Id of the one who had the device, or null where nobody had, or where only the session's number would tell.</summary>
    /// <param name="session">The how-manieth session of the date, from 1; null where it is not known.</param>
    public string? On(string serial, LocalDate date, int? session)
    {
        var people = bySerial[serial]
            .Where(one => one.Covers(date) && (session is null || one.Session is null || one.Session == session))
            .Select(one => one.Person)
            .Distinct(StringComparer.Ordinal)
            .ToList();
        return people is [var only] ? only : null;
    }

    /// <summary>Ids of all who ever had the device, sorted.</summary>
    public IReadOnlyList<string> PeopleOf(string serial) =>
        [.. bySerial[serial].Select(one => one.Person).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];
}
