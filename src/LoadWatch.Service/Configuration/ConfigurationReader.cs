using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using LoadWatch.Activities;
using LoadWatch.Decoding.Csv;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>Reads and checks <c>loadwatch.json</c>, the roster, the anchors and the devices before anything else is touched.</summary>
public sealed class ConfigurationReader
{
    private readonly string path;
    private readonly string folder;
    private readonly string name;
    private readonly FaultList faults;

    private ConfigurationReader(string path)
    {
        this.path = System.IO.Path.GetFullPath(path);
        folder = System.IO.Path.GetDirectoryName(this.path)!;
        name = System.IO.Path.GetFileName(path);
        faults = new FaultList(name);
    }

    /// <exception cref="ConfigurationException">Names every fault with file, line and the nearest right word.</exception>
    public static WorkingConfiguration Read(string path) => new ConfigurationReader(path).Read();

    private WorkingConfiguration Read()
    {
        var json = WithoutMark(Bytes(path, name));
        var file = Parse(json);
        var zone = faults.Zone(file.TimeZone, "$.time_zone") ?? MachineZone.Get();
        var exercises = Regions(file.Computation.Exercises, DefaultRegions.Exercises, ExerciseWord.Canonical, "$.computation.exercises");
        var computation = new ComputationSettings
        {
            UsableShareWanted = file.Computation.UsableShareWanted,
            Quality = file.Computation.Quality,
            Equations = file.Computation.Equations,
            HeartRateReserveBounds = Ascending(file.Computation.HeartRateReserveBounds, "$.computation.heart_rate_reserve_bounds"),
            PowerBounds = Ascending(file.Computation.PowerBounds, "$.computation.power_bounds"),
            SpeedBounds = Ascending(file.Computation.SpeedBounds, "$.computation.speed_bounds"),
            SpeedMaxShares = Shares(file.Computation.SpeedMaxShares, "$.computation.speed_max_shares"),
            Exercises = exercises,
            Sports = Regions(file.Computation.Sports, DefaultRegions.Sports, word => word, "$.computation.sports"),
        };
        var groups = Groups(file, json);
        CheckLayouts(file.Layouts);
        var inboxes = InboxesReader.Read(file, Resolve, faults);
        faults.Stop();

        var roster = faults.Collect(() => RosterReader.Read(Resolve(file.Roster), file.Roster, groups.Keys.ToList(), zone));
        var people = (roster ?? []).ToDictionary(
            person => person.Id,
            person => groups.TryGetValue(person.Group, out var group) ? person with { DayBeginsAt = group.DayBeginsAt } : person,
            StringComparer.OrdinalIgnoreCase);
        var anchors = faults.Collect(() => roster is null ? [] : AnchorsReader.Read(Resolve(file.Anchors), file.Anchors, people, exercises.Keys.ToList(), computation.Sports.Keys));
        var devices = faults.Collect(() => roster is null || !HasDevices(file) ? DeviceBook.Empty : DevicesReader.Read(Resolve(file.Devices), file.Devices, people));
        var limits = LimitsOfPeople(json, file, people, roster is not null);
        var contacts = ContactsReader.Read(file, groups, roster is null ? null : people, zone, faults);
        var administrators = AdministratorsReader.Read(file, zone, faults);
        var mail = new MailReader(Resolve, faults.Add).Read(file);
        var webhook = new WebhookReader(Resolve, faults.Add).Read(file);
        faults.Stop();

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
            new AnchorBook(anchors!) { HeartRateMaxEquation = computation.Equations.HeartRateMaxByAge },
            inboxes,
            [.. file.Layouts, .. BuiltInLayouts.All],
            computation,
            Duration.FromSeconds(file.Intake.ScanSeconds),
            Duration.FromSeconds(file.Intake.SettleSeconds),
            file.Intake.LargestFileMegabytes * 1024L * 1024L,
            file.Intake.LargestCsvMegabytes * 1024L * 1024L)
        {
            AllowNetworkDataFolder = file.AllowNetworkDataFolder,
            Administrators = administrators,
            Mail = mail,
            Webhook = webhook,
            Devices = devices!,
            CommonLimits = file.Limits,
            LimitsOfPeople = limits,
            Subjects = new Subjects(people, groups, devices!),
        };
    }

    private LoadWatchFile Parse(byte[] json)
    {
        try
        {
            var places = faults.Places = JsonPlaces.Of(json);
            using var document = JsonDocument.Parse(json, ConfigurationJson.DocumentOptions);
            faults.AddRange(KeyCheck.Faults(name, document.RootElement, typeof(LoadWatchFile), places));
            faults.Stop();
            var file = JsonSerializer.Deserialize<LoadWatchFile>(json, ConfigurationJson.Options)
                ?? throw new ConfigurationException(name, "holds null where an object is wanted");
            foreach (var (at, reason) in RangeCheck.Faults(file))
            {
                faults.Add(at, reason);
            }

            faults.Stop();
            CheckLimits(file.Limits, "$.limits");
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
        var limits = LimitsMerge.OfGroups(document.RootElement);
        var groups = new Dictionary<string, Group>(StringComparer.Ordinal);
        foreach (var (entry, i) in file.Groups.Select((entry, i) => (entry, i)))
        {
            CheckLoad(entry, QuantityNames.AllWith(file.Computation.SpeedBounds, file.Computation.SpeedMaxShares), $"$.groups[{i}]");
            if (entry.Limits is not null)
            {
                CheckLimits(limits[i], $"$.groups[{i}].limits");
            }

            var group = new Group(entry.Id, entry.Name.Length > 0 ? entry.Name : entry.Id, entry.LoadQuantity, limits[i])
            {
                LoadFallbacks = entry.LoadFallbacks,
                DayBeginsAt = HourAndMinute.Pattern.Parse(entry.DayBeginsAt).Value,
                Deviation = file.Computation.Equations.MonotonyDeviation,
            };
            if (!groups.TryAdd(entry.Id, group))
            {
                faults.Add($"$.groups[{i}].id", $"the group \"{entry.Id}\" stands above already");
            }
        }

        return groups;
    }

    private IReadOnlyDictionary<string, RuleLimits> LimitsOfPeople(byte[] json, LoadWatchFile file, Dictionary<string, Person> people, bool known)
    {
        foreach (var id in file.People.Keys.Where(id => known && !people.ContainsKey(id)))
        {
            faults.Add($"$.people.{id}", $"\"{id}\" is not in the roster{Nearest.Hint(id, people.Keys)}");
        }

        foreach (var twice in file.People.Keys.GroupBy(id => id, StringComparer.OrdinalIgnoreCase).Where(same => same.Count() > 1))
        {
            faults.Add($"$.people.{twice.Last()}", $"the person \"{twice.Key}\" stands above already");
            return new Dictionary<string, RuleLimits>();
        }

        using var document = JsonDocument.Parse(json, ConfigurationJson.DocumentOptions);
        var limits = LimitsMerge.OfPeople(document.RootElement, id => people.GetValueOrDefault(id)?.Group);
        foreach (var (id, own) in limits)
        {
            CheckLimits(own, $"$.people.{id}.limits");
        }

        return limits;
    }

    private void CheckLoad(GroupEntry entry, IReadOnlyList<string> known, string at)
    {
        faults.CheckWords([entry.LoadQuantity], known, $"{at}.load_quantity", "a quantity");
        faults.CheckWords(entry.LoadFallbacks, known, $"{at}.load_fallbacks", "a quantity");
        if (entry.LoadFallbacks.Contains(entry.LoadQuantity, StringComparer.Ordinal))
        {
            faults.Add($"{at}.load_fallbacks", $"\"{entry.LoadQuantity}\" is the group's load itself");
        }
    }

    private void CheckLimits(RuleLimits limits, string at)
    {
        foreach (var (below, reason) in LimitsCheck.Faults(limits))
        {
            faults.Add($"{at}.{below}", reason);
        }
    }

    private Dictionary<string, IReadOnlyList<BodyRegion>> Regions(
        IReadOnlyDictionary<string, IReadOnlyList<string>> own,
        IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> shipped,
        Func<string, string?> canonical,
        string at)
    {
        var seen = new HashSet<string>(StringComparer.Ordinal);
        var all = shipped.ToDictionary(pair => pair.Key, pair => pair.Value, StringComparer.Ordinal);
        foreach (var (word, regions) in own)
        {
            faults.CheckWords(regions, BodyRegions.All.Select(BodyRegions.Word), $"{at}.{word}", "a body region");
            if (canonical(word) is not { } key)
            {
                faults.Add($"{at}.{word}", $"\"{word}\" holds no letter");
            }
            else if (!seen.Add(key))
            {
                faults.Add($"{at}.{word}", $"\"{key}\" stands above already, written otherwise");
            }
            else
            {
                all[key] = regions.Select(BodyRegions.Parse).OfType<BodyRegion>().ToList();
            }
        }

        return all;
    }

    private IReadOnlyList<double> Ascending(IReadOnlyList<double> bounds, string at)
    {
        if (bounds.Prepend(0).Zip(bounds).Any(pair => pair.First >= pair.Second))
        {
            faults.Add(at, "the bounds must rise, the first from above 0");
        }

        return bounds;
    }

    private IReadOnlyList<double> Shares(IReadOnlyList<double> shares, string at)
    {
        var outside = shares.Any(share => share is < SpeedMaxShares.Lowest or > SpeedMaxShares.Highest);
        if (outside || shares.Zip(shares.Skip(1)).Any(pair => pair.First >= pair.Second))
        {
            faults.Add(at, "the shares must rise and lie in 0.5 to 1");
        }

        return shares;
    }

    private void CheckLayouts(IReadOnlyList<CsvLayout> layouts)
    {
        foreach (var (layout, i) in layouts.Select((layout, i) => (layout, i)))
        {
            foreach (var reason in layout.Validate())
            {
                faults.Add($"$.layouts[{i}]", $"layout \"{layout.Name}\": {reason}");
            }
        }
    }

    private (string Hash, string Text) Version(byte[] json, LoadWatchFile file)
    {
        var text = string.Join(
            '\n',
            Encoding.UTF8.GetString(json),
            TableFile.TextOf(Resolve(file.Roster), file.Roster),
            TableFile.TextOf(Resolve(file.Anchors), file.Anchors));
        text += HasDevices(file) ? $"\n{TableFile.TextOf(Resolve(file.Devices), file.Devices)}" : "";
        return (Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text))), text);
    }

    /// <summary>Only under its usual name may the file be missing: another name was written on purpose.</summary>
    private bool HasDevices(LoadWatchFile file) => file.Devices != LoadWatchFile.DefaultDevices || File.Exists(Resolve(file.Devices));

    private string Resolve(string relative) => System.IO.Path.GetFullPath(System.IO.Path.Combine(folder, relative));

    private static byte[] WithoutMark(byte[] bytes) => bytes is [0xEF, 0xBB, 0xBF, .. var rest] ? rest : bytes;

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
