using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Commands;

/// <summary>Finds the person that a user means.</summary>
public static class PersonArgument
{
    /// <summary>The id as the roster writes it; false, with a line on standard error, when nobody has it.</summary>
    public static bool TryResolve(WorkingConfiguration configuration, string? word, out string? id)
    {
        id = null;
        if (word is null)
        {
            return true;
        }

        if (configuration.People.TryGetValue(word, out var person))
        {
            id = person.Id;
            return true;
        }

        Console.Error.WriteLine($"\"{word}\" is not in the roster{Nearest.Hint(word, configuration.People.Keys)}");
        return false;
    }
}
