using System.Globalization;
using System.Text;
using LoadWatch.People;

namespace LoadWatch.Notices;

/// <summary>People by the first letters of their first and last name: <c>A. K.</c></summary>
internal static class Initials
{
    /// <summary>For a name without a letter or digit.</summary>
    private const string Nameless = "Somebody";

    /// <summary>One label for each person, by id; people who share their initials are numbered in the order of their ids: <c>A. K. 2</c>.</summary>
    public static IReadOnlyDictionary<string, string> Of(IEnumerable<Person> people) => people
        .OrderBy(person => person.Id, StringComparer.OrdinalIgnoreCase)
        .GroupBy(person => Of(person.Name), StringComparer.Ordinal)
        .SelectMany(Numbered)
        .ToDictionary(pair => pair.Id, pair => pair.Label, StringComparer.OrdinalIgnoreCase);

    /// <summary>Without a number.</summary>
    public static string Of(string name)
    {
        var letters = OneLine.Of(name).Split(' ').Select(First).OfType<string>().ToList();
        return letters switch
        {
            [] => Nameless,
            [var only] => only,
            [var first, .., var last] => $"{first} {last}",
        };
    }

    private static IEnumerable<(string Id, string Label)> Numbered(IGrouping<string, Person> same)
    {
        var people = same.ToList();
        return people.Select((person, place) =>
            (person.Id, people.Count == 1 ? same.Key : string.Create(CultureInfo.InvariantCulture, $"{same.Key} {place + 1}")));
    }

    /// <summary>The first letter or digit of a word with a full stop, or null where it has none.</summary>
    private static string? First(string word) => word.EnumerateRunes().Where(Rune.IsLetterOrDigit).Select(rune => $"{Rune.ToUpperInvariant(rune)}.").FirstOrDefault();
}
