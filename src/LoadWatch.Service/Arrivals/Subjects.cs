using LoadWatch.People;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Arrivals;

/// <summary>Who is meant by what a table writes: an id of the roster, else a name or an alias that only one person has; without regard to case.</summary>
public sealed class Subjects(WorkingConfiguration configuration)
{
    private readonly ILookup<string, Person> byName = configuration.People.Values
        .SelectMany(person => person.Aliases.Append(person.Name).Select(name => (Name: name.Trim(), person)))
        .DistinctBy(item => (item.Name.ToUpperInvariant(), item.person.Id))
        .ToLookup(item => item.Name, item => item.person, StringComparer.OrdinalIgnoreCase);

    /// <summary>Null where nobody or more than one person is meant.</summary>
    public Person? Find(string written) =>
        configuration.People.GetValueOrDefault(written.Trim()) ?? (byName[written.Trim()].ToList() is [var only] ? only : null);
}
