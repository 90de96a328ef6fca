using System.Security.Cryptography;
using System.Text.Json;
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Configurations;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// The configuration and the formulas, cut into the parts that derived rows depend on. What is in no part changes no row: contacts, mail, scan times, folders
/// of inboxes. A test knows of every property whether it is in one.
/// </summary>
public static class BasisParts
{
    /// <summary>Scope of what is about everybody.</summary>
    public const string Everybody = "";

    /// <summary>Formulas, cuts and quantities.</summary>
    public const string Formulas = "formulas";

    /// <summary>What a user may set of the computation.</summary>
    public const string Computation = "computation";

    /// <summary>How text files are read.</summary>
    public const string Layouts = "layouts";

    /// <summary>Ids, names and aliases by which people and groups are found.</summary>
    public const string Names = "names";

    /// <summary>Who had which device.</summary>
    public const string Devices = "devices";

    /// <summary>How file names tell whose a file is.</summary>
    public const string FileNames = "file_names";

    /// <summary>In which inboxes files that were cut off are used; there only where there is one.</summary>
    public const string Salvage = "salvage";

    /// <summary>Of a person: birth year, sex, zone, and when their day begins.</summary>
    public const string Profile = "profile";

    /// <summary>Of a person: when heart rate says nothing; dates, or empty.</summary>
    public const string HeartRate = "heart_rate";

    /// <summary>Of a person: reference values, a line each that begins with its date.</summary>
    public const string Anchors = "anchors";

    /// <summary>Of a person: the group, and the names by which a plan may mean it.</summary>
    public const string Group = "group";

    /// <summary>Of a person: what days and rules take from the group, and how they are computed.</summary>
    public const string Rules = "rules";

    private static readonly JsonSerializerOptions Json = new(ConfigurationJson.Options) { WriteIndented = false };

    public static IReadOnlyList<BasisPart> Of(WorkingConfiguration configuration) =>
    [
        .. OfEverybody(configuration),
        .. configuration.People.Values.SelectMany(person => OfPerson(configuration, person)),
    ];

    private static IEnumerable<BasisPart> OfEverybody(WorkingConfiguration configuration) =>
    [
        new(Everybody, Formulas, $"{ActivityComputation.Version}"),
        new(Everybody, Computation, Hash(Sorted(configuration.Computation))),
        new(Everybody, Layouts, Hash(configuration.Layouts)),
        new(Everybody, Names, Hash(new { People = configuration.People.Values.Select(person => new { person.Id, person.Name, person.Aliases }), Groups = GroupNames(configuration) })),
        new(Everybody, Devices, Hash(configuration.Devices.All.Select(one => new { one.Serial, one.Person, From = Date(one.From), To = Date(one.To), one.Session }))),
        new(Everybody, FileNames, Hash(configuration.Inboxes.Where(inbox => inbox.FilePattern is not null).Select(inbox => new { inbox.Name, inbox.FilePattern!.Text }))),
        .. OfSalvage([.. configuration.Inboxes.Where(inbox => inbox.Salvage).Select(inbox => inbox.Name).Order(StringComparer.Ordinal)]),
    ];

    private static IEnumerable<BasisPart> OfSalvage(IReadOnlyList<string> inboxes) => inboxes.Count == 0 ? [] : [new(Everybody, Salvage, Hash(inboxes))];

    private static IEnumerable<BasisPart> OfPerson(WorkingConfiguration configuration, Person person)
    {
        var group = configuration.GroupOf(person);
        return
        [
            new(person.Id, Profile, ProfileOf(person)),
            new(person.Id, HeartRate, person.HeartRateInvalid.ToString()),
            new(person.Id, Anchors, string.Join('\n', configuration.Anchors.Of(person.Id).Select(Line).Order(StringComparer.Ordinal))),
            new(person.Id, Group, Hash(new { person.Group, Names = GroupNames(configuration) })),
            new(person.Id, Rules, Hash(new { person.Name, group.LoadQuantity, group.LoadFallbacks, group.Deviation, group.Limits, LoadCalendar.Version })),
        ];
    }

    /// <summary>A day that begins at midnight is not named: nothing else was once.</summary>
    private static string ProfileOf(Person person) => person.DayBeginsAt == LocalTime.Midnight
        ? JsonSerializer.Serialize(new { person.BirthYear, person.Sex, Zone = person.Zone.Id }, Json)
        : JsonSerializer.Serialize(new { person.BirthYear, person.Sex, Zone = person.Zone.Id, DayBeginsAt = LocalTimePattern.ExtendedIso.Format(person.DayBeginsAt) }, Json);

    /// <summary>The date of a line of <see cref="Anchors"/>, or null where the value holds from the beginning.</summary>
    public static LocalDate? DateOf(string line) => JsonSerializer.Deserialize<string?[]>(line)![0] is { Length: > 0 } date ? LocalDatePattern.Iso.Parse(date).Value : null;

    private static string Line(Anchor anchor) => JsonSerializer.Serialize(new[]
    {
        Date(anchor.Date), anchor.Kind.ToString(), anchor.Value.ToString("R", System.Globalization.CultureInfo.InvariantCulture), anchor.Source.ToString(), anchor.Exercise, anchor.Note, anchor.Machine, anchor.Sport, Date(anchor.ShownOn),
    });

    private static IEnumerable<object> GroupNames(WorkingConfiguration configuration) =>
        configuration.Groups.Values.OrderBy(group => group.Id, StringComparer.Ordinal).Select(group => new { group.Id, group.Name });

    /// <summary>In which order words stand in the file says nothing.</summary>
    private static ComputationSettings Sorted(ComputationSettings settings) => settings with
    {
        Exercises = new SortedDictionary<string, IReadOnlyList<BodyRegion>>(settings.Exercises.ToDictionary(StringComparer.Ordinal), StringComparer.Ordinal),
        Sports = new SortedDictionary<string, IReadOnlyList<BodyRegion>>(settings.Sports.ToDictionary(StringComparer.Ordinal), StringComparer.Ordinal),
    };

    private static string Date(LocalDate? date) => date is { } known ? LocalDatePattern.Iso.Format(known) : "";

    private static string Hash<T>(T value) => Convert.ToHexStringLower(SHA256.HashData(JsonSerializer.SerializeToUtf8Bytes(value, Json)));
}
