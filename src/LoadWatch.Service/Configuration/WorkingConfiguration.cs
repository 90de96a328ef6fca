using LoadWatch.Activities;
using LoadWatch.Decoding.Csv;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Webhook;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Service.Arrivals;
using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>The configuration as the service works with it: checked, paths resolved, one snapshot for a whole sweep.</summary>
/// <param name="Folder">Absolute folder of <c>loadwatch.json</c>.</param>
/// <param name="Hash">SHA-256 over the files of the configuration, 64 hex digits.</param>
/// <param name="Text">Those files, one after the other, as kept in <c>config_version</c>.</param>
/// <param name="People">By id, compared without regard to case, in roster order.</param>
/// <param name="Groups">By id.</param>
public sealed record WorkingConfiguration(
    string Folder,
    string Hash,
    string Text,
    string DataFolder,
    string PagesFolder,
    string NoticesFolder,
    IReadOnlyDictionary<string, Person> People,
    IReadOnlyDictionary<string, Group> Groups,
    IReadOnlyList<Contact> Contacts,
    AnchorBook Anchors,
    IReadOnlyList<Inbox> Inboxes,
    IReadOnlyList<CsvLayout> Layouts,
    ComputationSettings Computation,
    Duration ScanEvery,
    Duration Settle,
    long LargestFileBytes,
    long LargestCsvBytes)
{
    /// <summary>The mail server; null when there is none.</summary>
    public MailSettings? Mail { get; init; }

    /// <summary>Where notices are posted to; null when nowhere.</summary>
    public WebhookSettings? Webhook { get; init; }

    /// <summary>Whether the data folder may lie on a network file system.</summary>
    public bool AllowNetworkDataFolder { get; init; }

    /// <summary>Who looks after the service.</summary>
    public IReadOnlyList<Administrator> Administrators { get; init; } = [];

    /// <summary>Devices that are handed out; empty without <c>devices.csv</c>.</summary>
    public DeviceBook Devices { get; init; } = DeviceBook.Empty;

    /// <summary>Finds people and groups by how they are written.</summary>
    public required Subjects Subjects { get; init; }

    /// <summary>Limits of groups that set none of their own.</summary>
    public RuleLimits CommonLimits { get; init; } = new();

    /// <summary>Limits of single people, by id compared without regard to case; who is not among them has those of the group.</summary>
    public IReadOnlyDictionary<string, RuleLimits> LimitsOfPeople { get; init; } = new Dictionary<string, RuleLimits>();

    /// <summary>A person's group, with the limits that are in force for the person.</summary>
    public Group GroupOf(Person person) =>
        LimitsOfPeople.GetValueOrDefault(person.Id) is { } own ? Groups[person.Group] with { Limits = own } : Groups[person.Group];

    /// <summary>Whether files that were cut off are used of any of these inboxes.</summary>
    public bool Salvages(IEnumerable<string> inboxes) => Inboxes.Any(inbox => inbox.Salvage && inboxes.Contains(inbox.Name, StringComparer.Ordinal));

    /// <summary>The people whom a contact's brief is about, sorted by id.</summary>
    public IEnumerable<Person> PeopleOf(Contact contact) =>
        People.Values
            .Where(person => contact.People.Count > 0
                ? contact.People.Contains(person.Id, StringComparer.OrdinalIgnoreCase)
                : contact.Groups.Contains(person.Group))
            .OrderBy(person => person.Id, StringComparer.Ordinal);
}

/// <summary>A watched folder.</summary>
/// <param name="Path">Absolute.</param>
public sealed record Inbox(string Name, string Path, TakeMode Take)
{
    /// <summary>How file names tell whose a file is; null: they do not.</summary>
    public FilePattern? FilePattern { get; init; }

    /// <summary>Name of what must lie in it for it to be the inbox; null: nothing.</summary>
    public string? Marker { get; init; }

    /// <summary>Whether the beginning of a FIT file that was cut off is used.</summary>
    public bool Salvage { get; init; }
}
