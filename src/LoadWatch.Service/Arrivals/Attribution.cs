using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Configuration;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>A name under which a content was seen.</summary>
/// <param name="Inbox">Name of the inbox.</param>
/// <param name="Path">Below it, <c>/</c> between folders.</param>
public readonly record struct SeenName(string Inbox, string Path);

/// <summary>
/// Who is named as the owner, the first that names anybody: a decision, the folders, the file name by its inbox's pattern; and once the content is decoded,
/// the devices.
/// </summary>
public static class Attribution
{
    /// <summary>Marks the step into an archive in a sighting's path: <c>anna/week.zip!/ride.fit</c>.</summary>
    public const string Inside = "!/";

    /// <summary>The owner by decision alone where there is one, in the roster or not: whoever was told to be wrong stays so. Else whom folders, else file names, name.</summary>
    /// <param name="decided">Id of the person to whom the content was assigned, or null.</param>
    /// <returns>Ids, sorted; empty where nobody is named.</returns>
    public static IReadOnlyList<string> Claims(string? decided, IReadOnlyCollection<SeenName> names, WorkingConfiguration configuration)
    {
        if (decided is not null)
        {
            return [configuration.People.GetValueOrDefault(decided)?.Id ?? decided];
        }

        var byFolder = ByFolder(names.Select(name => name.Path), configuration.People);
        return byFolder.Count > 0 ? byFolder : ByFileName(names, configuration);
    }

    /// <summary>Ids of the people whom any folder of any path names, sorted; folders inside archives count, file names do not.</summary>
    /// <param name="paths">Paths below their inbox, <c>/</c> between folders.</param>
    public static IReadOnlyList<string> ByFolder(IEnumerable<string> paths, IReadOnlyDictionary<string, Person> people) =>
        Ids(paths.SelectMany(Folders).Select(folder => people.GetValueOrDefault(folder)));

    /// <summary>Ids of the people who had the devices on the dates of the recordings, sorted; empty where any recording has no owner by its device.</summary>
    /// <param name="now">Recordings without a plausible date at this moment are passed over.</param>
    public static IReadOnlyList<string> ByDevice(IEnumerable<Recording> recordings, Instant now, DeviceBook devices, IReadOnlyDictionary<string, Person> people)
    {
        var owners = recordings.Where(recording => ArrivalVerdict.IsUsable(recording, now)).Select(recording => Owners(recording, devices, people)).ToList();
        return owners.Exists(those => those.Count == 0) ? [] : Ids(owners.SelectMany(those => those));
    }

    /// <summary>Who had a device. The date of a recording is one of its owner's: each candidate is asked by the clock of the recording, else of the own zone.</summary>
    public static IReadOnlyList<Person> Owners(Recording recording, string serial, DeviceBook devices, IReadOnlyDictionary<string, Person> people) =>
    [
        .. devices.PeopleOf(serial)
            .Select(id => people.GetValueOrDefault(id))
            .OfType<Person>()
            .Where(person => devices.On(serial, Activities.LocalStart.DateOf(recording, person), session: null) == person.Id),
    ];

    private static IReadOnlyList<string> ByFileName(IReadOnlyCollection<SeenName> names, WorkingConfiguration configuration)
    {
        var patterns = configuration.Inboxes.Where(inbox => inbox.FilePattern is not null).ToDictionary(inbox => inbox.Name, inbox => inbox.FilePattern!, StringComparer.Ordinal);
        return Ids(names
            .Where(name => patterns.ContainsKey(name.Inbox))
            .SelectMany(name => name.Path.Split(Inside).Select(stretch => patterns[name.Inbox].Find(stretch[(stretch.LastIndexOf('/') + 1)..], configuration.Subjects))));
    }

    private static IReadOnlyList<Person> Owners(Recording recording, DeviceBook devices, IReadOnlyDictionary<string, Person> people) =>
        recording.Device.Serial is { } serial ? Owners(recording, serial.ToString(System.Globalization.CultureInfo.InvariantCulture), devices, people) : [];

    private static IReadOnlyList<string> Ids(IEnumerable<Person?> people) =>
        [.. people.OfType<Person>().Select(person => person.Id).Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];

    private static IEnumerable<string> Folders(string path) =>
        path.Split(Inside).SelectMany(stretch => stretch.Split('/').SkipLast(1));
}
