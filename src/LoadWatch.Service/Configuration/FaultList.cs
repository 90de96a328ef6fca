using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>Gathers the faults of a reading, so that all of them are told at once.</summary>
/// <param name="name">The file whose paths are meant.</param>
internal sealed class FaultList(string name)
{
    private readonly List<ConfigurationFault> faults = [];

    /// <summary>Where the keys of the file stand; null until it is known to be JSON.</summary>
    public JsonPlaces? Places { get; set; }

    /// <param name="at">Path in the file: <c>$.inboxes[0].path</c>.</param>
    public void Add(string at, string reason) =>
        faults.Add(new ConfigurationFault(name, Places?.LineOf(at), at.Length > 2 ? $"{at[2..]}: {reason}" : reason));

    public void AddRange(IEnumerable<ConfigurationFault> more) => faults.AddRange(more);

    /// <summary>What <paramref name="read"/> gives, or null with its faults added.</summary>
    public T? Collect<T>(Func<T> read)
        where T : class
    {
        try
        {
            return read();
        }
        catch (ConfigurationException e)
        {
            faults.AddRange(e.Faults);
            return null;
        }
    }

    /// <param name="what">As in <c>"sqaud" is not a group</c>.</param>
    /// <param name="comparer">Null compares exactly.</param>
    public void CheckWords(IEnumerable<string> words, IEnumerable<string> known, string at, string what, StringComparer? comparer = null)
    {
        var list = known.ToList();
        foreach (var word in words.Where(word => !list.Contains(word, comparer ?? StringComparer.Ordinal)))
        {
            Add(at, $"\"{word}\" is not {what}{Nearest.Hint(word, list)}");
        }
    }

    /// <summary>The IANA zone of an id; null where it is blank or, with a fault, unknown.</summary>
    public DateTimeZone? Zone(string id, string at)
    {
        var zone = id.Length == 0 ? null : DateTimeZoneProviders.Tzdb.GetZoneOrNull(id);
        if (id.Length > 0 && zone is null)
        {
            Add(at, $"\"{id}\" is not an IANA time zone{Nearest.Hint(id, DateTimeZoneProviders.Tzdb.Ids)}");
        }

        return zone;
    }

    /// <exception cref="ConfigurationException">There are faults.</exception>
    public void Stop()
    {
        if (faults.Count > 0)
        {
            throw new ConfigurationException([.. faults]);
        }
    }
}
