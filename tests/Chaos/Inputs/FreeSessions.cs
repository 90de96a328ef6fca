namespace LoadWatch.Chaos.Inputs;

/// <summary>Sessions one after another at which nobody trained yet: as many as a scenario needs, none near another.</summary>
public sealed class FreeSessions(Nights nights)
{
    private const int Days = 12;
    private const int MinutesApart = 40;

    private readonly Dictionary<string, int> given = new(StringComparer.Ordinal);

    /// <summary>One that counts.</summary>
    public TrueSession Next(string person)
    {
        var number = given.GetValueOrDefault(person);
        given[person] = number + 1;
        return nights.Session(person, number % Days, MinutesApart * (1 + (number / Days)));
    }
}
