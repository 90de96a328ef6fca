using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Activities;
using LoadWatch.Decoding.Csv;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Stimulus;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads and checks <c>loadwatch.json</c>, the roster and the anchors before anything else is touched.</summary>
public sealed class ConfigurationReader
{
    private readonly string path;
    private readonly string folder;
    private readonly string name;
    private readonly List<ConfigurationFault> faults = [];
    private JsonPlaces places = null!;

    private ConfigurationReader(string path)
    {
        this.path = System.IO.Path.GetFullPath(path);
        folder = System.IO.Path.GetDirectoryName(this.path)!;
        name = System.IO.Path.GetFileName(path);
    }

    /// <exception cref="ConfigurationException">Names every fault with file, line and the nearest right word.</exception>
    public static WorkingConfiguration Read(string path) => new ConfigurationReader(path).Read();

    private WorkingConfiguration Read()
    {
        var json = Bytes(path, name);
        var file = Parse(json);
        var zone = Zone(file.TimeZone, "$.time_zone") ?? MachineZone.Get();
        var exercises = Regions(file.Computation.Exercises, DefaultRegions.Exercises, "$.computation.exercises");
        var computation = new ComputationSettings
        {
            UsableShareWanted = file.Computation.UsableShareWanted,
            HeartRateReserveBounds = Ascending(file.Computation.HeartRateReserveBounds, "$.computation.heart_rate_reserve_bounds"),
            PowerBounds = Ascending(file.Computation.PowerBounds, "$.computation.power_bounds"),
            SpeedBounds = Ascending(file.Computation.SpeedBounds, "$.computation.speed_bounds"),
            Exercises = exercises,
            Sports = Regions(file.Computation.Sports, DefaultRegions.Sports, "$.computation.sports"),
        };
        var groups = Groups(file, json);
        CheckLayouts(file.Layouts);
        Stop();

        var people = RosterReader.Read(Resolve(file.Roster), file.Roster, groups.Keys.ToList(), zone)
            .ToDictionary(person => person.Id, StringComparer.OrdinalIgnoreCase);
        var anchors = AnchorsReader.Read(Resolve(file.Anchors), file.Anchors, people, exercises.Keys.ToList());
        var contacts = Contacts(file, groups, people, zone);
        var inboxes = Inboxes(file);
        var mail = new MailReader(Resolve, (at, reason) => faults.Add(Fault(at, reason))).Read(file);
        Stop();

        var (hash, text) = Version(json, file);
        return new WorkingConfiguration(
            folder,
            hash,
            text,
            Resolve(file.Data),
            Resolve(file.Pages),
            Resolve(file.Notices),
            people,
            groups,
            contacts,
            new AnchorBook(anchors),
            inboxes,
            [.. file.Layouts, BuiltInLayouts.Samples],
            computation,
            Duration.FromSeconds(file.Intake.ScanSeconds),
            Duration.FromSeconds(file.Intake.SettleSeconds),
            file.Intake.LargestFileMegabytes * 1024L * 1024L)
        {
            Mail = mail,
        };
    }

    private LoadWatchFile Parse(byte[] json)
    {
        try
        {
            places = JsonPlaces.Of(json);
            using var document = JsonDocument.Parse(json, ConfigurationJson.DocumentOptions);
            faults.AddRange(KeyCheck.UnknownKeys(name, document.RootElement, typeof(LoadWatchFile), places));
            Stop();
            var file = JsonSerializer.Deserialize<LoadWatchFile>(json, ConfigurationJson.Options)
                ?? throw new ConfigurationException(name, "holds null where an object is wanted");
            faults.AddRange(RangeCheck.Faults(file).Select(fault => Fault(fault.Path, fault.Reason)));
            Stop();
            return file;
        }
        catch (JsonException e)
        {
            throw new ConfigurationException([JsonFault(e)]);
        }
    }

    private ConfigurationFault JsonFault(JsonException e)
    {
        // The serializer counts lines from 0 and repeats the place in its message; the first sentence says what is wrong.
        var reason = e.Message.Split(" Path: ", 2)[0].Split(" LineNumber: ", 2)[0];
        var at = e.Path is { Length: > 1 } where ? $"{where[2..]}: " : "";
        return new ConfigurationFault(name, e.LineNumber + 1, at + reason);
    }

    private Dictionary<string, Group> Groups(LoadWatchFile file, byte[] json)
    {
        using var document = JsonDocument.Parse(json, ConfigurationJson.DocumentOptions);
        var common = LimitsNode(document.RootElement);
        var entries = document.RootElement.TryGetProperty("groups", out var list) ? list.EnumerateArray().ToList() : [];
        var groups = new Dictionary<string, Group>(StringComparer.Ordinal);
        foreach (var (entry, i) in file.Groups.Select((entry, i) => (entry, i)))
        {
            var limits = Merge(common.DeepClone().AsObject(), entries.Count > i ? LimitsNode(entries[i]) : []);
            var group = new Group(
                entry.Id,
                entry.Name.Length > 0 ? entry.Name : entry.Id,
                entry.LoadQuantity,
                limits.Deserialize<RuleLimits>(ConfigurationJson.Options)!);
            if (!groups.TryAdd(entry.Id, group))
            {
                faults.Add(Fault($"$.groups[{i}].id", $"the group \"{entry.Id}\" stands above already"));
            }
        }

        return groups;
    }

    private static JsonObject LimitsNode(JsonElement owner) =>
        owner.TryGetProperty("limits", out var limits) && limits.ValueKind == JsonValueKind.Object ? JsonObject.Create(limits)! : [];

    private static JsonObject Merge(JsonObject under, JsonObject over)
    {
        foreach (var (key, value) in over)
        {
            under[key] = value is JsonObject inner && under[key] is JsonObject below ? Merge(below, inner) : value?.DeepClone();
        }

        return under;
    }

    private List<Contact> Contacts(
        LoadWatchFile file, Dictionary<string, Group> groups, Dictionary<string, Person> people, DateTimeZone zone)
    {
        var contacts = new List<Contact>();
        foreach (var (entry, i) in file.Contacts.Select((entry, i) => (entry, i)))
        {
            CheckWords(entry.Groups, groups.Keys, $"$.contacts[{i}].groups", "a group");
            CheckWords(entry.People, people.Keys, $"$.contacts[{i}].people", "in the roster");
            if (contacts.Exists(contact => string.Equals(contact.Id, entry.Id, StringComparison.OrdinalIgnoreCase)))
            {
                faults.Add(Fault($"$.contacts[{i}].id", $"the contact \"{entry.Id}\" stands above already"));
            }

            contacts.Add(new Contact(
                entry.Id,
                entry.Name.Length > 0 ? entry.Name : entry.Id,
                entry.Role,
                entry.Groups.Count > 0 ? entry.Groups : [.. groups.Keys],
                entry.People,
                Zone(entry.TimeZone, $"$.contacts[{i}].time_zone") ?? zone,
                LocalTimePattern.CreateWithInvariantCulture("HH:mm").Parse(entry.BriefAt).Value,
                entry.BriefDays.ToHashSet())
            {
                Mail = entry.Mail.Length > 0 ? entry.Mail : null,
            });
        }

        return contacts;
    }

    private List<Inbox> Inboxes(LoadWatchFile file)
    {
        var inboxes = file.Inboxes.Select(entry => new Inbox(entry.Name, Resolve(entry.Path), entry.Take)).ToList();
        foreach (var (entry, i) in inboxes.Select((entry, i) => (entry, i)))
        {
            if (inboxes.Take(i).Any(above => above.Name == entry.Name))
            {
                faults.Add(Fault($"$.inboxes[{i}].name", $"the inbox \"{entry.Name}\" stands above already"));
            }

            if (!Directory.Exists(entry.Path))
            {
                faults.Add(Fault($"$.inboxes[{i}].path", $"the folder \"{file.Inboxes[i].Path}\" is not there"));
            }
        }

        return inboxes;
    }

    private Dictionary<string, IReadOnlyList<BodyRegion>> Regions(
        IReadOnlyDictionary<string, IReadOnlyList<string>> own, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> shipped, string at)
    {
        var all = shipped.ToDictionary(pair => pair.Key, pair => pair.Value, StringComparer.Ordinal);
        foreach (var (word, regions) in own)
        {
            CheckWords(regions, BodyRegions.All.Select(BodyRegions.Word), $"{at}.{word}", "a body region");
            all[word] = regions.Select(BodyRegions.Parse).OfType<BodyRegion>().ToList();
        }

        return all;
    }

    private IReadOnlyList<double> Ascending(IReadOnlyList<double> bounds, string at)
    {
        if (bounds.Zip(bounds.Skip(1)).Any(pair => pair.First >= pair.Second))
        {
            faults.Add(Fault(at, "the bounds must rise"));
        }

        return bounds;
    }

    private void CheckLayouts(IReadOnlyList<CsvLayout> layouts)
    {
        foreach (var (layout, i) in layouts.Select((layout, i) => (layout, i)))
        {
            faults.AddRange(layout.Validate().Select(reason => Fault($"$.layouts[{i}]", $"layout \"{layout.Name}\": {reason}")));
        }
    }

    private void CheckWords(IEnumerable<string> words, IEnumerable<string> known, string at, string what)
    {
        var list = known.ToList();
        faults.AddRange(words
            .Where(word => !list.Contains(word, StringComparer.OrdinalIgnoreCase))
            .Select(word => Fault(at, $"\"{word}\" is not {what}{Nearest.Hint(word, list)}")));
    }

    private DateTimeZone? Zone(string id, string at)
    {
        if (id.Length == 0)
        {
            return null;
        }

        var zone = DateTimeZoneProviders.Tzdb.GetZoneOrNull(id);
        if (zone is null)
        {
            faults.Add(Fault(at, $"\"{id}\" is not an IANA time zone{Nearest.Hint(id, DateTimeZoneProviders.Tzdb.Ids)}"));
        }

        return zone;
    }

    private (string Hash, string Text) Version(byte[] json, LoadWatchFile file)
    {
        var text = string.Join(
            '\n',
            Encoding.UTF8.GetString(json),
            Encoding.UTF8.GetString(Bytes(Resolve(file.Roster), file.Roster)),
            Encoding.UTF8.GetString(Bytes(Resolve(file.Anchors), file.Anchors)));
        return (Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text))), text);
    }

    private ConfigurationFault Fault(string at, string reason) =>
        new(name, places.LineOf(at), at.Length > 2 ? $"{at[2..]}: {reason}" : reason);

    private string Resolve(string relative) => System.IO.Path.GetFullPath(System.IO.Path.Combine(folder, relative));

    private void Stop()
    {
        if (faults.Count > 0)
        {
            throw new ConfigurationException([.. faults]);
        }
    }

    private static byte[] Bytes(string path, string name)
    {
        try
        {
            return File.ReadAllBytes(path);
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            throw new ConfigurationException(name, $"cannot be read: {e.Message}");
        }
    }
}
