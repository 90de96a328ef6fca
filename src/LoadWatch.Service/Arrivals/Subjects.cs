using LoadWatch.People;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>Finds the person or group that a table, a file name or a device means.</summary>
public sealed class Subjects
{
    private readonly IReadOnlyDictionary<string, Person> people;
    private readonly IReadOnlyDictionary<string, Group> groups;
    private readonly DeviceBook devices;
    private readonly ILookup<string, Person> byName;
    private readonly ILookup<string, Person> byAlias;

    /// <param name="people">By id, compared without regard to case.</param>
    /// <param name="groups">By id.</param>
    public Subjects(IReadOnlyDictionary<string, Person> people, IReadOnlyDictionary<string, Group> groups, DeviceBook devices)
    {
        this.people = people;
        this.groups = groups;
        this.devices = devices;
        byName = people.Values.ToLookup(person => person.Name, StringComparer.OrdinalIgnoreCase);
        byAlias = people.Values.SelectMany(person => person.Aliases.Select(alias => (alias, person))).ToLookup(pair => pair.alias, pair => pair.person, StringComparer.OrdinalIgnoreCase);
    }

    /// <summary>By id, else by a name that only one has, else by alias; case does not matter. Null where nobody, or not one alone, is meant.</summary>
    public Person? Find(string written)
    {
        var word = written.Trim();
        return people.GetValueOrDefault(word) ?? Only(byName[word]) ?? Only(byAlias[word]);
    }

    /// <summary>As <see cref="Find(string)"/>, else who had the device of this serial number on the date.</summary>
    /// <param name="session">The how-manieth session of the date, from 1; null where it is not known.</param>
    public Person? Find(string written, LocalDate date, int? session = null) =>
        Find(written) ?? (devices.On(written.Trim(), date, session) is { } id ? people.GetValueOrDefault(id) : null);

    /// <summary>By id, else by a name that only one has; case does not matter.</summary>
    public Group? FindGroup(string written)
    {
        var word = written.Trim();
        return groups.GetValueOrDefault(word)
            ?? Only(groups.Values.Where(group => string.Equals(group.Id, word, StringComparison.OrdinalIgnoreCase)))
            ?? Only(groups.Values.Where(group => string.Equals(group.Name, word, StringComparison.OrdinalIgnoreCase)));
    }

    /// <summary>
    /// Whom a row of plan or answers is about, sorted by id: the person, else everybody of the group; null where neither is known. A row that names nobody is
    /// about nobody here.
    /// </summary>
    public IReadOnlyList<Person>? Of(StoredRow row)
    {
        if (row.Person is { } id)
        {
            return people.TryGetValue(id, out var looked) ? [looked] : null;
        }

        if (FindGroup(row.Subject) is { } group)
        {
            return [.. people.Values.Where(person => person.Group == group.Id).OrderBy(person => person.Id, StringComparer.Ordinal)];
        }

        return Find(row.Subject) is { } found ? [found] : null;
    }

    /// <summary>Whether what a row of plan or answers is about, where it is no one person's, means this person too; nobody named means everybody.</summary>
    public Func<string, bool> Means(Person person) => written => written.Length == 0
        || (FindGroup(written) is { } group ? person.Group == group.Id : Find(written)?.Id == person.Id);

    private static T? Only<T>(IEnumerable<T> all)
        where T : class =>
        all.Take(2).ToList() is [var only] ? only : null;
}
